import { controlOf, jackOf, type AcceptRow, type DeviceModel } from '@coaxwain/models'
import type { Obstacle } from '@coaxwain/shelf'
import {
  decode,
  followsField,
  followsLine,
  isEncoded,
  RF_SYSTEMS,
  SCANS,
  sameSoundSpacing,
  type Deflection,
  type ScanId,
  type SwitchVolt,
} from '@coaxwain/signal'
import { reachedBy } from '../compile/carriers'
import type { Core } from '../compile/signal'
import type { Way } from '../compile/way'
import { stopsAt } from '../search/protection'

/** What is known of the two ends of a join that breaks a rule. */
export interface Ends {
  readonly from: string
  readonly to: string
}

export const obstacle = (
  code: string,
  details: Obstacle['details'],
  flags: Partial<Pick<Obstacle, 'harmful' | 'lookalike'>> = {},
): Obstacle => ({ code, details, harmful: false, lookalike: false, ...flags })

/** Every rule that a signal breaks at an input, nearest cause first; empty when it is taken. */
export function breaksAt(
  way: Way,
  core: Core,
  ends: Ends,
  volts: readonly SwitchVolt[] = [],
): Obstacle[] {
  const { device } = way.variant
  const found: Obstacle[] = []
  if (stopsAt(way, core.protection)) {
    found.push(obstacle(core.protection === 'hdcp' ? 'no-handshake' : 'level-control', { ...ends }))
  }
  const deflection = device.display?.deflection
  if (way.fn.kind === 'shows' && deflection) found.push(...deflectionBreaks(deflection, core, ends))
  const isOutOfBand = (o: Obstacle): boolean => o.code === 'band'
  if (found.some((o) => o.code === 'line-rate'))
    return way.fn.tunedBy === undefined
      ? found
      : [...found, ...tunerBreaks(way, core, ends).filter(isOutOfBand)]
  if (way.fn.tunedBy !== undefined) return onceEach([...found, ...tunerBreaks(way, core, ends)])
  if (core.form !== way.into?.face.form) return found
  return onceEach([...found, ...rowBreaks(way, core, { ...ends, volts })])
}

const onceEach = (found: readonly Obstacle[]): Obstacle[] =>
  found.filter((o, i) => found.findIndex((x) => x.code === o.code) === i)

function deflectionBreaks(deflection: Deflection, core: Core, ends: Ends): Obstacle[] {
  const { lineKhz, fieldHz } = SCANS[core.scan]
  const near = nearest(deflection.lineKhz.flat(), lineKhz)
  // The two television rates differ by 0.7 %: what stops such a picture is its field rate.
  const television = Math.abs(near - lineKhz) / lineKhz < 0.02
  if (
    !followsLine(deflection, core.scan) &&
    !(television && !followsField(deflection, core.scan))
  ) {
    return [
      obstacle(
        'line-rate',
        { ...ends, fromKhz: lineKhz, toKhz: nearest(deflection.lineKhz.flat(), lineKhz) },
        { harmful: false },
      ),
    ]
  }
  if (followsField(deflection, core.scan)) return []
  return [
    obstacle('field-rate', {
      ...ends,
      fromHz: Math.round(fieldHz),
      toHz: Math.round(nearest(deflection.fieldHz.flat(), fieldHz)),
    }),
  ]
}

const nearest = (values: readonly number[], to: number): number =>
  values.reduce((best, v) => (Math.abs(v - to) < Math.abs(best - to) ? v : best), values[0] ?? 0)

