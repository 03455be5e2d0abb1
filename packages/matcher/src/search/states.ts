import { TIER } from '@coaxwain/signal'
import type { Face } from '../compile/face'
import type { Core } from '../compile/signal'
import type { Move, MoveTable } from './moves'

export type MovesFrom = (face: Face, core: Core) => readonly Move[]

/** All that the moves from one state to another cost at least, and keep at best; each figure by itself. */
export interface Stride {
  readonly to: State
  readonly boxes: number
  readonly pieces: number
  readonly doubt: number
  readonly bought: number
  readonly tier: number
  readonly lumaMhz: number
}

/** A picture at an output: all that decides where it can go. */
export interface State {
  readonly id: number
  readonly face: Face
  readonly core: Core
  /** Null until somebody wants to go on from here. */
  strides: readonly Stride[] | null
}

export const tierInto = (move: Move): number =>
  TIER[move.join.picture === 'luma-only' ? 'luma-only' : (move.way.into?.face.form ?? 'none')]

/**
 * Every picture that can come about on a shelf, and how one leads to the next. It serves any question: units
 * that one leaves out make it promise too much there, never too little.
 */
export class StateGraph {
  private readonly states = new Map<string, State>()

  constructor(private readonly table: MoveTable) {}

  at(face: Face, core: Core): State {
    const key = `${face.id} ${core.id}`
    const known = this.states.get(key)
    if (known) return known
    const made: State = { id: this.states.size, face, core, strides: null }
    this.states.set(key, made)
    return made
  }

  /** Works out in slices where a state leads to. */
  *prepare({ face, core, strides }: State): Generator<void> {
    if (!strides) yield* this.table.prepare(face, core)
  }

  /** Where a state leads to. */
  stridesFrom(state: State): readonly Stride[] {
    return (state.strides ??= this.grow(state))
  }

  private grow({ face, core }: State): Stride[] {
    const found = new Map<State, Stride>()
    for (const move of this.table.of(face, core).best) {
      const { leaving, way } = move
      if (!leaving || !way.from) continue
      const to = this.at(way.from.face, leaving.core)
      const known = found.get(to)
      const stride = strideBy(move, to)
      found.set(to, known ? better(known, stride) : stride)
    }
    return [...found.values()]
  }
}

const strideBy = (move: Move, to: State): Stride => ({
  to,
  boxes: move.boxes,
  pieces: move.pieces,
  doubt: move.doubt,
  bought: move.bought,
  tier: Math.min(TIER[move.leaving?.poorest ?? 'none'], tierInto(move)),
  lumaMhz: move.leaving?.lumaMhz ?? 0,
})

const better = (a: Stride, b: Stride): Stride => ({
  to: a.to,
  boxes: Math.min(a.boxes, b.boxes),
  pieces: Math.min(a.pieces, b.pieces),
  doubt: Math.min(a.doubt, b.doubt),
  bought: Math.min(a.bought, b.bought),
  tier: Math.max(a.tier, b.tier),
  lumaMhz: Math.max(a.lumaMhz, b.lumaMhz),
})
