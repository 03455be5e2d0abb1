import { db } from '@coaxwain/quantities'
import { describe, expect, it } from 'vitest'
import { amplifierDerating, cascadeDerating, ratioAfter, TRIPLE_BEAT } from './derating'

describe('staying below a rating', () => {
  // 7.5 log 7, and the rounded catalogue table: 3, 4, 5, 6, 7, 8, 10 channels.
  it.each([
    [2, 0],
    [3, 2.26],
    [8, 6.34],
    [10, 7.16],
  ])('with %d channels', (channels, by) => {
    const found = amplifierDerating(channels)
    expect(found.ok && found.value).toBeCloseTo(by, 2)
  })

  it.each([
    [1, 0],
    [2, 3.01],
    [4, 6.02],
  ])('with %d amplifiers in a row', (amplifiers, by) => {
    const found = cascadeDerating(amplifiers)
    expect(found.ok && found.value).toBeCloseTo(by, 2)
  })

  it('is asked of two channels and one amplifier at least', () => {
    expect(amplifierDerating(1)).toMatchObject({ problem: { code: 'too-few' } })
    expect(cascadeDerating(0)).toMatchObject({ problem: { code: 'too-few' } })
  })

  it('costs products their distance once or twice over', () => {
    expect(ratioAfter(db(57), 2, db(3))).toBe(54)
    expect(ratioAfter(db(57), 3, db(3))).toBe(51)
    expect(TRIPLE_BEAT).toBeCloseTo(6.02, 2)
  })
})
