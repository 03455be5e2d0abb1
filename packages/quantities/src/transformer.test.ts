import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { dbmvToDbm } from './levels'
import { transformed } from './transformer'
import { db, dbmv, ohm, type Dbmv } from './units'

const through = (level: number, from: number, to: number, loss = 0): Dbmv => {
  const result = transformed(dbmv(level), { from: ohm(from), to: ohm(to), loss: db(loss) })
  if (!result.ok) throw new Error(result.problem.code)
  return result.value
}

describe('a transformer', () => {
  // 10 log (300 / 75) = 6.02.
  it('doubles the voltage from 75 to 300 ohm', () => {
    expect(through(6, 75, 300)).toBeCloseTo(12.0206, 4)
  })

  it('keeps the power but for its loss', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -60, max: 60, noNaN: true }),
        fc.double({ min: 0, max: 6, noNaN: true }),
        (level, loss) => {
          const before = dbmvToDbm(dbmv(level), ohm(75))
          const after = dbmvToDbm(through(level, 75, 300, loss), ohm(300))
          expect(before - after).toBeCloseTo(loss, 9)
        },
      ),
    )
  })

  it('works backwards as forwards', () => {
    expect(through(through(3, 75, 300), 300, 75)).toBeCloseTo(3, 9)
  })

  it('has no impedance of nothing', () => {
    expect(transformed(dbmv(0), { from: ohm(0), to: ohm(75), loss: db(0) })).toMatchObject({
      problem: { code: 'not-positive', details: { what: 'from' } },
    })
  })
})
