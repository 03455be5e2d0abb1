import { ok, type Result } from '@coaxwain/result'
import { dbToPowerRatio, powerRatioToDb } from './decibels'
import { dbmToDbmv } from './levels'
import { whenAtLeast, whenNotNegative, whenPositive, type QuantityProblem } from './problems'
import {
  db,
  dbm,
  dbmv,
  kelvin,
  ohm,
  type Db,
  type Dbm,
  type Dbmv,
  type Hz,
  type Kelvin,
  type Ohm,
} from './units'

/** Joules per kelvin; exact since 2019 (SI brochure, 9th edition). */
const BOLTZMANN = 1.380649e-23

/** Room temperature by which noise figures are defined. */
export const ROOM: Kelvin = kelvin(290)

const CABLE: Ohm = ohm(75)

export interface NoiseBandwidth {
  readonly bandwidth: Hz
  readonly temperature?: Kelvin
  /** Across which the level is stated. */
  readonly across?: Ohm
}

export interface Floor {
  readonly power: Dbm
  readonly level: Dbmv
}

/**
 * Thermal noise in a bandwidth: N = k T B. -59.2 dBmV in 4 MHz at 290 K across 75 ohm.
 * Source: k T B; 47 CFR 76.609(e) measures in 4 MHz.
 */
export const thermalFloor = ({
  bandwidth,
  temperature = ROOM,
  across = CABLE,
}: NoiseBandwidth): Result<Floor, QuantityProblem> =>
  whenPositive({ bandwidth, temperature, across }, () => {
    const power = dbm(powerRatioToDb(BOLTZMANN * temperature * bandwidth * 1000))
    return { power, level: dbmToDbmv(power, across) }
  })

/** One thing in a row; a passive loss has a noise figure equal to it at room temperature. */
export interface Stage {
  readonly gain: Db
  readonly noiseFigure: Db
}

/** A lead, pad or splitter as a stage. Source: noise of a passive loss at room temperature. */
export const passiveStage = (loss: Db): Result<Stage, QuantityProblem> =>
  whenNotNegative({ loss }, () => ({ gain: db(0 - loss), noiseFigure: loss }))

/** Two stages as one: F = F1 + (F2 - 1) / G1. Gains and figures in dB. */
const joined = (first: Stage, second: Stage): Stage => ({
  gain: db(first.gain + second.gain),
  noiseFigure: powerRatioToDb(
    dbToPowerRatio(first.noiseFigure) +
      (dbToPowerRatio(second.noiseFigure) - 1) / dbToPowerRatio(first.gain),
  ),
})

/**
 * A row of stages as one: F = F1 + (F2-1)/G1 + (F3-1)/(G1 G2) + ... with ratios, not dB. Associative, so a
 * part of a row may be worked out first. A row of nothing passes everything and adds nothing.
 * Source: Friis noise formula.
 */
export function cascade(stages: readonly Stage[]): Result<Stage, QuantityProblem> {
  const [first, ...rest] = stages
  if (!first) return ok({ gain: db(0), noiseFigure: db(0) })
  return whenNotNegative(
    Object.fromEntries(stages.map((s, i) => [`noise figure ${i}`, s.noiseFigure])),
    () => rest.reduce(joined, first),
  )
}

export interface Reception {
  readonly bandwidth: Hz
  readonly noiseFigure: Db
}

const map = <T, U, P>(result: Result<T, P>, change: (value: T) => U): Result<U, P> =>
  result.ok ? ok(change(result.value)) : result

/** C/N = level - k T B - NF, at 290 K across 75 ohm. Source: k T B; 47 CFR 76.609(e). */
export const carrierToNoise = (
  level: Dbmv,
  { bandwidth, noiseFigure }: Reception,
): Result<Db, QuantityProblem> =>
  map(thermalFloor({ bandwidth }), (floor) => db(level - floor.level - noiseFigure))

/** Several ratios in a row: -10 log sum 10^(-CN_i / 10), never better than the poorest. Source: noise powers add. */
export const addCarrierToNoise = (ratios: readonly Db[]): Result<Db, QuantityProblem> =>
  whenAtLeast(1, 'ratios', ratios.length, () =>
    powerRatioToDb(1 / ratios.reduce((sum, ratio) => sum + 1 / dbToPowerRatio(ratio), 0)),
  )

/** The least level that still gives a wanted C/N. Source: 47 CFR 76.605(a)(7) asks 43 dB. */
export const levelFor = (
  wanted: Db,
  { bandwidth, noiseFigure }: Reception,
): Result<Dbmv, QuantityProblem> =>
  map(thermalFloor({ bandwidth }), (floor) => dbmv(floor.level + noiseFigure + wanted))

/**
 * Where a digital carrier falls off the edge: floor + NF + required C/N, 15.19 dB for 8-VSB.
 * Source: 47 CFR 73.623(c)(3); planning factors of the regulator.
 */
export const digitalThreshold = (
  required: Db,
  { bandwidth, noiseFigure }: Reception,
): Result<Floor, QuantityProblem> =>
  map(thermalFloor({ bandwidth }), ({ power, level }) => ({
    power: dbm(power + noiseFigure + required),
    level: dbmv(level + noiseFigure + required),
  }))
