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
import { FORM_MHZ, RF_SYSTEMS, type Colour, type PictureForm, type ScanId } from '@coaxwain/signal'
import { systemCarries } from './accept'
import { carriersOf } from './carriers'
import { embedsSound, type Core, type CoreTable, type Passing } from './signal'

/** An output of a function of a device. */
export interface Output {
  readonly device: DeviceModel
  readonly fn: ModelFunction
  readonly give: Give
}

/** A picture as it is inside a box. */
export interface Inside {
  readonly core: Core
  readonly colour: boolean
  readonly lumaOnly: boolean
}

/** A picture as it leaves a box, and the positions that make it so. */
export interface Leaving extends Passing {
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

const AS_IT_COMES: readonly PictureGive[] = [{ scan: 'same', colour: 'same' }]

/** What leaves by one output of a function when a signal has been taken at its input. */
export function leave(output: Output, inside: Inside, cores: CoreTable): Leaving[] {
  const { core } = inside
  return offered(output.give.picture ?? AS_IT_COMES, core.scan, core.colour).flatMap((row) =>
    leaveAs(row, output, inside, cores),
  )
}

function leaveAs(row: PictureGive, output: Output, inside: Inside, cores: CoreTable): Leaving[] {
  const { device, fn, give } = output
  const { core } = inside
  const form = jackOf(device, give.jack).form as PictureForm
  const scan = row.scan === 'same' ? core.scan : row.scan
  const colour = colourAfter(row, inside)
  const plain = { form, scan, colour, protection: core.protection, carrier: core.carrier }
  const passing: Omit<Leaving, 'core' | 'stand'> = {
    poorest: inside.lumaOnly ? 'luma-only' : form,
    lumaMhz: Math.min(bandwidthOf(fn), wireMhz(form, colour)),
    shape: row.shape ?? null,
    direct: isDirect(fn) && scan === core.scan,
    delayMs: fn.delayMs ?? 0,
    sound: embedsSound(form) ? 'stereo' : 'none',
  }
  if (give.rf) return give.rf.flatMap((rf) => modulate(rf, { device, row, plain, passing }, cores))
  // RF cannot come out of a box that neither passes a carrier on nor makes one.
  if (form === 'rf' && !core.carrier) return []
  const passed = cores.intern(form === 'rf' ? plain : { ...plain, carrier: null })
  return [{ ...passing, core: passed, stand: row.while ?? [] }]
}

function colourAfter(row: PictureGive, inside: Inside): Colour {
  if (inside.lumaOnly) return 'mono'
  if (row.colour === 'same') return inside.core.colour
  return inside.colour ? row.colour : 'mono'
}

const bandwidthOf = (fn: ModelFunction): number => fn.bandwidthMhz ?? Infinity

const isDirect = (fn: ModelFunction): boolean => fn.storesFields !== true

interface Unmodulated {
  readonly device: DeviceModel
  readonly row: PictureGive
  readonly plain: Omit<Core, 'id' | 'kind'>
  readonly passing: Omit<Leaving, 'core' | 'stand'>
}

function modulate(rf: RfGive, made: Unmodulated, cores: CoreTable): Leaving[] {
  const { device, row, plain, passing } = made
  const stand = together(rf.while, row.while)
  if (!stand || !systemCarries(rf.system, plain.scan)) return []
  return [
    {
      ...passing,
      core: cores.intern({ ...plain, carrier: carriersOf(device, rf) }),
      lumaMhz: Math.min(passing.lumaMhz, RF_SYSTEMS[rf.system].videoMhz),
      sound: rf.sound,
      stand,
    },
  ]
}
