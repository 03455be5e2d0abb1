import { mhz, picofarad } from '@coaxwain/quantities'
import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { combineYc, type CombinedYc } from './yc-capacitor'

const combined = (pf: number, at: number): CombinedYc => {
  const found = combineYc(picofarad(pf), mhz(at))
  if (!found.ok) throw new Error(found.problem.code)
  return found.value
}

describe('luma and chroma joined by a capacitor', () => {
  // X = 94.6 ohm: 75 / |112.5 - j94.6| and 2 |75 - j94.6| / |225 - j189.2|.
  it('lose 5.84 and 1.71 dB by 470 pF at the NTSC subcarrier', () => {
    expect(combined(470, 3.579545).chroma).toBeCloseTo(-5.84, 2)
    expect(combined(470, 3.579545).luma).toBeCloseTo(-1.71, 2)
  })

  it('let slow luma through whole', () => {
    expect(combined(470, 0.01).luma).toBeCloseTo(0, 2)
  })

  it('never gain, and split the loss ever more evenly as the capacitor grows', () => {
    const size = fc.double({ min: 10, max: 100_000, noNaN: true })
    fc.assert(
      fc.property(size, fc.double({ min: 0.1, max: 6, noNaN: true }), (pf, at) => {
        const { chroma, luma } = combined(pf, at)
        expect(chroma).toBeLessThan(0)
        expect(luma).toBeLessThanOrEqual(1e-9)
        expect(luma).toBeGreaterThan(chroma)
        expect(combined(2 * pf, at).chroma).toBeGreaterThan(chroma)
      }),
    )
  })

  it('need a capacitor and a frequency', () => {
    expect(combineYc(picofarad(0), mhz(3.58)).ok).toBe(false)
    expect(combineYc(picofarad(470), mhz(0))).toMatchObject({
      problem: { details: { what: 'at' } },
    })
  })
})
