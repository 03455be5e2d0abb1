import {
  khz,
  mhz,
  whenPositive,
  type Khz,
  type Mhz,
  type QuantityProblem,
} from '@coaxwain/quantities'
import type { Result } from '@coaxwain/result'

/**
 * How far off a carrier is for a relative error in millionths: 0.1 % at UHF is over half a megahertz.
 * Source: definition.
 */
export const frequencyError = (nominal: Mhz, millionths: number): Result<Khz, QuantityProblem> =>
  whenPositive({ nominal }, () => khz((nominal * millionths) / 1000))

/** Pilot of 8-VSB above the lower edge of its channel. Source: 47 CFR 73.682(d). */
const PILOT_MHZ = 0.309441

export const vsbPilot = (lowerEdge: Mhz): Mhz => mhz(lowerEdge + PILOT_MHZ)

/** A band of aircraft radio, and by how much a cable carrier in it must be moved. */
interface OffsetBand {
  readonly mhz: readonly [low: number, high: number]
  readonly offsetKhz: number
}

/** Source: 47 CFR 76.612(a)(1) and (b). */
const AERONAUTICAL: readonly OffsetBand[] = [
  { mhz: [108, 118], offsetKhz: 25 },
  { mhz: [118, 137], offsetKhz: 12.5 },
  { mhz: [225, 328.6], offsetKhz: 12.5 },
  { mhz: [328.6, 335.4], offsetKhz: 25 },
  { mhz: [335.4, 400], offsetKhz: 12.5 },
]

/** What a strong cable carrier must be moved up by; 0 outside the bands of aircraft radio. */
export const aeronauticalOffset = (vision: Mhz): Khz =>
  khz(AERONAUTICAL.find((b) => vision >= b.mhz[0] && vision < b.mhz[1])?.offsetKhz ?? 0)

/** The carrier where it has to stand. Source: 47 CFR 76.612. */
export const movedOffAircraft = (vision: Mhz): Mhz =>
  mhz(vision + aeronauticalOffset(vision) / 1000)
