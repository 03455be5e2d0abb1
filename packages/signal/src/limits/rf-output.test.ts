import { dbmvToDbm, ohm } from '@coaxwain/quantities'
import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { OUTPUT_LIMITS, outputLimit, type OutputLimit } from './rf-output'

const limit = (name: OutputLimit, across: number) => {
  const found = outputLimit(name, ohm(across))
  if (!found.ok) throw new Error(found.problem.code)
  return found.value
}

// 47 CFR 15.115: K sqrt(R).
describe('what may leave a box', () => {
  it.each([
    ['vision', 75, 2999.91, 9.54],
    ['vision', 300, 5999.82, 15.56],
    ['sound', 75, 671.17, -3.46],
    ['vision-cable-device', 75, 5999.82, 15.56],
    ['out-of-channel', 75, 94.83, -20.46],
    ['aerial-socket', 75, 3, -50.47],
  ] as const)('as %s across %d ohm', (name, across, microvolts, level) => {
    expect(limit(name, across).voltage).toBeCloseTo(microvolts, 1)
    expect(limit(name, across).level).toBeCloseTo(level, 1)
  })

  it('is one power across every impedance', () => {
    const names = fc.constantFrom(...(Object.keys(OUTPUT_LIMITS) as OutputLimit[]))
    const impedance = fc.double({ min: 10, max: 600, noNaN: true })
    fc.assert(
      fc.property(names, impedance, (name, across) => {
        expect(dbmvToDbm(limit(name, across).level, ohm(across))).toBeCloseTo(
          dbmvToDbm(limit(name, 75).level, ohm(75)),
          6,
        )
      }),
    )
  })

  it('needs an impedance', () => {
    expect(outputLimit('vision', ohm(0)).ok).toBe(false)
  })
})
