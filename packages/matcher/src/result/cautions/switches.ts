import { SCANS, type ScanId } from '@coaxwain/signal'
import { boxes, caution, display, named, source, type Rule } from './rule'

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
  if (!facts || !scanControl || boxes(c).length > 0) return []
  const beyond = (source(c).way.out?.picture ?? []).some(
    (r) => r.scan !== 'same' && !follows(facts.deflection.lineKhz, r.scan),
  )
  return beyond
    ? [caution('scan-too-fast', { name: named(source(c)), control: scanControl.label })]
    : []
}

const follows = (spans: readonly (readonly [number, number])[], scan: ScanId): boolean =>
  spans.some(([low, high]) => SCANS[scan].lineKhz >= low - 0.1 && SCANS[scan].lineKhz <= high + 0.1)

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
  progressive,
  automatic,
  directionSwitch,
  chooseByHand,
  sharedSocket,
  openLine,
]
