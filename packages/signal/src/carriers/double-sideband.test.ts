import { mhz } from '@coaxwain/quantities'
import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { channelsOf } from '../plans/index'
import { mirrorImages } from './double-sideband'

const images = (vision: number, channelWidth: number, soundOffset: number, subcarrier: number) => {
  const found = mirrorImages({
    vision: mhz(vision),
    channelWidth: mhz(channelWidth),
    soundOffset: mhz(soundOffset),
    colourSubcarrier: mhz(subcarrier),
  })
  if (!found.ok) throw new Error(found.problem.code)
  return found.value
}

describe('the mirror of a plain modulator', () => {
  // 61.25 - 4.5 and 6 - 4.5.
  it('puts the sound of channel 3 into channel 2', () => {
    expect(images(61.25, 6, 4.5, 3.579545)).toMatchObject({
      sound: 56.75,
      soundAboveLowerVision: 1.5,
      videoOnLowerSound: 1.5,
    })
  })

  it('stands above the vision of the channel below by what the channel is wider than the spacing', () => {
    const touching = channelsOf('us-broadcast').filter((c) =>
      ['3', '6', '8', '20'].includes(c.name),
    )
    for (const own of touching) {
      const below = channelsOf('us-broadcast').find((c) => c.upperMhz === own.lowerMhz)
      const found = images(own.visionMhz!, 6, 4.5, 3.579545)
      expect(found.sound - below!.visionMhz!).toBeCloseTo(found.soundAboveLowerVision, 9)
      expect(found.colour - below!.visionMhz!).toBeCloseTo(found.colourAboveLowerVision, 9)
    }
  })

  it('is as far below the carrier as the original is above', () => {
    const offset = fc.double({ min: 1, max: 7, noNaN: true })
    fc.assert(
      fc.property(offset, offset, (sound, colour) => {
        const found = images(591.25, 8, sound, colour)
        expect(591.25 - found.sound).toBeCloseTo(sound, 6)
        expect(591.25 - found.colour).toBeCloseTo(colour, 6)
      }),
    )
  })

  it('needs a carrier', () => {
    const nothing = { vision: mhz(0), channelWidth: mhz(6) }
    const found = mirrorImages({ ...nothing, soundOffset: mhz(4.5), colourSubcarrier: mhz(3.58) })
    expect(found.ok).toBe(false)
  })
})
