import { portOf } from '@coaxwain/models'
import type { Caution, Hookup } from '@coaxwain/shelf'
import { SCANS, TIER } from '@coaxwain/signal'
import { AERIAL_LIMIT_DBMV } from '../search/aerial'
import { pathOf } from '../search/label'
import type { BuildInput, PathStop } from './build'

export interface CautionInput {
  readonly hookup: Omit<Hookup, 'cautions'>
  readonly stops: readonly PathStop[]
  readonly input: BuildInput
}

type Rule = (c: CautionInput) => readonly Caution[]

const caution = (code: string, details: Caution['details'] = {}): Caution => ({ code, details })

const display = ({ stops }: CautionInput): PathStop => stops.at(-1)!
const source = ({ stops }: CautionInput): PathStop => stops[0]!
const boxes = ({ stops }: CautionInput): readonly PathStop[] => stops.slice(1, -1)
const named = (stop: PathStop): string => stop.variant.device.name

/** A modulated output must never meet an aerial or a cable company's line (47 CFR 15.115(c)). */
const neverToAerial: Rule = (c) =>
  c.stops
    .filter((s) => s.sends !== null)
    .map((s) => {
      const port = s.way.from?.ports[0]
      const label = port === undefined ? '' : portOf(s.variant.device, port).label
      return caution('never-to-aerial', {
        name: named(s),
        port: label,
        channel: s.sends!.channel.name,
      })
    })

const liveChassis: Rule = (c) => {
  const { device } = display(c).variant
  if (device.chassis === 'isolated') return []
  const unsafe = device.ports.filter((p) => p.isolated === 'no' && p.origin === 'added')
  const known = device.chassis === 'live' ? 'chassis-live' : 'chassis-may-be-live'
  return [
    ...unsafe.map((p) => caution('added-socket', { name: device.name, port: p.label })),
    caution(known, { name: device.name }),
    ...(usesUnknown(display(c)) ? [caution('check-chassis', { name: device.name })] : []),
  ]
}

const usesUnknown = (stop: PathStop): boolean =>
  (stop.way.into?.ports ?? []).some((p) => portOf(stop.variant.device, p).isolated === 'unknown')

const packs: Rule = (c) =>
  c.stops.flatMap((s) => {
    const pack = s.variant.device.pack
    if (!pack) return []
    return [
      caution(pack.polarity ? `pack-${pack.polarity}` : `pack-${pack.current}`, {
        name: named(s),
        volts: pack.volts,
        milliamps: pack.milliamps,
      }),
    ]
  })

const mainsDiffer: Rule = (c) => {
  const here = display(c).variant.device.mains
  if (!here) return []
  return c.stops.slice(0, -1).flatMap((s) => {
    const own = s.variant.device.mains
    if (!own || (own.volts[0] <= here.volts[1] && here.volts[0] <= own.volts[1])) return []
    return [caution('mains-differs', { name: named(s), volts: own.volts[0], here: here.volts[0] })]
  })
}

const playsStereo = (c: CautionInput): boolean =>
  source(c).way.fn.gives.some((g) => g.sound === 'stereo')

const sound: Rule = (c) => {
  const { sound: heard } = c.hookup.sound
  if (heard === 'half') return [caution('sound-half')]
  if (heard === 'none') return c.input.frame.best.sound ? [caution('silent')] : []
  return heard === 'mono' && playsStereo(c) ? [caution('sound-folded')] : []
}

const picture: Rule = (c) => {
  const { degradations, quality } = c.hookup.picture
  return [
    ...(quality === 'luma-only' ? [caution('luma-only')] : []),
    ...(degradations.includes('monochrome') && quality !== 'luma-only'
      ? [caution('colour-not-decoded', { colour: display(c).sig.colour })]
      : []),
    ...(degradations.includes('reduced-height') ? [caution('reduced-height')] : []),
    ...(degradations.includes('squeezed') ? [caution('squeezed')] : []),
  ]
}

/** A recorder's level control is upset by protection pulses (common practice, no source). */
const recorderInput: Rule = (c) =>
  boxes(c)
    .filter((s) => s.way.fn.inputAgc === true)
    .map((s) => caution('recorder-input', { name: named(s) }))

const handshake: Rule = (c) =>
  boxes(c)
    .filter((s) => source(c).sig.protection === 'hdcp' && s.way.fn.hdcp === undefined)
    .map((s) => caution('handshake-unknown', { name: named(s) }))

const channels: Rule = (c) =>
  c.stops.flatMap((s) => {
    const channel = s.sends?.channel
    if (!channel) return []
    if (channel.onAir) return [caution('channel-on-air', { channel: channel.name, name: named(s) })]
    const [other] = channel.orElse
    return other === undefined || (c.input.offAir.length > 0 && !c.input.solved.found.aerial)
      ? []
      : [caution('channel-may-be-used', { channel: channel.name, other })]
  })

