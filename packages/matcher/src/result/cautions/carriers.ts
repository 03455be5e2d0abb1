import { jackOf, type DeviceModel, type Key } from '@coaxwain/models'
import { channelsIn, LEVEL_WINDOWS, touches, type Channel } from '@coaxwain/signal'
import { AERIAL_LIMIT_DBMV, isolationDb, levelOf } from '../../search/aerial'
import { nodesOf } from '../../search/wiring'
import type { PathStop } from '../stops'
import { boxes, caution, display, named, source, type CautionInput, type Rule } from './rule'

const senders = (stops: readonly PathStop[]): readonly PathStop[] =>
  stops.filter((s) => s.sends !== null)

const channels: Rule = (c) =>
  senders(c.stops).flatMap((s) => {
    const { channel } = s.sends!
    const [other] = channel.orElse
    const [taken] = channel.taken
    const details = { channel: channel.name }
    if (channel.onAir) return [caution('channel-on-air', { ...details, name: named(s) })]
    if (taken !== undefined) return [caution('channel-taken', { ...details, taken })]
    if (c.input.wiring.found.aerial?.together) return [caution('channel-stays-free', details)]
    return other !== undefined && (isUnscreened(c) || isReceivedHere(c))
      ? [caution('channel-may-be-used', { ...details, other })]
      : []
  })

/** Flat 300 ohm line and screws pick up strong stations by themselves (common practice, no source). */
const isUnscreened = (c: CautionInput): boolean =>
  (display(c).way.into?.face.ports ?? []).some((p) => p.ohm >= 300)

/** Stations come down the same lead, if only past a switch. */
const isReceivedHere = (c: CautionInput): boolean =>
  c.input.wiring.found.aerial !== null && c.input.offAir.some((o) => o.kind === 'analogue')

/** Where FM radio is heard: 88 to 108 MHz (47 CFR 73.201). */
const FM_MHZ = [88, 108] as const

/** A carrier in the FM band shares it with strong stations. */
const inFmBand: Rule = (c) =>
  senders(c.stops)
    .map((s) => s.sends!.channel)
    .filter(({ visionMhz }) => visionMhz > FM_MHZ[0] && visionMhz < FM_MHZ[1])
    .map((channel) => caution('in-fm-band', { channel: channel.name }))

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
  c.input.wiring.found.aerial?.together
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

/** More than a set need stand, and the upper end of what is aimed at (see `LEVEL_WINDOWS`). */
const MOST_DBMV = LEVEL_WINDOWS['working-target'].high
const AIM_DBMV = 10

/** What pads, joints and transformers in the leads take off a carrier, in dB. */
const lostInLeads = (c: CautionInput): number =>
  c.hookup.links
    .filter((link) => link.circuits.some((x) => x.from === 'rf'))
    .flatMap((link) => link.pieces)
    .reduce((sum, { model }) => {
      const sort = c.input.frame.drawer.pieces.find((p) => p.models.some((m) => m.model === model))
      return sum + (sort?.piece.lossDb ?? 0)
    }, 0)

/** The carrier as it reaches the display's tuner: as made, with gains and losses since. */
const tooStrong: Rule = (c) => {
  const sent = display(c).receives ? levelOf(c.input.wiring.found.last) : null
  if (sent === null || sent <= MOST_DBMV) return []
  const level = sent - lostInLeads(c)
  const details = { set: named(display(c)), dbmv: Math.round(level) }
  return level > MOST_DBMV
    ? [caution('level-high', { ...details, pad: Math.ceil(level - AIM_DBMV) })]
    : []
}

/** Switches of the plan that a tuner counts in, and of its bands. */
const tunerSwitches = (c: CautionInput) =>
  c.hookup.settings.flatMap((s) => {
    const stop = c.stops.find((p) => p.unit.uid === s.unit)
    const control = stop?.variant.device.controls.find((k) => k.key === s.control)
    if (!stop || control?.kind !== 'positions') return []
    const position = control.positions.find((p) => p.key === s.position)?.label ?? s.position
    const isBand = stop.variant.device.controls.some(
      (k) =>
        k.kind === 'tuned-to' &&
        k.reaches.some((r) => r.while?.some((w) => w.control === s.control)),
    )
    const details = { name: named(stop), control: control.label, position }
    return [{ isPlan: control.role === 'tuner-plan', isBand, must: s.must, details }]
  })

