import { mhz, whenPositive, type Mhz, type QuantityProblem } from '@coaxwain/quantities'
import type { Result } from '@coaxwain/result'

/** A modulator without a vestigial-sideband filter, and the raster that it stands in. */
export interface PlainModulator {
  readonly vision: Mhz
  readonly channelWidth: Mhz
  readonly soundOffset: Mhz
  readonly colourSubcarrier: Mhz
}

/** What it mirrors to the other side of its vision carrier, and where that lies in the channel below. */
export interface MirrorImages {
  readonly sound: Mhz
  readonly soundAboveLowerVision: Mhz
  readonly colour: Mhz
  readonly colourAboveLowerVision: Mhz
  /** Video of this frequency falls on the sound carrier of the channel below. */
  readonly videoOnLowerSound: Mhz
}

/**
 * The lower sideband of a double-sideband modulator, in a channel of the same width below with the same
 * spacing. In M the mirrored sound stands 1.5 MHz above the vision carrier of the channel below.
 * Source: amplitude modulation is symmetrical about its carrier; lawful by 47 CFR 15.115(b)(2).
 */
export const mirrorImages = (modulator: PlainModulator): Result<MirrorImages, QuantityProblem> => {
  const { vision, channelWidth, soundOffset, colourSubcarrier } = modulator
  return whenPositive({ vision, channelWidth }, () => ({
    sound: mhz(vision - soundOffset),
    soundAboveLowerVision: mhz(channelWidth - soundOffset),
    colour: mhz(vision - colourSubcarrier),
    colourAboveLowerVision: mhz(channelWidth - colourSubcarrier),
    videoOnLowerSound: mhz(channelWidth - soundOffset),
  }))
}
