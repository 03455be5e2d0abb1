import { mhz, whenPositive, type Mhz, type QuantityProblem } from '@coaxwain/quantities'
import type { Result } from '@coaxwain/result'
import { findChannel, type PlanId } from '../plans/index'

/** Where a tuner listens by mistake, and what it sends out. */
export interface TunerWeakSpots {
  readonly oscillator: Mhz
  readonly visionImage: Mhz
}

/**
 * A superheterodyne with its oscillator above the carrier (or below): oscillator fv + IF, image fv + 2 IF.
 * Usual vision IF: 45.75 MHz in the Americas, 58.75 Japan, 38.9 B/G, 39.5 I. Source: superheterodyne arithmetic.
 */
export const weakSpots = (
  vision: Mhz,
  visionIf: Mhz,
  oscillator: 'above' | 'below' = 'above',
): Result<TunerWeakSpots, QuantityProblem> =>
  whenPositive({ vision, visionIf }, () => {
    const step = oscillator === 'above' ? visionIf : -1 * visionIf
    return { oscillator: mhz(vision + step), visionImage: mhz(vision + 2 * step) }
  })

/** Channels away from a UHF channel, to both sides, by what makes them a risk. Source: 47 CFR 73.698, table II. */
export const UHF_TABOO_OFFSETS = {
  adjacent: [1],
  intermodulation: [2, 3, 4, 5],
  oscillator: [7],
  ifBeat: [8],
  soundImage: [14],
  pictureImage: [15],
} as const

export type UhfTaboo = keyof typeof UHF_TABOO_OFFSETS

/** The plan and the first UHF number for which the table was made: M in 6 MHz channels, IF 45.75 MHz. */
const TABOO_PLAN: PlanId = 'us-broadcast'
const FIRST_UHF = 14

const exists = (channel: number): boolean =>
  channel >= FIRST_UHF && findChannel(TABOO_PLAN, String(channel)) !== null

const around = (channel: number, offsets: readonly number[]): number[] =>
  offsets
    .flatMap((offset) => [channel - offset, channel + offset])
    .filter(exists)
    .sort((a, b) => a - b)

/**
 * UHF channels 14 to 83 that disturb a set tuned to one of them, or are disturbed by it. Advice for sets with
 * the tuners of their day. Source: 47 CFR 73.698, table II.
 */
export const uhfTaboos = (channel: number): Readonly<Record<UhfTaboo, readonly number[]>> => ({
  adjacent: around(channel, UHF_TABOO_OFFSETS.adjacent),
  intermodulation: around(channel, UHF_TABOO_OFFSETS.intermodulation),
  oscillator: around(channel, UHF_TABOO_OFFSETS.oscillator),
  ifBeat: around(channel, UHF_TABOO_OFFSETS.ifBeat),
  soundImage: around(channel, UHF_TABOO_OFFSETS.soundImage),
  pictureImage: around(channel, UHF_TABOO_OFFSETS.pictureImage),
})