const airOrCable: Rule = (c) =>
  tunerSwitches(c).flatMap(({ isPlan, isBand, must, details }) => {
    if (isPlan) return must ? [caution('air-or-cable', details)] : []
    return isBand ? [caution('band-switch', details)] : []
  })

/** A plan that serves as well as the other is worth a word only where there is nothing else to say. */
export const eitherPlan: Rule = (c) =>
  tunerSwitches(c)
    .filter(({ isPlan, must }) => isPlan && !must)
    .map(({ details }) => caution('air-or-cable', details))

/** The aerial belongs to the box that receives digital stations, and not to the old set. */
const aerialToBox: Rule = (c) => {
  const use = c.input.wiring.found.aerial
  const digital = use?.fn.accepts.some((r) => (r.digital ?? []).length > 0)
  if (!use || use.variant === display(c).variant) return []
  const details = { name: use.variant.device.name, set: named(display(c)) }
  if (digital) return [caution('aerial-to-box', details)]
  return use.variant === source(c).variant ? [caution('aerial-first', details)] : []
}

/** Two ways in that meet without a switch. */
function joinsWays(device: DeviceModel): readonly Key[] | null {
  const free = device.functions.filter(
    (f) => f.tunedBy === undefined && (f.while ?? []).length === 0 && f.gives.length > 0,
  )
  const ins = free.flatMap((f) =>
    f.gives.some((g) => !g.rf && (g.while ?? []).length === 0)
      ? f.needs.filter((key) => jackOf(device, key).form === 'rf')
      : [],
  )
  const outs = new Set(free.flatMap((f) => f.gives.map((g) => g.jack)))
  const shared = [...outs].some(
    (out) => free.filter((f) => f.gives.some((g) => g.jack === out)).length > 1,
  )
  return shared ? [...new Set(ins)] : null
}

/** The least isolation between two of some jacks; none is recorded is none. */
const leastApart = (device: DeviceModel, jacks: readonly Key[]): number => {
  const ports = jacks.flatMap((key) => jackOf(device, key).contacts.map((x) => x.port))
  const pairs = ports.flatMap((a) =>
    ports.filter((b) => a !== b).map((b) => isolationDb(device, a, b) ?? 0),
  )
  return Math.min(...pairs)
}

/** A splitter or combiner on the shelf that must not join what the aerial and a modulator give. */
const splitters: Rule = (c) => {
  const level = senders(c.stops)[0]?.way.out?.rf?.[0]?.levelDbmv
  if (level === undefined || !c.input.wiring.found.aerial) return []
  const used = new Set(nodesOf(c.input.wiring).map((n) => n.way.variant.id))
  return c.input.frame.shelf
    .filter(({ id, device }) => {
      const ways = used.has(id) ? null : joinsWays(device)
      return ways !== null && level - leastApart(device, ways) > AERIAL_LIMIT_DBMV
    })
    .slice(0, 1)
    .map(({ device }) => caution('splitter-radiates', { name: device.name }))
}

/** A socket for digital sound on a carrier looks like an aerial output (2.88 MHz, from memory). */
const lookalikeRf: Rule = (c) =>
  source(c).variant.device.jacks.some((j) => j.form === 'ac3-rf' && j.dir === 'out')
    ? [caution('sound-carrier-socket', { name: named(source(c)) })]
    : []

/** What belongs to channels, bands and aerials. */
export const CARRIERS: readonly Rule[] = [
  channels,
  inFmBand,
  neighbours,
  sideband,
  idleCarriers,
  lossOnTheWay,
  tooStrong,
  airOrCable,
  aerialToBox,
  lookalikeRf,
  splitters,
]
