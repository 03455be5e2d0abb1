import type { Unit } from '@coaxwain/shelf'
import { leastDoubt, type Way } from '../compile/way'
import type { Join } from '../join/join'
import { pathOf, type Finished, type Step } from './label'

/** Every way that a chain uses of boxes from the shelf, in order: on the picture's path, then for sound alone. */
export function waysUsed(found: Finished): Way[] {
  const path = pathOf(found.last)
  const routes = [
    ...path.map((l) => l.step?.soundRoute ?? null),
    found.step.soundRoute,
    found.speakers?.route ?? null,
  ]
  const alone = routes.flatMap((r) => (r?.via ? [r.via] : []))
  return [
    ...path.slice(1).map((l) => l.way),
    ...alone,
    ...(found.speakers ? [found.speakers.way] : []),
    ...(found.aerial?.route.ways ?? []),
  ]
}

/** Every step of a chain, the last into the display. */
export const stepsOf = (found: Finished): Step[] => [
  ...pathOf(found.last).flatMap((l) => (l.step ? [l.step] : [])),
  found.step,
]

/** Every set of pieces that a chain uses, in order. */
export function joinsUsed(found: Finished): Join[] {
  return [
    ...stepsOf(found).flatMap((s) => [s.join, ...(s.soundRoute?.joins ?? [])]),
    ...(found.speakers?.route.joins ?? []),
    ...(found.aerial?.route.joins ?? []),
  ]
}

export interface Shortage {
  readonly variants: ReadonlySet<string>
  readonly pieces: ReadonlySet<number>
}

/** One unit for each way used, none twice; or the sorts of which there are too few. */
export function assign(
  found: Finished,
  stockOf: (piece: number) => number,
  exact: ReadonlySet<string>,
): { units: Map<Way, Unit> } | { short: Shortage } {
  const variants = new Set<string>()
  const units = new Map<Way, Unit>()
  const groups = new Map<string, Way[]>()
  for (const way of waysUsed(found)) {
    const group = groups.get(way.variant.id) ?? []
    groups.set(way.variant.id, [...group, way])
  }
  for (const [id, ways] of groups) {
    const picked = leastApart(ways)
    const hoped = ways.reduce((sum, way) => sum + leastDoubt(way), 0)
    if (picked && (picked.doubt === hoped || exact.has(id))) {
      ways.forEach((way, i) => units.set(way, picked.units[i] as Unit))
    } else variants.add(id)
  }
  const pieces = piecesShort(found, stockOf)
  return variants.size + pieces.size > 0 ? { short: { variants, pieces } } : { units }
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

function piecesShort(found: Finished, stockOf: (piece: number) => number): Set<number> {
  const used = new Map<number, number>()
  const note = (piece: number): void => void used.set(piece, (used.get(piece) ?? 0) + 1)
  for (const join of joinsUsed(found)) join.routing.instances.forEach((i) => note(i.piece))
  for (const step of stepsOf(found)) step.terminators.forEach(note)
  return new Set([...used].filter(([piece, n]) => n > stockOf(piece)).map(([piece]) => piece))
}
