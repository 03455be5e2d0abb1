import { LIMITS } from '@coaxwain/shelf'
import type { SwitchVolt } from '@coaxwain/signal'
import type { Face, FacePort } from '../compile/face'
import { Distances } from './distance'
import type { Drawer } from './drawer'
import { Router, usageOf, type Job, type Routing, type Supply, type WantedWire } from './route'
import {
  lumaOnly,
  mismatched,
  soundWires,
  wholePicture,
  type PictureMeeting,
  type SoundMeeting,
} from './wanted'

/** Everything that is plugged between two faces, and what comes across. */
export interface Join {
  /** Tells the joins of one table apart. */
  readonly id: number
  readonly out: Face
  readonly into: Face
  readonly wires: readonly WantedWire[]
  readonly routing: Routing
  readonly pieces: number
  /** How many of them have to be bought. */
  readonly bought: number
  /** Pieces of scarce sorts that it takes, by sort. */
  readonly scarce: ReadonlyMap<number, number>
  readonly picture: PictureMeeting | null
  readonly sound: SoundMeeting | null
  readonly volts: readonly SwitchVolt[]
  /** Direct current comes up the cable, and nobody knows whether the input stands it. */
  readonly dcUnknown: boolean
  /**
   * For a sound that is led over the pieces of a picture: that picture as it is then laid, and the unit that
   * the two have in common. Its pieces are counted there, and here only what it takes beyond the picture.
   */
  readonly along: Along | null
}

/** A picture whose pieces a sound is led over. */
export interface Along {
  readonly join: Join
  /** Both leave this unit, or both go into it. */
  readonly shared: 'from' | 'to'
}

export interface Wanted {
  readonly picture: boolean
  readonly sound: boolean
}

export const PICTURE: Wanted = { picture: true, sound: false }
export const BOTH: Wanted = { picture: true, sound: true }
export const SOUND: Wanted = { picture: false, sound: true }

/** Twice the pieces of one link, for pictures and sounds that need several leads. */
const MOST_PIECES = 2 * LIMITS.piecesInLink

/** Ways that need so many pieces more than the shortest are not sought in a well-filled drawer. */
const SPARE_PIECES = 2

/** Wires that are wanted, and what they amount to. */
export interface Wish extends Job {
  readonly picture: PictureMeeting | null
  readonly sound: SoundMeeting | null
  /** With more pieces it is not worth knowing. */
  readonly most?: number
}

const supplyOf = (drawer: Drawer): Supply => ({
  drawer,
  distances: new Distances(drawer),
  single: new Map(),
})

/** Works out once per pair of faces what can be plugged between them. */
export class JoinTable {
  private readonly known = new Map<string, readonly Join[]>()
  private readonly all: Supply
  private readonly owned: Supply
  private judged = 0
  /** True once a longer way round a scarce piece was not sought. */
  capped = false

  /** `scarce`: sorts of pieces of which there may be too few; ways without them are kept apart. */
  constructor(
    readonly drawer: Drawer,
    private readonly scarce: ReadonlySet<number>,
  ) {
    this.all = supplyOf(drawer)
    this.owned = drawer.owned === drawer ? this.all : supplyOf(drawer.owned)
  }

  get hasScarce(): boolean {
    return this.scarce.size > 0
  }

  /** Every way worth knowing, the fewest pieces first; none when the two cannot be linked. */
  between(out: Face, into: Face, wanted: Wanted): readonly Join[] {
    const key = `${out.id}>${into.id}:${wanted.picture ? 'p' : ''}${wanted.sound ? 's' : ''}`
    const known = this.known.get(key)
    if (known) return known
    const made = this.work(out, into, wanted)
    this.known.set(key, made)
    return made
  }

  /** Leads at hand join the two, contact to contact, although the circuits are not the same. */
  wrongWires(out: Face, into: Face): boolean {
    const wires = mismatched(out, into)
    return (
      wires !== null &&
      this.layFrom(this.owned, { out, into, wires, picture: 'whole', sound: null }).length > 0
    )
  }

