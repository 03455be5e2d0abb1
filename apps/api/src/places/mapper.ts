import type { Place } from '@coaxwain/contract'
import type { PlaceNode, PlaceRow } from './repository'

/** Places stand in one another this deep at most; no path is longer. */
export const MOST_DEPTH = 20

type Nodes = ReadonlyMap<number, PlaceNode>

export const byId = (nodes: readonly PlaceNode[]): Nodes => new Map(nodes.map((n) => [n.id, n]))

/** The place and everything that it stands in, outermost first. */
export function ancestry(place: PlaceNode, known: Nodes): PlaceNode[] {
  const found: PlaceNode[] = []
  for (
    let at: PlaceNode | undefined = place;
    at && found.length < MOST_DEPTH;
    at = at.parentId === null ? undefined : known.get(at.parentId)
  ) {
    found.unshift(at)
  }
  return found
}

export const toPlace = (row: PlaceRow, known: Nodes): Place => ({
  uid: row.uid,
  name: row.name,
  parent: (row.parentId === null ? undefined : known.get(row.parentId))?.uid ?? null,
  path: ancestry(row, known).map((p) => p.name),
  version: row.version,
  units: row.units,
})

/** Paths by the id of the place, for lists of what stands there. */
export const pathsOf = (
  nodes: readonly PlaceNode[],
): Map<number, { uid: string; path: string[] }> => {
  const known = byId(nodes)
  return new Map(
    nodes.map((n) => [n.id, { uid: n.uid, path: ancestry(n, known).map((p) => p.name) }]),
  )
}
