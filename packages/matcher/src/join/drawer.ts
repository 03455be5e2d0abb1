import type { PieceModel, Plug, Wire } from '@coaxwain/models'
import { mayLend } from '@coaxwain/shelf'
import type { Snapshot, Uid } from '@coaxwain/shelf'
import { contactOf, isSingle, mates, type Circuit, type Connector } from '@coaxwain/signal'

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

export interface DrawerPiece {
  readonly model: Uid
  readonly piece: PieceModel
  /** How many there are; Infinity for the usual leads that are taken as being there. */
  readonly stock: number
  readonly passesVolts: boolean
}

/** Leads and adapters at hand, each in both ways round. */
export interface Drawer {
  readonly pieces: readonly DrawerPiece[]
  /** How many pieces there are in all. */
  readonly total: number
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
): Drawer {
  const stock = new Map<Uid, number>()
  for (const unit of snapshot.units) {
    if (snapshot.models[unit.model]?.type !== 'piece' || leftOut.has(unit.uid)) continue
    if (!mayLend(unit) || unit.working === 'faulty') continue
    stock.set(unit.model, (stock.get(unit.model) ?? 0) + unit.quantity)
  }
  for (const uid of assumed) stock.set(uid, Infinity)
  const pieces = [...stock].flatMap(([model, count]): DrawerPiece[] => {
    const piece = snapshot.models[model]
    if (piece?.type !== 'piece' || piece.kind === 'terminator' || count <= 0) return []
    return [{ model, piece, stock: count, passesVolts: passesVolts(piece) }]
  })
  // By content, so that neither names nor the order on the shelf decide between equals.
  pieces.sort((a, b) => compareContent(a.piece, b.piece))
  const turned = pieces.flatMap(({ piece }, i) =>
    symmetric(piece)
      ? [turn(piece, i, 'forward')]
      : [turn(piece, i, 'forward'), turn(piece, i, 'reverse')],
  )
  const byConnector = new Map<Connector, { turned: Turned; plug: number }[]>()
  return {
    pieces,
    total: pieces.reduce((sum, p) => sum + p.stock, 0),
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

const withoutNames = (piece: PieceModel): string =>
  JSON.stringify({ ...piece, maker: '', name: '', aliases: [], year: 0 })

const compareContent = (a: PieceModel, b: PieceModel): number => {
  const [x, y] = [withoutNames(a), withoutNames(b)]
  return x < y ? -1 : x > y ? 1 : 0
}
