import { celsius, db, foot, mhz, type Db, type QuantityProblem } from '@coaxwain/quantities'
import type { Result } from '@coaxwain/result'
import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { cableLoss, fittedLoss, loss20At, scaledLoss, tabledLoss } from './cable-loss'
import { CABLE_IDS, CABLES, type CableId } from './cables'

const value = (result: Result<Db, QuantityProblem>): Db => {
  if (!result.ok) throw new Error(result.problem.code)
  return result.value
}

const span = (cable: CableId): [number, number] => {
  const { points } = CABLES[cable]
  return [points[0]![0], points.at(-1)![0]]
}

const within = fc.constantFrom(...CABLE_IDS).chain((cable) => {
  const [min, max] = span(cable)
  return fc.record({ cable: fc.constant(cable), at: fc.double({ min, max, noNaN: true }) })
})

describe('loss of a cable', () => {
  // 0.21378 sqrt(211) - 0.000263 x 211.
  it('by the fit', () => {
    expect(value(fittedLoss('RG-6', mhz(211), foot(100)))).toBeCloseTo(3.05, 2)
    expect(value(fittedLoss('RG-11', mhz(750), foot(200)))).toBeCloseTo(7.27, 2)
  })

  // The fit errors stated beside the published fit: 3.3, 2.1 and 2.7 %.
  it.each([
    ['RG-59', 3.3],
    ['RG-6', 2.1],
    ['RG-11', 2.7],
  ] as const)('of %s is fitted within %d %%', (cable, most) => {
    const errors = CABLES[cable].points
      .filter(([at]) => at >= 55)
      .map(([at, loss]) => Math.abs(value(fittedLoss(cable, mhz(at), foot(100))) / loss - 1))
    expect(100 * Math.max(...errors)).toBeLessThanOrEqual(most + 0.05)
  })

  it('is that of the table at its points', () => {
    expect(value(tabledLoss('RG-6', mhz(55), foot(100)))).toBe(1.6)
    expect(value(tabledLoss('RG-59 solid', mhz(400), foot(50)))).toBe(3.5)
  })

  it('takes the table where the fit strays', () => {
    expect(cableLoss('RG-6', mhz(5), foot(100))).toEqual({ ok: true, value: 0.58 })
    expect(cableLoss('RG-6', mhz(211), foot(100))).toEqual(fittedLoss('RG-6', mhz(211), foot(100)))
    expect(fittedLoss('RG-59 solid', mhz(100), foot(100))).toEqual({ ok: true, value: 3.4 })
  })

  it('is guessed at no frequency outside', () => {
    expect(cableLoss('RG-6', mhz(4), foot(100))).toMatchObject({
      problem: { code: 'out-of-range' },
    })
    expect(cableLoss('RG-6', mhz(1001), foot(100)).ok).toBe(false)
    expect(fittedLoss('RG-6', mhz(0), foot(100)).ok).toBe(false)
  })

  it('grows with the length, from nothing, and never becomes a gain', () => {
    const length = fc.double({ min: 0, max: 1000, noNaN: true })
    fc.assert(
      fc.property(within, length, length, ({ cable, at }, a, b) => {
        const [short, long] = [a, b].map((l) => value(cableLoss(cable, mhz(at), foot(l))))
        const both = value(cableLoss(cable, mhz(at), foot(a + b)))
        expect(short).toBeGreaterThanOrEqual(0)
        expect(both).toBeCloseTo(short! + long!, 6)
      }),
    )
    expect(cableLoss('RG-6', mhz(55), foot(-1))).toMatchObject({ problem: { code: 'negative' } })
  })

  it('by the table never falls as the frequency rises', () => {
    fc.assert(
      fc.property(within, fc.double({ min: 0, max: 1, noNaN: true }), ({ cable, at }, share) => {
        const lower = at + (span(cable)[0] - at) * share
        const [low, high] = [lower, at].map((f) => value(tabledLoss(cable, mhz(f), foot(100))))
        expect(low).toBeLessThanOrEqual(high! + 1e-9)
      }),
    )
  })

  // Root of the frequency: 4.9 x sqrt(0.1).
  it('is carried to another frequency and back', () => {
    expect(value(scaledLoss(db(4.9), mhz(550), mhz(55)))).toBeCloseTo(1.55, 2)
    const there = value(scaledLoss(db(4.9), mhz(550), mhz(55)))
    expect(value(scaledLoss(there, mhz(55), mhz(550)))).toBeCloseTo(4.9, 9)
    expect(scaledLoss(db(4.9), mhz(0), mhz(55)).ok).toBe(false)
  })

  it('rises by a fifth of a percent with each degree', () => {
    expect(value(loss20At(db(6), celsius(45)))).toBeCloseTo(6.3, 9)
    expect(value(loss20At(db(6), celsius(20)))).toBe(6)
    expect(loss20At(db(6), celsius(-300)).ok).toBe(false)
  })
})
