import { LIMITS } from '@coaxwain/shelf'
import { isSoundCircuit, mates, type Circuit, type Connector } from '@coaxwain/signal'
import type { Face, FacePort } from '../compile/face'
import type { Distances } from './distance'
import { meantFor, type Drawer, type Passage, type Turned } from './drawer'

/** One wire that must come about: a contact of an output to a contact of an input. */
export interface WantedWire {
  /** As it leaves. */
  readonly circuit: Circuit
  /** As the input takes it. */
  readonly taken: Circuit
  readonly fromPort: number
  readonly fromContact: string
  readonly toPort: number
  readonly toContact: string
}

/** A piece laid out, and what its plugs sit in. */
export interface Instance {
  readonly turned: Turned
  /** What each entry plug is pushed onto. */
  readonly entry: (End | undefined)[]
  readonly exit: (End | undefined)[]
}

export type End =
  | { readonly at: 'out'; readonly port: number }
  | { readonly at: 'in'; readonly port: number }
  | { readonly at: 'piece'; readonly instance: number; readonly plug: number }

/** The pieces that one wire runs through, with the plugs by which it enters and leaves. */
export interface Hop {
  readonly instance: number
  readonly inPlug: number
  readonly outPlug: number
}

export interface Routing {
  readonly instances: readonly Turned[]
  /** Per wanted wire, in the order asked. */
  readonly hops: readonly (readonly Hop[])[]
}

/** How many pieces of each sort a routing takes out of the drawer. */
export function usageOf(routing: Routing): Map<number, number> {
  const usage = new Map<number, number>()
  for (const { piece } of routing.instances) usage.set(piece, (usage.get(piece) ?? 0) + 1)
  return usage
}

/** A drawer, and what has been worked out about it. */
export interface Supply {
  readonly drawer: Drawer
  readonly distances: Distances
  readonly single: Map<string, number>
}

/** Wires that are to come about between two faces. */
export interface Job {
  readonly out: Face
  readonly into: Face
  readonly wires: readonly WantedWire[]
}

interface Open {
  readonly connector: Connector
  readonly mount: 'chassis' | 'lead'
  readonly contact: string | null
  readonly ohm: number
  readonly hops: readonly Hop[]
  readonly leads: number
}

/**
 * Lays out leads and adapters between two faces so that every wanted wire comes about, with exactly
 * `pieces` pieces, and hands each way of doing it to `found`. Returning true from `found` ends the search.
 */
export class Router {
  private readonly instances: Instance[] = []
  private readonly outMates: (End | undefined)[] = []
  private readonly inMates: (End | undefined)[] = []
  private readonly hops: (readonly Hop[])[] = []
  private done = false
  private readonly drawer: Drawer
  private readonly distances: Distances

  private readonly out: Face
  private readonly into: Face
  private readonly wires: readonly WantedWire[]

  constructor(
    supply: Supply,
    job: Job,
    private readonly pieces: number,
    private readonly found: (routing: Routing) => boolean,
  ) {
    this.drawer = supply.drawer
    this.distances = supply.distances
    this.out = job.out
    this.into = job.into
    this.wires = job.wires
  }

  run(): void {
    this.wire(0)
  }

  private wire(index: number): void {
    if (this.done) return
    const wire = this.wires[index]
    if (!wire) {
      if (this.instances.length === this.pieces) {
        this.done = this.found({
          instances: this.instances.map((i) => i.turned),
          hops: [...this.hops],
        })
      }
      return
    }
    const port = this.out.ports[wire.fromPort] as FacePort
    this.follow(
      index,
      { at: 'out', port: wire.fromPort },
      {
        connector: port.connector,
        mount: port.mount,
        contact: wire.fromContact,
        ohm: port.ohm,
        hops: [],
        leads: 0,
      },
    )
  }

  private mateOf(end: End): End | undefined {
    if (end.at === 'out') return this.outMates[end.port]
    if (end.at === 'in') return this.inMates[end.port]
    return this.instances[end.instance]?.exit[end.plug]
  }

  private join(from: End, to: End): void {
    this.setMate(from, 'exit', to)
    this.setMate(to, 'entry', from)
  }

