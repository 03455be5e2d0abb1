import type { PieceModel, Plug, Port, PortCircuit } from '@coaxwain/models'
import { LIMITS } from '@coaxwain/shelf'
import type { CarriedCircuit, Link, PieceUse } from '@coaxwain/shelf'
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
import type { Bench } from './bench'
import { finding, type Finding, type FindingCode } from './finding'
import type { ShelfView } from './shelf-view'

/** Walks every link from plug to plug and says what does not fit, carry or suit. */
export const checkLinks = (bench: Bench): Finding[] =>
  bench.hookup.links.flatMap((link, index) => {
    const run = runOf(link, index, bench.view)
    return 'code' in run ? [run] : checkRun(run)
  })

/** What stands in the way of one circuit along a link. */
export function hindrances(link: Link, carried: CarriedCircuit, view: ShelfView): Finding[] {
  const run = runOf(link, 0, view)
  return 'code' in run ? [run] : checkCircuit(run, carried)
}

/** A piece as it lies in a link: the plug by which one enters it, and the one by which one leaves. */
interface Laid {
  readonly piece: PieceModel
  readonly use: PieceUse
  readonly entry: readonly Plug[]
  readonly exit: readonly Plug[]
}

/** A link with everything that it names looked up. */
interface Run {
  readonly at: { readonly link: number }
  readonly from: Port
  readonly pieces: readonly Laid[]
  readonly to: Port
  readonly circuits: readonly CarriedCircuit[]
}

function runOf(link: Link, index: number, view: ShelfView): Run | Finding {
  const at = { link: index }
  const from = view.port(link.from.unit, link.from.port)
  const to = view.port(link.to.unit, link.to.port)
  if (!from || !to) return finding('port-unknown', at)
  const pieces = link.pieces.flatMap((use) => {
    const piece = view.piece(use.model)
    return piece ? [laid(piece, use)] : []
  })
  if (pieces.length < link.pieces.length) return finding('piece-unknown', at)
  return { at, from, pieces, to, circuits: link.circuits }
}

const laid = (piece: PieceModel, use: PieceUse): Laid =>
  use.wayRound === 'forward'
    ? { piece, use, entry: piece.a, exit: piece.b }
    : { piece, use, entry: piece.b, exit: piece.a }

const checkRun = (run: Run): Finding[] => [
  ...[run.from, run.to].filter((p) => p.retired).map(() => finding('port-retired', run.at)),
  ...checkCounts(run),
  ...checkPlugs(run),
  ...run.circuits.flatMap((c) => checkCircuit(run, c)),
  ...checkDc(run),
]

function checkCounts({ at, from, pieces, to }: Run): Finding[] {
  const leads = pieces.filter((p) => p.piece.kind === 'lead').length
  const captive = from.mount === 'lead' || to.mount === 'lead'
  return [
    ...(pieces.length > LIMITS.piecesInLink ? [finding('too-many-pieces', at)] : []),
    ...(leads > LIMITS.leadsInLink ? [finding('too-many-leads', at)] : []),
    ...(leads === 0 && !captive ? [finding('needs-a-lead', at)] : []),
  ]
}

function checkPlugs({ at, from, pieces, to }: Run): Finding[] {
  const found: Finding[] = []
  let open = from.connector
  const meet = (next: Connector): void => {
    if (mates(open, next)) return
    const code = fits(open, next) ? 'japanese-wiring' : 'plugs-do-not-mate'
    found.push(finding(code, { ...at, a: open, b: next }))
  }
  for (const { entry, exit, use } of pieces) {
    const [near, far] = [entry[use.inPlug], exit[use.outPlug]]
    if (!near || !far) return [finding('piece-unknown', at)]
    meet(near.connector)
    open = far.connector
  }
  meet(to.connector)
  return found
}

const isLoose = (c: Connector): boolean => ['screws', 'spades', 'bare'].includes(familyOf(c))
const usualOhm = (p: Port): number => p.impedanceOhm ?? (isLoose(p.connector) ? 300 : 75)

function checkCircuit(run: Run, carried: CarriedCircuit): Finding[] {
  const where = { ...run.at, circuit: carried.from }
  const leaves = run.from.circuits.find((c) => c.circuit === carried.from)
  const enters = run.to.circuits.find((c) => c.circuit === carried.to)
  if (!leaves || !enters) return [finding('circuit-not-on-port', where)]
  return [...wrongEnds(leaves, enters), ...wrongWires(run, carried)].map((code) =>
    finding(code, where),
  )
}

