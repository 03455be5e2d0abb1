import { db, dbmv } from '@coaxwain/quantities'
import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { backfeed } from './backfeed'

const up = (level: number, ...isolations: number[]) => {
  const found = backfeed(dbmv(level), isolations.map(db))
  if (!found.ok) throw new Error(found.problem.code)
  return found.value
}

// 47 CFR 15.115(c)(1)(ii): 0.346 sqrt(75) uV is -50.47 dBmV.
describe('what gets up to an aerial', () => {
  it('past a splitter as combiner is 38 dB too much', () => {
    expect(up(9.54, 22).level).toBeCloseTo(-12.46, 9)
    expect(up(9.54, 22).excess).toBeCloseTo(38.01, 2)
    expect(up(9.54, 22).allowed).toBe(false)
  })

  it('past 40 dB more is allowed', () => {
    expect(up(9.54, 22, 40)).toMatchObject({ allowed: true })
  })

  it('never grows by one isolation more', () => {
    const isolation = fc.double({ min: 0, max: 90, noNaN: true })
    fc.assert(
      fc.property(fc.array(isolation, { maxLength: 4 }), isolation, (way, more) => {
        expect(up(9, ...way, more).level).toBeLessThanOrEqual(up(9, ...way).level)
        expect(up(9, ...way).allowed && !up(9, ...way, more).allowed).toBe(false)
      }),
    )
  })

  it('is isolated by nothing that amplifies', () => {
    expect(backfeed(dbmv(9), [db(-3)])).toMatchObject({
      problem: { code: 'negative', details: { what: 'isolation 0' } },
    })
  })
})
