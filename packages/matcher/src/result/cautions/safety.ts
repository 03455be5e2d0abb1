import { portOf } from '@coaxwain/models'
import { AERIAL_LIMIT_DBMV } from '../../search/aerial'
import { pathOf } from '../../search/label'
import type { PathStop } from '../stops'
import { boxes, caution, display, named, source, type Rule } from './rule'

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

/** Sets whose chassis is or may be joined to the mains (common practice, no source). */
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

const dcUnknown: Rule = (c) =>
  [
    ...pathOf(c.input.wiring.found.last).flatMap((l) => (l.step ? [l.step] : [])),
    c.input.wiring.found.step,
  ].some((s) => s.join.dcUnknown)
    ? [caution('check-dc')]
    : []

/** What gets up to the aerial stays under the limit, or nobody knows (47 CFR 15.115(c)(1)). */
const radiation: Rule = (c) => {
  const use = c.input.wiring.found.aerial
  if (!use || use.radiatesDbmv === -Infinity) return []
  if (use.radiatesDbmv === null)
    return [caution('check-isolation', { name: use.variant.device.name })]
  return use.together
    ? [
        caution('radiation-limit', {
          level: Math.round(use.radiatesDbmv * 10) / 10,
          limit: AERIAL_LIMIT_DBMV,
        }),
      ]
    : []
}

/** A recorder's level control is upset by protection pulses (common practice, no source). */
const recorderInput: Rule = (c) =>
  boxes(c)
    .filter((s) => s.way.fn.inputAgc === true)
    .map((s) => caution('recorder-input', { name: named(s) }))

const handshake: Rule = (c) =>
  source(c).sig.core.protection !== 'hdcp'
    ? []
    : boxes(c)
        .filter((s) => s.way.in !== null && s.way.into?.face.form === 'hdmi')
        .map((s) =>
          caution(s.way.fn.hdcp === undefined ? 'handshake-unknown' : 'handshake-needed', {
            name: named(s),
          }),
        )

/** Danger first, then what could spoil an evening. */
export const SAFETY: readonly Rule[] = [
  liveChassis,
  neverToAerial,
  radiation,
  dcUnknown,
  mainsDiffer,
  packs,
  recorderInput,
  handshake,
]
