import type { Control, DeviceModel } from '@coaxwain/models'
import type { PlanPart } from '@coaxwain/signal'
import { describe, expect, it } from 'vitest'
import { isSoldFor, receivedOffAir } from './sold-for'

const US: PlanPart = { plan: 'us-broadcast' }
const US_3_4: PlanPart = { plan: 'us-broadcast', names: '3..4' }
const UK: PlanPart = { plan: 'uk-uhf' }
const CABLE: PlanPart = { plan: 'us-cable-std', names: '2..6' }

const having = (kind: DeviceModel['kind'], control: object): DeviceModel =>
  ({ kind, controls: [control as Control] }) as unknown as DeviceModel

const set = (...parts: PlanPart[]): DeviceModel =>
  having('television', { kind: 'tuned-to', reaches: parts.map((part) => ({ part })) })

const modulator = (part: PlanPart): DeviceModel =>
  having('modulator', { kind: 'channel', carriers: { part } })

const sold = (part: DeviceModel, beside: DeviceModel): boolean =>
  isSoldFor(part, receivedOffAir(beside))

describe('a modulator', () => {
  it('is sold where its channels are on the air', () => {
    expect(sold(modulator(US_3_4), set(US))).toBe(true)
    expect(sold(modulator(UK), set(UK))).toBe(true)
  })

  it('is not sold in a country with other channels', () => {
    expect(sold(modulator(US_3_4), set(UK))).toBe(false)
  })

  it('is not sold for a cable plan that a set also reaches', () => {
    expect(sold(modulator(CABLE), set(UK, CABLE))).toBe(false)
  })

  it('is sold beside a set without a tuner', () => {
    expect(sold(modulator(UK), having('monitor', { kind: 'positions' }))).toBe(true)
  })
})

it('everything else is sold anywhere', () => {
  expect(sold(having('scan-converter', { kind: 'positions' }), set(UK))).toBe(true)
})
