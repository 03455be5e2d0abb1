import type { PieceModel, Plug, Port, Wire } from '@coaxwain/models'
import { LIMITS } from '@coaxwain/shelf'
import type { CarriedCircuit, Hookup, Link, PieceUse } from '@coaxwain/shelf'
import {
  contactOf,
  familyOf,
  fits,
  isSingle,
  isSoundCircuit,
  mates,
  type Circuit,
  type Connector,
} from '@coaxwain/signal'
import { finding, type Finding } from './finding'
import type { ShelfView } from './shelf-view'

/** Walks every link from plug to plug and says what does not fit, carry or suit. */
export function checkLinks(hookup: Hookup, view: ShelfView): Finding[] {
  return [
    ...hookup.links.flatMap((link, i) => checkLink(link, i, view)),
    ...checkSockets(hookup),
    ...checkStock(hookup, view),
  ]
}

interface Side {
  readonly plugs: readonly Plug[]
  readonly which: 'a' | 'b'
}

const entrySide = (piece: PieceModel, use: PieceUse): Side =>
  use.wayRound === 'forward' ? { plugs: piece.a, which: 'a' } : { plugs: piece.b, which: 'b' }

const exitSide = (piece: PieceModel, use: PieceUse): Side =>
  use.wayRound === 'forward' ? { plugs: piece.b, which: 'b' } : { plugs: piece.a, which: 'a' }

function checkLink(link: Link, index: number, view: ShelfView): Finding[] {
  const from = view.port(link.from.unit, link.from.port)
  const to = view.port(link.to.unit, link.to.port)
  const at = { link: index }
  if (!from || !to) return [finding('port-unknown', at)]
  const pieces = link.pieces.map((use) => view.piece(use.model))
  if (pieces.some((p) => p === null)) return [finding('piece-unknown', at)]
  const known = pieces as PieceModel[]
  return [
    ...[from, to].filter((p) => p.retired).map(() => finding('port-retired', at)),
    ...checkCounts(link, known, from, to, at),
    ...checkPlugs(link, known, from, to, at),
    ...link.circuits.flatMap((c) => checkCircuit(link, known, c, { from, to }, at)),
    ...checkDc(known, from, to, at),
  ]
}

function checkCounts(
  link: Link,
  pieces: readonly PieceModel[],
  from: Port,
  to: Port,
  at: Finding['details'],
): Finding[] {
  const leads = pieces.filter((p) => p.kind === 'lead').length
  const captive = from.mount === 'lead' || to.mount === 'lead'
  return [
    ...(link.pieces.length > LIMITS.piecesInLink ? [finding('too-many-pieces', at)] : []),
    ...(leads > LIMITS.leadsInLink ? [finding('too-many-leads', at)] : []),
    ...(leads === 0 && !captive ? [finding('needs-a-lead', at)] : []),
  ]
}

/** The connectors that meet along a link, pair by pair. */
function meetings(
  link: Link,
  pieces: readonly PieceModel[],
  from: Port,
  to: Port,
): [Connector, Connector][] | null {
  const ends: Connector[] = [from.connector]
  for (const [i, use] of link.pieces.entries()) {
    const piece = pieces[i]!
    const entry = entrySide(piece, use).plugs[use.inPlug]
    const exit = exitSide(piece, use).plugs[use.outPlug]
    if (!entry || !exit) return null
    ends.push(entry.connector, exit.connector)
  }
  ends.push(to.connector)
  return Array.from({ length: ends.length / 2 }, (_, i) => [ends[2 * i]!, ends[2 * i + 1]!])
}

function checkPlugs(
  link: Link,
  pieces: readonly PieceModel[],
  from: Port,
  to: Port,
  at: Finding['details'],
): Finding[] {
  const pairs = meetings(link, pieces, from, to)
  if (!pairs) return [finding('piece-unknown', at)]
  return pairs.flatMap(([a, b]) => {
    if (mates(a, b)) return []
    return [finding(fits(a, b) ? 'japanese-wiring' : 'plugs-do-not-mate', { ...at, a, b })]
  })
}

const isLoose = (c: Connector): boolean => ['screws', 'spades', 'bare'].includes(familyOf(c))
const usualOhm = (p: Port): number => p.impedanceOhm ?? (isLoose(p.connector) ? 300 : 75)

function checkCircuit(
  link: Link,
  pieces: readonly PieceModel[],
  carried: CarriedCircuit,
  { from, to }: { from: Port; to: Port },
  at: Finding['details'],
): Finding[] {
  const found: Finding[] = []
  const where = { ...at, circuit: carried.from }
  const leaves = from.circuits.find((c) => c.circuit === carried.from)
  const enters = to.circuits.find((c) => c.circuit === carried.to)
  if (!leaves || !enters) return [finding('circuit-not-on-port', where)]
  if (leaves.dir === 'in' || enters.dir === 'out') found.push(finding('wrong-direction', where))
  if (leaves.level === 'loudspeaker' && (enters.level ?? 'line') === 'line') {
    found.push(finding('loudspeaker-into-line', where))
  }
  let contact: string | null = contactOf(from.connector, carried.from)
  let ohm = usualOhm(from)
  for (const [i, use] of link.pieces.entries()) {
    const piece = pieces[i]!
    if (!suits(piece, carried.from)) found.push(finding('not-meant-for', where))
    const next = through(piece, use, contact)
    if (next === undefined) return [...found, finding('wire-missing', where)]
    contact = next ?? contact
    if (carried.from === 'rf') {
      const after = ohmThrough(piece, use, ohm)
      if (after === null) return [...found, finding('impedance', where)]
      ohm = after
    }
  }
  const wanted = contactOf(to.connector, carried.to)
  if (contact !== null && contact !== wanted) found.push(finding('wire-missing', where))
  if (carried.from === 'rf' && ohm !== usualOhm(to)) found.push(finding('impedance', where))
  return found
}

