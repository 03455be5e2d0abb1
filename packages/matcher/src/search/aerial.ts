import {
  jackOf,
  together,
  type Condition,
  type DeviceModel,
  type Key,
  type ModelFunction,
} from '@coaxwain/models'
import type { OffAir } from '@coaxwain/shelf'
import { channelsIn, findChannel, leastMargin, type Occupant } from '@coaxwain/signal'
import type { FaceTable, Placed } from '../compile/face'
import type { CarrierSet } from '../compile/signal'
import { priceOf } from '../compile/variant'
import { bothLeans, offersOf } from '../compile/leans'
import { leastDoubt, type Way } from '../compile/way'
import type { JoinTable } from '../join/join'
import { noWorseCost, type AerialRoute, type AerialUse, type Label } from './label'
import { PICTURE } from '../join/join'
import { scarceIn } from './sound-route'

/**
 * What may reach an aerial terminal at most: 0.346 sqrt(75) microvolts, 47 CFR 15.115(c)(1)(ii),
 * taken as the target everywhere.
 */
export const AERIAL_LIMIT_DBMV = -50.47

const MOST_BOXES = 2

const noWorse = (a: AerialRoute, b: AerialRoute): boolean =>
  noWorseCost(a, b) && a.reverseDb >= b.reverseDb && (!a.reverseUnknown || b.reverseUnknown)

/** Isolation from one port to another on a way that is not meant; null where it is not recorded. */
export function isolationDb(device: DeviceModel, from: Key, to: Key): number | null {
  return device.leaks.find((l) => l.from === from && l.to === to)?.db ?? null
}

const portsOf = (device: DeviceModel, jack: Key): Key[] =>
  jackOf(device, jack).contacts.map((c) => c.port)

function worstIsolation(device: DeviceModel, from: Key, to: Key): number | null {
  const pairs = portsOf(device, from).flatMap((a) =>
    portsOf(device, to).map((b) => isolationDb(device, a, b)),
  )
  return pairs.reduce<number | null>(
    (worst, db) => (worst === null || db === null ? null : Math.min(worst, db)),
    Infinity,
  )
}

const passesRf = (way: Way): boolean =>
  way.in !== null &&
  way.out !== null &&
  way.into?.face.form === 'rf' &&
  way.from?.face.form === 'rf' &&
  way.fn.tunedBy === undefined &&
  way.out.rf === undefined &&
  way.soundFrom === 'picture'

/** An RF input at which an aerial may join a chain. */
interface Joint {
  readonly way: Way
  readonly fn: ModelFunction
  readonly jack: Key
  readonly stand: Condition
  /** Level of the carrier that comes into the unit; null where none does. */
  readonly arrives: number | null
  /** The aerial goes out by the same lead as the carrier, and is not received here. */
  readonly meets: boolean
}

const freeRfInputs = (device: DeviceModel, fn: ModelFunction, taken: readonly Key[]): Key[] =>
  [...fn.needs, ...(fn.oneOf ?? [])].filter(
    (key) =>
      device.jacks.find((j) => j.key === key)?.form === 'rf' &&
      !portsOf(device, key).some((p) => taken.includes(p)),
  )

/** The way with everything that the aerial leans on in the same unit. */
function alsoFed({ way, fn, jack }: Joint): Way {
  const contacts = portsOf(way.variant.device, jack).map((port) => ({
    jack,
    port,
  }))
  const leans = bothLeans(way.leans, { contacts, functions: [fn.key] })
  return { ...way, leans, offers: offersOf(way.variant, leans) }
}

/** A carrier in the unit: the jack where it goes in or comes out, and its level there. */
function carrierAt({ way, arrives }: Joint): { jack: Key; levelDbmv: number } | null {
  const own = way.out?.rf?.[0]
  if (way.out && own) return { jack: way.out.jack, levelDbmv: own.levelDbmv }
  return way.in === null || arrives === null ? null : { jack: way.in, levelDbmv: arrives }
}

const straightFrom = (way: Way): AerialRoute => ({
  ways: [way],
  joins: [],
  boxes: 0,
  pieces: 0,
  doubt: leastDoubt(way),
  bought: 0,
  reverseDb: 0,
  reverseUnknown: false,
})

