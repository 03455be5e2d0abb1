import type { Result } from '@coaxwain/result'
import { powerRatioToDb, voltageRatioToDb } from './decibels'
import { impossible, whenNotNegative, whenPositive, type QuantityProblem } from './problems'
import {
  db,
  microsecond,
  percent,
  type Db,
  type Metre,
  type Microsecond,
  type Ohm,
  type Percent,
} from './units'

/** What a line meets at its end. */
export interface Reflection {
  /** Reflected over arriving voltage, from -1 (a short) to below 1. */
  readonly gamma: number
  /** Null where everything comes back: the ratio has no bound. */
  readonly standingWaveRatio: number | null
  /** Null where nothing comes back. */
  readonly returnLoss: Db | null
  /** Null where everything comes back. */
  readonly mismatchLoss: Db | null
}

/**
 * A resistive load at the end of a line: gamma = (ZL - Z0) / (ZL + Z0), VSWR = (1 + |g|) / (1 - |g|), return
 * loss = -20 log |g|, mismatch loss = -10 log (1 - |g|^2). Source: transmission-line theory.
 */
export const reflect = (line: Ohm, load: Ohm): Result<Reflection, QuantityProblem> =>
  load < 0
    ? impossible('negative', 'load', load)
    : whenPositive({ line }, () => {
        const gamma = (load - line) / (load + line)
        const size = Math.abs(gamma)
        const absorbs = size < 1
        return {
          gamma,
          standingWaveRatio: absorbs ? (1 + size) / (1 - size) : null,
          returnLoss: size > 0 ? voltageRatioToDb(1 / size) : null,
          mismatchLoss: absorbs ? powerRatioToDb(1 / (1 - size ** 2)) : null,
        }
      })

/** A mismatch seen through a line or pad: the echo pays its loss twice. Source: transmission-line theory. */
export const returnLossThrough = (load: Db, oneWayLoss: Db): Result<Db, QuantityProblem> =>
  whenNotNegative({ oneWayLoss }, () => db(load + 2 * oneWayLoss))

/**
 * How far a level may swing up with frequency where both ends of a line are mismatched: 20 log (1 + |Gs| |GL|).
 * Source: transmission-line theory.
 */
export const ripple = (source: Reflection, load: Reflection): Db =>
  voltageRatioToDb(1 + Math.abs(source.gamma * load.gamma))

/** Metres in a microsecond; exact (definition of the metre). */
const LIGHT_M_PER_US = 299.792458

export interface Ghost {
  readonly delay: Microsecond
  /** How far beside the picture it stands, as a share of the picture's width. */
  readonly ofWidth: Percent
}

export interface EchoPath {
  readonly length: Metre
  /** Speed on the line over the speed of light, up to 1. */
  readonly velocityFactor: number
  /** Visible part of a line: 52.66 us in 525 lines, 52.0 us in 625 (47 CFR 73.682; ITU-R BT.470). */
  readonly activeLine: Microsecond
}

/** An echo from the end of a lead: t = 2 L / (v c). Source: transmission-line theory. */
export function ghost(path: EchoPath): Result<Ghost, QuantityProblem> {
  const { length, velocityFactor, activeLine } = path
  if (velocityFactor > 1) return impossible('out-of-range', 'velocityFactor', velocityFactor)
  return whenPositive({ length, velocityFactor, activeLine }, () => {
    const delay = (2 * length) / (velocityFactor * LIGHT_M_PER_US)
    return { delay: microsecond(delay), ofWidth: percent((100 * delay) / activeLine) }
  })
}
