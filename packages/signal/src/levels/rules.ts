import {
  db,
  levelDifference,
  whenAtLeast,
  type Db,
  type Dbmv,
  type Mhz,
  type QuantityProblem,
} from '@coaxwain/quantities'
import type { Result } from '@coaxwain/result'

/** One figure held against what is allowed. */
export interface LevelRule {
  readonly found: Db
  readonly allowed: Db
  readonly holds: boolean
}

const rule = (found: Db, allowed: Db): LevelRule => ({ found, allowed, holds: found <= allowed })

/** Vision carriers so far apart nominally are neighbours; HRC and IRC rasters differ by some kHz. */
const NEIGHBOURS_MHZ = 6.05

/**
 * Two vision carriers that lie within 6 MHz of each other may differ by 3 dB; farther apart this rule says
 * nothing. Source: 47 CFR 76.605(a)(4)(i).
 */
export function neighbourRule(a: Dbmv, b: Dbmv, apart: Mhz): LevelRule {
  const found = db(Math.abs(levelDifference(a, b)))
  return apart <= NEIGHBOURS_MHZ ? rule(found, db(3)) : { ...rule(found, db(3)), holds: true }
}

/** What all channels of a system may differ by: 10 dB up to 300 MHz, 1 dB more per further 100 MHz or part. */
const spreadAllowed = (upperLimit: Mhz): Db =>
  db(10 + Math.max(0, Math.ceil((upperLimit - 300) / 100)))

/** The strongest against the weakest vision carrier of a system. Source: 47 CFR 76.605(a)(4)(ii). */
export const spreadRule = (
  levels: readonly Dbmv[],
  upperLimit: Mhz,
): Result<LevelRule, QuantityProblem> =>
  whenAtLeast(1, 'levels', levels.length, () =>
    rule(db(Math.max(...levels) - Math.min(...levels)), spreadAllowed(upperLimit)),
  )

export interface SoundBelowVision {
  readonly below: Db
  readonly holds: boolean
}

/**
 * Sound carrier below vision: 10 to 17 dB, 6.5 to 17 dB behind a converter. Source: 47 CFR 76.605(a)(5).
 */
export function soundBelowVision(
  vision: Dbmv,
  sound: Dbmv,
  afterConverter = false,
): SoundBelowVision {
  const below = levelDifference(vision, sound)
  return { below, holds: below >= (afterConverter ? 6.5 : 10) && below <= 17 }
}
