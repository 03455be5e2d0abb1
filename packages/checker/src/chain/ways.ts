import type { PieceModel, Plug, PlugColour, Port } from '@coaxwain/models'
import {
  USUAL_COLOUR,
  type CarriedCircuit,
  type ChainLink,
  type ChainPiece,
  type Link,
  type PieceUse,
} from '@coaxwain/shelf'
import { contactOf, isSoundCircuit, mates, type Circuit, type Connector } from '@coaxwain/signal'
import { hindrances } from '../links'
import type { ShelfView } from '../shelf-view'

/** How far a circuit at its far end is what is wanted there. */
export const FITNESS = { same: 3, usual: 2, lookalike: 1, foreign: 0 } as const

/** A circuit that gets across a link, and how well it suits the contact at which it arrives. */
export interface Pair extends CarriedCircuit {
  readonly fitness: number
}

/** One way of plugging a link: which plugs of its pieces, and what then gets across. */
export interface Way {
  readonly pieces: readonly Omit<PieceUse, 'copy'>[]
  /** Plugs that do not go together along the way. */
  readonly misfits: number
  readonly pairs: readonly Pair[]
  /** Where nothing gets across: what was most likely meant to. */
  readonly meant: CarriedCircuit | null
  readonly fitness: number
}

const MOST_WAYS = 60
const MOST_MISFITS = 4

/** Every way of plugging a link that is worth a thought, the best first. */
export function waysOf(link: ChainLink, view: ShelfView): Way[] {
  const from = view.port(link.from.unit, link.from.port)
  const to = view.port(link.to.unit, link.to.port)
  const models = link.pieces.flatMap((p) => view.piece(p.model) ?? [])
  if (!from || !to || models.length < link.pieces.length) return []
  let ways: Begun[] = [{ open: from.connector, pieces: [], misfits: 0, colours: [] }]
  link.pieces.forEach((piece, i) => {
    ways = ways.flatMap((way) => onwards(way, piece, models[i] as PieceModel)).slice(0, MOST_WAYS)
  })
  return ways
    .map((begun) => ({ begun, way: wayOf(begun, link, { from, to }, view) }))
    .sort((a, b) => order(a.way, b.way) || wrongColours(a) - wrongColours(b))
    .map(({ way }) => way)
}

const order = (a: Way, b: Way): number => a.misfits - b.misfits || b.fitness - a.fitness

/** A way as far as its last plug. */
interface Begun {
  readonly open: Connector
  readonly pieces: readonly Omit<PieceUse, 'copy'>[]
  readonly misfits: number
  readonly colours: readonly (PlugColour | undefined)[]
}

/** Every pair of plugs of a piece that a wire joins, as far as nobody has said which; those that mate first. */
function onwards(way: Begun, piece: ChainPiece, model: PieceModel): Begun[] {
  const all = sidesOf(piece, model).flatMap(({ wayRound, entry, exit, joined }) =>
    joined
      .filter(({ near, far }) => (piece.inPlug ?? near) === near && (piece.outPlug ?? far) === far)
      .flatMap(({ near, far }): (Begun & { fits: boolean })[] => {
        const [plug, last] = [entry[near], exit[far]]
        if (!plug || !last) return []
        const fits = mates(way.open, plug.connector)
        return [
          {
            open: last.connector,
            pieces: [...way.pieces, { model: piece.model, wayRound, inPlug: near, outPlug: far }],
            misfits: way.misfits + (fits ? 0 : 1),
            colours: [...way.colours, plug.colour],
            fits,
          },
        ]
      }),
  )
  const fitting = all.filter((w) => w.fits)
  return fitting.length > 0 ? fitting : all.slice(0, MOST_MISFITS)
}

interface Side {
  readonly wayRound: PieceUse['wayRound']
  readonly entry: readonly Plug[]
  readonly exit: readonly Plug[]
  readonly joined: readonly { readonly near: number; readonly far: number }[]
}

