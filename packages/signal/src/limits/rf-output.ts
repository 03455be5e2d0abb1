import {
  microvolt,
  microvoltToDbmv,
  whenPositive,
  type Dbmv,
  type Microvolt,
  type Ohm,
  type QuantityProblem,
} from '@coaxwain/quantities'
import type { Result } from '@coaxwain/result'

/**
 * What may leave a television interface device in North America, in microvolts per root ohm of its rated
 * impedance: constant power. Source: 47 CFR 15.115(b), (c), 2015 edition.
 */
export const OUTPUT_LIMITS = {
  /** Vision carrier of an ordinary device. */
  vision: 346.4,
  sound: 77.5,
  /** Vision carrier of a cable terminal or master-antenna device. */
  'vision-cable-device': 692.8,
  /** More than 4.6 MHz below or 7.4 MHz above the vision carrier. */
  'out-of-channel': 10.95,
  /** At the aerial socket of its transfer switch. */
  'aerial-socket': 0.346,
} as const

export type OutputLimit = keyof typeof OUTPUT_LIMITS

export interface RfLimit {
  readonly voltage: Microvolt
  readonly level: Dbmv
}

/** A limit across an impedance: K sqrt(R). Source: 47 CFR 15.115. */
export const rfLimit = (
  microvoltPerRootOhm: number,
  across: Ohm,
): Result<RfLimit, QuantityProblem> =>
  whenPositive({ microvoltPerRootOhm, across }, () => {
    const voltage = microvolt(microvoltPerRootOhm * Math.sqrt(across))
    return { voltage, level: microvoltToDbmv(voltage) }
  })

/** A limit by its name: +9.54 dBmV for the vision carrier of an ordinary device at 75 ohm. */
export const outputLimit = (limit: OutputLimit, across: Ohm): Result<RfLimit, QuantityProblem> =>
  rfLimit(OUTPUT_LIMITS[limit], across)
