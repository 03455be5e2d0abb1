import type { LineEnd, Link, PieceUse, PortRef, Uid } from '@coaxwain/shelf'
import type { Placed } from '../compile/face'
import type { Drawer } from '../join/drawer'
import type { Join } from '../join/join'

interface End {
  readonly unit: Uid
  readonly placed: Placed
}

interface Taken {
  readonly model: Uid
  readonly copy: number
}

/** Numbers the pieces that are used: two of one sort are two copies, cores of one lead share its number. */
export class PieceStock {
  private readonly copies = new Map<Uid, number>()
  private readonly drawn = new Map<number, number>()
  private readonly known = new Map<string, readonly Taken[]>()

  constructor(private readonly drawer: Drawer) {}

  take(piece: number): Taken {
    const model = this.draw(piece)
    const copy = (this.copies.get(model) ?? 0) + 1
    this.copies.set(model, copy)
    return { model, copy }
  }

  /** The pieces of one join; the same ones when the same is plugged for another hookup. */
  between({ routing, wires }: Join, from: End, to: End): readonly Taken[] {
    const ports = wires.map((w) => [from.placed.ports[w.fromPort], to.placed.ports[w.toPort]])
    const key = JSON.stringify([from.unit, to.unit, ports])
    const known = this.known.get(key)
    if (known) return known
    const made = routing.instances.map(({ piece }) => this.take(piece))
    this.known.set(key, made)
    return made
  }

  /** The next piece of a sort: its models in turn, each as often as it is there. */
  private draw(piece: number): Uid {
    let nth = this.drawn.get(piece) ?? 0
    this.drawn.set(piece, nth + 1)
    const { models } = this.drawer.pieces[piece]!
    for (const m of models) {
      if (nth < m.stock) return m.model
      nth -= m.stock
    }
    return models.at(-1)!.model
  }
}

/** Writes down what is plugged. */
export class LinkMaker {
  readonly links: Link[] = []
  readonly ends: LineEnd[] = []

  /** Pieces of the joins that were added, for sounds that are led along them. */
  private readonly laid = new Map<Join, readonly Taken[]>()

  constructor(private readonly pieces: PieceStock) {}

  /** A terminator on a socket. */
  end(piece: number, at: PortRef): void {
    this.ends.push({ ...at, ...this.pieces.take(piece) })
  }

  /** Adds the links of one join, and says which they are. */
  add(join: Join, from: End, to: End): number[] {
    const shared = join.along && this.laid.get(join.along.join)
    const taken = shared ?? this.pieces.between(join, from, to)
    this.laid.set(join, taken)
    const made: number[] = []
    join.wires.forEach((wire, i) => {
      const pieces = (join.routing.hops[i] ?? []).map((hop): PieceUse => ({
        ...taken[hop.instance]!,
        wayRound: join.routing.instances[hop.instance]!.wayRound,
        inPlug: hop.inPlug,
        outPlug: hop.outPlug,
      }))
      const circuit = { from: wire.circuit, to: wire.taken }
      const link = {
        from: { unit: from.unit, port: from.placed.ports[wire.fromPort] as string },
        to: { unit: to.unit, port: to.placed.ports[wire.toPort] as string },
        pieces,
      }
      const same = made.find((at) => sameWay(this.links[at] as Link, link))
      if (same === undefined) {
        made.push(this.links.length)
        this.links.push({ ...link, circuits: [circuit] })
      } else {
        const before = this.links[same] as Link
        this.links[same] = { ...before, circuits: [...before.circuits, circuit] }
      }
    })
    return made
  }
}

const samePort = (a: PortRef, b: PortRef): boolean => a.unit === b.unit && a.port === b.port

const sameWay = (a: Omit<Link, 'circuits'>, b: Omit<Link, 'circuits'>): boolean =>
  samePort(a.from, b.from) &&
  samePort(a.to, b.to) &&
  JSON.stringify(a.pieces) === JSON.stringify(b.pieces)
