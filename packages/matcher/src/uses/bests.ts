import type { Cost } from '../search/label'
import type { Merged } from './merge'

/** The axes of an arrangement: a picture and a sound for each use, and what it costs together. */
export interface Bound {
  readonly pictures: readonly number[]
  readonly sounds: readonly number[]
  readonly cost: Cost
}

/** Smaller is better, number by number. */
type Rank = readonly number[]

const sum = (values: readonly number[]): number => values.reduce((a, b) => a + b, 0)

const seen = (b: Bound): Rank => [-sum(b.pictures), -sum(b.sounds)]
const effort = (b: Bound): Rank => [b.cost.boxes, b.cost.pieces]
const doubted = (b: Bound): number => Number(b.cost.doubt > 0)

/** In the default order; by picture whatever the doubt; by effort. The first is the answer. */
const ORDERS: readonly ((b: Bound) => Rank)[] = [
  (b) => [doubted(b), ...seen(b), ...effort(b), b.cost.doubt],
  (b) => [...seen(b), ...effort(b), b.cost.doubt],
  (b) => [...effort(b), doubted(b), ...seen(b), b.cost.doubt],
]

function compareRanks(a: Rank, b: Rank): number {
  const at = a.findIndex((value, i) => value !== b[i])
  return at < 0 ? 0 : a[at]! - b[at]!
}

const boundOf = ({ wirings, cost }: Merged): Bound => ({
  pictures: wirings.map((w) => w.found.axes.picture),
  sounds: wirings.map((w) => w.found.axes.sound),
  cost,
})

/** The best arrangement that is known by each of the orders. */
export class Bests {
  private readonly held: { readonly merged: Merged; readonly rank: Rank }[] = []

  add(merged: Merged): void {
    const bound = boundOf(merged)
    ORDERS.forEach((order, i) => {
      const rank = order(bound)
      const held = this.held[i]
      if (!held || compareRanks(rank, held.rank) < 0) this.held[i] = { merged, rank }
    })
  }

  /** Something at most so good could still be the best by one of the orders. */
  couldGain(bound: Bound): boolean {
    return ORDERS.some((order, i) => {
      const held = this.held[i]
      return !held || compareRanks(order(bound), held.rank) < 0
    })
  }

  /** Each once, the answer first. */
  all(): readonly Merged[] {
    return [...new Set(this.held.map((h) => h.merged))]
  }
}
