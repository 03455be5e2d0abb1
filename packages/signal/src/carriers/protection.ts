import { db, type Db, type Mhz } from '@coaxwain/quantities'
import { err, ok, problem, type Problem, type Result } from '@coaxwain/result'
import {
  PROTECTION_ROWS,
  type CarrierOffset,
  type DvbMode,
  type ProtectionRow,
  type Service,
} from './protection-rows'

/** Planning of broadcasts, or interference that is always there, as inside a house. */
export type Hearing = 'planning' | 'continuous'

export interface Encounter {
  readonly wanted: Service
  /** Of a wanted DVB-T multiplex. */
  readonly mode?: DvbMode | undefined
  readonly unwanted: Service
  /** Where the unwanted lies, in channels above the wanted. */
  readonly channels: number
  /** Where it is not known the stricter of both holds. */
  readonly band?: 'VHF' | 'UHF' | undefined
  readonly offset?: CarrierOffset | undefined
  /** On one cable with filtered modulators, or each from its own aerial. */
  readonly medium?: 'air' | 'cable' | undefined
  readonly hearing: Hearing
}

export type NoRatio = Problem<'no-ratio', { readonly wanted: string; readonly unwanted: string }>

const isBetween = (row: ProtectionRow, { wanted, unwanted, mode }: Encounter): boolean =>
  row.wanted.includes(wanted) &&
  row.unwanted.includes(unwanted) &&
  (row.mode === undefined || row.mode === mode)

const liesThere = (row: ProtectionRow, { channels, band, offset, medium }: Encounter): boolean =>
  row.channels.includes(channels) &&
  (row.band === undefined || band === undefined || row.band === band) &&
  (row.offset ?? 'none') === (offset ?? 'none') &&
  (row.medium ?? 'air') === (medium ?? 'air')

/** Where nobody tabulated continuous interference, planning is the best figure there is. */
const ratioOf = (row: ProtectionRow, hearing: Hearing): number =>
  hearing === 'continuous' ? (row.continuousDb ?? row.planningDb) : row.planningDb

/** Least wanted minus unwanted level. Sources: beside each row of the table. */
export function protectionRatio(meeting: Encounter): Result<Db, NoRatio> {
  const found = PROTECTION_ROWS.filter((row) => isBetween(row, meeting) && liesThere(row, meeting))
  const { wanted, unwanted, hearing } = meeting
  return found.length === 0
    ? err(problem('no-ratio', { wanted, unwanted }))
    : ok(db(Math.max(...found.map((row) => ratioOf(row, hearing)))))
}

export interface Protected {
  readonly required: Db
  /** Below zero it is disturbed. */
  readonly margin: Db
}

/** Whether a level difference is enough. */
export function protection(meeting: Encounter, wantedOverUnwanted: Db): Result<Protected, NoRatio> {
  const required = protectionRatio(meeting)
  return required.ok
    ? ok({ required: required.value, margin: db(wantedOverUnwanted - required.value) })
    : required
}

/** MHz above the wanted vision carrier, planning and continuous ratio. */
type CurvePoint = readonly [offsetMhz: number, planningDb: number, continuousDb: number]

/**
 * A single carrier within a PAL channel. The first point is for H, I, K1 and L; B, G, D and K need less there.
 * The last two hold for B and G; systems with more video have the last slope 0.4 MHz higher.
 * Source: ITU-R BT.655, read through a public open-source coding of its tables.
 */
const SINGLE_CARRIER: readonly CurvePoint[] = [
  [-1.25, 32, 40],
  [-0.5, 44, 50],
  [0, 47, 54],
  [0.5, 50, 58],
  [1, 50, 58],
  [2, 44, 54],
  [3, 36, 44],
  [3.6, 45, 53],
  [4.8, 45, 53],
  [5.3, 25, 35],
  [6, 25, 35],
]

/** Wanted over a single carrier in its channel, by where it lies; straight lines between the points. */
export function singleCarrierRatio(offset: Mhz, hearing: Hearing): Result<Db, NoRatio> {
  const column = hearing === 'planning' ? 1 : 2
  const above = SINGLE_CARRIER.find(([mhz]) => mhz >= offset)
  const below = SINGLE_CARRIER.findLast(([mhz]) => mhz <= offset)
  if (!above || !below) {
    return err(problem('no-ratio', { wanted: 'PAL', unwanted: `carrier at ${offset} MHz` }))
  }
  const share = above === below ? 0 : (offset - below[0]) / (above[0] - below[0])
  return ok(db(below[column] + share * (above[column] - below[column])))
}

/** Any single carrier or product in a channel of a cable lies so far below vision. Source: 47 CFR 76.605(a)(8)(i). */
export const CABLE_PRODUCT_RATIO: Db = db(51)

/** FM sound on FM sound of another carrier. Source: ITU-R BT.655 as above. */
export const SOUND_RATIO: Readonly<Record<Hearing, Db>> = { planning: db(32), continuous: db(39) }
