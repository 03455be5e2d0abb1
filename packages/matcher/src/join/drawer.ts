import type { PieceModel, Plug, Wire } from '@coaxwain/models'
import { mayLend } from '@coaxwain/shelf'
import type { Snapshot, Uid } from '@coaxwain/shelf'
import {
  CONNECTORS,
  contactOf,
  isSingle,
  isSoundCircuit,
  mates,
  type Circuit,
  type Connector,
} from '@coaxwain/signal'

/** A wire of a piece seen from the side that it is entered by. */
export interface Passage {
  readonly plug: number
  /** Contact of the entry plug, or null when any signal may enter. */
  readonly contact: string | null
  readonly exitPlug: number
  readonly exitContact: string | null
}

/** A piece in one way round. */
export interface Turned {
  readonly piece: number
  readonly wayRound: 'forward' | 'reverse'
  readonly entry: readonly Plug[]
  readonly exit: readonly Plug[]
  readonly passages: readonly Passage[]
  readonly ohm: readonly [entry: number, exit: number] | null
}

/** Pieces that do the same, whatever their names and lengths. */
export interface DrawerPiece {
  readonly models: readonly { readonly model: Uid; readonly stock: number }[]
  readonly piece: PieceModel
  /** How many there are; Infinity for the usual leads that are taken as being there. */
  readonly stock: number
  readonly passesVolts: boolean
  /** Not in the drawer: one to be bought. */
  readonly bought: boolean
}

/** Leads and adapters at hand, each in both ways round. */
export interface Drawer {
  readonly pieces: readonly DrawerPiece[]
  readonly turned: readonly Turned[]
  /** Every connector at which a lead could begin or end. */
  readonly connectors: readonly Connector[]
  /** How many pieces there are in all. */
  readonly total: number
  readonly mixers: boolean
  /** The piece is made for such a circuit. */
  suits(piece: number, circuit: Circuit): boolean
  /** A terminator that goes onto a connector, or null when there is none. */
  terminatorFor(connector: Connector): number | null
  /** The same drawer without what would have to be bought. */
  readonly owned: Drawer
  /** Pieces that can be pushed onto a connector, by that connector. */
  onto(connector: Connector): readonly { readonly turned: Turned; readonly plug: number }[]
}

const contact = (plug: Plug, circuit: Circuit | 'any'): string | null =>
  circuit === 'any' ? (isSingle(plug.connector) ? 'pin' : null) : contactOf(plug.connector, circuit)

function turn(piece: PieceModel, index: number, wayRound: Turned['wayRound']): Turned {
  const forward = wayRound === 'forward'
  const [entry, exit] = forward ? [piece.a, piece.b] : [piece.b, piece.a]
  const passes = (wire: Wire): boolean =>
    wire.way === 'both' || wire.way === (forward ? 'a-to-b' : 'b-to-a')
  const passages = piece.wires.filter(passes).map((wire): Passage => {
    const [near, far] = forward ? [wire.a, wire.b] : [wire.b, wire.a]
    return {
      plug: near.plug,
      contact: contact(entry[near.plug] as Plug, near.circuit),
      exitPlug: far.plug,
      exitContact: contact(exit[far.plug] as Plug, far.circuit),
    }
  })
  const ohm = piece.impedanceOhm
    ? forward
      ? piece.impedanceOhm
      : ([piece.impedanceOhm[1], piece.impedanceOhm[0]] as const)
    : null
  return { piece: index, wayRound, entry, exit, passages, ohm }
}

const passesVolts = (piece: PieceModel): boolean =>
  piece.wires.some((w) => w.a.circuit === 'switch-volts' && w.b.circuit === 'switch-volts')

/** Ends that look alike make the second way round the same as the first. */
const symmetric = (piece: PieceModel): boolean =>
  !piece.impedanceOhm &&
  JSON.stringify(piece.a.map((p) => p.connector)) ===
    JSON.stringify(piece.b.map((p) => p.connector)) &&
  piece.wires.every((w) => w.way === 'both' && w.a.plug === w.b.plug && w.a.circuit === w.b.circuit)

export function compileDrawer(
  snapshot: Snapshot,
  leftOut: ReadonlySet<Uid>,
  assumed: readonly Uid[],
  bought: ReadonlySet<Uid>,
): Drawer {
  const stock = new Map<Uid, number>()
  for (const unit of snapshot.units) {
    if (snapshot.models[unit.model]?.type !== 'piece' || leftOut.has(unit.uid)) continue
    if (!mayLend(unit) || unit.working === 'faulty') continue
    stock.set(unit.model, (stock.get(unit.model) ?? 0) + unit.quantity)
  }
  for (const uid of assumed) stock.set(uid, Infinity)
  const pieces = classes(snapshot, stock, bought)
  const all = view(pieces, () => true)
  return pieces.some((p) => p.bought) ? { ...all, owned: view(pieces, (p) => !p.bought) } : all
}

