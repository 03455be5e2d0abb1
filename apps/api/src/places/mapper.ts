import type { Place } from '@coaxwain/contract'
import type { PlaceRow } from './repository'

const MOST_DEPTH = 50

type Rows = ReadonlyMap<number, PlaceRow>

export const byId = (rows: readonly PlaceRow[]): Rows => new Map(rows.map((r) => [r.id, r]))

/** The place and everything that it stands in, outermost first. */
export function ancestry(place: PlaceRow, rows: Rows): PlaceRow[] {
  const found: PlaceRow[] = []
  for (
    let at: PlaceRow | undefined = place;
    at && found.length < MOST_DEPTH;
    at = at.parentId === null ? undefined : rows.get(at.parentId)
  ) {
    found.unshift(at)
  }
  return found
}

export const toPlace = (row: PlaceRow, rows: Rows): Place => ({
  uid: row.uid,
  name: row.name,
  parent: (row.parentId === null ? undefined : rows.get(row.parentId))?.uid ?? null,
  path: ancestry(row, rows).map((p) => p.name),
  version: row.version,
  units: row.units,
})

/** Paths by the id of the place, for lists of what stands there. */
export const pathsOf = (
  rows: readonly PlaceRow[],
): Map<number, { uid: string; path: string[] }> => {
  const known = byId(rows)
  return new Map(
    rows.map((r) => [r.id, { uid: r.uid, path: ancestry(r, known).map((p) => p.name) }]),
  )
}
