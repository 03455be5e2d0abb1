import type { Wiring } from '../search/wiring'
import { footprintOf, type Footprint } from './footprint'

/** A chain that has been found, ready to be set beside others. */
export interface Known {
  readonly wiring: Wiring
  readonly footprint: Footprint
  readonly ending: Ending
}

interface Ending {
  /** The display and its sockets that are used. */
  readonly display: string
  readonly ports: readonly string[]
  /** The model and sockets that the last lead comes from, and the pieces of it. */
  readonly from: string
}

/**
 * Chains by the way in which they come into the display. Two that come in by one socket must come from one
 * unit by one lead; all others cannot be wired at once and need not be tried.
 */
export class Endings {
  private readonly groups = new Map<string, Known[]>()
  count = 0

  add(wiring: Wiring): Known {
    const known = { wiring, footprint: footprintOf(wiring), ending: endingOf(wiring) }
    const key = JSON.stringify(known.ending)
    this.groups.set(key, [...(this.groups.get(key) ?? []), known])
    this.count++
    return known
  }

  /** Chains that may stand beside one. */
  *besides({ ending }: Known): Generator<Known> {
    for (const group of this.groups.values()) {
      const [first] = group
      if (first && goTogether(first.ending, ending)) yield* group
    }
  }
}

const goTogether = (a: Ending, b: Ending): boolean =>
  a.display !== b.display ||
  a.ports.every((p) => !b.ports.includes(p)) ||
  (a.ports.join() === b.ports.join() && a.from === b.from)

function endingOf({ chain, edges }: Wiring): Ending {
  const end = chain.at(-1)!
  const { from, to, join } = edges.find((e) => e.of === 'chain' && e.to.node === end)!
  const ports = join.wires.map((w) => to.placed.ports[w.toPort]!)
  return {
    display: end.way.variant.id,
    ports: [...new Set(ports)].sort(),
    from: JSON.stringify([
      from.node.way.variant.model,
      join.wires.map((w) => from.placed.ports[w.fromPort]),
      join.routing.instances.map((t) => t.piece),
    ]),
  }
}
