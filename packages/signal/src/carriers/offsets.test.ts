import { mhz } from '@coaxwain/quantities'
import { describe, expect, it } from 'vitest'
import { channelsOf } from '../plans/index'
import { aeronauticalOffset, frequencyError, movedOffAircraft, vsbPilot } from './offsets'

describe('carriers in the bands of aircraft radio', () => {
  // 47 CFR 76.612(a)(1) and (b).
  it.each([
    [109.25, 25],
    [121.25, 12.5],
    [139.25, 0],
    [229.25, 12.5],
    [331.25, 25],
    [337.25, 12.5],
    [403.25, 0],
  ])('at %d MHz are moved by %d kHz', (vision, by) => {
    expect(aeronauticalOffset(mhz(vision))).toBe(by)
  })

  it('stand in the standard cable plan where the rule puts them', () => {
    const wrong = channelsOf('us-cable-std').filter(({ name, visionMhz }) => {
      if (name.startsWith('T-')) return false
      const nominal = Math.floor(visionMhz! * 4) / 4
      return Math.abs(movedOffAircraft(mhz(nominal)) - visionMhz!) > 1e-6
    })
    expect(wrong.map((c) => c.name)).toEqual([])
  })
})

describe('other offsets', () => {
  it('are 591 kHz for a tenth of a percent at UHF', () => {
    expect(frequencyError(mhz(591.25), 1000)).toEqual({ ok: true, value: 591.25 })
    expect(frequencyError(mhz(0), 1000).ok).toBe(false)
  })

  // 47 CFR 73.682(d).
  it('put the pilot of 8-VSB near the lower edge', () => {
    expect(vsbPilot(mhz(470))).toBeCloseTo(470.309441, 6)
  })
})
