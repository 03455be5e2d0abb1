import { mhz } from '@coaxwain/quantities'
import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { findChannel } from '../plans/index'
import { UHF_TABOO_OFFSETS, uhfTaboos, weakSpots, type UhfTaboo } from './superheterodyne'

describe('a tuner', () => {
  // fv + IF and fv + 2 IF.
  it('hears its image as far beyond its oscillator as the carrier lies before it', () => {
    expect(weakSpots(mhz(567.25), mhz(45.75))).toEqual({
      ok: true,
      value: { oscillator: 613, visionImage: 658.75 },
    })
    expect(weakSpots(mhz(567.25), mhz(45.75), 'below')).toMatchObject({
      value: { oscillator: 521.5, visionImage: 475.75 },
    })
    expect(weakSpots(mhz(0), mhz(45.75)).ok).toBe(false)
  })

  // Channel 30 is n; n + 15 holds the image, n + 7 the oscillator.
  it('has the image and the oscillator in the channels that are taboo', () => {
    const vision = findChannel('us-broadcast', '30')!.visionMhz!
    const found = weakSpots(mhz(vision), mhz(45.75))
    const holds = (name: string, at: number): boolean => {
      const channel = findChannel('us-broadcast', name)!
      return at >= channel.lowerMhz && at < channel.upperMhz
    }
    expect(found.ok && holds('45', found.value.visionImage)).toBe(true)
    expect(found.ok && holds('37', found.value.oscillator)).toBe(true)
  })
})

describe('UHF channels that do not go together', () => {
  // 47 CFR 73.698, table II, rows 30 and 69.
  it('are those of the table', () => {
    expect(uhfTaboos(30)).toMatchObject({
      ifBeat: [22, 38],
      intermodulation: [25, 26, 27, 28, 32, 33, 34, 35],
      soundImage: [16, 44],
    })
    expect(uhfTaboos(69)).toMatchObject({ soundImage: [55, 83], pictureImage: [54] })
  })

  it('are so from both sides, and lie between 14 and 83', () => {
    const channel = fc.integer({ min: 14, max: 83 })
    const taboo = fc.constantFrom(...(Object.keys(UHF_TABOO_OFFSETS) as UhfTaboo[]))
    fc.assert(
      fc.property(channel, channel, taboo, (a, b, kind) => {
        expect(uhfTaboos(a)[kind].includes(b)).toBe(uhfTaboos(b)[kind].includes(a))
        expect(uhfTaboos(a)[kind].every((c) => c >= 14 && c <= 83)).toBe(true)
      }),
    )
  })
})