const airOrCable: Rule = (c) =>
  c.hookup.settings.flatMap((s) => {
    const stop = c.stops.find((p) => p.unit.uid === s.unit)
    const control = stop?.variant.device.controls.find((k) => k.key === s.control)
    if (control?.kind !== 'positions' || control.role !== 'tuner-plan') return []
    const position = control.positions.find((p) => p.key === s.position)?.label ?? s.position
    return [
      caution('air-or-cable', { name: stop ? named(stop) : '', control: control.label, position }),
    ]
  })

const directionSwitch: Rule = (c) =>
  c.stops.flatMap((s) =>
    s.variant.device.controls
      .filter(
        (k) =>
          k.kind === 'positions' &&
          k.role === 'direction' &&
          s.stand.some((x) => x.control === k.key),
      )
      .map((k) => caution('direction-switch', { name: named(s), control: k.label })),
  )

/** Nothing on the lead wakes a 21-pin input, so its input is chosen by hand. */
const chooseByHand: Rule = (c) => {
  const end = display(c)
  const scart = (end.way.into?.face.ports ?? []).some((p) => p.connector === 'scart-socket')
  const woken = c.input.solved.found.step.join.volts.includes('av-select')
  return scart && !woken ? [caution('choose-by-hand', { name: named(end) })] : []
}

const automatic: Rule = (c) =>
  c.stops.flatMap((s) =>
    s.variant.device.controls
      .filter((k) => k.kind === 'auto' && s.stand.some((x) => x.control === k.key))
      .map(() => caution('moves-itself', { name: named(s) })),
  )

/** A scan setting of the source that this display cannot follow. */
const progressive: Rule = (c) => {
  const facts = display(c).variant.device.display
  const set = source(c).stand.map((s) => s.control)
  const scanControl = source(c).variant.device.controls.find(
    (k) => k.kind === 'positions' && k.role === 'scan' && set.includes(k.key),
  )
  if (!facts || !scanControl) return []
  const rows = source(c).way.out?.picture ?? []
  const beyond = rows.some(
    (r) =>
      r.scan !== 'same' &&
      !facts.deflection.lineKhz.some(([low, high]) =>
        inside(SCANS[r.scan as keyof typeof SCANS].lineKhz, low, high),
      ),
  )
  return beyond && boxes(c).length === 0
    ? [caution('scan-too-fast', { name: named(source(c)), control: scanControl.label })]
    : []
}

const inside = (value: number, low: number, high: number): boolean =>
  value >= low - 0.1 && value <= high + 0.1

const lessDetail: Rule = (c) => {
  const first = source(c).sig
  const shown = display(c).sig
  return SCANS[first.scan].lineKhz > 31 &&
    SCANS[shown.scan].lineKhz < 20 &&
    TIER[first.poorest] >= 5
    ? [caution('less-detail')]
    : []
}

const dcUnknown: Rule = (c) =>
  [
    ...pathOf(c.input.solved.found.last).flatMap((l) => (l.step ? [l.step] : [])),
    c.input.solved.found.step,
  ].some((s) => s.join.dcUnknown)
    ? [caution('check-dc')]
    : []

/** What gets up to the aerial stays under the limit, or nobody knows (47 CFR 15.115(c)(1)). */
const radiation: Rule = (c) => {
  const use = c.input.solved.found.aerial
  if (!use || use.radiatesDbmv === -Infinity) return []
  if (use.radiatesDbmv === null)
    return [caution('check-isolation', { name: use.variant.device.name })]
  return [
    caution('radiation-limit', {
      level: Math.round(use.radiatesDbmv * 10) / 10,
      limit: AERIAL_LIMIT_DBMV,
    }),
  ]
}

/** Passive joints and splitters on the way cost level. */
const lossOnTheWay: Rule = (c) => {
  const loss = boxes(c).reduce((sum, s) => sum + Math.min(0, s.way.fn.gainDb ?? 0), 0)
  return loss <= -3 ? [caution('level-lost', { db: -loss })] : []
}

/** The sideband of an unfiltered modulator falls on a station below. */
const sideband: Rule = (c) => {
  const use = c.input.solved.found.aerial
  if (!use?.together) return []
  return c.stops
    .filter((s) => s.sends !== null && s.way.out?.rf?.some((r) => r.sideband === 'double'))
    .map((s) => caution('channel-below', { name: named(s), channel: s.sends!.channel.name }))
}

/** Danger first, then what is lost, then what helps. */
const RULES: readonly Rule[] = [
  liveChassis,
  neverToAerial,
  radiation,
  dcUnknown,
  mainsDiffer,
  packs,
  recorderInput,
  handshake,
  picture,
  sound,
  progressive,
  channels,
  sideband,
  lossOnTheWay,
  airOrCable,
  automatic,
  directionSwitch,
  chooseByHand,
  lessDetail,
]

/** Everything about a hookup that a person must know before the first step. */
export const cautionsOf = (c: CautionInput): Caution[] => RULES.flatMap((rule) => rule(c))
