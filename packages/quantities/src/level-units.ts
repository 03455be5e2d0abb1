import type { Result } from '@coaxwain/result'
import { dbToPowerRatio, dbToVoltageRatio, powerRatioToDb, voltageRatioToDb } from './decibels'
import { whenPositive, type QuantityProblem } from './problems'
import type { Ohm } from './units'

/** Ways of writing down one level across a known impedance; voltages are r.m.s. */
export const LEVEL_UNITS = [
  'dBmV',
  'dBuV',
  'dBV',
  'dBm',
  'dBW',
  'uV',
  'mV',
  'V',
  'mW',
  'W',
] as const

export type LevelUnit = (typeof LEVEL_UNITS)[number]

/** Microvolts in one of each unit, or at 0 of it. */
const MICROVOLTS = { uV: 1, mV: 1e3, V: 1e6, dBuV: 1, dBmV: 1e3, dBV: 1e6 } as const
/** Watts in one of each unit, or at 0 of it. */
const WATTS = { mW: 1e-3, W: 1, dBm: 1e-3, dBW: 1 } as const

type VoltageUnit = keyof typeof MICROVOLTS

const isVoltage = (unit: LevelUnit): unit is VoltageUnit => unit in MICROVOLTS
const isLogarithmic = (unit: LevelUnit): boolean => unit.startsWith('dB')

/** Source: definition, P = V^2 / Z. */
function toMicrovolts(value: number, unit: LevelUnit, across: Ohm): number {
  if (isVoltage(unit))
    return MICROVOLTS[unit] * (isLogarithmic(unit) ? dbToVoltageRatio(value) : value)
  const watts = WATTS[unit] * (isLogarithmic(unit) ? dbToPowerRatio(value) : value)
  return 1e6 * Math.sqrt(watts * across)
}

function fromMicrovolts(microvolts: number, unit: LevelUnit, across: Ohm): number {
  if (isVoltage(unit)) {
    const ratio = microvolts / MICROVOLTS[unit]
    return isLogarithmic(unit) ? voltageRatioToDb(ratio) : ratio
  }
  const ratio = (microvolts * 1e-6) ** 2 / across / WATTS[unit]
  return isLogarithmic(unit) ? powerRatioToDb(ratio) : ratio
}

/** A level as somebody wrote it down. */
export interface WrittenLevel {
  readonly value: number
  readonly unit: LevelUnit
}

/**
 * The same level in another unit, across the same impedance. Voltages and powers must be above zero, for
 * silence has no level in decibels. Source: definitions; dBm = dBmV - 48.751 at 75 ohm.
 */
export const convertLevel = (
  { value, unit }: WrittenLevel,
  to: LevelUnit,
  across: Ohm,
): Result<number, QuantityProblem> =>
  whenPositive({ impedance: across, ...(isLogarithmic(unit) ? {} : { level: value }) }, () =>
    fromMicrovolts(toMicrovolts(value, unit, across), to, across),
  )
