import type { Plug } from '@coaxwain/models'
import { mates } from '@coaxwain/signal'
import type { Face } from '../../compile/face'
import { caution, display, named, source, type Rule } from './rule'

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

/** Nothing on the lead wakes a 21-pin input, so its input is chosen by hand (IEC 60933-1, pin 8). */
const chooseByHand: Rule = (c) => {
  const end = display(c)
  const scart = (end.way.into?.face.ports ?? []).some((p) => p.connector === 'scart-socket')
  const { edges, chain } = c.input.wiring
  const last = edges.find((e) => e.of === 'chain' && e.to.node === chain.at(-1))
  const woken = last?.join.volts.includes('av-select') === true
  return scart && !woken ? [caution('choose-by-hand', { name: named(end) })] : []
}

const plugsInto = (plugs: readonly Plug[], face: Face | undefined): boolean =>
  plugs.some((a) => face?.ports.some((b) => mates(a.connector, b.connector)))

/** RGB that wants a voltage which only some of the leads at hand bring, or the lead and not the source. */
const voltsByLead: Rule = (c) => {
  const end = display(c)
  const { scan, colour } = end.sig.core
  const rows = end.way.fn.accepts.filter(
    (r) =>
      (r.scans === 'any' || r.scans.includes(scan)) &&
      (r.colours === 'any' || r.colours.includes(colour)),
  )
  const wanted = rows.flatMap((r) => r.volts ?? [])
  if (wanted.length === 0 || rows.some((r) => !r.volts)) return []
  const out = c.stops.at(-2)?.way.from?.face
  const into = end.way.into?.face
  const given = out?.volts ?? []
  const thin = c.input.frame.drawer.owned.pieces.some(
    ({ piece: { a, b }, passesVolts }) =>
      !passesVolts &&
      ((plugsInto(a, out) && plugsInto(b, into)) || (plugsInto(b, out) && plugsInto(a, into))),
  )
  const byLead = wanted.some((v) => !given.includes(v))
  return thin || byLead ? [caution('volts-by-lead', { name: named(end) })] : []
}

const automatic: Rule = (c) =>
  c.stops.flatMap((s) =>
    s.variant.device.controls
      .filter((k) => k.kind === 'auto' && s.stand.some((x) => x.control === k.key))
      .map(() => caution('moves-itself', { name: named(s) })),
  )

/** A box on the shelf that would switch over by itself, if this source sent a voltage. */
const waits: Rule = (c) => {
  const used = new Set(c.stops.map((s) => s.variant.id))
  const ports = source(c).variant.device.ports.filter((p) =>
    p.circuits.some((x) => x.circuit === 'rf' && x.dir !== 'in'),
  )
  if (ports.length === 0 || ports.some((p) => (p.suppliesDcVolts ?? 0) !== 0)) return []
  return c.input.frame.shelf
    .filter(
      ({ id, device }) =>
        !used.has(id) &&
        device.controls.some(
          (k) => k.kind === 'auto' && k.positions.some((p) => p.cause.kind === 'voltage-at'),
        ),
    )
    .map(({ device }) => caution('box-waits', { name: device.name, source: named(source(c)) }))
}

/** One socket takes composite or luma, as the input is chosen. */
const sharedSocket: Rule = (c) => {
  const { device } = display(c).variant
  const used = display(c).way.into?.ports ?? []
  return device.ports
    .filter((p) => used.includes(p.key))
    .filter((p) => {
      const taken = p.circuits.filter((x) => x.dir !== 'out').map((x) => x.circuit)
      return taken.includes('cvbs') && taken.includes('y') && !p.connector.startsWith('scart')
    })
    .map((p) => caution('shared-socket', { name: named(display(c)), port: p.label }))
}

/** An input of high impedance without a loop (formulas of video lines: about twice the amplitude). */
const openLine: Rule = (c) =>
  c.stops.filter((s) => s.way.openEnded).map((s) => caution('line-open', { name: named(s) }))

/** Positions that decide whether anything comes at all. */
export const SWITCHES: readonly Rule[] = [
  automatic,
  waits,
  directionSwitch,
  chooseByHand,
  voltsByLead,
  sharedSocket,
  openLine,
]
