import { channelsIn, touches, type Channel } from '@coaxwain/signal'
import type { PathStop } from '../stops'
import { boxes, caution, display, named, source, type Rule } from './rule'

const senders = (stops: readonly PathStop[]): readonly PathStop[] =>
  stops.filter((s) => s.sends !== null)

const channels: Rule = (c) =>
  senders(c.stops).flatMap((s) => {
    const channel = s.sends!.channel
    if (channel.onAir) return [caution('channel-on-air', { channel: channel.name, name: named(s) })]
    if (c.input.solved.found.aerial?.together)
      return [caution('channel-stays-free', { channel: channel.name })]
    const [other] = channel.orElse
    return other === undefined || (c.input.offAir.length > 0 && !c.input.solved.found.aerial)
      ? []
      : [caution('channel-may-be-used', { channel: channel.name, other })]
  })

/** One of the channels on offer has neighbours and another has none. */
const neighbours: Rule = (c) =>
  senders(c.stops).flatMap((s) => {
    const { plan, name, orElse } = s.sends!.channel
    const all = channelsIn({ plan })
    const crowded = (n: string): Channel | undefined => {
      const own = all.find((x) => x.name === n)
      return own && all.find((x) => x !== own && touches(own, x))
    }
    const other = orElse.find((n) => crowded(n))
    const beside = other === undefined ? undefined : crowded(other)
    return !crowded(name) && other !== undefined && beside
      ? [caution('neighbour-channel', { channel: name, other, beside: beside.name })]
      : []
  })

/** The sideband of an unfiltered modulator falls on the channel below (47 CFR 15.115(b)(2) lets it). */
const sideband: Rule = (c) =>
  c.input.solved.found.aerial?.together
    ? senders(c.stops)
        .filter((s) => s.way.out?.rf?.some((r) => r.sideband === 'double'))
        .map((s) => caution('channel-below', { name: named(s), channel: s.sends!.channel.name }))
    : []

/** A recorder on the shelf whose own carrier is always on would meet this one in the aerial lead. */
const idleCarriers: Rule = (c) => {
  const own = display(c).receives
  const used = new Set(c.stops.map((s) => s.variant.id))
  if (!own) return []
  return c.input.frame.idle
    .filter(
      (i) =>
        !used.has(i.variant.id) &&
        i.channels.some((ch) => Math.abs((ch.visionMhz ?? 0) - own.visionMhz) < 12),
    )
    .flatMap((i) => [
      caution('idle-carrier', { name: i.variant.device.name, channel: own.name }),
      caution('idle-sideband', { name: i.variant.device.name }),
    ])
}

/** Passive joints and splitters on the way cost level. */
const lossOnTheWay: Rule = (c) => {
  const loss = boxes(c).reduce((sum, s) => sum + Math.min(0, s.way.fn.gainDb ?? 0), 0)
  return loss <= -3 ? [caution('level-lost', { db: -loss })] : []
}

const airOrCable: Rule = (c) =>
  c.hookup.settings.flatMap((s) => {
    const stop = c.stops.find((p) => p.unit.uid === s.unit)
    const control = stop?.variant.device.controls.find((k) => k.key === s.control)
    if (!stop || control?.kind !== 'positions') return []
    const position = control.positions.find((p) => p.key === s.position)?.label ?? s.position
    const details = { name: named(stop), control: control.label, position }
    if (control.role === 'tuner-plan') return [caution('air-or-cable', details)]
    const bands = stop.variant.device.controls.some(
      (k) =>
        k.kind === 'tuned-to' &&
        k.reaches.some((r) => r.while?.some((w) => w.control === s.control)),
    )
    return bands ? [caution('band-switch', details)] : []
  })

/** The aerial belongs to the box that receives digital stations, and not to the old set. */
const aerialToBox: Rule = (c) => {
  const use = c.input.solved.found.aerial
  const digital = use?.fn.accepts.some((r) => (r.digital ?? []).length > 0)
  return use && digital && use.variant !== display(c).variant
    ? [caution('aerial-to-box', { name: use.variant.device.name, set: named(display(c)) })]
    : []
}

/** A socket for digital sound on a carrier looks like an aerial output (2.88 MHz, from memory). */
const lookalikeRf: Rule = (c) =>
  source(c).variant.device.jacks.some((j) => j.form === 'ac3-rf' && j.dir === 'out')
    ? [caution('sound-carrier-socket', { name: named(source(c)) })]
    : []

/** What belongs to channels, bands and aerials. */
export const CARRIERS: readonly Rule[] = [
  channels,
  neighbours,
  sideband,
  idleCarriers,
  lossOnTheWay,
  airOrCable,
  aerialToBox,
  lookalikeRf,
]
