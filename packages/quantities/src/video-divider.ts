import type { Result } from '@coaxwain/result'
import { voltageRatioToDb } from './decibels'
import { whenPositive, type QuantityProblem } from './problems'
import { voltPp, type Db, type Ohm, type VoltPp } from './units'

/** An output as a voltage behind a resistance: 2 Vpp behind 75 ohm for nominal video. */
export interface VideoSource {
  readonly emf: VoltPp
  readonly impedance: Ohm
  /** What it should be at its load. */
  readonly nominal: VoltPp
}

export interface LoadedVideo {
  readonly level: VoltPp
  /** Against nominal: 0 with one 75 ohm load, -3.52 with two, +6.02 with none. */
  readonly error: Db
}

const conductance = (loads: readonly Ohm[]): number =>
  loads.reduce((sum, load) => sum + 1 / load, 0)

/**
 * Voltage on a video line with every load that hangs on it in parallel: V = E RL / (RL + Rs). No load at all
 * leaves the whole e.m.f. Source: voltage divider.
 */
export const loadVideo = (
  source: VideoSource,
  loads: readonly Ohm[],
): Result<LoadedVideo, QuantityProblem> =>
  whenPositive({ ...source, ...Object.fromEntries(loads.map((l, i) => [`load ${i}`, l])) }, () => {
    const level = source.emf / (1 + source.impedance * conductance(loads))
    return { level: voltPp(level), error: voltageRatioToDb(level / source.nominal) }
  })
