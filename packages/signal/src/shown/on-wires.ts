import { arrivalAt, type Arrival } from '../arrival'
import type { Circuit } from '../circuits'
import type { PictureForm } from '../forms'
import { SCANS } from '../scan'
import type { Protection } from '../signals'
import { follow, type Picture, type Screen } from './followed'
import type { PictureShown, Shown } from './shown'
import type { Why } from './why'

/** A picture on wires: what it is, and which circuit arrives at each contact of the input. */
export interface OnWires extends Picture {
  readonly arrives: ReadonlyMap<Circuit, Circuit>
  readonly protection: Protection
}

export interface WiredInput extends Screen {
  readonly form: PictureForm
  /** Counts lines instead of following them: a converter, a capture box, a flat set. */
  readonly countsLines: boolean
  /** A recorder's level control, which looks for black where protection puts pulses. */
  readonly levelControl: boolean
}

const shown = (picture: PictureShown, colour: Shown['colour'], ...why: readonly Why[]): Shown => ({
  picture,
  colour,
  sound: 'apart',
  harms: false,
  why,
})

/** Logic levels at inputs that expect 0.7 V: each colour is either off or far too bright. */
const LOGIC: Partial<Record<Circuit, Circuit>> = { r: 'ttl-r', g: 'ttl-g', b: 'ttl-b' }

const isLogic = ({ arrives }: OnWires): boolean =>
  Object.entries(LOGIC).every(([wanted, logic]) => arrives.get(wanted as Circuit) === logic)

/** What an input with sockets of its own shows of the circuits that reach it. */
export function shownOnWires(sent: OnWires, input: WiredInput): Shown {
  if (isLogic(sent)) return shown('clipped', 'few', 'logic-level')
  const arrival = arrivalAt(input.form, sent.arrives)
  if (arrival.kind === 'nothing') return shown('nothing', 'none', whyNothing(sent))
  if (arrival.kind === 'wrong-colours') return tinted(arrival)
  return arrival.kind === 'luma-only' ? grey(sent, input, arrival.from) : whole(sent, input)
}

const VIDEO: ReadonlySet<Circuit> = new Set(['c', 'pb', 'pr', 'r', 'g', 'b'])

const whyNothing = ({ arrives }: OnWires): Why =>
  [...arrives.values()].every((c) => VIDEO.has(c)) ? 'no-sync' : 'other-signal'

function tinted(arrival: Extract<Arrival, { kind: 'wrong-colours' }>): Shown {
  const matrix =
    arrival.cast === 'green' ? 'colour-difference-into-rgb' : 'rgb-into-colour-difference'
  return shown('tinted', 'wrong', matrix, ...(arrival.locks ? [] : (['no-sync'] as const)))
}

/** Luma shows clean; composite in its place brings its subcarrier along as dots. */
function grey(sent: OnWires, input: WiredInput, from: 'y' | 'cvbs'): Shown {
  const followed = follow({ ...sent, colour: 'mono' }, input)
  if (followed.picture !== 'steady') return { ...followed, sound: 'apart' }
  return from === 'y'
    ? shown('steady', 'none', 'luma-alone')
    : shown('dots', 'none', 'composite-as-luma')
}

function whole(sent: OnWires, input: WiredInput): Shown {
  if (sent.protection === 'agc-pulses' && input.levelControl) {
    return shown('pumps', 'may-drop', 'protection-pulses')
  }
  const followed = follow(sent, input)
  if (followed.picture === 'steady' && input.countsLines && !hasUsualLines(sent)) {
    return shown('may-be-refused', 'may-drop', 'not-interlaced')
  }
  return { ...followed, sound: 'apart' }
}

/** Television has a whole number of lines in a picture and half lines in a field; consoles leave the half out. */
const hasUsualLines = ({ scan }: Picture): boolean =>
  SCANS[scan].interlaced || SCANS[scan].lineKhz > 16
