import type { Unit } from '@coaxwain/shelf'
import { leastDoubt, type Way } from '../compile/way'
import { pathOf, type Finished, type Step } from './label'
import { boxesOf, type Node, type Wiring } from './wiring'

/** Every step of a chain, the last into the display. */
export const stepsOf = (found: Finished): Step[] => [
  ...pathOf(found.last).flatMap((l) => (l.step ? [l.step] : [])),
  found.step,
]

export interface Shortage {
  readonly variants: ReadonlySet<string>
  readonly pieces: ReadonlySet<number>
}

/** One unit for each node of a chain that wants one, none twice; or the sorts of which there are too few. */
export function assign(
  wiring: Wiring,
  stockOf: (piece: number) => number,
  exact: ReadonlySet<string>,
  wanted: readonly Node[] = boxesOf(wiring),
): { unitOf: Map<Node, Unit> } | { short: Shortage } {
  const variants = new Set<string>()
  const unitOf = new Map<Node, Unit>()
  const groups = new Map<string, Node[]>()
  for (const node of wanted) {
    const { id } = node.way.variant
    groups.set(id, [...(groups.get(id) ?? []), node])
  }
  for (const [id, nodes] of groups) {
    const ways = nodes.map((n) => n.way)
    const picked = leastApart(ways)
    const hoped = ways.reduce((sum, way) => sum + leastDoubt(way), 0)
    if (picked && (picked.doubt === hoped || exact.has(id))) {
      nodes.forEach((node, i) => unitOf.set(node, picked.units[i] as Unit))
    } else variants.add(id)
  }
  const pieces = piecesShort(wiring, stockOf)
  return variants.size + pieces.size > 0 ? { short: { variants, pieces } } : { unitOf }
}

/** Distinct units for several ways of one variant, at the least doubt in all; null when there are too few. */
export function leastApart(
  ways: readonly Way[],
): { readonly units: readonly Unit[]; readonly doubt: number } | null {
  let best: { units: Unit[]; doubt: number } | null = null
  const pick = (i: number, units: readonly Unit[], doubt: number): void => {
    if (best && doubt >= best.doubt) return
    const way = ways[i]
    if (!way) {
      best = { units: [...units], doubt }
      return
    }
    for (const offer of way.offers) {
      if (!units.includes(offer.unit)) pick(i + 1, [...units, offer.unit], doubt + offer.doubt)
    }
  }
  pick(0, [], 0)
  return best
}

function piecesShort(wiring: Wiring, stockOf: (piece: number) => number): Set<number> {
  const used = new Map<number, number>()
  const note = (piece: number): void => void used.set(piece, (used.get(piece) ?? 0) + 1)
  for (const { join } of wiring.edges)
    if (!join.along) join.routing.instances.forEach((i) => note(i.piece))
  for (const step of stepsOf(wiring.found)) step.terminators.forEach(note)
  return new Set([...used].filter(([piece, n]) => n > stockOf(piece)).map(([piece]) => piece))
}
