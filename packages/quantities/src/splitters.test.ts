import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { dbToPowerRatio } from './decibels'
import { resistiveStar, splitterLoss, tapThroughLoss } from './splitters'
import { db, ohm } from './units'

describe('dividing power', () => {
  it.each([
    [1, 0],
    [2, 3.0103],
    [3, 4.7712],
    [8, 9.0309],
  ])('into %d costs 10 log N', (outputs, loss) => {
    const found = splitterLoss(outputs)
    expect(found.ok && found.value).toBeCloseTo(loss, 4)
  })

  it('into none cannot be', () => {
    expect(splitterLoss(0)).toMatchObject({ problem: { code: 'too-few' } })
  })

  it.each([
    [6, 1.256],
    [12, 0.283],
    [20, 0.044],
  ])('by a %d dB tap leaves the rest', (tap, loss) => {
    const found = tapThroughLoss(db(tap))
    expect(found.ok && found.value).toBeCloseTo(loss, 3)
  })

  it('by a tap makes and loses no power', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.5, max: 40, noNaN: true }), (tap) => {
        const through = tapThroughLoss(db(tap))
        if (!through.ok) throw new Error(through.problem.code)
        const shares = [tap, through.value].map((loss) => 1 / dbToPowerRatio(loss))
        expect(shares[0]! + shares[1]!).toBeCloseTo(1, 9)
      }),
    )
  })

  it('by a tap that takes everything cannot be', () => {
    expect(tapThroughLoss(db(0))).toMatchObject({ problem: { code: 'not-positive' } })
  })
})

describe('a resistive star', () => {
  it('is matched at each of its ends', () => {
    fc.assert(
      fc.property(fc.integer({ min: 2, max: 12 }), (outputs) => {
        const found = resistiveStar(outputs, ohm(75))
        if (!found.ok) throw new Error(found.problem.code)
        const arm = found.value.resistor
        expect(arm + (arm + 75) / outputs).toBeCloseTo(75, 9)
      }),
    )
  })

  // 75 x 1/3 and 20 log 2.
  it('of two outputs takes 25 ohm and 6.02 dB, and parts them no better', () => {
    const found = resistiveStar(2, ohm(75))
    expect(found.ok && found.value.resistor).toBe(25)
    expect(found.ok && found.value.loss).toBeCloseTo(6.0206, 4)
    expect(found.ok && found.value.isolation).toBeCloseTo(6.0206, 4)
  })

  it('has two outputs at least', () => {
    expect(resistiveStar(1, ohm(75))).toMatchObject({ problem: { code: 'too-few' } })
    expect(resistiveStar(2, ohm(0))).toMatchObject({ problem: { code: 'not-positive' } })
  })
})
