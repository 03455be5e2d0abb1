import type { Condition, DeviceModel, RfGive, TunedControl } from '@coaxwain/models'
import { controlOf } from '@coaxwain/models'
import { channelsIn, type Channel, type PlanPart } from '@coaxwain/signal'
import type { CarrierSet } from './signal'

type NamedCarriers = Pick<CarrierSet, 'part' | 'names' | 'visionMhz'>

function named(part: PlanPart, channels: readonly Channel[]): NamedCarriers {
  const analogue = channels.filter((c) => c.visionMhz !== null)
  return {
    part: { plan: part.plan },
    names: analogue.map((c) => c.name),
    visionMhz: analogue.map((c) => c.visionMhz as number),
  }
}

/** The carriers that an output may be set to. */
export function carriersOf(device: DeviceModel, give: RfGive): CarrierSet {
  const base = { system: give.system, digital: null, sideband: give.sideband }
  if ('part' in give.channel)
    return { ...named(give.channel.part, channelsIn(give.channel.part)), ...base }
  const control = controlOf(device, give.channel.control)
  if (control.kind !== 'channel') throw new Error(`${control.key} does not choose a channel`)
  const { carriers } = control
  const channels = channelsIn(carriers.part)
  const offered =
    carriers.kind === 'channels'
      ? channels
      : channels.filter(
          (c) =>
            c.visionMhz !== null &&
            c.visionMhz >= carriers.lowMhz &&
            c.visionMhz <= carriers.highMhz,
        )
  return { ...named(carriers.part, offered), ...base }
}

/** Tuners that run through a band without steps can stop between channels. */
const STEPLESS: readonly TunedControl['way'][] = ['knob', 'presets', 'search']

const catches = (control: TunedControl, channel: Channel, visionMhz: number): boolean =>
  channel.visionMhz !== null &&
  (Math.abs(channel.visionMhz - visionMhz) <= control.pullInMhz ||
    (STEPLESS.includes(control.way) &&
      visionMhz >= channel.lowerMhz &&
      visionMhz <= channel.upperMhz))

/** The channel of a part of a plan by which a tuner catches a carrier: the nearest, or null. */
export function caughtBy(control: TunedControl, part: PlanPart, visionMhz: number): Channel | null {
  const caught = channelsIn(part).filter((c) => catches(control, c, visionMhz))
  return caught.reduce<Channel | null>((best, c) => {
    const off = Math.abs((c.visionMhz as number) - visionMhz)
    return best && Math.abs((best.visionMhz as number) - visionMhz) <= off ? best : c
  }, null)
}

export interface Reached {
  readonly carrier: CarrierSet
  readonly while: Condition
}

/** What of a set of carriers a tuner reaches, once per band or AIR/CABLE position that reaches any. */
export function reachedBy(control: TunedControl, carrier: CarrierSet): Reached[] {
  return control.reaches.flatMap((reach): Reached[] => {
    const kept = carrier.visionMhz
      .map((mhz, i) => ({ mhz, name: carrier.names[i] as string }))
      .filter(({ mhz }) => caughtBy(control, reach.part, mhz) !== null)
    if (kept.length === 0) return []
    return [
      {
        carrier: { ...carrier, names: kept.map((k) => k.name), visionMhz: kept.map((k) => k.mhz) },
        while: reach.while ?? [],
      },
    ]
  })
}
