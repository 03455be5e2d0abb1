import { db, dbmv, metre, mhz, microvoltPerMetre } from '@coaxwain/quantities'
import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { fieldAt, leakageLimit, radiatedField } from './leakage'

describe('what a cable system may let out', () => {
  // 47 CFR 76.605(a)(12), 2015 edition.
  it.each([
    [54, 15, 30],
    [54.1, 20, 3],
    [216, 20, 3],
    [216.1, 15, 30],
  ])('at %d MHz', (at, field, distance) => {
    expect(leakageLimit(mhz(at))).toEqual({ ok: true, value: { field, at: distance } })
  })

  it('is asked for at a frequency', () => {
    expect(leakageLimit(mhz(0)).ok).toBe(false)
  })
})

describe('a field', () => {
  it('falls with the distance, and comes back', () => {
    const distance = fc.double({ min: 0.5, max: 300, noNaN: true })
    fc.assert(
      fc.property(distance, distance, (near, far) => {
        const there = fieldAt({ field: microvoltPerMetre(20), at: metre(near) }, metre(far))
        if (!there.ok) throw new Error(there.problem.code)
        const back = fieldAt({ field: there.value, at: metre(far) }, metre(near))
        expect(back.ok && back.value).toBeCloseTo(20, 9)
      }),
    )
  })

  // 1.333e-7 W: sqrt(30 x 1.333e-7 x 1.64) / 3.
  it('of +10 dBmV on a dipole is 854 uV/m at 3 m', () => {
    const radiator = {
      level: dbmv(10),
      shielding: db(0),
      antennaGain: 1.64,
      distance: metre(3),
    }
    const open = radiatedField(radiator)
    expect(open.ok && open.value).toBeCloseTo(853.75, 2)
    const held = radiatedField({ ...radiator, shielding: db(20) })
    expect(held.ok && held.value).toBeCloseTo(85.375, 3)
    expect(radiatedField({ ...radiator, distance: metre(0) }).ok).toBe(false)
  })
})