const sumOf = (r: AerialRoute): number => r.boxes + r.pieces + r.doubt + r.bought

/** None is beaten by one that comes after it. */
const cheapFirst = (a: AerialRoute, b: AerialRoute): number =>
  sumOf(a) - sumOf(b) ||
  b.reverseDb - a.reverseDb ||
  Number(a.reverseUnknown) - Number(b.reverseUnknown)

/** Of routes that leave by equal faces the best, so that one of them does without whichever box comes next. */
function bestOut(routes: readonly AerialRoute[]): AerialRoute[] {
  const byFace = new Map<number, AerialRoute[]>()
  for (const route of [...routes].sort(cheapFirst)) {
    const face = route.ways.at(-1)?.from?.face.id ?? -1
    const kept = byFace.get(face) ?? []
    byFace.set(face, kept)
    const better = kept.filter((k) => noWorse(k, route))
    const inAll = better[0]?.ways
      .slice(1)
      .filter((w) => better.every((k) => k.ways.some((x) => x.variant === w.variant)))
    if (inAll?.length !== 0) kept.push(route)
  }
  return [...byFace.values()].flat()
}

/** No worse, and nobody can tell in which of two ways the aerial goes on from there. */
function isBetter(a: AerialUse, b: AerialUse, isFirst: boolean): boolean {
  if (a === b || !noWorseCost(a, b) || (!isFirst && noWorseCost(b, a))) return false
  const tuned = (use: AerialUse): boolean => use.fn.tunedBy !== undefined
  return tuned(a) === tuned(b) && a.together === b.together && sameOffers(a.at, b.at)
}

const sameOffers = ({ offers: a }: Way, { offers: b }: Way): boolean =>
  a.length === b.length && a.every((o, i) => o.unit === b[i]?.unit && o.doubt === b[i]?.doubt)

/** What of that gets up to the aerial terminal; null where it might be too much and nobody knows. */
function radiated(joint: Joint, route: AerialRoute): number | null {
  const carrier = carrierAt(joint)
  if (!carrier) return -Infinity
  const isolation = worstIsolation(joint.way.variant.device, carrier.jack, joint.jack)
  const atMost = carrier.levelDbmv - (isolation ?? 0) - route.reverseDb
  const unknown = isolation === null || route.reverseUnknown
  return unknown && atMost > AERIAL_LIMIT_DBMV ? null : atMost
}

/** Finds where an aerial can join a chain, what that costs, and whether anything gets up to the aerial. */
export class Aerials {
  private outs: readonly AerialRoute[] | null = null
  private readonly known = new Map<number, readonly AerialRoute[]>()
  private readonly joints = new Map<string, readonly AerialUse[]>()
  private readonly stations: readonly Occupant[]

  constructor(
    private readonly place: {
      readonly aerials: readonly Way[]
      readonly boxes: readonly Way[]
      readonly joins: JoinTable
      readonly faces: FaceTable
      readonly offAir: readonly OffAir[]
      /** Sorts of units of which a chain may want more than there are. */
      readonly scarceUnits: ReadonlySet<string>
    },
  ) {
    this.stations = place.offAir.flatMap((s) => stationOf(s) ?? [])
  }

  /**
   * Finds in slices how each aerial can be had, straight or through a few boxes. Of routes that end alike only
   * the best are kept, so that the work grows with the boxes and not with their combinations.
   */
  *prepare(): Generator<void> {
    if (this.outs) return
    const boxes = this.place.boxes.filter(passesRf)
    let layer = bestOut(this.place.aerials.map(straightFrom))
    const outs = [...layer]
    for (let n = 0; n < MOST_BOXES; n++) {
      const next: AerialRoute[] = []
      for (const way of boxes) {
        next.push(...layer.flatMap((route) => this.through(route, way)))
        yield
      }
      layer = bestOut(next)
      outs.push(...layer)
    }
    this.outs = outs
  }

  private allOuts(): readonly AerialRoute[] {
    if (!this.outs) for (const _ of this.prepare());
    return this.outs ?? []
  }

