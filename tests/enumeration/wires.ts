import type { Jack, JackContact } from '@coaxwain/models'
import {
  arrivalAt,
  contactOf,
  FORM_CIRCUITS,
  type Circuit,
  type PictureForm,
} from '@coaxwain/signal'
import { doubtIn, portIn, refOf, type Bench, type Box } from './bench'
import type { Wire } from './layout'
import { pathsBetween, type Path } from './paths'

/** A jack of a unit on the bench. */
export interface End {
  readonly box: Box
  readonly jack: Jack
}

/** From a contact of an output to a contact of an input. */
type Pair = readonly [from: JackContact, to: JackContact]

/** What an input could do with, besides the circuit of that name. */
const STANDS_IN: Partial<Record<Circuit, readonly Circuit[]>> = { csync: ['cvbs', 'y'] }

/** Inputs that make a grey picture of one wire, and the wires that do. */
const GREY: Partial<Record<PictureForm, readonly (readonly [from: Circuit, to: Circuit])[]>> = {
  composite: [['y', 'cvbs']],
  's-video': [
    ['y', 'y'],
    ['cvbs', 'y'],
  ],
  component: [
    ['y', 'y'],
    ['cvbs', 'y'],
  ],
}

/** What a composite wire beside red, green and blue is meant for is sync; that there is a picture on it nobody says. */
const TAKES_RGB: ReadonlySet<PictureForm> = new Set(['rgbs', 'rgsb', 'rgbhv'])

/**
 * Every set of wires by which an input could get a picture from an output: all that the form wants, or the one
 * that makes a grey picture. More than one of the latter makes nothing better of it, and other sets no picture.
 */
export function pictureWires(out: Jack, into: Jack): Pair[][] {
  const form = into.form as PictureForm
  if (out.form === 'rgbs' && !TAKES_RGB.has(form)) return []
  const whole = everyChoice(
    into.contacts.map((to) => feeding(out, to).map((from): Pair => [from, to])),
  )
  const grey = (GREY[form] ?? []).flatMap(([from, to]) =>
    contactsOf(out, from).flatMap((a) => contactsOf(into, to).map((b): Pair[] => [[a, b]])),
  )
  return [...whole, ...grey].filter((pairs) => pairs.length > 0 && makesPicture(form, pairs))
}

const contactsOf = (jack: Jack, circuit: Circuit): JackContact[] =>
  jack.contacts.filter((c) => c.circuit === circuit)

const feeding = (out: Jack, to: JackContact): JackContact[] =>
  out.contacts.filter(
    (from) => from.circuit === to.circuit || STANDS_IN[to.circuit]?.includes(from.circuit) === true,
  )

function everyChoice<T>(choices: readonly (readonly T[])[]): T[][] {
  return choices.reduce<T[][]>(
    (sets, next) => sets.flatMap((set) => next.map((one) => [...set, one])),
    [[]],
  )
}

function makesPicture(form: PictureForm, pairs: readonly Pair[]): boolean {
  if (['rf', 'hdmi', 'dvi'].includes(form)) return pairs.length === FORM_CIRCUITS[form].length
  const arrives = new Map(pairs.map(([from, to]) => [asWanted(form, to.circuit), from.circuit]))
  return arrivalAt(form, arrives).kind !== 'nothing'
}

/** A socket for RGB may take its sync on a composite contact. */
const asWanted = (form: PictureForm, circuit: Circuit): Circuit =>
  form === 'rgbs' && circuit === 'cvbs' ? 'csync' : circuit

/**
 * The sets of wires by which sound could get from an output to an input: each channel to its own or to the
 * other's socket, one channel alone, or both into one. Of sets that use like sockets in like states, those are
 * left out that bring no more than another: crossed channels, and the right socket where the left takes it all.
 */
export function soundWires(out: End, into: End, mixes: boolean): Pair[][] {
  const sockets = socketsOf(into)
  const targets = sockets.filter((s, i) => !sockets.slice(0, i).some((t) => servesFor(into, t, s)))
  const single = out.jack.contacts.flatMap((a) => targets.map((s): Pair[] => [[a, s.alone]]))
  const [left] = contactsOf(out.jack, 'audio-l')
  const [right] = contactsOf(out.jack, 'audio-r')
  if (!left || !right) return single
  const isCrossed = (a: SoundSocket, b: SoundSocket): boolean =>
    sockets.indexOf(a) > sockets.indexOf(b)
  const alike =
    isLike(out, left, right) || sockets.every((s) => isLike(into, s.alone, sockets[0]!.alone))
  const apart = sockets.flatMap((a) =>
    sockets
      .filter((b) => a !== b && !(alike && isCrossed(a, b)))
      .map((b): Pair[] => [
        [left, a.beside],
        [right, b.beside],
      ]),
  )
  const folded = targets.map((s): Pair[] => [
    [left, s.alone],
    [right, s.alone],
  ])
  return [...apart, ...(mixes ? folded : []), ...single]
}