const suits = (piece: PieceModel, circuit: Circuit): boolean =>
  !piece.meantFor ||
  piece.meantFor.includes(circuit) ||
  (isSoundCircuit(circuit) && piece.meantFor.some((c) => isSoundCircuit(c)))

/** The contact of the exit plug that a wire leads to; null keeps the contact, undefined means no wire. */
function through(
  piece: PieceModel,
  use: PieceUse,
  contact: string | null,
): string | null | undefined {
  const near = entrySide(piece, use)
  const far = exitSide(piece, use)
  const named = (plug: Plug | undefined, circuit: Circuit | 'any'): string | null => {
    if (!plug) return null
    if (circuit === 'any') return isSingle(plug.connector) ? 'pin' : null
    return contactOf(plug.connector, circuit)
  }
  const allowed = (wire: Wire): boolean =>
    wire.way === 'both' || (wire.way === 'a-to-b') === (near.which === 'a')
  const wire = piece.wires.find((w) => {
    const [start, end] = near.which === 'a' ? [w.a, w.b] : [w.b, w.a]
    const entry = named(near.plugs[start.plug], start.circuit)
    return (
      allowed(w) &&
      start.plug === use.inPlug &&
      end.plug === use.outPlug &&
      (entry === null || contact === null || entry === contact)
    )
  })
  if (!wire) return undefined
  const end = near.which === 'a' ? wire.b : wire.a
  return named(far.plugs[end.plug], end.circuit)
}

function ohmThrough(piece: PieceModel, use: PieceUse, ohm: number): number | null {
  const entry = entrySide(piece, use).plugs[use.inPlug]
  if (!piece.impedanceOhm) return entry && isLoose(entry.connector) && ohm !== 300 ? null : ohm
  const [near, far] =
    use.wayRound === 'forward' ? piece.impedanceOhm : [piece.impedanceOhm[1], piece.impedanceOhm[0]]
  return near === ohm ? far : null
}

function checkDc(
  pieces: readonly PieceModel[],
  from: Port,
  to: Port,
  at: Finding['details'],
): Finding[] {
  const arrives = (from.suppliesDcVolts ?? 0) !== 0 && !pieces.some((p) => p.blocksDc)
  if (arrives && to.standsDc === 'no') return [finding('dc-not-stood', at)]
  return !arrives && to.needsDcVolts !== undefined ? [finding('dc-missing', at)] : []
}

const plugKey = (use: PieceUse, side: 'in' | 'out'): string =>
  `${use.model} ${use.copy} ${side === 'in' ? use.inPlug : use.outPlug} ${
    (use.wayRound === 'forward') === (side === 'in') ? 'a' : 'b'
  }`

/** A socket holds one plug, and a plug sits in one socket. */
function checkSockets(hookup: Hookup): Finding[] {
  const inSocket = new Map<string, Set<string>>()
  const note = (socket: string, plug: string): void => {
    inSocket.set(socket, (inSocket.get(socket) ?? new Set()).add(plug))
  }
  const pairs: [string, string][] = []
  hookup.links.forEach((link) => {
    const from = `port ${link.from.unit} ${link.from.port}`
    const to = `port ${link.to.unit} ${link.to.port}`
    let last = from
    for (const use of link.pieces) {
      pairs.push([last, `plug ${plugKey(use, 'in')}`])
      last = `plug ${plugKey(use, 'out')}`
    }
    pairs.push([last, to])
  })
  for (const [a, b] of pairs) {
    note(a, b)
    note(b, a)
  }
  return [...inSocket]
    .filter(([, mates_]) => mates_.size > 1)
    .map(([end]) =>
      finding(end.startsWith('port') ? 'port-taken-twice' : 'plug-taken-twice', { end }),
    )
    .concat(wiresJoined(hookup))
}

/** Two outputs must not meet on one wire unless a piece mixes them. */
function wiresJoined(hookup: Hookup): Finding[] {
  const arrivals = new Map<string, Link[]>()
  for (const link of hookup.links) {
    for (const c of link.circuits) {
      const key = `${link.to.unit} ${link.to.port} ${c.to}`
      arrivals.set(key, [...(arrivals.get(key) ?? []), link])
    }
  }
  return [...arrivals.values()]
    .filter((links) => links.length > 1 && links.some((l) => l.pieces.length === 0))
    .map((links) => finding('wires-joined', { port: links[0]!.to.port }))
}

function checkStock(hookup: Hookup, view: ShelfView): Finding[] {
  const copies = new Map<string, Set<number>>()
  for (const use of hookup.links.flatMap((l) => l.pieces)) {
    copies.set(use.model, (copies.get(use.model) ?? new Set()).add(use.copy))
  }
  return [...copies].flatMap(([model, set]) => {
    const stock = view.snapshot.units
      .filter((u) => u.model === model && u.working !== 'parts-only' && u.working !== 'faulty')
      .reduce((sum, u) => sum + u.quantity, 0)
    return set.size > stock ? [finding('piece-short', { piece: model })] : []
  })
}

/** Wires of different outputs that a piece adds up, by the port where they arrive. */
export function mixedAt(hookup: Hookup, view: ShelfView, unit: string, port: string): boolean {
  const links = hookup.links.filter((l) => l.to.unit === unit && l.to.port === port)
  return (
    links.length > 1 &&
    links.every((l) => l.pieces.some((p) => view.piece(p.model)?.mixes === true))
  )
}