  private part(from: End, to: End): void {
    this.setMate(from, 'exit', undefined)
    this.setMate(to, 'entry', undefined)
  }

  private setMate(end: End, side: 'entry' | 'exit', mate: End | undefined): void {
    if (end.at === 'out') this.outMates[end.port] = mate
    else if (end.at === 'in') this.inMates[end.port] = mate
    else (this.instances[end.instance] as Instance)[side][end.plug] = mate
  }

  /** Goes on from an open end: along what is plugged in there already, or by plugging something in. */
  private follow(index: number, end: End, open: Open): void {
    if (this.done) return
    const wire = this.wires[index] as WantedWire
    const mate = this.mateOf(end)
    if (mate) {
      if (mate.at === 'in') this.arrive(index, mate.port, open)
      else if (mate.at === 'piece') this.through(index, mate.instance, mate.plug, open)
      return
    }
    const target = this.into.ports[wire.toPort] as FacePort
    if (!this.inMates[wire.toPort] && this.pluggable(open, target)) {
      const to: End = { at: 'in', port: wire.toPort }
      this.join(end, to)
      this.arrive(index, wire.toPort, open)
      this.part(end, to)
    }
    if (this.tooFar(wire, target, open)) return
    this.intoLaidOut(index, end, open)
    if (this.instances.length < this.pieces) this.intoNew(index, end, open)
  }

  /** The target cannot be reached with the pieces that a link may still have. */
  private tooFar(wire: WantedWire, target: FacePort, open: Open): boolean {
    const left = this.distances.from(
      { ...open, circuit: wire.circuit },
      { port: target, contact: wire.toContact },
    )
    return open.hops.length + Math.max(left, 1) > LIMITS.piecesInLink
  }

  private pluggable(open: Open, target: FacePort): boolean {
    // Adapters alone do not span the distance between two chassis: a lead must be in it, or be captive.
    return (
      mates(open.connector, target.connector) && (open.mount === 'lead' || target.mount === 'lead')
    )
  }

  private intoLaidOut(index: number, end: End, open: Open): void {
    for (let i = 0; i < this.instances.length; i++) {
      const instance = this.instances[i] as Instance
      const tried = new Set<string>()
      for (let plug = 0; plug < instance.turned.entry.length; plug++) {
        if (instance.entry[plug] || !mates(instance.turned.entry[plug]!.connector, open.connector))
          continue
        const kind = JSON.stringify(
          instance.turned.passages
            .filter((p) => p.plug === plug)
            .map((p) => [
              p.contact,
              instance.turned.exit[p.exitPlug]!.connector,
              p.exitContact,
              instance.exit[p.exitPlug] ?? null,
            ]),
        )
        if (tried.has(kind)) continue
        tried.add(kind)
        const to: End = { at: 'piece', instance: i, plug }
        this.join(end, to)
        this.through(index, i, plug, open)
        this.part(end, to)
      }
    }
  }

  private intoNew(index: number, end: End, open: Open): void {
    for (const { turned, plug } of this.drawer.onto(open.connector)) {
      const lead = this.drawer.pieces[turned.piece]?.piece.kind === 'lead' ? 1 : 0
      if (open.leads + lead > LIMITS.leadsInLink || this.usedUp(turned.piece)) continue
      const instance = this.instances.length
      if (!this.leadsOn(index, turned, plug, open)) continue
      this.instances.push({ turned, entry: [], exit: [] })
      const to: End = { at: 'piece', instance, plug }
      this.join(end, to)
      this.through(index, instance, plug, open)
      this.part(end, to)
      this.instances.pop()
    }
  }

  /** Some wire of the piece brings the signal nearer within what is left. */
  private leadsOn(index: number, turned: Turned, plug: number, open: Open): boolean {
    const wire = this.wires[index] as WantedWire
    const target = this.into.ports[wire.toPort] as FacePort
    return turned.passages.some((p) => {
      if (p.plug !== plug || !enters(p, open.contact)) return false
      const { connector } = turned.exit[p.exitPlug]!
      const left = this.distances.from(
        { connector, contact: p.exitContact ?? open.contact, circuit: wire.circuit },
        { port: target, contact: wire.toContact },
      )
      return open.hops.length + 1 + left <= LIMITS.piecesInLink
    })
  }