  private work(out: Face, into: Face, wanted: Wanted): readonly Join[] {
    const sound = wanted.sound ? soundWires(out, into) : null
    if (wanted.sound && !sound) return []
    const heard = { wires: sound?.wires ?? [], sound: sound?.meeting ?? null }
    if (!wanted.picture) return this.lay({ out, into, ...heard, picture: null })
    const pictures: readonly (readonly [PictureMeeting, WantedWire[] | null])[] = [
      ['whole', wholePicture(out, into)],
      ['luma-only', lumaOnly(out, into)],
    ]
    return pictures.flatMap(([picture, wires]) =>
      wires
        ? this.lay({ out, into, wires: [...wires, ...heard.wires], picture, sound: heard.sound })
        : [],
    )
  }

  /** The same could be laid with as many pieces so that one of some sorts is among them. */
  mayTake({ out, into, wires, pieces }: Join, sorts: readonly number[]): boolean {
    let taken = false
    new Router(this.all, { out, into, wires }, pieces, ({ instances }) => {
      taken = instances.some((i) => sorts.includes(i.piece))
      return taken
    }).run()
    return taken
  }

  /** With what is there if that does it; else with something bought. */
  lay(wish: Wish): Join[] {
    const own = this.layFrom(this.owned, wish)
    const enough = this.owned === this.all || own.some((j) => j.scarce.size === 0)
    return enough ? own : [...own, ...this.layFrom(this.all, wish).filter((j) => j.bought > 0)]
  }

  private layFrom(supply: Supply, wish: Wish): Join[] {
    const folds = wish.sound === 'fold'
    if (folds && !supply.drawer.mixers) return []
    const each = wish.wires.map((w) => this.leastFor(supply, wish, [w]))
    const alone = Math.max(...each)
    const least = alone === Infinity ? alone : Math.max(alone, this.leastInPairs(supply, wish))
    if (least === Infinity) return []
    // Every wire by pieces of its own is the most that can be needed; a mixing piece is one more.
    const sum = each.reduce((all, n) => all + n, folds ? 1 : 0)
    const most = Math.max(least, Math.min(MOST_PIECES, sum))
    let kept: Join[] = []
    const last = (): number => Math.min(most + this.slack(kept), wish.most ?? Infinity)
    for (let pieces = least; pieces <= last(); pieces++) {
      if (this.isEnough(kept, pieces, supply)) break
      new Router(supply, wish, pieces, (routing) => {
        const join = this.judge(wish, routing)
        if (join && !kept.some((k) => noWorse(k, join))) {
          kept = [...kept.filter((k) => !noWorse(join, k)), join]
        }
        return settled(kept, wish.out)
      }).run()
      if (settled(kept, wish.out)) break
    }
    return kept
  }

  /** Longer ways are not sought in a well-filled drawer, nor in a shop. */
  private isEnough([first]: readonly Join[], pieces: number, supply: Supply): boolean {
    const filled = supply.drawer.total > MOST_PIECES
    if (!first) return false
    if (supply !== this.owned) return true
    if (pieces <= first.pieces + SPARE_PIECES) return false
    this.capped ||= this.scarce.size > 0 && filled
    return filled
  }

  /** Round a scarce piece or a missing voltage it may take longer. */
  private slack(kept: readonly Join[]): number {
    return kept.length > 0 || this.scarce.size > 0 ? SPARE_PIECES : 0
  }

  /**
   * The fewest pieces by which any two of many wires can come about together. Wires that are in each other's way
   * show it in pairs, and far sooner than in all the ways to lay the rest.
   */
  private leastInPairs(supply: Supply, wish: Wish): number {
    const { wires } = wish
    if (wires.length < 3) return 0
    const pairs = wires.flatMap((a, i) => wires.slice(i + 1).map((b) => [a, b]))
    let least = 0
    for (const pair of pairs) {
      least = Math.max(least, this.leastFor(supply, wish, pair))
      if (least === Infinity) break
    }
    return least
  }

