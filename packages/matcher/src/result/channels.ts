import { controlOf, type Key, type RfGive } from '@coaxwain/models'
import type { OffAir } from '@coaxwain/shelf'
import { findChannel, type Channel, type PlanId } from '@coaxwain/signal'
import { caughtBy, carriersOf } from '../compile/carriers'
import type { CarrierSet } from '../compile/signal'
import type { Variant } from '../compile/variant'

export interface ChosenChannel {
  readonly plan: PlanId
  readonly name: string
  readonly visionMhz: number
  /** Other channels on which it would work as well. */
  readonly orElse: readonly string[]
  /** Channels that it offers as well and on which a station is received. */
  readonly taken: readonly string[]
  /** A station is received on it. */
  readonly onAir: boolean
}

const stationOn = (visionMhz: number, offAir: readonly OffAir[]): boolean =>
  offAir.some((station) => {
    const channel = findChannel(station.plan, station.channel)
    return channel !== null && channel.lowerMhz <= visionMhz && visionMhz <= channel.upperMhz
  })

/** The first channel on which nothing is received off air; else the first that there is. */
export function chooseChannel(carrier: CarrierSet, offAir: readonly OffAir[]): ChosenChannel {
  const all = carrier.names.map((name, i) => ({ name, mhz: carrier.visionMhz[i] as number }))
  const free = all.filter(({ mhz }) => !stationOn(mhz, offAir))
  const pool = free.length > 0 ? free : all
  const [first] = pool
  if (!first) throw new Error('a carrier without channels has got through')
  return {
    plan: carrier.part.plan,
    name: first.name,
    visionMhz: first.mhz,
    orElse: pool.slice(1).map((c) => c.name),
    taken: free.length === 0 ? [] : all.filter((c) => !free.includes(c)).map((c) => c.name),
    onAir: free.length === 0,
  }
}

/** The control by which a box puts its carrier on a channel, or null where there is only one. */
export function channelControl(variant: Variant, gives: readonly RfGive[]): Key | null {
  for (const give of gives) {
    if ('control' in give.channel && carriersOf(variant.device, give).names.length > 1)
      return give.channel.control
  }
  return null
}

export interface TunedChannel {
  readonly channel: Channel
  readonly plan: PlanId
}

/** What a tuner calls the carrier that it is to catch, under the positions of its unit. */
export function tunedAs(
  variant: Variant,
  tunedBy: Key,
  visionMhz: number,
  stand: ReadonlyMap<Key, readonly string[]>,
): TunedChannel | null {
  const control = controlOf(variant.device, tunedBy)
  if (control.kind !== 'tuned-to') return null
  for (const reach of control.reaches) {
    const open = (reach.while ?? []).every((c) => {
      const at = stand.get(c.control)
      return at === undefined || at.some((p) => c.in.includes(p))
    })
    const channel = open ? caughtBy(control, reach.part, visionMhz) : null
    if (channel) return { channel, plan: reach.part.plan }
  }
  return null
}
