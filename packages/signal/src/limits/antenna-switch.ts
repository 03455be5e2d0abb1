import { db, impossible, type Db, type Mhz, type QuantityProblem } from '@coaxwain/quantities'
import { ok, type Result } from '@coaxwain/result'

/** Least isolation up to and with a frequency. */
interface IsolationBand {
  readonly upToMhz: number
  readonly leastDb: number
}

const LOWEST_MHZ = 54

/** Source: 47 CFR 15.115(c)(1)(i) and (h): 80 dB applies at 216 MHz, 60 dB at 550 MHz. */
const BANDS: readonly IsolationBand[] = [
  { upToMhz: 216, leastDb: 80 },
  { upToMhz: 550, leastDb: 60 },
  { upToMhz: 806, leastDb: 55 },
]

/** What an aerial/cable switch must part at a frequency from 54 to 806 MHz. Source: 47 CFR 15.115(c), (h). */
export function antennaSwitchIsolation(at: Mhz): Result<Db, QuantityProblem> {
  const band = at < LOWEST_MHZ ? undefined : BANDS.find((b) => at <= b.upToMhz)
  return band ? ok(db(band.leastDb)) : impossible('out-of-range', 'at', at)
}
