import {
  dbmvToDbm,
  dbToPowerRatio,
  lower,
  metre,
  microvoltPerMetre,
  ohm,
  whenPositive,
  type Db,
  type Dbmv,
  type Metre,
  type Mhz,
  type MicrovoltPerMetre,
  type QuantityProblem,
} from '@coaxwain/quantities'
import type { Result } from '@coaxwain/result'

/** A field, and how far off it is measured. */
export interface FieldLimit {
  readonly field: MicrovoltPerMetre
  readonly at: Metre
}

const NEAR: FieldLimit = { field: microvoltPerMetre(20), at: metre(3) }
const FAR: FieldLimit = { field: microvoltPerMetre(15), at: metre(30) }

/**
 * What a cable system may let out: 15 uV/m at 30 m up to 54 MHz and above 216 MHz, 20 uV/m at 3 m between.
 * Source: 47 CFR 76.605(a)(12), 2015 edition; amended from 2018.
 */
export const leakageLimit = (at: Mhz): Result<FieldLimit, QuantityProblem> =>
  whenPositive({ at }, () => (at > 54 && at <= 216 ? NEAR : FAR))

/** The same field farther off or nearer: E2 = E1 d1 / d2. Source: free space, far field. */
export const fieldAt = (
  { field, at }: FieldLimit,
  distance: Metre,
): Result<MicrovoltPerMetre, QuantityProblem> =>
  whenPositive({ field, at, distance }, () => microvoltPerMetre((field * at) / distance))

export interface Radiator {
  readonly level: Dbmv
  /** What the screen of the cable holds back; 0 for a system joined to an aerial. */
  readonly shielding: Db
  /** As a power ratio: 1.64 for a half-wave dipole. */
  readonly antennaGain: number
  readonly distance: Metre
}

/** A level is taken across 75 ohm. */
const CABLE = ohm(75)

/**
 * Field of what gets out: E = sqrt(30 P G) / d. +10 dBmV on an open dipole is 33 dB over the limit at 3 m.
 * Source: far-field estimate of a dipole.
 */
export const radiatedField = (radiator: Radiator): Result<MicrovoltPerMetre, QuantityProblem> => {
  const { level, shielding, antennaGain, distance } = radiator
  return whenPositive({ antennaGain, distance }, () => {
    const watts = dbToPowerRatio(dbmvToDbm(lower(level, shielding), CABLE)) / 1000
    return microvoltPerMetre((1e6 * Math.sqrt(30 * watts * antennaGain)) / distance)
  })
}
