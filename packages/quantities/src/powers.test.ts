import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { addPowers } from './powers'
import { dbmv, type Dbmv } from './units'

const sum = (levels: readonly number[]): Dbmv => {
  const result = addPowers(levels.map(dbmv))
  if (!result.ok) throw new Error(result.problem.code)
  return result.value
}

const levels = fc.array(fc.double({ min: -40, max: 40, noNaN: true }), {
  minLength: 1,
  maxLength: 9,
})

describe('adding carriers', () => {
  // 10 + 10 log 8.
  it('loads an amplifier with eight at +10 like one at +19.03', () => {
    expect(sum([10, 10, 10, 10, 10, 10, 10, 10])).toBeCloseTo(19.0309, 3)
  })

  it('is never below the strongest nor above it by more than 10 log N', () => {
    fc.assert(
      fc.property(levels, (all) => {
        const most = Math.max(...all)
        expect(sum(all)).toBeGreaterThanOrEqual(most - 1e-9)
        expect(sum(all)).toBeLessThanOrEqual(most + 10 * Math.log10(all.length) + 1e-9)
      }),
    )
  })

  it('does not depend on what is added first', () => {
    fc.assert(
      fc.property(levels, levels, (a, b) => {
        expect(sum([...a, ...b])).toBeCloseTo(sum([sum(b), sum(a)]), 9)
      }),
    )
  })

  it('says that there is nothing to add', () => {
    expect(addPowers([])).toMatchObject({ problem: { code: 'too-few' } })
  })
})
