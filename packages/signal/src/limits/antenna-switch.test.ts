import { mhz } from '@coaxwain/quantities'
import { describe, expect, it } from 'vitest'
import { antennaSwitchIsolation } from './antenna-switch'

// 47 CFR 15.115(c)(1)(i), (h).
describe('an aerial switch', () => {
  it.each([
    [54, 80],
    [216, 80],
    [216.01, 60],
    [550, 60],
    [550.01, 55],
    [806, 55],
  ])('parts at %d MHz by %d dB', (at, least) => {
    expect(antennaSwitchIsolation(mhz(at))).toEqual({ ok: true, value: least })
  })

  it.each([53.9, 806.1])('is not asked for anything at %d MHz', (at) => {
    expect(antennaSwitchIsolation(mhz(at))).toMatchObject({ problem: { code: 'out-of-range' } })
  })
})
