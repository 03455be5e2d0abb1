import {
  jackOf,
  together,
  type Condition,
  type DeviceModel,
  type Give,
  type ModelFunction,
  type PictureGive,
  type RfGive,
} from '@coaxwain/models'
import {
  FORM_MHZ,
  poorer,
  RF_SYSTEMS,
  SOUND_RANK,
  type Colour,
  type PictureForm,
  type ScanId,
  type Sound,
} from '@coaxwain/signal'
import { systemCarries } from './accept'
import { carriersOf } from './carriers'
import { embedsSound, type Sig, type SigTable } from './sig'

/** A signal as it leaves a box, and the positions that make it so. */
export interface Leaving {
  readonly sig: Sig
  readonly stand: Condition
}

/**
 * Luma bandwidth of a form on a wire. Composite keeps what its colour system leaves:
 * ITU-R BT.470 and 47 CFR 73.682 (4.2 MHz in M, 5 MHz in the 625-line systems); SECAM 3.5 MHz is
 * common practice, no source.
 */
export function wireMhz(form: PictureForm, colour: Colour): number {
  if (form === 'rf') return Infinity
  if (form !== 'composite') return FORM_MHZ[form]
  if (colour === 'secam') return 3.5
  return colour === 'pal' || colour === 'pal-n' || colour === 'pal-60' ? 5 : FORM_MHZ.composite
}

const lesserSound = (a: Sound, b: Sound): Sound => (SOUND_RANK[a] <= SOUND_RANK[b] ? a : b)

export interface Inside {
  readonly sig: Sig
  readonly colour: boolean
  readonly lumaOnly: boolean
  /** Sound that goes out by this way, if it goes out inside the picture signal. */
  readonly sound: Sound
}

/** Rows that a box offers: those that equal what arrives, else those of the same scan, else any. */
function offered(rows: readonly PictureGive[], scan: ScanId, colour: Colour): PictureGive[] {
  const rank = (row: PictureGive): number => {
    const sameScan = row.scan === 'same' || row.scan === scan
    const sameColour = row.colour === 'same' || row.colour === colour
    return sameScan && sameColour ? 0 : sameScan ? 1 : 2
  }
  return rows.filter((row) => !rows.some((r) => rank(r) < rank(row) && preempts(r, row)))
}

/** A better row takes over when its positions follow from those of the other. */
const preempts = (better: PictureGive, row: PictureGive): boolean => {
  const own = new Set((row.while ?? []).map((c) => c.control))
  return (
    together(better.while, row.while) !== null &&
    (better.while ?? []).every((c) => own.has(c.control))
  )
}

/** What leaves by one output of a function when a signal has been taken at its input. */
export function leave(
  device: DeviceModel,
  fn: ModelFunction,
  give: Give,
  inside: Inside,
  sigs: SigTable,
): Leaving[] {
  const form = jackOf(device, give.jack).form as PictureForm
  const { sig } = inside
  const pictures = offered(give.picture ?? [{ scan: 'same', colour: 'same' }], sig.scan, sig.colour)
  return pictures.flatMap((row): Leaving[] => {
    const scan = row.scan === 'same' ? sig.scan : row.scan
    const colour = inside.lumaOnly ? 'mono' : colourAfter(row, inside)
    const passed = {
      ...sig,
      form,
      scan,
      colour,
      poorest: poorer(inside.lumaOnly ? 'luma-only' : sig.poorest, form),
      lumaMhz: Math.min(sig.lumaMhz, fn.bandwidthMhz ?? Infinity, wireMhz(form, colour)),
      shape: row.shape ?? sig.shape,
      direct: sig.direct && fn.storesFields !== true && scan === sig.scan,
      delayMs: sig.delayMs + (fn.delayMs ?? 0),
      sound: embedsSound(form) ? inside.sound : ('none' as const),
    }
    if (!give.rf) {
      const carrier = form === 'rf' ? sig.carrier : null
      // RF cannot come out of a box that neither passes a carrier on nor makes one.
      if (form === 'rf' && !carrier) return []
      return [{ sig: sigs.intern({ ...passed, carrier }), stand: row.while ?? [] }]
    }
    return give.rf.flatMap((rf) => modulated(device, rf, row, passed, sigs))
  })
}

const colourAfter = (row: PictureGive, inside: Inside): Colour => {
  if (row.colour === 'same') return inside.sig.colour
  return inside.colour ? row.colour : 'mono'
}

function modulated(
  device: DeviceModel,
  rf: RfGive,
  row: PictureGive,
  passed: Omit<Sig, 'id'>,
  sigs: SigTable,
): Leaving[] {
  const stand = together(rf.while, row.while)
  if (!stand || !systemCarries(rf.system, passed.scan)) return []
  const sig = sigs.intern({
    ...passed,
    carrier: carriersOf(device, rf),
    lumaMhz: Math.min(passed.lumaMhz, RF_SYSTEMS[rf.system].videoMhz),
    sound: rf.sound === 'none' ? 'none' : lesserSound(rf.sound, passed.sound),
  })
  return [{ sig, stand }]
}
