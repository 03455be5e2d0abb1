import {
  db,
  impossible,
  whenNotNegative,
  whenPositive,
  type Celsius,
  type Db,
  type Foot,
  type Mhz,
  type QuantityProblem,
} from '@coaxwain/quantities'
import { ok, type Result } from '@coaxwain/result'
import { CABLES, type CableId, type LossFit, type LossPoint } from './cables'

const PER_FT = 100

const over = (dbPer100ft: number, length: Foot): Result<Db, QuantityProblem> =>
  whenNotNegative({ length }, () => db((dbPer100ft * length) / PER_FT))

const fitted = ({ a, b }: LossFit, at: Mhz): number => a * Math.sqrt(at) + b * at

/**
 * Loss by the two-term fit of a cable. Outside the span of the fit it strays: at 5 MHz it is 30 % low.
 * Source: skin effect and dielectric loss, fitted to the tables.
 */
export function fittedLoss(cable: CableId, at: Mhz, length: Foot): Result<Db, QuantityProblem> {
  const { fit } = CABLES[cable]
  if (!fit) return tabledLoss(cable, at, length)
  return at > 0 ? over(fitted(fit, at), length) : impossible('not-positive', 'at', at)
}

/** Between two points loss runs with the root of the frequency (skin effect). */
function between([f1, low]: LossPoint, [f2, high]: LossPoint, at: Mhz): number {
  if (f1 === f2) return low
  return low + (high - low) * ((Math.sqrt(at) - Math.sqrt(f1)) / (Math.sqrt(f2) - Math.sqrt(f1)))
}

/** Loss by the published points of a cable; nothing is guessed beyond the first and the last. */
export function tabledLoss(cable: CableId, at: Mhz, length: Foot): Result<Db, QuantityProblem> {
  const { points } = CABLES[cable]
  const above = points.find(([mhz]) => mhz >= at)
  const below = points.findLast(([mhz]) => mhz <= at)
  if (!above || !below) return impossible('out-of-range', 'at', at)
  return over(between(below, above, at), length)
}

/** Loss of a run at 20 degrees: by the fit within its span, else by the table. */
export function cableLoss(cable: CableId, at: Mhz, length: Foot): Result<Db, QuantityProblem> {
  const { fit } = CABLES[cable]
  const within = fit && at >= fit.mhz[0] && at <= fit.mhz[1]
  return within ? fittedLoss(cable, at, length) : tabledLoss(cable, at, length)
}

/** Loss at another frequency by the root alone, good to about 3 % over a decade. Source: skin effect. */
export const scaledLoss = (loss: Db, from: Mhz, to: Mhz): Result<Db, QuantityProblem> =>
  whenPositive({ from, to }, () => db(loss * Math.sqrt(to / from)))

/** Temperature of the tables. */
const TABLE_DEGREES = 20
/** Copper rises 0.39 % per kelvin, and loss with its root. Source: resistivity of copper, skin effect. */
const PER_KELVIN = 0.002

/** Loss at another temperature. Below absolute zero there is none. */
export const loss20At = (loss: Db, temperature: Celsius): Result<Db, QuantityProblem> =>
  temperature < -273.15
    ? impossible('out-of-range', 'temperature', temperature)
    : ok(db(loss * (1 + PER_KELVIN * (temperature - TABLE_DEGREES))))