function tunerBreaks(way: Way, core: Core, ends: Ends): Obstacle[] {
  const { carrier } = core
  if (!carrier) return [obstacle('not-a-channel', { ...ends })]
  const rows = way.fn.accepts
  const systems = rows.flatMap((r) => r.systems ?? [])
  if (!carrier.digital && systems.length === 0) return [obstacle('digital-only', { ...ends })]
  const control = controlOf(way.variant.device, way.fn.tunedBy ?? '')
  // A channel out of reach hides everything else that might be wrong with it.
  if (control.kind === 'tuned-to' && reachedBy(control, carrier).length === 0) {
    const [channel = ''] = carrier.names
    return [obstacle('band', { ...ends, channel, mhz: carrier.visionMhz[0] ?? 0 })]
  }
  const found: Obstacle[] = []
  const seen = systems.filter(
    (s) =>
      RF_SYSTEMS[s].polarity === RF_SYSTEMS[carrier.system].polarity &&
      (s === 'A') === (carrier.system === 'A'),
  )
  if (seen.length === 0) {
    found.push(
      obstacle('vision-polarity', { ...ends, system: carrier.system, listed: systems.join(', ') }),
    )
  } else if (!seen.some((s) => sameSoundSpacing(s, carrier.system))) {
    found.push(
      obstacle('sound-spacing', {
        ...ends,
        fromMhz: Math.round(RF_SYSTEMS[carrier.system].soundMhz * 10) / 10,
        toMhz: Math.round(RF_SYSTEMS[seen[0]!].soundMhz * 10) / 10,
      }),
    )
  }
  return [...found, ...scanBreaks(rows, core, ends), ...colourBreaks(rows, core, ends)]
}

/** The ends of a join, and the voltages that arrive by it. */
interface Joined extends Ends {
  readonly volts: readonly SwitchVolt[]
}

function rowBreaks(way: Way, core: Core, { volts, ...ends }: Joined): Obstacle[] {
  const rows = way.fn.accepts.filter((r) => !r.jacks || r.jacks.includes(way.in ?? ''))
  if (rows.length === 0) return []
  const open = rows.filter((r) => (r.volts ?? []).every((v) => volts.includes(v)))
  const scan = scanBreaks(rows, core, ends)
  if (scan.length > 0) return [...scan, ...colourBreaks(rows, core, ends)]
  if (open.length === 0) return [obstacle('switching-voltage', { ...ends })]
  return colourBreaks(rows, core, ends)
}

const lists = (row: AcceptRow, scan: ScanId): boolean =>
  row.scans === 'any' || row.scans.includes(scan)

function scanBreaks(rows: readonly AcceptRow[], core: Core, ends: Ends): Obstacle[] {
  if (rows.some((r) => lists(r, core.scan))) return []
  const wanted = rows.flatMap((r) => (r.scans === 'any' ? [] : r.scans))
  const [first] = wanted
  if (!first) return []
  const own = SCANS[core.scan]
  if (!wanted.some((s) => Math.abs(SCANS[s].lineKhz - own.lineKhz) < 0.2)) {
    const at = nearest(
      wanted.map((s) => SCANS[s].lineKhz),
      own.lineKhz,
    )
    return [obstacle('line-rate', { ...ends, fromKhz: own.lineKhz, toKhz: at })]
  }
  if (!wanted.some((s) => Math.abs(SCANS[s].fieldHz - own.fieldHz) < 1)) {
    const at = nearest(
      wanted.map((s) => SCANS[s].fieldHz),
      own.fieldHz,
    )
    return [
      obstacle('field-rate', { ...ends, fromHz: Math.round(own.fieldHz), toHz: Math.round(at) }),
    ]
  }
  return [obstacle('scan', { ...ends, scan: core.scan })]
}

/** The colour of an encoded signal that no row decodes. */
function colourBreaks(rows: readonly AcceptRow[], core: Core, ends: Ends): Obstacle[] {
  if (core.colour === 'mono' || rows.some((r) => r.colours === 'any')) return []
  const listed = rows.flatMap((r) => (r.colours === 'any' ? [] : r.colours))
  if (isEncoded(core.colour)) {
    return decode(core.colour, listed) === 'colour'
      ? []
      : [
          obstacle('colour', {
            ...ends,
            colour: core.colour,
            listed: [...new Set(listed)].join(', '),
          }),
        ]
  }
  return listed.includes(core.colour)
    ? []
    : [obstacle('not-taken', { ...ends, colour: core.colour })]
}

/** A display that cannot serve a light gun: it looks for a spot on a tube drawn at the source's own rate. */
export function gunBreaks(device: DeviceModel, ends: Ends): Obstacle[] {
  const facts = device.display
  const fits =
    facts?.directView && facts.screen !== 'flat' && !facts.storesFields && !facts.convertsScan
  return fits ? [] : [obstacle('light-gun', { ...ends })]
}

export const formOf = (way: Way): string =>
  way.in === null ? '' : jackOf(way.variant.device, way.in).form
