import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { db, dbmv, mhz, minus, ohm, plus, times, type Dbmv } from './units'

describe('quantities', () => {
  it('add up and take away within one unit', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: -500, max: 500 }),
        fc.integer({ min: -500, max: 500 }),
        (a, b) => {
          expect(minus(plus(mhz(a), mhz(b)), mhz(b))).toBe(a)
        },
      ),
    )
    expect(times(db(3), 2)).toBe(6)
  })

  // What these lines prove is proved when the types are checked: without the errors they do not compile.
  it('of two units have no sum, and no unit takes a bare number', () => {
    // @ts-expect-error a level and a frequency
    plus(dbmv(3), mhz(61.25))
    // @ts-expect-error a frequency and a level
    minus(mhz(61.25), dbmv(3))
    // @ts-expect-error the plain sum of both is neither
    const level: Dbmv = dbmv(3) + mhz(61.25)
    // @ts-expect-error a bare number
    const bare: Dbmv = 3
    expect([level, bare]).toEqual([64.25, 3])
  })

  it.each([Number.NaN, Infinity, -Infinity])('are never made of %s', (value) => {
    expect(() => ohm(value)).toThrow('finite')
  })
})
