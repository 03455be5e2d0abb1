import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { ghost, reflect, returnLossThrough, ripple, type Reflection } from './reflection'
import { db, metre, microsecond, ohm } from './units'

const at = (line: number, load: number): Reflection => {
  const result = reflect(ohm(line), ohm(load))
  if (!result.ok) throw new Error(result.problem.code)
  return result.value
}

const impedance = fc.double({ min: 1, max: 10_000, noNaN: true })

// By hand from (ZL - Z0) / (ZL + Z0).
describe('a mismatch', () => {
  it.each([
    [75, 300, 0.6, 4, 4.437, 1.938],
    [75, 50, -0.2, 1.5, 13.979, 0.177],
    [75, 1000, 0.86047, 13.333, 1.305, 5.857],
    [75, 37.5, -0.33333, 2, 9.542, 0.512],
  ])('of %d ohm with %d ohm', (...[line, load, gamma, ratio, back, lost]) => {
    const found = at(line, load)
    expect(found.gamma).toBeCloseTo(gamma, 4)
    expect(found.standingWaveRatio).toBeCloseTo(ratio, 3)
    expect(found.returnLoss).toBeCloseTo(back, 3)
    expect(found.mismatchLoss).toBeCloseTo(lost, 3)
  })

  it('costs the same from either side', () => {
    fc.assert(
      fc.property(impedance, impedance, (a, b) => {
        expect(at(a, b).mismatchLoss).toBeCloseTo(at(b, a).mismatchLoss!, 9)
      }),
    )
  })

  it('loses nothing where there is none, and sends nothing back', () => {
    expect(at(75, 75)).toEqual({
      gamma: 0,
      standingWaveRatio: 1,
      returnLoss: null,
      mismatchLoss: 0,
    })
  })

  it('sends everything back from a short', () => {
    expect(at(75, 0)).toMatchObject({ gamma: -1, standingWaveRatio: null, mismatchLoss: null })
  })

  it('needs a line and a load', () => {
    expect(reflect(ohm(0), ohm(75))).toMatchObject({ problem: { code: 'not-positive' } })
    expect(reflect(ohm(75), ohm(-1))).toMatchObject({ problem: { code: 'negative' } })
  })

  it('is seen better by twice the loss of a pad before it', () => {
    const seen = returnLossThrough(db(4.5), db(3))
    expect(seen).toEqual({ ok: true, value: 10.5 })
    expect(returnLossThrough(db(4.437), db(-3))).toMatchObject({ problem: { code: 'negative' } })
  })

  it('at both ends lets the level swing', () => {
    expect(ripple(at(75, 75), at(75, 300))).toBe(0)
    // 20 log (1 + 0.6 x 0.6)
    expect(ripple(at(75, 300), at(75, 300))).toBeCloseTo(2.671, 3)
  })
})

describe('a ghost', () => {
  const lead = (length: number, velocityFactor: number) =>
    ghost({ length: metre(length), velocityFactor, activeLine: microsecond(52.66) })

  // 2 x 15 m at 0.82 of the speed of light.
  it('from 15 m of foam cable lies within the width of a line', () => {
    const found = lead(15, 0.82)
    expect(found.ok && found.value.delay).toBeCloseTo(0.12204, 4)
    expect(found.ok && found.value.ofWidth).toBeCloseTo(0.2317, 3)
  })

  it('never outruns light', () => {
    expect(lead(15, 1.1)).toMatchObject({ problem: { code: 'out-of-range' } })
    expect(lead(15, 0)).toMatchObject({ problem: { code: 'not-positive' } })
  })
})
