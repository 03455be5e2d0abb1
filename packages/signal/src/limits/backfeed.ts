import {
  db,
  lower,
  ohm,
  whenNotNegative,
  type Db,
  type Dbmv,
  type Ohm,
  type QuantityProblem,
} from '@coaxwain/quantities'
import type { Result } from '@coaxwain/result'
import { OUTPUT_LIMITS, rfLimit } from './rf-output'

export interface Backfeed {
  /** What gets up to the aerial socket. */
  readonly level: Dbmv
  readonly limit: Dbmv
  /** Above zero it transmits. */
  readonly excess: Db
  readonly allowed: boolean
}

/**
 * What of a modulator reaches the aerial past every isolation on the way, against -50.5 dBmV at 75 ohm. A
 * splitter as a combiner parts by about 22 dB and is 38 dB short. Source: 47 CFR 15.115(c)(1)(ii).
 */
export function backfeed(
  modulator: Dbmv,
  isolations: readonly Db[],
  across: Ohm = ohm(75),
): Result<Backfeed, QuantityProblem> {
  const limit = rfLimit(OUTPUT_LIMITS['aerial-socket'], across)
  if (!limit.ok) return limit
  return whenNotNegative(named(isolations), () => {
    const level = isolations.reduce(lower, modulator)
    const excess = db(level - limit.value.level)
    return { level, limit: limit.value.level, excess, allowed: excess <= 0 }
  })
}

const named = (isolations: readonly Db[]): Record<string, number> =>
  Object.fromEntries(isolations.map((isolation, i) => [`isolation ${i}`, isolation]))
