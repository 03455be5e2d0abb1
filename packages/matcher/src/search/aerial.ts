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
import type { CarrierSet, Sig, SigTable } from '../compile/sig'
import { priceOf, type Variant } from '../compile/variant'
import type { Way } from '../compile/way'
import type { Join, JoinTable } from '../join/join'
import { pathOf, type Cost, type Label } from './label'

/**
 * What may reach an aerial terminal at most: 0.346 sqrt(75) microvolts, 47 CFR 15.115(c)(1)(ii),
 * taken as the target everywhere.
 */
export const AERIAL_LIMIT_DBMV = -50.47

/** How a signal gets from an aerial to the place where it joins a chain. */
export interface AerialRoute extends Cost {
  /** The aerial, then boxes that pass it on. */
  readonly ways: readonly Way[]
  readonly joins: readonly Join[]
  /** Isolation backwards through the boxes in dB; null where nobody knows. */
  readonly reverseDb: number | null
}

/** The aerial as part of a chain: where it joins, and by what. */
export interface AerialUse extends Cost {
  readonly route: AerialRoute
  readonly at: Way
  readonly variant: Variant
  readonly fn: ModelFunction
  readonly in: Key
  readonly into: Placed
  readonly stand: Condition
  /** On the lead together with the modulated carrier, and not switched. */
  readonly together: boolean
  /** What reaches the aerial terminal, in dBmV; null where nobody knows. */
  readonly radiatesDbmv: number | null
}

const MOST_BOXES = 2

const PICTURE = { picture: true, sound: false }

const noWorse = (a: AerialRoute, b: AerialRoute): boolean =>
  a.boxes <= b.boxes &&
  a.pieces <= b.pieces &&
  a.doubt <= b.doubt &&
  a.bought <= b.bought &&
  (a.reverseDb ?? -1) >= (b.reverseDb ?? -1)

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

/** Finds where an aerial can join a chain, what that costs, and whether anything gets up to the aerial. */
export class Aerials {
  private readonly outs: AerialRoute[]
  private readonly known = new Map<number, readonly AerialRoute[]>()

  constructor(
    aerials: readonly Way[],
    boxes: readonly Way[],
    private readonly joins: JoinTable,
    private readonly faces: FaceTable,
    private readonly offAir: readonly OffAir[],
  ) {
    this.outs = this.reach(aerials, boxes.filter(passesRf))
  }

  get any(): boolean {
    return this.outs.length > 0
  }

  /** Every aerial, straight or through a few boxes, as it can be had. */
  private reach(aerials: readonly Way[], boxes: readonly Way[]): AerialRoute[] {
    let layer = aerials.map((way): AerialRoute => ({
      ways: [way],
      joins: [],
      boxes: 0,
      pieces: 0,
      doubt: way.offers[0]?.doubt ?? 0,
      bought: 0,
      reverseDb: 0,
    }))
    const all = [...layer]
    for (let n = 0; n < MOST_BOXES; n++) {
      layer = layer.flatMap((route) => boxes.flatMap((way) => this.through(route, way)))
      all.push(...layer)
    }
    return all
  }

  private through(route: AerialRoute, way: Way): AerialRoute[] {
    const last = route.ways.at(-1)!
    if (!last.from || !way.into || route.ways.some((w) => w.variant === way.variant)) return []
    const { device } = way.variant
    const back = worstIsolation(device, way.out!.jack, way.in!)
    return this.joins.between(last.from.face, way.into.face, PICTURE).map((join) => ({
      ways: [...route.ways, way],
      joins: [...route.joins, join],
      boxes: route.boxes + (way.variant.powered ? 1 : 0),
      pieces: route.pieces + join.pieces + (way.variant.powered ? 0 : 1),
      doubt: route.doubt + (way.offers[0]?.doubt ?? 0) + (join.dcUnknown ? 1 : 0),
      bought: route.bought + join.bought + priceOf(way.variant),
      reverseDb: route.reverseDb === null || back === null ? null : route.reverseDb + back,
    }))
  }

  /** Routes to an input, none of them beaten. */
  private to(into: Placed): readonly AerialRoute[] {
    const known = this.known.get(into.face.id)
    if (known) return known
    const kept: AerialRoute[] = []
    for (const route of this.outs) {
      const from = route.ways.at(-1)!.from
      if (!from) continue
      for (const join of this.joins.between(from.face, into.face, PICTURE)) {
        const whole: AerialRoute = {
          ...route,
          joins: [...route.joins, join],
          pieces: route.pieces + join.pieces,
          doubt: route.doubt + (join.dcUnknown ? 1 : 0),
          bought: route.bought + join.bought,
        }
        if (!kept.some((k) => noWorse(k, whole))) kept.push(whole)
      }
    }
    this.known.set(into.face.id, kept)
    return kept
  }

