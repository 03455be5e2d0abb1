import { LIMITS } from '@coaxwain/shelf'
import { isSoundCircuit, mates, type Circuit, type Connector } from '@coaxwain/signal'
import type { FacePort } from '../compile/face'
import type { Drawer, Passage } from './drawer'

/**
 * The fewest pieces between an open connector and a target, by connectors, contacts and circuits alone.
 * Stock, occupied plugs and impedance can only make it more, so it never cuts off a way that exists.
 */
export class Distances {
  private readonly tables = new Map<string, ReadonlyMap<string, number>>()

  constructor(private readonly drawer: Drawer) {}

  /** Distance from an open end to a port; Infinity when no pieces at hand lead there. */
  from(
    connector: Connector,
    contact: string | null,
    circuit: Circuit,
    target: FacePort,
    at: string,
  ): number {
    const table = this.tableFor(circuit, target.connector, at)
    const exact = table.get(`${connector} ${contact ?? '*'}`) ?? Infinity
    return contact === null ? exact : Math.min(exact, table.get(`${connector} *`) ?? Infinity)
  }

  private tableFor(
    circuit: Circuit,
    connector: Connector,
    contact: string,
  ): ReadonlyMap<string, number> {
    const kind = isSoundCircuit(circuit) ? 'sound' : circuit
    const key = `${kind} ${connector} ${contact}`
    const known = this.tables.get(key)
    if (known) return known
    const made = this.spread(circuit, connector, contact)
    this.tables.set(key, made)
    return made
  }

  /** Spreads backwards from the target: which open ends reach it with so many pieces. */
  private spread(circuit: Circuit, connector: Connector, contact: string): Map<string, number> {
    const reached = new Map<string, number>()
    const note = (c: Connector, at: string | null, steps: number): boolean => {
      const key = `${c} ${at ?? '*'}`
      if (reached.has(key)) return false
      reached.set(key, steps)
      return true
    }
    let edge: { connector: Connector; contact: string | null }[] = []
    for (const c of this.drawer.connectors) {
      if (!mates(c, connector)) continue
      for (const at of [contact, null]) if (note(c, at, 0)) edge.push({ connector: c, contact: at })
    }
    for (let steps = 1; steps <= LIMITS.piecesInLink && edge.length > 0; steps++) {
      const next: typeof edge = []
      for (const turned of this.drawer.turned) {
        if (!this.drawer.suits(turned.piece, circuit)) continue
        for (const passage of turned.passages) {
          const exit = turned.exit[passage.exitPlug]!.connector
          if (!edge.some((e) => e.connector === exit && agrees(passage, e.contact))) continue
          const entry = turned.entry[passage.plug]!.connector
          for (const c of this.drawer.connectors) {
            if (mates(c, entry) && note(c, passage.contact, steps)) {
              next.push({ connector: c, contact: passage.contact })
            }
          }
        }
      }
      edge = next
    }
    return reached
  }
}

const agrees = (passage: Passage, contact: string | null): boolean =>
  passage.exitContact === null || contact === null || passage.exitContact === contact