/** A piece each way round that it may lie; a lead that is the same both ways lies forward. */
function sidesOf(piece: ChainPiece, model: PieceModel): Side[] {
  const ways = piece.wayRound
    ? [piece.wayRound]
    : isSymmetrical(model)
      ? (['forward'] as const)
      : (['forward', 'reverse'] as const)
  return ways.map((wayRound): Side => {
    const forward = wayRound === 'forward'
    const runs = model.wires.map((w) =>
      forward ? { near: w.a.plug, far: w.b.plug } : { near: w.b.plug, far: w.a.plug },
    )
    const named = { near: piece.inPlug ?? 0, far: piece.outPlug ?? 0 }
    const isNamed = piece.inPlug !== undefined && piece.outPlug !== undefined
    return {
      wayRound,
      entry: forward ? model.a : model.b,
      exit: forward ? model.b : model.a,
      joined: isNamed ? [named] : distinct(runs),
    }
  })
}

const distinct = <T extends { near: number; far: number }>(runs: readonly T[]): T[] => [
  ...new Map(runs.map((r) => [`${r.near} ${r.far}`, r])).values(),
]

const isSymmetrical = (model: PieceModel): boolean =>
  !model.impedanceOhm &&
  model.a.length === model.b.length &&
  model.a.every((plug, i) => plug.connector === model.b[i]?.connector) &&
  model.wires.every((w) => w.way === 'both' && w.a.plug === w.b.plug && w.a.circuit === w.b.circuit)

interface Ends {
  readonly from: Port
  readonly to: Port
}

function wayOf(begun: Begun, link: ChainLink, ends: Ends, view: ShelfView): Way {
  const plugged: Link = {
    from: link.from,
    to: link.to,
    pieces: begun.pieces.map((p) => ({ ...p, copy: 1 })),
    circuits: [],
  }
  const trials = pairsOf(ends).map((pair) => ({
    pair,
    faults: hindrances(plugged, pair, view).filter((f) => f.code !== 'not-meant-for').length,
  }))
  const pairs = trials.flatMap((t) => (t.faults === 0 ? [t.pair] : []))
  const [likely] = [...trials].sort(
    (a, b) => b.pair.fitness - a.pair.fitness || a.faults - b.faults,
  )
  return {
    pieces: begun.pieces,
    misfits: begun.misfits + (mates(begun.open, ends.to.connector) ? 0 : 1),
    pairs,
    meant: pairs.length === 0 && likely ? bare(likely.pair) : null,
    fitness: Math.max(-1, ...pairs.map((p) => p.fitness)),
  }
}

const bare = ({ from, to }: Pair): CarriedCircuit => ({ from, to })

const pairsOf = ({ from, to }: Ends): Pair[] =>
  from.circuits.flatMap((a) =>
    to.circuits.map((b): Pair => ({
      from: a.circuit,
      to: b.circuit,
      fitness: fitness(a.circuit, b.circuit),
    })),
  )

/** Composite and luma carry sync, and serve where sync is wanted (two published SCART pin tables). */
const SYNC: readonly Circuit[] = ['cvbs', 'y', 'csync']

function fitness(from: Circuit, to: Circuit): number {
  if (from === to) return FITNESS.same
  if (to === 'csync' && SYNC.includes(from)) return FITNESS.usual
  if (isSoundCircuit(from) && isSoundCircuit(to)) {
    return from === 'audio-mono' || to === 'audio-mono' ? FITNESS.usual : FITNESS.lookalike
  }
  const luma = (from === 'y' && to === 'cvbs') || (from === 'cvbs' && to === 'y')
  return luma ? FITNESS.lookalike : FITNESS.foreign
}

/** Of plugs that would do as well, the one of the usual colour is taken. */
function wrongColours({ begun, way }: { begun: Begun; way: Way }): number {
  const wanted = new Set(way.pairs.filter((p) => p.fitness > 0).map((p) => USUAL_COLOUR[p.from]))
  return begun.colours.filter((c) => c !== undefined && !wanted.has(c)).length
}

/** Different circuits at one contact of the far plug, of which only one can be what is sent. */
export const contactsOf = (pair: CarriedCircuit, from: Port, to: Port): string =>
  `${contactOf(from.connector, pair.from)} ${contactOf(to.connector, pair.to)}`
