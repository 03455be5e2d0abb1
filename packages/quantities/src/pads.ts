import type { Result } from '@coaxwain/result'
import { dbToVoltageRatio, voltageRatioToDb } from './decibels'
import { impossible, whenPositive, type QuantityProblem } from './problems'
import { ohm, type Db, type Ohm } from './units'

/** Two resistors that match two impedances with the least loss. */
export interface MinimumLossPad {
  /** In line with the higher impedance. */
  readonly series: Ohm
  /** Across the lower impedance. */
  readonly shunt: Ohm
  readonly loss: Db
}

/**
 * Rs = sqrt(Z1 (Z1 - Z2)), Rp = Z2 sqrt(Z1 / (Z1 - Z2)), loss = 20 log (sqrt(Z1/Z2) + sqrt(Z1/Z2 - 1)).
 * Equal impedances need no pad and have none. Source: minimum-loss pad theory.
 */
export function minimumLossPad(high: Ohm, low: Ohm): Result<MinimumLossPad, QuantityProblem> {
  if (low > 0 && high <= low) return impossible('wrong-order', 'high', high)
  return whenPositive({ high, low }, () => {
    const step = high / low
    return {
      series: ohm(Math.sqrt(high * (high - low))),
      shunt: ohm(low * Math.sqrt(high / (high - low))),
      loss: voltageRatioToDb(Math.sqrt(step) + Math.sqrt(step - 1)),
    }
  })
}

/** Resistors of an attenuator that is matched at both ends, in either form. */
export interface Attenuator {
  /** Each of the two arms in line. */
  readonly teeSeries: Ohm
  readonly teeShunt: Ohm
  /** Each of the two arms across. */
  readonly piShunt: Ohm
  readonly piSeries: Ohm
}

/**
 * With K = 10^(A/20): T series Z (K-1)/(K+1), T shunt 2 Z K/(K^2-1), pi shunt Z (K+1)/(K-1),
 * pi series Z (K^2-1)/(2K). Source: matched attenuator theory.
 */
export const attenuator = (z: Ohm, loss: Db): Result<Attenuator, QuantityProblem> =>
  whenPositive({ z, loss }, () => {
    const k = dbToVoltageRatio(loss)
    return {
      teeSeries: ohm((z * (k - 1)) / (k + 1)),
      teeShunt: ohm((2 * z * k) / (k ** 2 - 1)),
      piShunt: ohm((z * (k + 1)) / (k - 1)),
      piSeries: ohm((z * (k ** 2 - 1)) / (2 * k)),
    }
  })
