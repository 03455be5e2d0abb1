import type { Variant } from '../compile/variant'
import type { Way } from '../compile/way'
import type { JoinTable } from '../join/join'
import { waysUsed, type Label } from './label'

/** Sorts of units and pieces of which a chain may want more than there are. */
export interface Scarcity {
  readonly scarceUnits: ReadonlySet<string>
  readonly joins: JoinTable
}

interface Use {
  /** Null for a piece. */
  readonly variant: Variant | null
  readonly count: number
}

/** What a chain has taken of scarce sorts. */
export interface Used {
  readonly uses: ReadonlyMap<string, Use>
  /** Sorts of units of which none is left: nobody asks any more by which ways they were taken. */
  readonly spent: ReadonlySet<Variant>
}

const NOTHING: Used = { uses: new Map(), spent: new Set() }

/** All by which one way through a sort of units leaves less than another: who could do it, and at what doubt. */
const offered = ({ offers }: Way): string =>
  offers.map(({ unit, doubt }) => `${unit.uid}=${doubt}`).join()

/** What a chain has taken of scarce sorts, aerial and all. */
export function usedOf(label: Label, { scarceUnits, joins }: Scarcity): Used {
  if (scarceUnits.size === 0 && !joins.hasScarce) return NOTHING
  const uses = new Map<string, Use>()
  const note = (key: string, variant: Variant | null, n: number): void =>
    void uses.set(key, { variant, count: (uses.get(key)?.count ?? 0) + n })
  const left = new Map<Variant, number>()
  for (const way of waysUsed(label)) {
    const { variant } = way
    if (!scarceUnits.has(variant.id)) continue
    note(`${variant.id} ${offered(way)}`, variant, 1)
    left.set(variant, (left.get(variant) ?? variant.units.length) - 1)
  }
  for (const [piece, n] of scarcePieces(label)) note(`#${piece}`, null, n)
  return { uses, spent: new Set([...left].flatMap(([v, n]) => (n <= 0 ? [v] : []))) }
}

/**
 * Whatever the second chain could still take, the first could take as well, and for no more doubt: what is left
 * of a sort grows dearer with every unit that is taken from it.
 */
export const takesNoMore = (a: Used, b: Used): boolean =>
  [...a.uses].every(
    ([key, { variant, count }]) =>
      (variant !== null && b.spent.has(variant)) || count <= (b.uses.get(key)?.count ?? 0),
  )

/** Pieces of scarce sorts that a chain takes, and its terminators. */
export function scarcePieces(label: Label): Map<number, number> {
  const used = new Map<number, number>()
  const note = (piece: number, n: number): void => void used.set(piece, (used.get(piece) ?? 0) + n)
  for (let at: Label = label; at.prev && at.step; at = at.prev) {
    const { join, soundRoute, terminators } = at.step
    for (const { scarce } of [join, ...(soundRoute?.joins ?? [])])
      for (const [piece, n] of scarce) note(piece, n)
    for (const piece of terminators) note(piece, 1)
  }
  for (const { scarce } of label.aerial?.route.joins ?? [])
    for (const [piece, n] of scarce) note(piece, n)
  return used
}
