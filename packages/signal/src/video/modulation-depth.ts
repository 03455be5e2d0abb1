import {
  voltageRatioToDb,
  whenPositive,
  type Db,
  type Percent,
  type QuantityProblem,
} from '@coaxwain/quantities'
import { percent } from '@coaxwain/quantities'
import { problem, err, type Result } from '@coaxwain/result'
import { RF_SYSTEMS, type RfSystemId } from '../systems'

/** Video as it reaches a modulator without a limiter. */
export interface ModulatedVideo {
  readonly system: RfSystemId
  /** Video against nominal: 1 with one 75 ohm load, 2 with none, 2/3 with two. */
  readonly videoGain: number
  /** Carrier at white with nominal video, in percent of its peak; that of the system unless stated. */
  readonly white?: Percent | undefined
}

export interface ModulationDepth {
  /** Carrier at white; below zero the phase turns over, above 100 the peak is overdriven. */
  readonly white: Percent
  readonly overmodulated: boolean
  /** Video against nominal at which the limit is met. */
  readonly gainLimit: number
  readonly gainLimitLevel: Db
}

/**
 * Carrier at white of a modulator that holds the sync tips (no automatic gain). Negative modulation:
 * 100 - (100 - W) g percent, which reaches zero at g = 100 / (100 - W), 1.16 dB above nominal in M. Positive
 * modulation (L and its kin): sync is the carrier minimum, taken as zero, so white is W g and 100 the limit.
 * Sources: 47 CFR 73.682(a)(12), (13); ITU-R BT.470.
 */
export function modulationDepth(video: ModulatedVideo): Result<ModulationDepth, QuantityProblem> {
  const { system, videoGain } = video
  const { polarity, whitePercent } = RF_SYSTEMS[system]
  const nominal = video.white ?? whitePercent
  const negative = polarity === 'negative'
  if (negative && nominal >= 100) {
    return err(problem('out-of-range', { what: 'white', value: nominal }))
  }
  return whenPositive({ videoGain, white: nominal }, () => {
    const white = negative ? 100 - (100 - nominal) * videoGain : nominal * videoGain
    const gainLimit = negative ? 100 / (100 - nominal) : 100 / nominal
    return {
      white: percent(white),
      overmodulated: videoGain > gainLimit,
      gainLimit,
      gainLimitLevel: voltageRatioToDb(gainLimit),
    }
  })
}