  /** The kinds of station that are received here; both when nobody has said. */
  private received(fn: ModelFunction): boolean {
    const wanted = new Set(this.offAir.map((s) => s.kind))
    const analogue = fn.accepts.some((r) => (r.systems ?? []).length > 0)
    const digital = fn.accepts.some((r) => (r.digital ?? []).length > 0)
    if (wanted.size === 0) return analogue || digital
    return (wanted.has('analogue') && analogue) || (wanted.has('digital') && digital)
  }

  /** An RF input of a unit that receives what is on the air here. */
  canWatch(fn: ModelFunction): boolean {
    return fn.tunedBy !== undefined && this.received(fn)
  }

  /** Joins at a tuner of the unit itself: a converter box, or another input of the display. */
  atTuner(way: Way, taken: readonly Key[]): AerialUse[] {
    const { device } = way.variant
    return device.functions
      .filter((fn) => this.canWatch(fn))
      .flatMap((fn) =>
        [...fn.needs, ...(fn.oneOf ?? [])].flatMap((key) => {
          const jack = device.jacks.find((j) => j.key === key)
          if (jack?.form !== 'rf' || portsOf(device, key).some((p) => taken.includes(p))) return []
          return this.uses(way, fn, key, fn.while ?? [], false, null)
        }),
      )
  }

  /** Joins on the way out of a unit: by another RF input that leads to the same output. */
  atBox(before: Label | null, way: Way): AerialUse[] {
    if (way.out === null || way.from?.face.form !== 'rf') return []
    const { device } = way.variant
    const taken = way.in === null ? [] : portsOf(device, way.in)
    return device.functions
      .filter((fn) => fn.tunedBy === undefined)
      .flatMap((fn) => {
        const give = fn.gives.find((g) => g.jack === way.out?.jack && g.rf === undefined)
        const own = give ? together(fn.while, give.while) : null
        if (!own) return []
        return [...fn.needs, ...(fn.oneOf ?? [])].flatMap((key) => {
          const jack = device.jacks.find((j) => j.key === key)
          if (jack?.form !== 'rf' || portsOf(device, key).some((p) => taken.includes(p))) return []
          const atOnce = together(own, way.stand) !== null
          return this.uses(way, fn, key, own, atOnce, { before, jack: key })
        })
      })
  }

  private uses(
    way: Way,
    fn: ModelFunction,
    key: Key,
    stand: Condition,
    atOnce: boolean,
    sender: { before: Label | null; jack: Key } | null,
  ): AerialUse[] {
    const { device } = way.variant
    const into = this.faces.place(device, { picture: jackOf(device, key), sound: null, volts: [] })
    return this.to(into).flatMap((route): AerialUse[] => {
      const radiates = sender ? this.radiated(way, sender, route) : -Infinity
      if (radiates !== null && radiates > AERIAL_LIMIT_DBMV) return []
      return [
        {
          route,
          at: way,
          variant: way.variant,
          fn,
          in: key,
          into,
          stand,
          together: atOnce,
          radiatesDbmv: radiates,
          boxes: route.boxes,
          pieces: route.pieces,
          doubt: route.doubt + (radiates === null ? 1 : 0),
          bought: route.bought,
        },
      ]
    })
  }

  /** What of a modulated carrier gets up to the aerial terminal. */
  private radiated(
    way: Way,
    sender: { before: Label | null; jack: Key },
    route: AerialRoute,
  ): number | null {
    const own = way.out?.rf?.[0]
    const from = own || way.in === null ? way.out!.jack : way.in
    const level = own ? own.levelDbmv : sender.before ? levelOf(sender.before) : null
    const isolation = worstIsolation(way.variant.device, from, sender.jack)
    if (level === null || isolation === null || route.reverseDb === null) return null
    return level - isolation - route.reverseDb
  }

  /** The carriers that can lie on one lead with the stations without harm to either. */
  besideStations(carrier: CarrierSet, levelDbmv: number): CarrierSet | null {
    const stations = this.offAir.flatMap((s) => stationOf(s) ?? [])
    const kept = carrier.names
      .map((name, i) => ({ name, mhz: carrier.visionMhz[i] as number }))
      .filter(({ name }) => {
        const own = occupantOf(carrier, name, levelDbmv)
        return own !== null && stations.every((s) => leastMargin(s, own) >= 0)
      })
    if (kept.length === 0) return null
    return { ...carrier, names: kept.map((k) => k.name), visionMhz: kept.map((k) => k.mhz) }
  }

  narrowed(sig: Sig, sigs: SigTable, levelDbmv: number): Sig | null {
    if (!sig.carrier) return null
    const carrier = this.besideStations(sig.carrier, levelDbmv)
    return carrier ? sigs.intern({ ...sig, carrier }) : null
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
  let level: number | null = null
  for (const at of pathOf(label)) {
    const own = at.way.out?.rf?.[0]
    if (own) level = own.levelDbmv
    else if (level !== null) level += at.way.fn.gainDb ?? 0
  }
  return level
}
