import { LIMITS } from '@coaxwain/shelf'
import { isSoundCircuit, type Circuit, type Connector, type SwitchVolt } from '@coaxwain/signal'
import type { Face } from '../compile/face'
import type { Drawer, DrawerPiece } from './drawer'
import type { Join, JoinTable } from './join'
import { enters, type Hop, type WantedWire } from './route'
import { soundWires, type WantedSound } from './wanted'

/** The unit that a picture and a sound on one lead have in common: both leave it, or both go into it. */
export type Shared = 'from' | 'to'

/** A sound that is to go over the pieces of a picture. */
export interface Led {
  readonly out: Face
  readonly into: Face
  readonly shared: Shared
  /** With more pieces in all it is not worth knowing. */
  readonly most: number
  /** Voltages that are to come along with the picture. */
  readonly volts: readonly SwitchVolt[]
}

/** A piece with several plugs at an end, which may go to several units. */
const isForked = ({ piece }: DrawerPiece): boolean =>
  (piece.a.length > 1 || piece.b.length > 1) && piece.wires.length > 1 && servesBoth(piece.meantFor)

const servesBoth = (meant: readonly Circuit[] | undefined): boolean =>
  !meant || (meant.some(isSoundCircuit) && !meant.every(isSoundCircuit))

/**
 * Leads of which some cores serve a picture and others a sound that goes to another unit, or comes from
 * another: the tails of a breakout lead, or the cores of a lead with several plugs at either end.
 */
export class Forks {
  private readonly known = new Map<string, readonly Join[]>()
  private readonly parting = new Map<number, boolean>()
  private readonly sharing = new Map<number, boolean>()
  private readonly forked: readonly number[]

  constructor(private readonly joins: JoinTable) {
    this.forked = joins.drawer.pieces.flatMap((p, i) => (isForked(p) ? [i] : []))
  }

  /** Some piece at hand has several plugs at an end. */
  get any(): boolean {
    return this.forked.length > 0
  }

  /** Ways for a sound over the pieces that a picture comes by. */
  along(picture: Join, led: Led): readonly Join[] {
    const { out, into, shared, most, volts } = led
    const key = `${picture.id} ${out.id} ${into.id} ${shared} ${most} ${volts.join()}`
    const known = this.known.get(key)
    if (known) return known
    const heard = soundWires(out, into)
    const may = heard && picture.pieces > 0 && this.mayServe([...picture.wires, ...heard.wires])
    const made = may ? this.lay(picture, { ...led, ...heard }) : []
    this.known.set(key, made)
    return made
  }

  private lay(picture: Join, led: Led & WantedSound): Join[] {
    const { out, into, wires, meeting: sound, shared, most, volts } = led
    const [outPorts, intoPorts] = [picture.out.ports, picture.into.ports]
    const besides = wires.map((w) =>
      shared === 'from'
        ? { ...w, toPort: w.toPort + intoPorts.length }
        : { ...w, fromPort: w.fromPort + outPorts.length },
    )
    const from = shared === 'from' ? out : { ...picture.out, ports: [...outPorts, ...out.ports] }
    const both = {
      out: { ...from, volts },
      into: shared === 'to' ? into : { ...picture.into, ports: [...intoPorts, ...into.ports] },
      wires: [...picture.wires, ...besides],
    }
    const count = picture.wires.length
    return this.joins.lay({ ...both, picture: null, sound, most }).flatMap(({ routing }) => {
      const { instances, hops } = routing
      const [shown, heard] = [hops.slice(0, count), hops.slice(count)]
      const join = this.joins.judge(picture, { instances, hops: shown })
      const wish = { out, into, wires, picture: null, sound }
      const all = this.joins.judge(wish, { instances, hops: heard })
      if (!join || !all || !meet(shown, heard) || join.dcUnknown !== picture.dcUnknown) return []
      const own = beyond(picture, all)
      return own ? [{ ...own, along: { join, shared } }] : []
    })
  }

  /** A lead with several plugs would do for a picture instead of what it comes by, with no piece more. */
  mayShare(picture: Join): boolean {
    const known = this.sharing.get(picture.id)
    if (known !== undefined) return known
    const made = picture.pieces > 0 && this.joins.mayTake(picture, this.forked)
    this.sharing.set(picture.id, made)
    return made
  }

  /** Some piece with several plugs suits a picture and a sound among the wires. */
  private mayServe(wires: readonly WantedWire[]): boolean {
    const { drawer } = this.joins
    return this.forked.some((p) => wires.filter((w) => drawer.suits(p, w.circuit)).length > 1)
  }

  /** Pieces at hand bring a picture and a sound that leave by one socket to plugs of their own. */
  part({ id, ports, picture, sound }: Face): boolean {
    const known = this.parting.get(id)
    if (known !== undefined) return known
    const shared = picture.flatMap((p) =>
      sound
        .filter((s) => s.port === p.port)
        .map((s): Socket => ({
          connector: ports[p.port]!.connector,
          contacts: [p.contact, s.contact],
        })),
    )
    const made = shared.some((socket) => isParted(this.joins.drawer, socket, LIMITS.piecesInLink))
    this.parting.set(id, made)
    return made
  }
}

const known = new WeakMap<JoinTable, Forks>()

/** What has been worked out beside the joins of a table, for any number of questions. */
export function forksOf(joins: JoinTable): Forks {
  const forks = known.get(joins) ?? new Forks(joins)
  known.set(joins, forks)
  return forks
}

/** Some piece carries both. */
function meet(shown: Routes, led: Routes): boolean {
  const used = new Set(shown.flat().map((hop) => hop.instance))
  return led.flat().some((hop) => used.has(hop.instance))
}

type Routes = readonly (readonly Hop[])[]

/** What a sound costs beside its picture; null where the two cost less in something than the picture alone. */
function beyond(picture: Join, all: Join): Join | null {
  const scarce = new Map(all.scarce)
  for (const [piece, n] of picture.scarce) scarce.set(piece, (scarce.get(piece) ?? 0) - n)
  const own = {
    ...all,
    volts: [],
    pieces: all.pieces - picture.pieces,
    bought: all.bought - picture.bought,
    scarce: new Map([...scarce].filter(([, n]) => n !== 0)),
  }
  return [own.pieces, own.bought, ...own.scarce.values()].every((n) => n >= 0) ? own : null
}

/** Contacts of one plug or socket that a picture and a sound come by. */
interface Socket {
  readonly connector: Connector
  readonly contacts: readonly [picture: string | null, sound: string | null]
}

function isParted(drawer: Drawer, { connector, contacts }: Socket, pieces: number): boolean {
  if (pieces === 0) return false
  return drawer.onto(connector).some(({ turned, plug }) => {
    const [shown, heard] = contacts.map((contact) =>
      turned.passages.filter((p) => p.plug === plug && enters(p, contact)),
    )
    return shown!.some((p) =>
      heard!.some((s) => {
        if (p.exitPlug !== s.exitPlug) return true
        const next = turned.exit[p.exitPlug]!.connector
        const on = [p.exitContact ?? contacts[0], s.exitContact ?? contacts[1]] as const
        return isParted(drawer, { connector: next, contacts: on }, pieces - 1)
      }),
    )
  })
}