  /** The fewest pieces by which one wire, or a few, can come about with nothing beside them. */
  private leastFor(supply: Supply, { out, into }: Wish, wires: readonly WantedWire[]): number {
    const key = JSON.stringify(
      wires.map((w) => [
        ...[out.ports[w.fromPort], into.ports[w.toPort]],
        ...[w.circuit, w.fromContact, w.toContact],
        ...[w.fromPort === wires[0]?.fromPort, w.toPort === wires[0]?.toPort],
      ]),
    )
    const known = supply.single.get(key)
    if (known !== undefined) return known
    let least = Infinity
    const most = LIMITS.piecesInLink * wires.length
    for (let pieces = 0; pieces <= most && least === Infinity; pieces++) {
      new Router(supply, { out, into, wires }, pieces, () => {
        least = pieces
        return true
      }).run()
    }
    supply.single.set(key, least)
    return least
  }

  /** What comes of wires that are laid so; null where it would harm. */
  judge({ out, into, wires, picture, sound }: Wish, routing: Routing): Join | null {
    const dc = this.directCurrent(out, into, wires, routing)
    if (dc === 'harm') return null
    const usage = usageOf(routing)
    return {
      id: this.judged++,
      out,
      into,
      wires,
      routing,
      pieces: routing.instances.length,
      bought: routing.instances.filter((i) => this.drawer.pieces[i.piece]?.bought).length,
      scarce: new Map([...usage].filter(([piece]) => this.scarce.has(piece))),
      picture,
      sound,
      volts: this.volts(out, routing),
      dcUnknown: dc === 'unknown',
      along: null,
    }
  }

  private volts(out: Face, routing: Routing): readonly SwitchVolt[] {
    const first = (routing.hops[0] ?? []).map((hop) => this.pieceAt(routing, hop.instance))
    const supplied = first.flatMap((p) => p?.piece.suppliesVolts ?? [])
    const passed = first.every((p) => p?.passesVolts) ? out.volts : []
    return [...new Set([...passed, ...supplied])].sort()
  }

  private pieceAt(routing: Routing, instance: number) {
    const turned = routing.instances[instance]
    return turned ? this.drawer.pieces[turned.piece] : undefined
  }

  private directCurrent(
    out: Face,
    into: Face,
    wires: readonly WantedWire[],
    routing: Routing,
  ): 'fine' | 'unknown' | 'harm' {
    let worst: 'fine' | 'unknown' = 'fine'
    for (const [i, wire] of wires.entries()) {
      const blocked = (routing.hops[i] ?? []).some(
        (hop) => this.pieceAt(routing, hop.instance)?.piece.blocksDc,
      )
      const ends = [
        out.ports[wire.fromPort] as FacePort,
        into.ports[wire.toPort] as FacePort,
      ] as const
      // A supply goes up the cable against the signal as well as with it.
      const met = [supplied(ends[0], ends[1], blocked), supplied(ends[1], ends[0], blocked)]
      if (met.includes('harm')) return 'harm'
      if (met.includes('unknown')) worst = 'unknown'
    }
    return worst
  }
}

/** What the supply of one end of a wire, or its absence, does at the other. */
function supplied(from: FacePort, to: FacePort, blocked: boolean): 'fine' | 'unknown' | 'harm' {
  const arrives = from.suppliesDc && !blocked
  if (to.needsDc) return arrives ? 'fine' : 'harm'
  if (!arrives || to.standsDc === 'yes') return 'fine'
  return to.standsDc === 'no' ? 'harm' : 'unknown'
}

const noWorse = (a: Join, b: Join): boolean =>
  a.pieces <= b.pieces &&
  a.bought <= b.bought &&
  b.volts.every((v) => a.volts.includes(v)) &&
  (!a.dcUnknown || b.dcUnknown) &&
  [...a.scarce].every(([piece, n]) => n <= (b.scarce.get(piece) ?? 0))

/** Nothing better can come: no scarce piece used, all voltages across, no doubt. */
const settled = (kept: readonly Join[], out: Face): boolean =>
  kept.some(
    (j) =>
      j.bought === 0 &&
      j.scarce.size === 0 &&
      !j.dcUnknown &&
      out.volts.every((v) => j.volts.includes(v)),
  )
