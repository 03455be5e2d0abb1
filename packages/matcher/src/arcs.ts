import { LIMITS, type Hookup, type Question, type Uid } from '@coaxwain/shelf'
import { TIER } from '@coaxwain/signal'
import type { Face } from './compile/face'
import type { CompiledShelf } from './compile/shelf'
import type { Core } from './compile/signal'
import { leastDoubt } from './compile/way'
import { buildHookup } from './result/build'
import { assign } from './search/assign'
import type { Finished, Label } from './search/label'
import { layOut, type Layout } from './search/layout'
import type { Move } from './search/moves'
import { beginRound } from './search/round'
import type { SearchSpace } from './search/search'
import { wiringOf } from './search/wiring'

/** One step of a picture between two nodes, with all that it costs. */
export interface Arc {
  readonly from: number
  readonly to: number
  readonly boxes: number
  readonly pieces: number
  readonly doubt: number
  /** By how much the form on this step is below the best there is. */
  readonly tiersBelow: number
}

/** Everything that the search of one question can walk over, as a plain graph. */
export interface ArcMap {
  /** Node 0 is the source, node 1 the display. */
  readonly nodes: number
  readonly arcs: readonly Arc[]
  /** The hookup along a path of arcs, by their numbers; null where it lacks a unit, a piece or a position. */
  hookup(path: readonly number[]): Hookup | null
}

export const START = 0
export const DISPLAY = 1

const HIGHEST = Math.max(...Object.values(TIER))

/**
 * The compiled arcs that a question can reach, for comparing other searches with ours over the same facts.
 * Throws when the question names a unit that is not on the shelf, or a lead.
 */
export function arcsOf(shelf: CompiledShelf, question: Question, nodes: Nodes = 'units'): ArcMap {
  for (const _ of shelf.compile());
  return new Explored(shelf, question, nodes)
}

/** A node for each unit and picture that leaves it; or one for all units from which the same leaves. */
export type Nodes = 'units' | 'sorts'

interface Place {
  readonly node: number
  readonly face: Face
  readonly core: Core
}

class Explored implements ArcMap {
  readonly arcs: Arc[] = []
  private readonly moves: (Move | null)[] = []
  private readonly places = new Map<string, Place>()
  private readonly layout: Layout
  private readonly space: Omit<SearchSpace, 'budget'>

  constructor(
    shelf: CompiledShelf,
    private readonly question: Question,
    private readonly kindOfNodes: Nodes,
  ) {
    this.layout = layOut(shelf, question)
    const none = { units: new Set<string>(), pieces: new Set<number>() }
    this.space = beginRound(shelf, question, this.layout, none).space
    let edge = this.space.starts.flatMap(({ way, sig }) =>
      this.put(START, { unit: '', face: way.from!.face, core: sig.core }, null),
    )
    for (let depth = 0; edge.length > 0; depth++)
      edge = edge.flatMap((place) => this.grow(place, depth < LIMITS.boxesInLeg))
  }

  get nodes(): number {
    return this.places.size + 2
  }

  private grow({ node, face, core }: Place, further: boolean): Place[] {
    for (const move of this.space.ends(face, core)) this.add(node, DISPLAY, move)
    const moves = further ? this.space.moves(face, core) : []
    return moves.flatMap((move) => {
      const { leaving, way } = move
      if (!leaving || !way.from) return []
      const to = { face: way.from.face, core: leaving.core }
      return this.takersOf(move).flatMap(({ unit, doubt }) =>
        this.put(node, { unit, ...to }, move, doubt),
      )
    })
  }

  private takersOf({ kin, way, doubt }: Move): readonly { unit: Uid; doubt: number }[] {
    if (this.kindOfNodes === 'sorts') return [{ unit: '', doubt }]
    const others = doubt - leastDoubt(way)
    return kin.flatMap(({ offers }) =>
      offers.map((offer) => ({ unit: offer.unit.uid, doubt: others + offer.doubt })),
    )
  }

  /** An arc to a place, which is given back when it is new. */
  private put(
    from: number,
    { unit, face, core }: { unit: Uid; face: Face; core: Core },
    move: Move | null,
    doubt = 0,
  ): Place[] {
    const key = placeKey(unit, face, core)
    const known = this.places.get(key)
    const place = known ?? { node: this.nodes, face, core }
    this.places.set(key, place)
    this.add(from, place.node, move, doubt)
    return known ? [] : [place]
  }

  private add(from: number, to: number, move: Move | null, doubt = move?.doubt ?? 0): void {
    const { boxes, pieces } = move ?? { boxes: 0, pieces: 0 }
    const tiersBelow = move ? HIGHEST - TIER[move.way.into?.face.form ?? 'none'] : 0
    this.arcs.push({ from, to, boxes, pieces, doubt, tiersBelow })
    this.moves.push(move)
  }

  hookup(path: readonly number[]): Hookup | null {
    const found = this.follow(path)
    if (!found) return null
    const wiring = wiringOf(found)
    const { frame } = this.layout
    const stockOf = (piece: number): number => frame.drawer.pieces[piece]?.stock ?? 0
    const result = assign(wiring, stockOf, new Set())
    if (!('unitOf' in result)) return null
    return buildHookup({ wiring, unitOf: result.unitOf, frame, offAir: this.question.offAir })
  }

  private follow(path: readonly number[]): Finished | null {
    const { starts, expander, finisher } = this.space
    const begin = this.arcs[path[0]!]!.to
    const moves = path.slice(1).map((n) => this.moves[n]!)
    let labels: readonly Label[] = starts.filter(
      ({ way, sig }) => this.places.get(placeKey('', way.from!.face, sig.core))!.node === begin,
    )
    for (const move of moves.slice(0, -1))
      labels = labels.flatMap((label) =>
        expander.entries(label, move).flatMap((entry) => expander.leave(label, move, entry)),
      )
    const last = moves.at(-1)!
    return labels.flatMap((label) => finisher.finish(label, last, () => true))[0] ?? null
  }
}

const placeKey = (unit: Uid, face: Face, core: Core): string => `${unit} ${face.id} ${core.id}`
