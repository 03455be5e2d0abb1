import type { Result } from '@coaxwain/result'
import { powerRatioToDb } from './decibels'
import { whenPositive, type QuantityProblem } from './problems'
import { dbmv, type Db, type Dbmv, type Ohm } from './units'

export interface Transformer {
  readonly from: Ohm
  readonly to: Ohm
  readonly loss: Db
}

/**
 * Level behind a transformer, across its second impedance. Power is kept but for the loss, so the voltage
 * rises with the root of the impedance: 75 to 300 ohm is +6.02 dB in dBmV. Source: V = sqrt(P R).
 */
export const transformed = (
  level: Dbmv,
  { from, to, loss }: Transformer,
): Result<Dbmv, QuantityProblem> =>
  whenPositive({ from, to }, () => dbmv(level + powerRatioToDb(to / from) - loss))
