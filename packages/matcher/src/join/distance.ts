import { LIMITS } from '@coaxwain/shelf'
import { isSoundCircuit, mates, type Circuit, type Connector } from '@coaxwain/signal'
import type { FacePort } from '../compile/face'
import type { Drawer, Passage } from './drawer'

/** An open end of what is laid out so far, and what is to come by it; no contact where any signal may. */
export interface OpenEnd {
  readonly connector: Connector
  readonly contact: string | null
  readonly circuit: Circuit
}

/** A contact of an input. */
export interface Target {
  readonly port: FacePort
  readonly contact: string
}

type Tip = Omit<OpenEnd, 'circuit'>

const nameOf = ({ connector, contact }: Tip): string => `${connector} ${contact ?? '*'}`

/**
 * The fewest pieces between an open connector and a target, by connectors, contacts and circuits alone.
 * Stock, occupied plugs and impedance can only make it more, so it never cuts off a way that exists.
 */
export class Distances {
  private readonly tables = new Map<string, ReadonlyMap<string, number>>()

  constructor(private readonly drawer: Drawer) {}

  /** Distance from an open end to a port; Infinity when no pieces at hand lead there. */
  from(end: OpenEnd, target: Target): number {
    const table = this.tableFor(end.circuit, target)
    const exact = table.get(nameOf(end)) ?? Infinity
    if (end.contact === null) return exact
    return Math.min(exact, table.get(nameOf({ ...end, contact: null })) ?? Infinity)
  }

  private tableFor(circuit: Circuit, { port, contact }: Target): ReadonlyMap<string, number> {
    const kind = isSoundCircuit(circuit) ? 'sound' : circuit
    const key = `${kind} ${port.connector} ${contact}`
    const known = this.tables.get(key)
    if (known) return known
    const made = this.spread(circuit, { connector: port.connector, contact })
    this.tables.set(key, made)
    return made
  }

  /** Spreads backwards from the target: which open ends reach it with so many pieces. */
  private spread(circuit: Circuit, target: Tip): Map<string, number> {
    const reached = new Map<string, number>()
    const first = [target.contact, null].flatMap((contact) => this.onto(target.connector, contact))
    let edge = fresh(first, reached, 0)
    for (let steps = 1; steps <= LIMITS.piecesInLink && edge.length > 0; steps++) {
      edge = fresh(this.behind(circuit, edge), reached, steps)
    }
    return reached
  }

  private onto(connector: Connector, contact: string | null): Tip[] {
    return this.drawer.connectors
      .filter((c) => mates(c, connector))
      .map((c) => ({ connector: c, contact }))
  }

  /** Open ends from which one piece more leads to the edge. */
  private behind(circuit: Circuit, edge: readonly Tip[]): Tip[] {
    const suited = this.drawer.turned.filter((t) => this.drawer.suits(t.piece, circuit))
    return suited.flatMap(({ passages, entry, exit }) =>
      passages
        .filter((p) =>
          edge.some((e) => e.connector === exit[p.exitPlug]!.connector && agrees(p, e.contact)),
        )
        .flatMap((p) => this.onto(entry[p.plug]!.connector, p.contact)),
    )
  }
}

/** Those not reached before, noted with their distance. */
function fresh(tips: readonly Tip[], reached: Map<string, number>, steps: number): Tip[] {
  return tips.filter((tip) => {
    const name = nameOf(tip)
    if (reached.has(name)) return false
    reached.set(name, steps)
    return true
  })
}

const agrees = (passage: Passage, contact: string | null): boolean =>
  passage.exitContact === null || contact === null || passage.exitContact === contact
