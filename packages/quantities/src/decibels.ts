import { db, type Db } from './units'

/** A ratio of powers in dB: 10 log r (definition). */
export const powerRatioToDb = (ratio: number): Db => db(10 * Math.log10(ratio))

/** Inverse of {@link powerRatioToDb}. */
export const dbToPowerRatio = (level: number): number => 10 ** (level / 10)

/** A ratio of voltages across one impedance in dB: 20 log r (definition). */
export const voltageRatioToDb = (ratio: number): Db => db(20 * Math.log10(ratio))

/** Inverse of {@link voltageRatioToDb}. */
export const dbToVoltageRatio = (level: number): number => 10 ** (level / 20)
