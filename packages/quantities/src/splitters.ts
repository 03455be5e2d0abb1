import type { Result } from '@coaxwain/result'
import { dbToPowerRatio, powerRatioToDb, voltageRatioToDb } from './decibels'
import { impossible, whenAtLeast, whenPositive, type QuantityProblem } from './problems'
import { ohm, type Db, type Ohm } from './units'

/**
 * Loss of an ideal splitter to each of N equal outputs: 10 log N. As a combiner it costs the same on every
 * input. Source: power division.
 */
export const splitterLoss = (outputs: number): Result<Db, QuantityProblem> =>
  whenAtLeast(1, 'outputs', outputs, () => powerRatioToDb(outputs))

/**
 * What an ideal tap takes from the line that goes on: -10 log (1 - 10^(-T/10)), T being what the tapped
 * socket lies below the line. Source: power conservation.
 */
export const tapThroughLoss = (tap: Db): Result<Db, QuantityProblem> =>
  whenPositive({ tap }, () => powerRatioToDb(1 / (1 - 1 / dbToPowerRatio(tap))))

export interface ResistiveStar {
  /** Each of the N + 1 equal resistors. */
  readonly resistor: Ohm
  readonly loss: Db
  /** Between two outputs: no better than the loss. */
  readonly isolation: Db
}

/**
 * A splitter of resistors alone: R = Z (N-1)/(N+1), loss and isolation 20 log N.
 * Source: symmetrical resistive star.
 */
export function resistiveStar(outputs: number, z: Ohm): Result<ResistiveStar, QuantityProblem> {
  if (outputs < 2) return impossible('too-few', 'outputs', outputs)
  return whenPositive({ z }, () => {
    const loss = voltageRatioToDb(outputs)
    return { resistor: ohm((z * (outputs - 1)) / (outputs + 1)), loss, isolation: loss }
  })
}
