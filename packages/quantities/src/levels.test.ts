import { describe, expect, it } from 'vitest'
import * as fc from 'fast-check'
import {
  dbmToDbmv,
  dbmvToDbm,
  dbmvToDbuv,
  dbmvToMicrovolt,
  dbuvToDbmv,
  microvoltToDbmv,
} from './levels'
import { dbmv, microvolt, ohm } from './units'

describe('levels', () => {
  // P = V^2 / Z: 0 dBmV across 75 ohm is -48.751 dBm.
  it('gives the power of 0 dBmV across 75 ohm', () => {
    expect(dbmvToDbm(dbmv(0), ohm(75))).toBeCloseTo(-48.751, 3)
  })

  // 47 CFR 15.115(b)(1)(ii): 346.4 x sqrt(75) uV.
  it('gives 9.54 dBmV for the output limit of a television interface device', () => {
    expect(microvoltToDbmv(microvolt(346.4 * Math.sqrt(75)))).toBeCloseTo(9.54, 2)
  })

  const level = fc.double({ min: -120, max: 120, noNaN: true })

  it('comes back from dBuV, dBm and microvolts', () => {
    fc.assert(
      fc.property(level, (value) => {
        expect(dbuvToDbmv(dbmvToDbuv(dbmv(value)))).toBeCloseTo(value, 9)
        expect(dbmToDbmv(dbmvToDbm(dbmv(value), ohm(300)), ohm(300))).toBeCloseTo(value, 9)
        expect(microvoltToDbmv(dbmvToMicrovolt(dbmv(value)))).toBeCloseTo(value, 9)
      }),
    )
  })

  it('refuses a level of no voltage', () => {
    expect(() => microvoltToDbmv(microvolt(0))).toThrow()
  })
})
