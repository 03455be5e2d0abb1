import { nameOf, thingOf } from '@coaxwain/shelf'
import { beyondOne, type Trial } from './trial'

/** Sets of chains that are tried before the best so far has to do. */
const MOST_TRIED = 3000

/** More sockets than one way through a unit has. */
const MOST_SOCKETS = 1000

export interface Chosen<C> {
  /** In the order in which they are to be tried. */
  readonly chains: readonly C[]
  /** No smaller set has been missed. */
  readonly complete: boolean
}

/** How many things a chain still tries, and then on how many sockets. */
function gain({ seen, heard }: Trial, known: ReadonlySet<string>): number {
  const left = [...seen, ...heard].filter((s) => !known.has(nameOf(s)))
  return new Set(left.map(thingOf)).size * MOST_SOCKETS + left.length
}

const withTrial = (known: ReadonlySet<string>, { seen, heard }: Trial): ReadonlySet<string> =>
  new Set([...known, ...[...seen, ...heard].map(nameOf)])

/** Of chains that still try something, those that put the least on trial at once. */
function sharpest<C extends Trial>(chains: readonly C[], known: ReadonlySet<string>): C[] {
  const useful = chains.filter((c) => gain(c, known) > 0)
  const least = Math.min(...useful.map((c) => beyondOne(c, known)))
  return useful.filter((c) => beyondOne(c, known) === least)
}

/** So many more chains are needed at least, since each tries only so many things on a leg. */
function atLeast(chains: readonly Trial[], known: ReadonlySet<string>): number {
  return Math.max(
    ...(['seen', 'heard'] as const).map((leg) => {
      const sets = chains.map(
        (c) => new Set(c[leg].filter((s) => !known.has(nameOf(s))).map(thingOf)),
      )
      const most = Math.max(1, ...sets.map((s) => s.size))
      return Math.ceil(new Set(sets.flatMap((s) => [...s])).size / most)
    }),
  )
}

/**
 * The fewest chains that try everything that any of them tries. What one has proved counts as known for those
 * after it, and one that puts more things on trial at once than another is taken only where it must be.
 * `chains`: the better of equals first.
 */
export function chooseChains<C extends Trial>(chains: readonly C[]): Chosen<C> {
  let best: readonly C[] | null = null
  let tried = 0
  const extend = (taken: readonly C[], known: ReadonlySet<string>): void => {
    if (best && (tried >= MOST_TRIED || taken.length + atLeast(chains, known) >= best.length))
      return
    tried++
    const next = sharpest(chains, known)
    if (next.length === 0) {
      best = taken
      return
    }
    const byGain = [...next].sort((a, b) => gain(b, known) - gain(a, known))
    for (const chain of byGain) extend([...taken, chain], withTrial(known, chain))
  }
  extend([], new Set())
  return { chains: best ?? [], complete: tried < MOST_TRIED }
}
