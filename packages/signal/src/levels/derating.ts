import {
  db,
  powerRatioToDb,
  voltageRatioToDb,
  whenAtLeast,
  type Db,
  type QuantityProblem,
} from '@coaxwain/quantities'
import type { Result } from '@coaxwain/result'

/**
 * How far to stay below the rating of an amplifier that is rated with two carriers at a third-order ratio of
 * 60 dB: 7.5 log (n - 1), up to about ten channels. Source: the rule behind a published catalogue table.
 */
export const amplifierDerating = (channels: number): Result<Db, QuantityProblem> =>
  whenAtLeast(2, 'channels', channels, () => db(7.5 * Math.log10(channels - 1)))

/**
 * How far to lower each of m equal amplifiers in a row: 10 log m, 3 dB per doubling.
 * Source: published planning note for master-antenna systems.
 */
export const cascadeDerating = (amplifiers: number): Result<Db, QuantityProblem> =>
  whenAtLeast(1, 'amplifiers', amplifiers, () => powerRatioToDb(amplifiers))

export type IntermodulationOrder = 2 | 3

/**
 * Carrier-to-product ratio after the output is raised by so much: worse by as much (second order) or twice as
 * much (third). Source: power series of an amplifier.
 */
export const ratioAfter = (before: Db, order: IntermodulationOrder, raisedBy: Db): Db =>
  db(before - (order - 1) * raisedBy)

/**
 * A beat of three carriers above a third-order product of two of them: coefficients 3/2 and 3/4.
 * Source: cubic term of a power series.
 */
export const TRIPLE_BEAT: Db = voltageRatioToDb(3 / 2 / (3 / 4))
