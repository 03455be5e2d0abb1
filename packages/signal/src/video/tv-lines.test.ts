import { mhz, microsecond } from '@coaxwain/quantities'
import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { ACTIVE_LINE, horizontalTvLines } from './tv-lines'

// 2 x B x t x 3/4, by hand.
describe('detail across a picture', () => {
  it.each([
    [4.2, 525, 331.76],
    [5, 625, 390],
    [5.5, 625, 429],
    [3, 525, 236.97],
  ] as const)('of %d MHz in %d lines', (bandwidth, lines, expected) => {
    const found = horizontalTvLines(mhz(bandwidth), ACTIVE_LINE[lines])
    expect(found.ok && found.value).toBeCloseTo(expected, 2)
  })

  it('grows with the bandwidth and shrinks with the width of the screen', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.5, max: 20, noNaN: true }), (bandwidth) => {
        const narrow = horizontalTvLines(mhz(bandwidth), ACTIVE_LINE[625])
        const wide = horizontalTvLines(mhz(bandwidth), ACTIVE_LINE[625], 16 / 9)
        if (!narrow.ok || !wide.ok) throw new Error('refused')
        expect(narrow.value / bandwidth).toBeCloseTo(78, 9)
        expect(wide.value).toBeCloseTo(narrow.value * 0.75, 9)
      }),
    )
  })

  it('needs a bandwidth and a line', () => {
    expect(horizontalTvLines(mhz(0), ACTIVE_LINE[525]).ok).toBe(false)
    expect(horizontalTvLines(mhz(4), microsecond(0))).toMatchObject({
      problem: { code: 'not-positive', details: { what: 'activeLine' } },
    })
  })
})
