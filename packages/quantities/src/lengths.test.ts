import { describe, expect, it } from 'vitest'
import { footToMetre, metreToFoot } from './lengths'
import { foot, metre } from './units'

describe('lengths', () => {
  it('have 0.3048 m to the foot, both ways', () => {
    expect(footToMetre(foot(100))).toBeCloseTo(30.48, 9)
    expect(metreToFoot(metre(30.48))).toBeCloseTo(100, 9)
  })
})
