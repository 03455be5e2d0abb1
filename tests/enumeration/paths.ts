import type { PieceModel, Plug, Port, Wire } from '@coaxwain/models'
import { LIMITS, type PieceUse } from '@coaxwain/shelf'
import {
  contactOf,
  isSingle,
  isSoundCircuit,
  mates,
  type Circuit,
  type Connector,
  type SwitchVolt,
} from '@coaxwain/signal'
import type { Stock } from './bench'

/** A piece in a path before it is known which copy of it is taken. */
export type Step = Omit<PieceUse, 'copy'>

/** One way of getting one circuit from a port to a port, by pieces in a row. */
export interface Path {
  readonly steps: readonly Step[]
  /** Switching voltages cross every piece; and those that pieces bring themselves. */
  readonly passesVolts: boolean
  readonly supplies: readonly SwitchVolt[]
  readonly blocksDc: boolean
}

/** A port with a circuit that leaves or enters there. */
export interface Contact {
  readonly port: Port
  readonly circuit: Circuit
}

/** How far a path has come. */
interface Tip {
  readonly connector: Connector
  /** The contact that the circuit is on; null where the plug does not say. */
  readonly contact: string | null
  readonly ohm: number
  readonly steps: readonly Step[]
  readonly pieces: readonly PieceModel[]
}

const LOOSE: readonly Connector[] = ['screws', 'spades', 'bare']

/** Loose wires are twin lead, everything else is coax (common practice, no source). */
const usualOhm = (port: Port): number =>
  port.impedanceOhm ?? (LOOSE.includes(port.connector) ? 300 : 75)

/** Everything that can be laid between two contacts with the pieces of a drawer, each way round. */
export function pathsBetween(
  from: Contact,
  to: Contact,
  drawer: readonly Stock[],
  mostPieces: number = LIMITS.piecesInLink,
): Path[] {
  const found: Path[] = []
  const walk = (tip: Tip): void => {
    if (arrives(tip, from, to)) found.push(pathOf(tip))
    if (tip.steps.length >= mostPieces) return
    for (const stock of drawer) {
      if (mayBeAdded(stock, tip, from.circuit))
        for (const next of onwards(tip, stock, from)) walk(next)
    }
  }
  const contact = contactOf(from.port.connector, from.circuit)
  const start = { connector: from.port.connector, contact, ohm: usualOhm(from.port) }
  if (goesAcross(from, to)) walk({ ...start, steps: [], pieces: [] })
  return found
}

/** The circuit leaves at one end and is taken at the other, and no loudspeaker output meets a line input. */
function goesAcross(from: Contact, to: Contact): boolean {
  const leaves = from.port.circuits.find((c) => c.circuit === from.circuit)
  const enters = to.port.circuits.find((c) => c.circuit === to.circuit)
  if (!leaves || !enters || leaves.dir === 'in' || enters.dir === 'out') return false
  return leaves.level !== 'loudspeaker' || (enters.level ?? 'line') !== 'line'
}

const leadsIn = (pieces: readonly PieceModel[]): number =>
  pieces.filter((p) => p.kind === 'lead').length

function arrives(tip: Tip, from: Contact, to: Contact): boolean {
  const captive = from.port.mount === 'lead' || to.port.mount === 'lead'
  if (!mates(tip.connector, to.port.connector)) return false
  if (leadsIn(tip.pieces) === 0 && !captive) return false
  const lost = tip.contact !== null && tip.contact !== contactOf(to.port.connector, to.circuit)
  return !lost && (from.circuit !== 'rf' || tip.ohm === usualOhm(to.port))
}

function mayBeAdded({ model, piece, count }: Stock, tip: Tip, circuit: Circuit): boolean {
  const used = tip.steps.filter((s) => s.model === model).length
  return (
    used < count && suits(piece, circuit) && leadsIn([...tip.pieces, piece]) <= LIMITS.leadsInLink
  )
}

const suits = ({ meantFor }: PieceModel, circuit: Circuit): boolean =>
  !meantFor ||
  meantFor.includes(circuit) ||
  (isSoundCircuit(circuit) && meantFor.some((c) => isSoundCircuit(c)))

/** Every way through a piece that is pushed onto the tip. */
function onwards(tip: Tip, { model, piece }: Stock, { circuit }: Contact): Tip[] {
  return (['forward', 'reverse'] as const).flatMap((wayRound) => {
    if (wayRound === 'reverse' && sameBothWays(piece)) return []
    const forward = wayRound === 'forward'
    const [entry, exit] = forward ? [piece.a, piece.b] : [piece.b, piece.a]
    return wiresOf(piece, forward).flatMap(({ near, far }): Tip[] => {
      const [inPlug, outPlug] = [entry[near.plug], exit[far.plug]]
      if (!inPlug || !outPlug || !mates(tip.connector, inPlug.connector)) return []
      const named = contactNamed(inPlug, near.circuit)
      if (named !== null && tip.contact !== null && named !== tip.contact) return []
      const ohm = circuit === 'rf' ? ohmAfter(piece, forward, inPlug, tip.ohm) : tip.ohm
      if (ohm === null) return []
      return [
        {
          connector: outPlug.connector,
          contact: contactNamed(outPlug, far.circuit) ?? tip.contact,
          ohm,
          steps: [...tip.steps, { model, wayRound, inPlug: near.plug, outPlug: far.plug }],
          pieces: [...tip.pieces, piece],
        },
      ]
    })
  })
}

interface Run {
  readonly near: Wire['a']
  readonly far: Wire['a']
}

const wiresOf = (piece: PieceModel, forward: boolean): Run[] =>
  piece.wires
    .filter((w) => w.way === 'both' || (w.way === 'a-to-b') === forward)
    .map((w) => (forward ? { near: w.a, far: w.b } : { near: w.b, far: w.a }))

/** A lead of like cores with like plugs is the same the other way round. */
export const sameBothWays = (piece: PieceModel): boolean =>
  !piece.impedanceOhm &&
  piece.wires.every(
    (w) => w.way === 'both' && w.a.plug === w.b.plug && w.a.circuit === w.b.circuit,
  ) &&
  piece.a.length === piece.b.length &&
  piece.a.every((plug, i) => plug.connector === piece.b[i]?.connector)

function contactNamed(plug: Plug, circuit: Circuit | 'any'): string | null {
  if (circuit === 'any') return isSingle(plug.connector) ? 'pin' : null
  return contactOf(plug.connector, circuit)
}

function ohmAfter(piece: PieceModel, forward: boolean, plug: Plug, ohm: number): number | null {
  if (!piece.impedanceOhm) return LOOSE.includes(plug.connector) && ohm !== 300 ? null : ohm
  const [a, b] = piece.impedanceOhm
  const [near, far] = forward ? [a, b] : [b, a]
  return near === ohm ? far : null
}

const passes = (piece: PieceModel): boolean =>
  piece.wires.some((w) => w.a.circuit === 'switch-volts' && w.b.circuit === 'switch-volts')

const pathOf = ({ steps, pieces }: Tip): Path => ({
  steps,
  passesVolts: pieces.every(passes),
  supplies: pieces.flatMap((p) => p.suppliesVolts),
  blocksDc: pieces.some((p) => p.blocksDc),
})
