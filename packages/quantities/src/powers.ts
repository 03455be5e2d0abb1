import type { Result } from '@coaxwain/result'
import { dbToPowerRatio, powerRatioToDb } from './decibels'
import { whenAtLeast, type QuantityProblem } from './problems'
import type { Quantity } from './units'

/** Units in which a level stands for a power, so that carriers can be added. */
type PowerLevel = 'dBmV' | 'dBuV' | 'dBm'

/**
 * Level of several carriers together: P = 10 log sum 10^(P_i / 10), so N equal ones add 10 log N.
 * All across one impedance. Source: powers add.
 */
export const addPowers = <Unit extends PowerLevel>(
  levels: readonly Quantity<Unit>[],
): Result<Quantity<Unit>, QuantityProblem> =>
  whenAtLeast(
    1,
    'levels',
    levels.length,
    () =>
      powerRatioToDb(
        levels.reduce((sum, level) => sum + dbToPowerRatio(level), 0),
      ) as number as Quantity<Unit>,
  )
