import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { attenuator, minimumLossPad } from './pads'
import { db, ohm } from './units'

const parallel = (a: number, b: number): number => (a * b) / (a + b)

describe('a minimum-loss pad', () => {
  const pad = (high: number, low: number) => {
    const result = minimumLossPad(ohm(high), ohm(low))
    if (!result.ok) throw new Error(result.problem.code)
    return result.value
  }

  // sqrt(300 x 225) = 259.81 and 75 sqrt(300 / 225) = 86.60.
  it('joins 300 to 75 ohm for 11.44 dB', () => {
    expect(pad(300, 75).series).toBeCloseTo(259.81, 2)
    expect(pad(300, 75).shunt).toBeCloseTo(86.6, 2)
    expect(pad(300, 75).loss).toBeCloseTo(11.439, 3)
  })

  it('is matched at both ends and never amplifies', () => {
    const pair = fc.tuple(
      fc.double({ min: 10, max: 300, noNaN: true }),
      fc.double({ min: 1.01, max: 20, noNaN: true }),
    )
    fc.assert(
      fc.property(pair, ([low, step]) => {
        const high = low * step
        const { series, shunt, loss } = pad(high, low)
        expect(series + parallel(shunt, low)).toBeCloseTo(high, 6)
        expect(parallel(shunt, series + high)).toBeCloseTo(low, 6)
        expect(loss).toBeGreaterThan(0)
      }),
    )
  })

  it('is for two impedances, the higher one first', () => {
    expect(minimumLossPad(ohm(75), ohm(300))).toMatchObject({ problem: { code: 'wrong-order' } })
    expect(minimumLossPad(ohm(75), ohm(75))).toMatchObject({ problem: { code: 'wrong-order' } })
    expect(minimumLossPad(ohm(75), ohm(0))).toMatchObject({ problem: { code: 'not-positive' } })
  })
})

describe('an attenuator', () => {
  const made = (z: number, loss: number) => {
    const result = attenuator(ohm(z), db(loss))
    if (!result.ok) throw new Error(result.problem.code)
    return result.value
  }

  // K = 1.9953: 75 x 0.9953 / 2.9953 = 24.92.
  it('of 6 dB at 75 ohm', () => {
    expect(made(75, 6).teeSeries).toBeCloseTo(24.92, 2)
    expect(made(75, 6).teeShunt).toBeCloseTo(100.4, 1)
    expect(made(75, 6).piShunt).toBeCloseTo(225.71, 1)
    expect(made(75, 6).piSeries).toBeCloseTo(56.03, 2)
  })

  it('is matched in both forms and takes what it says', () => {
    const z = 75
    fc.assert(
      fc.property(fc.double({ min: 0.1, max: 60, noNaN: true }), (loss) => {
        const { teeSeries, teeShunt, piShunt, piSeries } = made(z, loss)
        expect(teeSeries + parallel(teeShunt, teeSeries + z)).toBeCloseTo(z, 6)
        expect(parallel(piShunt, piSeries + parallel(piShunt, z))).toBeCloseTo(z, 6)
        const across = parallel(piShunt, z)
        expect(20 * Math.log10((across + piSeries) / across)).toBeCloseTo(loss, 6)
      }),
    )
  })

  it.each([0, -3])('does not come in %d dB', (loss) => {
    expect(attenuator(ohm(75), db(loss))).toMatchObject({ problem: { code: 'not-positive' } })
  })
})