const isLike = ({ box }: End, a: JackContact, b: JackContact): boolean => {
  const [one, other] = [portIn(box, a.port), portIn(box, b.port)]
  const levelOf = ({ circuits }: typeof one, { circuit }: JackContact) =>
    circuits.find((c) => c.circuit === circuit)?.level
  return (
    one.connector === other.connector &&
    one.mount === other.mount &&
    levelOf(one, a) === levelOf(other, b)
  )
}

/** A socket that takes a sound of one channel to both sides, where the other is like it and no surer. */
function servesFor({ box, jack }: End, socket: SoundSocket, other: SoundSocket): boolean {
  const doubt = ({ alone }: SoundSocket): number =>
    doubtIn([{ box, jack: jack.key, port: alone.port }]) ?? Infinity
  return (
    socket.alone.circuit === 'audio-mono' &&
    isLike({ box, jack }, socket.alone, other.alone) &&
    doubt(socket) <= doubt(other)
  )
}

/** A contact of a sound input, and what it takes when it is the only one used, or one of two. */
interface SoundSocket {
  readonly alone: JackContact
  readonly beside: JackContact
}

/** One socket may take the left channel of two or, with nothing in the other, a sound of one channel. */
function socketsOf({ box, jack }: End): SoundSocket[] {
  const sockets = new Map<string, JackContact[]>()
  for (const contact of jack.contacts) {
    const pin = `${contact.port} ${contactOf(portIn(box, contact.port).connector, contact.circuit)}`
    sockets.set(pin, [...(sockets.get(pin) ?? []), contact])
  }
  return [...sockets.values()].map((same) => ({
    alone: same.find((c) => c.circuit === 'audio-mono') ?? same[0]!,
    beside: same.find((c) => c.circuit !== 'audio-mono') ?? same[0]!,
  }))
}

/** The wires with every path that could carry them; null when one has none. */
export class Wiring {
  private readonly known = new Map<string, readonly Path[]>()

  constructor(private readonly bench: Bench) {}

  wires(out: End, into: End, pairs: readonly Pair[]): Wire[] | null {
    const wires = pairs.map(([from, to]): Wire => ({
      from: refOf(out.box, from.port),
      to: refOf(into.box, to.port),
      carried: { from: from.circuit, to: to.circuit },
      paths: this.paths(out, into, [from, to]),
    }))
    return wires.every((w) => w.paths.length > 0) ? wires : null
  }

  private paths(out: End, into: End, [from, to]: Pair): readonly Path[] {
    const key = [out.box.unit.uid, from.port, from.circuit, into.box.unit.uid, to.port, to.circuit]
    const known = this.known.get(key.join(' '))
    if (known) return known
    const made = pathsBetween(
      { port: portIn(out.box, from.port), circuit: from.circuit },
      { port: portIn(into.box, to.port), circuit: to.circuit },
      this.bench.drawer,
    ).sort((a, b) => a.steps.length - b.steps.length)
    this.known.set(key.join(' '), made)
    return made
  }
}

/**
 * The same wires once for each way in which their paths differ for the devices at the ends: in the switching
 * voltages that cross, where the input asks for any, and in whether direct current gets through, where there is any.
 */
export function variantsOf(wires: readonly Wire[], asksVolts: boolean, hasDc: boolean): Wire[][] {
  const sortsOf = (wire: Wire, i: number): Wire[] => {
    const groups = new Map<string, Path[]>()
    for (const path of wire.paths) {
      const volts =
        asksVolts && i === 0 ? `${path.passesVolts} ${[...path.supplies].sort().join()}` : ''
      const key = `${volts} ${hasDc ? path.blocksDc : ''}`
      groups.set(key, [...(groups.get(key) ?? []), path])
    }
    return [...groups.values()].map((paths) => ({ ...wire, paths }))
  }
  return everyChoice(wires.map(sortsOf))
}
