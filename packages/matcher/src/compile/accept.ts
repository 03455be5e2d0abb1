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
import type { Sig } from './sig'

/** What an input makes of a signal, and under which positions. */
export interface Taken {
  readonly colour: boolean
  readonly reducedHeight: boolean
  /** The sound inside the signal comes out. */
  readonly heard: boolean
  readonly stand: Condition
  /** The carriers that are still possible. */
  readonly sig: Sig
}

export interface Arriving {
  readonly sig: Sig
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
export function accept(
  device: DeviceModel,
  fn: ModelFunction,
  jack: Key,
  arriving: Arriving,
  widen: (sig: Sig, carrier: Sig['carrier']) => Sig,
): Taken[] {
  const { sig } = arriving
  const reached: readonly (Reached | null)[] = tunes(device, fn, sig)
  const rows = fn.accepts.length > 0 ? fn.accepts : ANYTHING
  return reached.flatMap((reach) =>
    rows.flatMap((row): Taken[] => {
      if (row.jacks && !row.jacks.includes(jack)) return []
      if (row.volts && !row.volts.every((v) => arriving.volts.includes(v))) return []
      if (row.scans !== 'any' && !row.scans.includes(sig.scan)) return []
      const systems = fn.tunedBy === undefined ? 'pass' : receives(row, sig)
      if (systems === 'nothing') return []
      const seen = colourOf(row, arriving)
      if (seen === 'nothing') return []
      const stand = together(row.while, reach?.while)
      if (!stand) return []
      return [
        {
          colour: seen === 'colour' && row.outcome !== 'monochrome',
          reducedHeight: row.outcome === 'reduced-height',
          heard: systems !== 'silent' && row.outcome !== 'silent',
          stand,
          sig: reach ? widen(sig, reach.carrier) : sig,
        },
      ]
    }),
  )
}

function tunes(device: DeviceModel, fn: ModelFunction, sig: Sig): readonly (Reached | null)[] {
  if (fn.tunedBy === undefined) return [null]
  const control = controlOf(device, fn.tunedBy)
  if (control.kind !== 'tuned-to' || !sig.carrier) return []
  return reachedBy(control, sig.carrier)
}

function receives(row: AcceptRow, sig: Sig): 'fine' | 'silent' | 'nothing' {
  const carrier = sig.carrier
  if (!carrier) return 'nothing'
  if (carrier.digital) return row.digital?.includes(carrier.digital) ? 'fine' : 'nothing'
  const listed = row.systems ?? []
  if (!listed.some((s) => showsPicture(s, carrier.system))) return 'nothing'
  return listed.some((s) => sameSoundSpacing(s, carrier.system)) ? 'fine' : 'silent'
}

function colourOf(row: AcceptRow, { sig, lumaOnly }: Arriving): 'colour' | 'grey' | 'nothing' {
  if (lumaOnly || sig.colour === 'mono') return 'grey'
  if (row.colours === 'any') return 'colour'
  if (isEncoded(sig.colour)) return decode(sig.colour, row.colours) === 'colour' ? 'colour' : 'grey'
  return row.colours.includes(sig.colour) ? 'colour' : 'nothing'
}

/** Lines of a system against the scan of what is to be sent by it. */
export function systemCarries(system: RfSystemId, scan: Sig['scan']): boolean {
  switch (RF_SYSTEMS[system].lines) {
    case 525:
      return scan === '525i60' || scan === '262p60'
    case 625:
      return scan === '625i50' || scan === '312p50'
    case 405:
      return scan === '405i50'
    case 819:
      return scan === '819i50'
  }
}