/** A drawer of some of the pieces; their numbers stay the same. */
function view(pieces: readonly DrawerPiece[], among: (piece: DrawerPiece) => boolean): Drawer {
  const turned = pieces.flatMap((drawn, i) => {
    if (!among(drawn)) return []
    const { piece } = drawn
    if (piece.kind === 'terminator') return []
    return symmetric(piece)
      ? [turn(piece, i, 'forward')]
      : [turn(piece, i, 'forward'), turn(piece, i, 'reverse')]
  })
  const byConnector = new Map<Connector, { turned: Turned; plug: number }[]>()
  const present = pieces.filter((p) => among(p) && p.piece.kind !== 'terminator')
  const made: Drawer = {
    pieces,
    turned,
    connectors: CONNECTORS,
    mixers: present.some((p) => p.piece.mixes),
    suits: (piece, circuit) => meantFor(pieces[piece]?.piece.meantFor, circuit),
    total: present.reduce((sum, p) => sum + p.stock, 0),
    terminatorFor(connector) {
      const at = pieces.findIndex(
        (p) =>
          among(p) &&
          p.piece.kind === 'terminator' &&
          p.piece.a.some((plug) => mates(plug.connector, connector)),
      )
      return at < 0 ? null : at
    },
    get owned() {
      return made
    },
    onto(connector) {
      const known = byConnector.get(connector)
      if (known) return known
      const fitting = turned.flatMap((t) =>
        t.entry.flatMap((plug, i) =>
          mates(plug.connector, connector) && firstOfItsKind(t, i) ? [{ turned: t, plug: i }] : [],
        ),
      )
      byConnector.set(connector, fitting)
      return fitting
    },
  }
  return made
}

/** Cores of a lead that differ in nothing need to be tried only once. */
function firstOfItsKind(turned: Turned, plug: number): boolean {
  const kind = (i: number): string =>
    JSON.stringify([
      turned.entry[i]?.connector,
      turned.passages
        .filter((p) => p.plug === i)
        .map((p) => [
          p.contact,
          turned.exit[p.exitPlug]?.connector,
          p.exitContact,
          sharedExit(turned, p),
        ]),
    ])
  return turned.entry.findIndex((_, i) => kind(i) === kind(plug)) === plug
}

/** The exit plug itself matters where several wires leave by it. */
const sharedExit = (turned: Turned, passage: Passage): number | null =>
  turned.passages.filter((p) => p.exitPlug === passage.exitPlug).length > 1
    ? passage.exitPlug
    : null

const ofAll = (piece: PieceModel): number => piece.a.length + piece.b.length

const leadFirst = (a: PieceModel, b: PieceModel): number =>
  Number(b.kind === 'lead') - Number(a.kind === 'lead')

/** Alike in everything that matters between two sockets. */
const content = (piece: PieceModel): string =>
  JSON.stringify({
    kind: piece.kind,
    a: piece.a,
    b: piece.b,
    wires: piece.wires,
    meantFor: piece.meantFor ?? null,
    lossDb: piece.lossDb,
    impedanceOhm: piece.impedanceOhm ?? null,
    mixes: piece.mixes,
    suppliesVolts: piece.suppliesVolts,
    blocksDc: piece.blocksDc,
  })

/** Puts pieces that do the same together, those with the fewest plugs first: none is left hanging. */
function classes(
  snapshot: Snapshot,
  stock: ReadonlyMap<Uid, number>,
  bought: ReadonlySet<Uid>,
): DrawerPiece[] {
  const groups = new Map<string, { model: Uid; stock: number; piece: PieceModel }[]>()
  for (const [model, count] of stock) {
    const piece = snapshot.models[model]
    if (piece?.type !== 'piece' || count <= 0) continue
    const key = `${bought.has(model) ? 1 : 0} ${content(piece)}`
    groups.set(key, [...(groups.get(key) ?? []), { model, stock: count, piece }])
  }
  // By content, so that neither names nor the order on the shelf decide between equals.
  return [...groups.entries()]
    .sort(
      ([x, [a]], [y, [b]]) =>
        Number(bought.has(a!.model)) - Number(bought.has(b!.model)) ||
        ofAll(a!.piece) - ofAll(b!.piece) ||
        leadFirst(a!.piece, b!.piece) ||
        (x < y ? -1 : 1),
    )
    .map(([, members]) => ({
      models: members
        .map(({ model, stock: n }) => ({
          model,
          stock: n,
          length: snapshotLength(snapshot, model),
        }))
        .sort((a, b) => a.length - b.length),
      piece: members[0]!.piece,
      stock: members.reduce((sum, m) => sum + m.stock, 0),
      passesVolts: passesVolts(members[0]!.piece),
      bought: bought.has(members[0]!.model),
    }))
}

/** Shorter leads first. */
function snapshotLength(snapshot: Snapshot, model: Uid): number {
  const piece = snapshot.models[model]
  return piece?.type === 'piece' ? (piece.lengthMm ?? 0) : 0
}

export const meantFor = (meant: readonly Circuit[] | undefined, circuit: Circuit): boolean =>
  !meant ||
  meant.includes(circuit) ||
  (isSoundCircuit(circuit) && meant.some((c) => isSoundCircuit(c)))
