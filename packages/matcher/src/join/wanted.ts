import { arrivalAt, isSingle, mates, type Circuit, type SoundCircuit } from '@coaxwain/signal'
import type { Face, FaceContact } from '../compile/face'
import type { WantedWire } from './route'

/** How the sound of an output meets the sound of an input. */
export type SoundMeeting =
  /** Left to left and right to right. */
  | 'both'
  /** Both channels added into one wire by a mixing piece. */
  | 'fold'
  /** One channel of two; the other is lost. */
  | 'one'
  /** A source with one wire. */
  | 'mono'

export type PictureMeeting = 'whole' | 'luma-only'

const wire = (from: FaceContact, to: FaceContact): WantedWire => ({
  circuit: from.circuit,
  taken: to.circuit,
  fromPort: from.port,
  fromContact: from.contact,
  toPort: to.port,
  toContact: to.contact,
})

/** Composite video and luma serve where sync is wanted. */
const SERVES_SYNC: readonly Circuit[] = ['csync', 'cvbs', 'y']

const isRgb = (face: Face): boolean => face.form === 'rgbs'

function source(out: Face, want: FaceContact, into: Face): FaceContact | undefined {
  const same = out.picture.find((c) => c.circuit === want.circuit)
  if (same || !isRgb(into) || !SERVES_SYNC.includes(want.circuit)) return same
  return out.picture.find((c) => SERVES_SYNC.includes(c.circuit))
}

const DIGITAL: readonly string[] = ['hdmi', 'dvi']

/** Forms whose wires agree name by name; digital sockets of both kinds carry the same pairs. */
const formsAgree = (out: Face, into: Face): boolean =>
  out.form === into.form || (DIGITAL.includes(out.form ?? '') && DIGITAL.includes(into.form ?? ''))

/** The wires that bring a whole picture across, or null when the output lacks one. */
export function wholePicture(out: Face, into: Face): WantedWire[] | null {
  if (!formsAgree(out, into)) return null
  const wires: WantedWire[] = []
  for (const want of into.picture) {
    const from = source(out, want, into)
    if (!from) return null
    wires.push(wire(from, want))
  }
  return wires
}

/**
 * The one wire that brings a steady grey picture across where the whole does not come: luma, or composite
 * into a luma contact. Decided by what arrives, not by a list of lookalikes.
 */
export function lumaOnly(out: Face, into: Face): WantedWire[] | null {
  if (into.form === null || formsAgree(out, into)) return null
  for (const want of into.picture) {
    for (const from of out.picture) {
      const arrival = arrivalAt(into.form, new Map([[want.circuit, from.circuit]]))
      if (arrival.kind === 'luma-only') return [wire(from, want)]
    }
  }
  return null
}

/** Where a person would put a plug by its colour: green on green, blue on blue, red on red. */
const BY_COLOUR: Partial<Record<Circuit, Circuit>> = {
  g: 'y',
  b: 'pb',
  r: 'pr',
  y: 'g',
  pb: 'b',
  pr: 'r',
}

/**
 * Wires that a person may lay because the plugs fit: RGB and component by colour, or a multi-way plug in its
 * own socket whose wanted circuits are not there. Null where nothing invites it.
 */
export function mismatched(out: Face, into: Face): WantedWire[] | null {
  const coloured = into.picture.flatMap((want) => {
    const from = out.picture.find((c) => BY_COLOUR[c.circuit] === want.circuit)
    return from ? [wire(from, want)] : []
  })
  if (coloured.length === 3) return coloured
  const [from] = out.picture
  const [want] = into.picture
  const a = from && out.ports[from.port]
  const b = want && into.ports[want.port]
  if (!a || !b || isSingle(a.connector) || !mates(a.connector, b.connector)) return null
  return [{ ...wire(from, want), toContact: from.contact }]
}

export interface WantedSound {
  readonly wires: readonly WantedWire[]
  readonly meeting: SoundMeeting
}

/** The wires that bring sound from one sound end to another, or null when they do not meet. */
export function soundWires(out: Face, into: Face): WantedSound | null {
  const from = new Map(out.sound.map((c) => [c.circuit as SoundCircuit, c]))
  const to = new Map(into.sound.map((c) => [c.circuit as SoundCircuit, c]))
  if ([...from.values()].some((c) => c.level === 'loudspeaker')) return null
  const left = from.get('audio-l')
  const right = from.get('audio-r')
  const mono = from.get('audio-mono')
  const toLeft = to.get('audio-l')
  const toRight = to.get('audio-r')
  const toMono = to.get('audio-mono')
  if (left && right) {
    if (toLeft && toRight)
      return { wires: [wire(left, toLeft), wire(right, toRight)], meeting: 'both' }
    return toMono && !toLeft && !toRight
      ? { wires: [wire(left, toMono), wire(right, toMono)], meeting: 'fold' }
      : null
  }
  if (toLeft && toRight) return null
  if (mono) {
    const target = toMono ?? toLeft
    return target ? { wires: [wire(mono, target)], meeting: 'mono' } : null
  }
  const one = left ?? right
  const target = toMono ?? (left ? toLeft : toRight)
  return one && target ? { wires: [wire(one, target)], meeting: 'one' } : null
}
