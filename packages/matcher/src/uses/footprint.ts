import { leastDoubt } from '../compile/way'
import type { Cost } from '../search/label'
import type { Node, Wiring } from '../search/wiring'

/** What a chain needs, sort by sort, to tell quickly what two chains could share at most. */
export interface Footprint {
  /** Models of boxes under power, and of those without. */
  readonly powered: readonly string[]
  readonly passive: readonly string[]
  /** Models of its source and display, which cost nothing as boxes of another chain. */
  readonly ends: readonly string[]
  /** The doubt of every unit, by its model. */
  readonly doubts: ReadonlyMap<string, readonly number[]>
  /** Connections, each with its pieces. */
  readonly joins: ReadonlyMap<string, number>
  readonly cost: Cost
}

const modelOf = ({ way }: Node): string => way.variant.model

export function footprintOf({ found, chain, alone, edges }: Wiring): Footprint {
  const boxes = [...chain.slice(1, -1), ...alone]
  const underPower = (n: Node): boolean => n.way.variant.powered || n.way.fn.kind === 'makes-sound'
  const doubts = new Map<string, number[]>()
  for (const node of [...chain, ...alone])
    doubts.set(modelOf(node), [...(doubts.get(modelOf(node)) ?? []), leastDoubt(node.way)])
  const joins = new Map<string, number>()
  for (const { from, to, join } of edges) {
    const ports = join.wires.map((w) => [from.placed.ports[w.fromPort], to.placed.ports[w.toPort]])
    const what = JSON.stringify([modelOf(from.node), modelOf(to.node), ports])
    joins.set(what, (joins.get(what) ?? 0) + join.pieces)
  }
  return {
    powered: boxes.filter(underPower).map(modelOf),
    passive: boxes.filter((n) => !underPower(n)).map(modelOf),
    ends: [chain[0]!, chain.at(-1)!].map(modelOf),
    doubts,
    joins,
    cost: { ...found.axes, bought: found.bought },
  }
}

/** Two chains together cost at least so much, whatever they share. */
export function leastTogether(a: Footprint, b: Footprint): Cost {
  const boxes = common(a.powered, [...b.powered, ...b.ends]) + common(b.powered, a.ends)
  const passive = common(a.passive, [...b.passive, ...b.ends]) + common(b.passive, a.ends)
  let leads = 0
  for (const [what, pieces] of a.joins) leads += Math.min(pieces, b.joins.get(what) ?? 0)
  return {
    boxes: a.cost.boxes + b.cost.boxes - boxes,
    pieces: a.cost.pieces + b.cost.pieces - leads - passive,
    doubt: a.cost.doubt + b.cost.doubt - sharedDoubt(a, b),
    bought: 0,
  }
}

/** How many of two lists could be the same. */
function common(a: readonly string[], b: readonly string[]): number {
  const left = [...b]
  return a.filter((x) => {
    const at = left.indexOf(x)
    if (at >= 0) left.splice(at, 1)
    return at >= 0
  }).length
}

/** Doubt that both have and that counts once where they share units: at most the lesser of each pair. */
function sharedDoubt(a: Footprint, b: Footprint): number {
  let shared = 0
  for (const [model, own] of a.doubts) {
    const theirs = [...(b.doubts.get(model) ?? [])].sort((x, y) => y - x)
    const mine = [...own].sort((x, y) => y - x)
    mine.forEach((doubt, i) => (shared += Math.min(doubt, theirs[i] ?? 0)))
  }
  return shared
}
