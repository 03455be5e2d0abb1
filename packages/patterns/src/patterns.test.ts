import { checkModel, type DeviceModel } from '@coaxwain/models'
import { expect, it } from 'vitest'
import { ORDINARY_PARTS, partsFor } from './index'

it.each(Object.entries(ORDINARY_PARTS))('%s holds together as a model', (_, model) => {
  expect(checkModel(model)).toEqual([])
})

/** A set that is tuned to some channels; what else it is does not matter here. */
const setFor = (plan: 'us-broadcast' | 'uk-uhf'): DeviceModel => ({
  ...(ORDINARY_PARTS['analogue-tuner'] as DeviceModel),
  controls: [
    {
      key: 'tuned-to',
      label: 'CHANNEL',
      access: 'front',
      look: 'push',
      kind: 'tuned-to',
      way: 'numbers',
      reaches: [{ part: { plan } }, { part: { plan: 'us-cable-std' } }],
      pullInMhz: 0.3,
    },
  ],
})

it.each([
  ['us-broadcast', 'modulator-3-4', 'modulator-jp'],
  ['uk-uhf', 'modulator-uhf', 'modulator-3-4'],
] as const)('a set for %s has %s beside it and no %s', (plan, sold, foreign) => {
  const parts = Object.keys(partsFor(setFor(plan)))
  expect(parts).toContain(sold)
  expect(parts).not.toContain(foreign)
})

it('a set without a tuner has everything beside it', () => {
  expect(partsFor(undefined)).toBe(ORDINARY_PARTS)
})