const wrongEnds = (leaves: PortCircuit, enters: PortCircuit): FindingCode[] => [
  ...(leaves.dir === 'in' || enters.dir === 'out' ? (['wrong-direction'] as const) : []),
  ...(leaves.level === 'loudspeaker' && (enters.level ?? 'line') === 'line'
    ? (['loudspeaker-into-line'] as const)
    : []),
]

/** How far a circuit has come along a link: the contact that it is on (null: any), and its impedance. */
interface Tip {
  readonly contact: string | null
  readonly ohm: number
}

function wrongWires({ from, pieces, to }: Run, carried: CarriedCircuit): FindingCode[] {
  const found: FindingCode[] = []
  let tip: Tip = { contact: contactOf(from.connector, carried.from), ohm: usualOhm(from) }
  for (const part of pieces) {
    if (!suits(part.piece, carried.from)) found.push('not-meant-for')
    const next = through(part, carried.from, tip)
    if (typeof next === 'string') return [...found, next]
    tip = next
  }
  const lost = tip.contact !== null && tip.contact !== contactOf(to.connector, carried.to)
  if (lost) found.push('wire-missing')
  if (carried.from === 'rf' && tip.ohm !== usualOhm(to)) found.push('impedance')
  return found
}

const suits = (piece: PieceModel, circuit: Circuit): boolean =>
  !piece.meantFor ||
  piece.meantFor.includes(circuit) ||
  (isSoundCircuit(circuit) && piece.meantFor.some((c) => isSoundCircuit(c)))

function through(part: Laid, circuit: Circuit, tip: Tip): Tip | 'wire-missing' | 'impedance' {
  const end = wireEnd(part, tip.contact)
  if (!end) return 'wire-missing'
  const contact = end.contact ?? tip.contact
  if (circuit !== 'rf') return { ...tip, contact }
  const ohm = ohmThrough(part, tip.ohm)
  return ohm === null ? 'impedance' : { contact, ohm }
}

/** The contact of the exit plug to which the wire from a contact leads, null for any; no object: no wire. */
function wireEnd(
  { piece, use, entry, exit }: Laid,
  contact: string | null,
): { readonly contact: string | null } | null {
  const forward = use.wayRound === 'forward'
  const ends = piece.wires
    .filter((w) => w.way === 'both' || (w.way === 'a-to-b') === forward)
    .map((w) => (forward ? { near: w.a, far: w.b } : { near: w.b, far: w.a }))
    .filter(({ near, far }) => near.plug === use.inPlug && far.plug === use.outPlug)
  const wire = ends.find(({ near }) => {
    const named = contactNamed(entry[near.plug], near.circuit)
    return named === null || contact === null || named === contact
  })
  return wire ? { contact: contactNamed(exit[wire.far.plug], wire.far.circuit) } : null
}

function contactNamed(plug: Plug | undefined, circuit: Circuit | 'any'): string | null {
  if (!plug) return null
  if (circuit === 'any') return isSingle(plug.connector) ? 'pin' : null
  return contactOf(plug.connector, circuit)
}

function ohmThrough({ piece, use, entry }: Laid, ohm: number): number | null {
  const plug = entry[use.inPlug]
  if (!piece.impedanceOhm) return plug && isLoose(plug.connector) && ohm !== 300 ? null : ohm
  const [a, b] = piece.impedanceOhm
  const [near, far] = use.wayRound === 'forward' ? [a, b] : [b, a]
  return near === ohm ? far : null
}

/** A supply goes up the cable against the signal as well as with it. */
function checkDc({ at, from, pieces, to }: Run): Finding[] {
  const blocked = pieces.some((p) => p.piece.blocksDc)
  const judge = (supply: Port, load: Port): FindingCode[] => {
    const arrives = (supply.suppliesDcVolts ?? 0) !== 0 && !blocked
    if (load.needsDcVolts !== undefined) return arrives ? [] : ['dc-missing']
    return arrives && load.standsDc === 'no' ? ['dc-not-stood'] : []
  }
  return [...judge(from, to), ...judge(to, from)].map((code) => finding(code, at))
}
