import { controlOf, jackOf } from '@coaxwain/models'
import type { Obstacle } from '@coaxwain/shelf'
import {
  fits,
  followsField,
  followsLine,
  isEncoded,
  mates,
  RF_SYSTEMS,
  SCANS,
  type Deflection,
} from '@coaxwain/signal'
import { accept } from '../compile/accept'
import { reachedBy } from '../compile/carriers'
import type { Face } from '../compile/face'
import type { SigTable } from '../compile/sig'
import type { Way } from '../compile/way'
import type { JoinTable } from '../join/join'
import { stopsAt } from '../search/expand'
import type { Label } from '../search/label'

interface Tools {
  readonly joins: JoinTable
  readonly sigs: SigTable
  /** There is an answer: only what would harm is worth a word. */
  readonly solved: boolean
}

/** At most so many reasons are given, nearest first. */
const MOST_REASONS = 4

const obstacle = (code: string, details: Obstacle['details']): Obstacle => ({
  code,
  details,
  harmful: false,
  lookalike: false,
})

/** What stands between a source and a display when they are put together directly. */
export function obstaclesBetween(
  starts: readonly Label[],
  ends: readonly Way[],
  tools: Tools,
): Obstacle[] {
  const pairs = starts.flatMap((label) => ends.map((end) => broken(label, end, tools)))
  const harmful = pairs.flatMap((rules) => rules.filter((r) => r.harmful))
  if (tools.solved) return distinct(harmful)
  const nearest = [...pairs].sort((a, b) => a.length - b.length).flat()
  return distinct([...harmful, ...nearest.filter((r) => !r.harmful)]).slice(0, MOST_REASONS)
}

const distinct = (obstacles: readonly Obstacle[]): Obstacle[] => {
  const seen = new Set<string>()
  return obstacles.filter((o) => !seen.has(o.code) && seen.add(o.code))
}

/** Every rule that a direct join of one output and one input would break. */
function broken(label: Label, end: Way, tools: Tools): Obstacle[] {
  const out = label.way.from?.face
  const into = end.into?.face
  if (!out || !into) return []
  const names = { source: label.way.variant.device.name, display: end.variant.device.name }
  const lookalike = wrongWiring(out, into)
  if (lookalike) return [{ ...obstacle('japanese-21-pin', names), harmful: true, lookalike: true }]
  const signals = signalRules(label, end, tools)
  const joined = tools.joins.between(out, into, { picture: true, sound: false }).length > 0
  const [join] = joined ? [] : [unjoined(out, into, names)]
  const found = [...(join ? [join] : []), ...signals]
  if (end.harm && joined && signals.length === 0) {
    return [{ ...obstacle('added-socket', { ...names, port: end.harm.label }), harmful: true }]
  }
  return found
}

/** A plug that goes in and is wired differently inside. */
const wrongWiring = (out: Face, into: Face): boolean =>
  out.ports.some((a) =>
    into.ports.some((b) => fits(a.connector, b.connector) && !mates(a.connector, b.connector)),
  )

const unjoined = (out: Face, into: Face, names: Record<string, string>): Obstacle =>
  out.form === into.form
    ? obstacle('no-lead', { ...names, form: out.form ?? '' })
    : obstacle('no-common-form', { ...names, from: out.form ?? '', to: into.form ?? '' })

function signalRules(label: Label, end: Way, tools: Tools): Obstacle[] {
  const { sig } = label
  const { device } = end.variant
  const names = { source: label.way.variant.device.name, display: device.name }
  const deflection = device.display?.deflection
  const found: Obstacle[] = []
  if (deflection && !followsLine(deflection, sig.scan)) {
    found.push({
      ...obstacle('line-rate', {
        ...names,
        sourceKhz: SCANS[sig.scan].lineKhz,
        displayKhz: nearestEdge(deflection, SCANS[sig.scan].lineKhz),
      }),
      harmful: false,
    })
  } else if (deflection && !followsField(deflection, sig.scan)) {
    found.push(
      obstacle('field-rate', {
        ...names,
        sourceHz: Math.round(SCANS[sig.scan].fieldHz),
        displayHz: Math.round(deflection.fieldHz[0]?.[0] ?? 0),
      }),
    )
  }
  if (stopsAt(device, end, sig.protection)) found.push(obstacle('protection', names))
  if (sig.carrier) found.push(...carrierRules(label, end))
  else if (found.length === 0) found.push(...rowRules(label, end, tools))
  return found
}

/** The edge of what a display follows that lies nearest to a line rate. */
const nearestEdge = (deflection: Deflection, lineKhz: number): number =>
  deflection.lineKhz
    .flat()
    .reduce((best, edge) => (Math.abs(edge - lineKhz) < Math.abs(best - lineKhz) ? edge : best))

function carrierRules(label: Label, end: Way): Obstacle[] {
  const carrier = label.sig.carrier
  if (!carrier || end.fn.tunedBy === undefined) return []
  const names = { source: label.way.variant.device.name, display: end.variant.device.name }
  const systems = end.fn.accepts.flatMap((row) => row.systems ?? [])
  if (systems.length === 0) return [obstacle('digital-only', names)]
  const control = controlOf(end.variant.device, end.fn.tunedBy)
  if (control.kind === 'tuned-to' && reachedBy(control, carrier).length === 0) {
    return [
      obstacle('band', {
        ...names,
        channel: carrier.names[0] ?? '',
        mhz: carrier.visionMhz[0] ?? 0,
      }),
    ]
  }
  const positive = RF_SYSTEMS[carrier.system].polarity
  return systems.some((s) => RF_SYSTEMS[s].polarity === positive)
    ? []
    : [obstacle('vision-polarity', { ...names, system: carrier.system })]
}

function rowRules(label: Label, end: Way, tools: Tools): Obstacle[] {
  const { sig } = label
  const arriving = { sig, lumaOnly: false, volts: ['av-select', 'rgb-select'] as const }
  const taken = accept(end.variant.device, end.fn, end.in ?? '', arriving, (from, carrier) =>
    tools.sigs.intern({ ...from, carrier }),
  )
  if (taken.length > 0) return []
  const names = { source: label.way.variant.device.name, display: end.variant.device.name }
  const form = jackOf(end.variant.device, end.in ?? '').form
  return isEncoded(sig.colour)
    ? [obstacle('standard', { ...names, colour: sig.colour, scan: sig.scan })]
    : [obstacle('not-taken', { ...names, form, scan: sig.scan })]
}