  private through(route: AerialRoute, way: Way): AerialRoute[] {
    const last = route.ways.at(-1)!
    if (!last.from || !way.into || route.ways.some((w) => w.variant === way.variant)) return []
    const { device } = way.variant
    const joins = this.place.joins.between(last.from.face, way.into.face, PICTURE)
    if (joins.length === 0) return []
    const back = worstIsolation(device, way.out!.jack, way.in!)
    return joins.map((join) => ({
      ways: [...route.ways, way],
      joins: [...route.joins, join],
      boxes: route.boxes + (way.variant.powered ? 1 : 0),
      pieces: route.pieces + join.pieces + (way.variant.powered ? 0 : 1),
      doubt: route.doubt + leastDoubt(way) + (join.dcUnknown ? 1 : 0),
      bought: route.bought + join.bought + priceOf(way.variant),
      reverseDb: route.reverseDb + (back ?? 0),
      reverseUnknown: route.reverseUnknown || back === null,
    }))
  }

  /** Routes to an input, none of them beaten. */
  private to(into: Placed): readonly AerialRoute[] {
    const known = this.known.get(into.face.id)
    if (known) return known
    const kept: AerialRoute[] = []
    for (const route of this.allOuts()) {
      const from = route.ways.at(-1)!.from
      if (!from) continue
      for (const join of this.place.joins.between(from.face, into.face, PICTURE)) {
        const whole: AerialRoute = {
          ...route,
          joins: [...route.joins, join],
          pieces: route.pieces + join.pieces,
          doubt: route.doubt + (join.dcUnknown ? 1 : 0),
          bought: route.bought + join.bought,
        }
        if (!kept.some((k) => noWorse(k, whole) && this.takesNoMore(k, whole))) kept.push(whole)
      }
    }
    this.known.set(into.face.id, kept)
    return kept
  }

  /** Takes no scarce unit or piece that the other does without. */
  private takesNoMore(a: AerialRoute, b: AerialRoute): boolean {
    const { scarceUnits } = this.place
    const boxes = a.ways.map((w) => w.variant).filter((v) => scarceUnits.has(v.id))
    const used = scarceIn(b)
    return (
      boxes.every((v) => b.ways.some((w) => w.variant === v)) &&
      [...scarceIn(a)].every(([piece, n]) => n <= (used.get(piece) ?? 0))
    )
  }

  /** The kinds of station that are received here; both when nobody has said. */
  private received(fn: ModelFunction): boolean {
    const wanted = new Set(this.place.offAir.map((s) => s.kind))
    const analogue = fn.accepts.some((r) => (r.systems ?? []).length > 0)
    const digital = fn.accepts.some((r) => (r.digital ?? []).length > 0)
    if (wanted.size === 0) return analogue || digital
    return (wanted.has('analogue') && analogue) || (wanted.has('digital') && digital)
  }

  /** An RF input of a unit that receives what is on the air here. */
  canWatch(fn: ModelFunction): boolean {
    return fn.tunedBy !== undefined && this.received(fn)
  }

  /** Every way in which an aerial can join at a unit, of those that lead to the same the best. */
  joining(before: Label | null, way: Way): readonly AerialUse[] {
    const arrives = before !== null && way.into?.face.form === 'rf' ? levelOf(before) : null
    const key = `${way.id} ${arrives}`
    const known = this.joints.get(key)
    if (known) return known
    const all = [...this.atBox(way, arrives), ...this.atTuner(way, arrives)]
    const kept = all.filter(
      (use, i) =>
        !all.some((u, j) => isBetter(u, use, j < i) && this.takesNoMore(u.route, use.route)),
    )
    this.joints.set(key, kept)
    return kept
  }

  /** Joins at a tuner of the unit itself: a converter box, or another input of the display. */
  private atTuner(way: Way, arrives: number | null): AerialUse[] {
    const { device } = way.variant
    const taken = [...(way.into?.ports ?? []), ...(way.from?.ports ?? [])]
    return device.functions
      .filter((fn) => this.canWatch(fn))
      .flatMap((fn) =>
        freeRfInputs(device, fn, taken).flatMap((jack) =>
          this.uses({
            way,
            fn,
            jack,
            stand: fn.while ?? [],
            arrives,
            meets: false,
          }),
        ),
      )
  }

