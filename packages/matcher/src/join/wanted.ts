import { arrivalAt, isSingle, mates, type Circuit } from '@coaxwain/signal'
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
  if (into.form === null || out.form === 'rgbs') return null
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

type SoundContacts = Partial<Record<Circuit, FaceContact>>

const soundContacts = (face: Face): SoundContacts =>
  Object.fromEntries(face.sound.map((c) => [c.circuit, c]))

/** The wires that bring sound from one sound end to another, or null when they do not meet. */
export function soundWires(out: Face, into: Face): WantedSound | null {
  if (out.sound.some((c) => c.level === 'loudspeaker')) return null
  const from = soundContacts(out)
  const to = soundContacts(into)
  const { 'audio-l': left, 'audio-r': right } = from
  return left && right ? stereoWires(left, right, to) : oneWire(from, to)
}

function stereoWires(left: FaceContact, right: FaceContact, to: SoundContacts): WantedSound | null {
  const { 'audio-l': toLeft, 'audio-r': toRight, 'audio-mono': toMono } = to
  if (toLeft && toRight)
    return { wires: [wire(left, toLeft), wire(right, toRight)], meeting: 'both' }
  return toMono && !toLeft && !toRight
    ? { wires: [wire(left, toMono), wire(right, toMono)], meeting: 'fold' }
    : null
}

function oneWire(from: SoundContacts, to: SoundContacts): WantedSound | null {
  const { 'audio-l': toLeft, 'audio-r': toRight, 'audio-mono': toMono } = to
  if (toLeft && toRight) return null
  const mono = from['audio-mono']
  const one = mono ?? from['audio-l'] ?? from['audio-r']
  // One channel is heard by whichever socket there is.
  const target = toMono ?? toLeft ?? toRight
  return one && target ? { wires: [wire(one, target)], meeting: mono ? 'mono' : 'one' } : null
}
