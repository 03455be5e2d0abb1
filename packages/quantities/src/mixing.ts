import type { Result } from '@coaxwain/result'
import { voltageRatioToDb } from './decibels'
import { whenPositive, type QuantityProblem } from './problems'
import type { Db, Ohm } from './units'

/** Left and right, each through its own resistor, into one input. */
export interface ResistiveFold {
  readonly source: Ohm
  readonly series: Ohm
  readonly load: Ohm
}

/**
 * Level of two equal signals folded to mono, against one channel left unloaded:
 * 20 log (RL / (RL + (Rs + R) / 2)). Never join two outputs without the resistors. Source: divider theory.
 */
export const foldedLevel = ({ source, series, load }: ResistiveFold): Result<Db, QuantityProblem> =>
  whenPositive({ source, series, load }, () =>
    voltageRatioToDb(load / (load + (source + series) / 2)),
  )

/** The same where only one channel plays: the other one loads it, and half is left. Source: superposition. */
export const foldedOneSide = ({
  source,
  series,
  load,
}: ResistiveFold): Result<Db, QuantityProblem> =>
  whenPositive({ source, series, load }, () =>
    voltageRatioToDb(load / (load + (source + series) / 2) / 2),
  )