  /** Joins on the way out of a unit: by another RF input that leads to the same output. */
  private atBox(way: Way, arrives: number | null): AerialUse[] {
    if (way.out === null || way.from?.face.form !== 'rf') return []
    const { device } = way.variant
    const taken = way.in === null ? [] : portsOf(device, way.in)
    return device.functions
      .filter((fn) => fn.tunedBy === undefined)
      .flatMap((fn) => {
        const give = fn.gives.find((g) => g.jack === way.out?.jack && g.rf === undefined)
        const stand = give ? together(fn.while, give.while) : null
        if (!stand) return []
        return freeRfInputs(device, fn, taken).flatMap((jack) =>
          this.uses({ way, fn, jack, stand, arrives, meets: true }),
        )
      })
  }

  private uses(joint: Joint): AerialUse[] {
    const { way, fn, jack, stand } = joint
    const { device } = way.variant
    const picture = jackOf(device, jack)
    const into = this.place.faces.place(device, {
      picture,
      sound: null,
      volts: [],
    })
    const at = alsoFed(joint)
    if (at.offers.length === 0) return []
    return this.to(into).flatMap((route): AerialUse[] => {
      const radiates = radiated(joint, route)
      if (radiates !== null && radiates > AERIAL_LIMIT_DBMV) return []
      return [
        {
          route,
          at,
          variant: way.variant,
          fn,
          in: jack,
          into,
          stand,
          together: joint.meets && together(stand, way.stand) !== null,
          radiatesDbmv: radiates,
          boxes: route.boxes,
          pieces: route.pieces,
          doubt: route.doubt + (radiates === null ? 1 : 0) + leastDoubt(at) - leastDoubt(way),
          bought: route.bought,
        },
      ]
    })
  }

  /** The carriers that can lie on one lead with the stations without harm to either. */
  besideStations(carrier: CarrierSet, levelDbmv: number): CarrierSet | null {
    const kept = carrier.names
      .map((name, i) => ({ name, mhz: carrier.visionMhz[i] as number }))
      .filter(({ name }) => {
        const own = occupantOf(carrier, name, levelDbmv)
        return own !== null && this.stations.every((s) => leastMargin(s, own) >= 0)
      })
    if (kept.length === 0) return null
    return {
      ...carrier,
      names: kept.map((k) => k.name),
      visionMhz: kept.map((k) => k.mhz),
    }
  }
}

/** Level of a station that nobody has measured (a usual figure; common practice, no source). */
const USUAL_STATION_DBMV = 6

function stationOf(station: OffAir): Occupant | null {
  const channel = findChannel(station.plan, station.channel)
  if (!channel) return null
  return {
    lowerMhz: channel.lowerMhz,
    upperMhz: channel.upperMhz,
    visionMhz: station.kind === 'analogue' ? channel.visionMhz : null,
    system: station.kind === 'analogue' && channel.system !== 'DVB-T' ? channel.system : null,
    sideband: 'vestigial',
    levelDbmv: station.levelDbmv ?? USUAL_STATION_DBMV,
  }
}

export function occupantOf(carrier: CarrierSet, name: string, levelDbmv: number): Occupant | null {
  const channel = channelsIn(carrier.part).find((c) => c.name === name)
  if (!channel) return null
  return {
    lowerMhz: channel.lowerMhz,
    upperMhz: channel.upperMhz,
    visionMhz: channel.visionMhz,
    system: carrier.system,
    sideband: carrier.sideband,
    levelDbmv,
  }
}

/** Level of the carrier as it leaves the last unit of a chain: as made, with gains and losses since. */
export function levelOf(label: Label): number | null {
  let gain = 0
  for (let at: Label | null = label; at; at = at.prev) {
    const own = at.way.out?.rf?.[0]
    if (own) return own.levelDbmv + gain
    gain += at.way.fn.gainDb ?? 0
  }
  return null
}
