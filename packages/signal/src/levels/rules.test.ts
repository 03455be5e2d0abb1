import { dbmv, mhz } from '@coaxwain/quantities'
import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { neighbourRule, soundBelowVision, spreadRule } from './rules'

// 47 CFR 76.605(a)(4), (5), 2015 text.
describe('levels of a cable', () => {
  it.each([
    [6, 10, 6, false],
    [6, 9, 6, true],
    [9, 6, 6.0003, true],
    [6, 10, 12, true],
  ])('%d and %d dBmV, %d MHz apart', (...[a, b, apart, holds]) => {
    expect(neighbourRule(dbmv(a), dbmv(b), mhz(apart)).holds).toBe(holds)
  })

  it('are neighbours from both sides', () => {
    const level = fc.double({ min: -20, max: 30, noNaN: true })
    fc.assert(
      fc.property(level, level, (a, b) => {
        expect(neighbourRule(dbmv(a), dbmv(b), mhz(6))).toEqual(
          neighbourRule(dbmv(b), dbmv(a), mhz(6)),
        )
      }),
    )
  })

  it.each([
    [216, 10],
    [300, 10],
    [301, 11],
    [400, 11],
    [401, 12],
    [550, 13],
  ])('up to %d MHz may differ by %d dB', (upper, allowed) => {
    expect(spreadRule([dbmv(3), dbmv(13)], mhz(upper))).toMatchObject({
      value: { found: 10, allowed, holds: true },
    })
  })

  it('that are none differ by nothing that could be judged', () => {
    expect(spreadRule([], mhz(300))).toMatchObject({ problem: { code: 'too-few' } })
  })

  it.each([
    [10, false, true],
    [9.9, false, false],
    [17.1, false, false],
    [6.5, true, true],
    [6.4, true, false],
  ])('with sound %d dB below vision, behind a converter: %s', (below, converter, holds) => {
    expect(soundBelowVision(dbmv(20), dbmv(20 - below), converter).holds).toBe(holds)
  })
})
