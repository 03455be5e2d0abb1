import type { Db, Dbm, Dbmv, Dbuv, Microvolt, Ohm } from './units'
import { db, dbm, dbmv, dbuv, microvolt } from './units'

/** 0 dBmV is 1 mV and 0 dBuV is 1 microvolt, so the two differ by exactly 60 (definition). */
export const dbmvToDbuv = (level: Dbmv): Dbuv => dbuv(level + 60)

/** Inverse of {@link dbmvToDbuv}. */
export const dbuvToDbmv = (level: Dbuv): Dbmv => dbmv(level - 60)

/**
 * Power of a level across an impedance: dBm = dBmV - 30 - 10 log Z.
 * Source: definition, P = V^2 / Z.
 */
export const dbmvToDbm = (level: Dbmv, across: Ohm): Dbm =>
  dbm(level - 30 - 10 * Math.log10(across))

/** Inverse of {@link dbmvToDbm}. */
export const dbmToDbmv = (power: Dbm, across: Ohm): Dbmv =>
  dbmv(power + 30 + 10 * Math.log10(across))

/** dBmV = 20 log(V / 1 mV), V in microvolts r.m.s. (definition). Throws on zero or less. */
export function microvoltToDbmv(v: Microvolt): Dbmv {
  if (v <= 0) throw new Error(`a level needs a positive voltage, not ${v} uV`)
  return dbmv(20 * Math.log10(v / 1000))
}

/** Inverse of {@link microvoltToDbmv}. */
export const dbmvToMicrovolt = (level: Dbmv): Microvolt => microvolt(1000 * 10 ** (level / 20))

/** A level after a gain (positive) or a loss (negative), both in dB. */
export const raise = (level: Dbmv, gain: Db): Dbmv => dbmv(level + gain)

/** A level after a loss of so many dB. */
export const lower = (level: Dbmv, loss: Db): Dbmv => dbmv(level - loss)

/** How far one level lies above another, in dB. */
export const levelDifference = (a: Dbmv, b: Dbmv): Db => db(a - b)
