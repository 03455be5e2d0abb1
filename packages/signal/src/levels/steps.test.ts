import { db, dbmv, foot, mhz, type Dbmv } from '@coaxwain/quantities'
import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { afterSteps, type LevelStep } from './steps'

const after = (start: number, ...steps: LevelStep[]): Dbmv => {
  const found = afterSteps(dbmv(start), steps)
  if (!found.ok) throw new Error(found.problem.code)
  return found.value
}

const dB = fc.double({ min: 0, max: 20, noNaN: true }).map(db)

const passive = fc.oneof(
  dB.map((loss): LevelStep => ({ kind: 'loss', loss })),
  fc.record({
    kind: fc.constant('splitter' as const),
    outputs: fc.integer({ min: 1, max: 8 }),
    excess: dB,
  }),
  fc.record({
    kind: fc.constant('cable' as const),
    cable: fc.constantFrom('RG-6' as const, 'RG-59' as const),
    length: fc.double({ min: 0, max: 300, noNaN: true }).map(foot),
    at: fc.double({ min: 5, max: 1000, noNaN: true }).map(mhz),
  }),
  dB.map((excess): LevelStep => ({ kind: 'tap-through', tap: db(12), excess })),
)

const any = fc.oneof(
  passive,
  dB.map((gain): LevelStep => ({ kind: 'amplifier', gain })),
)

describe('a level along its way', () => {
  // 9.54 - 1.66 - (3.01 + 0.5) + 10.
  it('through a cable, a splitter and an amplifier', () => {
    const level = after(
      9.54,
      { kind: 'cable', cable: 'RG-6', length: foot(100), at: mhz(61.25) },
      { kind: 'splitter', outputs: 2, excess: db(0.5) },
      { kind: 'amplifier', gain: db(10) },
    )
    expect(level).toBeCloseTo(14.37, 2)
  })

  it('is what it was where nothing is on it', () => {
    expect(after(7)).toBe(7)
  })

  it('comes out the same in any order and in parts', () => {
    const row = fc.array(any, { maxLength: 5 })
    fc.assert(
      fc.property(row, row, (a, b) => {
        expect(after(0, ...b, ...a)).toBeCloseTo(after(0, ...a, ...b), 6)
        expect(after(after(0, ...a), ...b)).toBeCloseTo(after(0, ...a, ...b), 6)
      }),
    )
  })

  it('is never raised by what has no power', () => {
    fc.assert(
      fc.property(fc.array(passive, { maxLength: 6 }), (row) => {
        expect(after(10, ...row)).toBeLessThanOrEqual(10)
      }),
    )
  })

  it('stops at the first thing that cannot be', () => {
    const none: LevelStep = { kind: 'splitter', outputs: 0, excess: db(0) }
    expect(afterSteps(dbmv(10), [none])).toMatchObject({ problem: { code: 'too-few' } })
    const tap: LevelStep = { kind: 'tap-through', tap: db(0), excess: db(1) }
    expect(afterSteps(dbmv(10), [tap]).ok).toBe(false)
  })
})
