import { LIMITS } from '@coaxwain/shelf'
import { plus, type Cost, type Label } from '../search/label'
import type { Move, MoveTable } from '../search/moves'
import { Outlooks } from '../search/outlook'
import { Queue } from '../search/queue'
import type { Round } from '../search/round'
import { soundStillThere, stateOf } from '../search/search'

/** A chain so far, and what it is for; chains for different purposes do not beat each other. */
export interface Lane<T> {
  readonly label: Label
  readonly purpose: T
}

export interface Course<T> {
  readonly round: Round
  /** Moves that end a chain. */
  readonly ends: MoveTable
  readonly mostBoxes: number
  readonly isWorthwhile: (purpose: T, cost: Cost) => boolean
  readonly reach: (lane: Lane<T>, move: Move) => void
}

/** More boxes than any chain has, sound included. */
const MOST_BOXES = 16

type Effort = Pick<Cost, 'doubt' | 'boxes' | 'pieces'>

/** The least doubt first, then the fewest boxes; pieces decide after that. */
export const rankOf = ({ doubt, boxes }: Effort): number => doubt * MOST_BOXES + boxes

/** Less doubt, else fewer boxes, else fewer pieces. */
export const compareCosts = (a: Effort, b: Effort): number =>
  rankOf(a) - rankOf(b) || a.pieces - b.pieces

/**
 * Grows chains, the cheapest first, until each has reached every end that it can. Of chains with one purpose
 * that lead to the same only the cheapest goes on. Says true for a step that took a chain further.
 */
export function* grow<T>(starts: readonly Lane<T>[], course: Course<T>): Generator<boolean> {
  const { round, ends, mostBoxes, isWorthwhile, reach } = course
  const { space } = round
  const outlooks = new Outlooks(
    starts.map((s) => s.label),
    {
      ...space,
      allEnds: (face, core) => ends.all(face, core),
      prepareEnds: (face, core) => ends.prepare(face, core),
    },
  )
  for (const _ of outlooks.explore()) yield false
  const queue = new Queue<Lane<T>>()
  const met = new Map<T, Map<string, Cost>>()
  const put = (lane: Lane<T>): void => {
    const { label, purpose } = lane
    const ahead = outlooks.at(label.way.from!.face, label.sig.core)
    if (!ahead || label.depth + ahead.units > LIMITS.boxesInLeg) return
    const cost = plus(label, ahead)
    if (cost.boxes <= mostBoxes && isWorthwhile(purpose, cost))
      queue.put(lane, rankOf(cost), cost.pieces)
  }
  const isBeaten = ({ label, purpose }: Lane<T>): boolean => {
    const known = met.get(purpose) ?? new Map<string, Cost>()
    met.set(purpose, known)
    // A chain that brings less sound is no match for one that brings more, though it costs less.
    const key = `${stateOf(label, space)} ${label.sig.sound} ${soundStillThere(label)}`
    const before = known.get(key)
    if (before && compareCosts(before, label) <= 0) return true
    known.set(key, label)
    return false
  }
  starts.forEach(put)
  for (let lane = queue.take(); lane; lane = queue.take()) {
    if (isBeaten(lane)) continue
    const { label, purpose } = lane
    const { face } = label.way.from!
    const { core } = label.sig
    for (const move of ends.of(face, core).best) reach(lane, move)
    const further = label.depth < LIMITS.boxesInLeg ? round.moves(face, core) : []
    for (const move of further)
      onwards(round, label, move).forEach((made) => put({ label: made, purpose }))
    yield true
  }
}

/** Every way of going on from a chain through one more box. */
export const onwards = ({ expander }: Round, label: Label, move: Move): Label[] =>
  expander.entries(label, move).flatMap((entry) => expander.leave(label, move, entry))
