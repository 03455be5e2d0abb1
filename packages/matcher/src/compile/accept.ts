import {
  controlOf,
  together,
  type AcceptRow,
  type Condition,
  type DeviceModel,
  type Key,
  type ModelFunction,
} from '@coaxwain/models'
import {
  decode,
  isEncoded,
  RF_SYSTEMS,
  samePolarity,
  sameSoundSpacing,
  type RfSystemId,
  type SwitchVolt,
} from '@coaxwain/signal'
import { reachedBy, type Reached } from './carriers'
import type { Core, CoreTable } from './signal'

/** An input of a function of a device. */
export interface Input {
  readonly device: DeviceModel
  readonly fn: ModelFunction
  readonly jack: Key
}

/** What an input makes of a signal, and under which positions. */
export interface Taken {
  readonly colour: boolean
  readonly reducedHeight: boolean
  /** The sound inside the signal comes out. */
  readonly heard: boolean
  readonly stand: Condition
  /** The signal, with the carriers that are still possible. */
  readonly core: Core
}

export interface Arriving {
  readonly core: Core
  readonly lumaOnly: boolean
  readonly volts: readonly SwitchVolt[]
}

/** A function without rows sets no conditions. */
const ANYTHING: readonly AcceptRow[] = [{ scans: 'any', colours: 'any' }]

/** System A scans 405 lines; nothing else shows it, nor it anything else. */
const showsPicture = (listed: RfSystemId, sent: RfSystemId): boolean =>
  samePolarity(listed, sent) && (listed === 'A') === (sent === 'A')

/**
 * The rows of a function that take a signal at one of its inputs. The first row that matches in full wins
 * under its positions; a row that matches but for the colour takes the picture in grey.
 */
export function accept(input: Input, arriving: Arriving, cores: CoreTable): Taken[] {
  const { fn } = input
  const rows = fn.accepts.length > 0 ? fn.accepts : ANYTHING
  const reached: readonly (Reached | null)[] = tunes(input, arriving.core)
  const open = firstOfAll(rows.flatMap((row) => matches(row, input, arriving) ?? []))
  return reached.flatMap((reach) =>
    open.flatMap(({ row, ...outcome }): Taken[] => {
      const stand = together(row.while, reach?.while)
      if (!stand) return []
      const core = reach
        ? cores.intern({ ...arriving.core, carrier: reach.carrier })
        : arriving.core
      return [{ ...outcome, stand, core }]
    }),
  )
}

/** A row that takes a signal, and what it makes of it. */
interface Match extends Pick<Taken, 'colour' | 'reducedHeight' | 'heard'> {
  readonly row: AcceptRow
  /** In full, its colour included. */
  readonly full: boolean
}

/** Rows that come about under some positions: those before them in full, or alike, do not hold under all of theirs. */
function firstOfAll(matching: readonly Match[]): Match[] {
  const ordered = [...matching.filter((m) => m.full), ...matching.filter((m) => !m.full)]
  return ordered.filter(
    (m, i) => !ordered.slice(0, i).some((first) => holdsWherever(first.row, m.row)),
  )
}

interface Conditional {
  readonly while?: Condition | undefined
}

/** Under all positions under which one row holds, another does as well. */
export const holdsWherever = (row: Conditional, other: Conditional): boolean =>
  (row.while ?? []).every(({ control, in: wanted }) =>
    (other.while ?? []).some((c) => c.control === control && c.in.every((p) => wanted.includes(p))),
  )

/** What one row makes of a signal; null when it is not for it. */
function matches(row: AcceptRow, { fn, jack }: Input, arriving: Arriving): Match | null {
  const { core, volts } = arriving
  const meant =
    (!row.jacks || row.jacks.includes(jack)) &&
    (row.volts ?? []).every((v) => volts.includes(v)) &&
    (row.scans === 'any' || row.scans.includes(core.scan))
  const tuned = fn.tunedBy === undefined ? 'pass' : receives(row, core)
  const seen = colourOf(row, arriving)
  if (!meant || tuned === 'nothing' || seen === 'nothing') return null
  return {
    row,
    full: seen === 'colour',
    colour: seen === 'colour' && row.outcome !== 'monochrome',
    reducedHeight: row.outcome === 'reduced-height',
    heard: tuned !== 'silent' && row.outcome !== 'silent',
  }
}

function tunes({ device, fn }: Input, { carrier }: Core): readonly (Reached | null)[] {
  if (fn.tunedBy === undefined) return [null]
  const control = controlOf(device, fn.tunedBy)
  if (control.kind !== 'tuned-to' || !carrier) return []
  return reachedBy(control, carrier)
}

function receives(row: AcceptRow, { carrier }: Core): 'fine' | 'silent' | 'nothing' {
  if (!carrier) return 'nothing'
  if (carrier.digital) return row.digital?.includes(carrier.digital) ? 'fine' : 'nothing'
  const listed = row.systems ?? []
  if (!listed.some((s) => showsPicture(s, carrier.system))) return 'nothing'
  return listed.some((s) => sameSoundSpacing(s, carrier.system)) ? 'fine' : 'silent'
}

function colourOf(row: AcceptRow, { core, lumaOnly }: Arriving): 'colour' | 'grey' | 'nothing' {
  if (lumaOnly || core.colour === 'mono') return 'grey'
  if (row.colours === 'any') return 'colour'
  if (isEncoded(core.colour))
    return decode(core.colour, row.colours) === 'colour' ? 'colour' : 'grey'
  return row.colours.includes(core.colour) ? 'colour' : 'nothing'
}

/**
 * Whether a modulator for a system sends a scan on. One for 525 or 625 lines knows nothing of lines and sends either:
 * the set decides (common practice, no source); the old narrow and wide systems carry their own alone.
 */
export function systemCarries(system: RfSystemId, scan: Core['scan']): boolean {
  switch (RF_SYSTEMS[system].lines) {
    case 525:
    case 625:
      return ['525i60', '262p60', '625i50', '312p50'].includes(scan)
    case 405:
      return scan === '405i50'
    case 819:
      return scan === '819i50'
  }
}