  private usedUp(piece: number): boolean {
    const used = this.instances.filter((i) => i.turned.piece === piece).length
    return used >= (this.drawer.pieces[piece]?.stock ?? 0)
  }

  private through(index: number, at: number, plug: number, open: Open): void {
    const { turned } = this.instances[at] as Instance
    const after = this.insidePiece(index, at, plug, open)
    if (!after) return
    for (const passage of turned.passages) {
      if (passage.plug !== plug || !enters(passage, open.contact)) continue
      if (this.taken(index, at, passage, open.hops)) continue
      this.follow(
        index,
        { at: 'piece', instance: at, plug: passage.exitPlug },
        {
          ...after,
          connector: turned.exit[passage.exitPlug]!.connector,
          contact: passage.exitContact ?? open.contact,
          hops: [...open.hops, { instance: at, inPlug: plug, outPlug: passage.exitPlug }],
        },
      )
    }
  }

  /** What comes of a wire by going into a piece; null where the piece is not made for it. */
  private insidePiece(
    index: number,
    at: number,
    plug: number,
    open: Open,
  ): Pick<Open, 'mount' | 'ohm' | 'leads'> | null {
    const { turned } = this.instances[at] as Instance
    const { circuit } = this.wires[index] as WantedWire
    const piece = this.drawer.pieces[turned.piece]?.piece
    if (!piece || !meantFor(piece.meantFor, circuit)) return null
    if (open.hops.length >= LIMITS.piecesInLink || open.hops.some((h) => h.instance === at))
      return null
    const leads = open.leads + (piece.kind === 'lead' ? 1 : 0)
    const ohm = this.ohmAfter(turned, plug, open.ohm, circuit)
    if (leads > LIMITS.leadsInLink || ohm === null) return null
    return { mount: leads > 0 ? 'lead' : open.mount, ohm, leads }
  }

  /** Two wires never share a way through a piece, nor a contact of its exit unless it is made to mix them. */
  private taken(index: number, at: number, passage: Passage, path: readonly Hop[]): boolean {
    const wire = this.wires[index] as WantedWire
    const mixes = this.mixes(at) && isSoundCircuit(wire.circuit)
    return this.hops.slice(0, index).some((hops, other) =>
      hops.some((hop) => {
        if (hop.instance !== at || hop.outPlug !== passage.exitPlug) return false
        if (this.mixedBefore(hops, at, path)) return false
        return (passage.exitContact === 'pin' || this.sameEnd(wire, other)) && !mixes
      }),
    )
  }

  private sameEnd(wire: WantedWire, other: number): boolean {
    const { toPort, toContact } = this.wires[other] as WantedWire
    return toPort === wire.toPort && toContact === wire.toContact
  }

  private mixes(instance: number): boolean {
    return this.drawer.pieces[this.instances[instance]!.turned.piece]?.piece.mixes === true
  }

  /** Both wires came out of one mixing piece, and have been one ever since. */
  private mixedBefore(other: readonly Hop[], at: number, path: readonly Hop[]): boolean {
    return path.some(
      (mine) =>
        mine.instance !== at &&
        this.mixes(mine.instance) &&
        other.some((o) => o.instance === mine.instance && o.outPlug === mine.outPlug),
    )
  }

  private ohmAfter(turned: Turned, plug: number, ohm: number, circuit: Circuit): number | null {
    if (circuit !== 'rf') return ohm
    if (turned.ohm) return turned.ohm[0] === ohm ? turned.ohm[1] : null
    const loose = ['screws', 'spades', 'bare'].includes(turned.entry[plug]!.connector)
    return loose && ohm !== 300 ? null : ohm
  }

  private arrive(index: number, port: number, open: Open): void {
    const wire = this.wires[index] as WantedWire
    if (port !== wire.toPort || (open.contact !== null && open.contact !== wire.toContact)) return
    if (wire.circuit === 'rf' && open.ohm !== this.into.ports[port]?.ohm) return
    this.hops[index] = open.hops
    this.wire(index + 1)
    this.hops.length = index
  }
}

/** A wire on a contact may go in by a passage. */
export const enters = (passage: Passage, contact: string | null): boolean =>
  passage.contact === null || contact === null || passage.contact === contact
