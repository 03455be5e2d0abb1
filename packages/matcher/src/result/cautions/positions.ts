import {
  jackOf,
  together,
  type AcceptRow,
  type Condition,
  type Control,
  type PictureGive,
} from '@coaxwain/models'
import type { Caution } from '@coaxwain/shelf'
import {
  decode,
  followsField,
  followsLine,
  isEncoded,
  RF_SYSTEMS,
  sameSoundSpacing,
  SCANS,
  type Colour,
  type Deflection,
  type RfSystemId,
  type ScanId,
} from '@coaxwain/signal'
import type { PathStop } from '../stops'
import { boxes, caution, display, named, source, type CautionInput, type Rule } from './rule'

type Switch = Extract<Control, { kind: 'positions' }>

/** Switches of a unit that are set for this hookup and have positions that do not serve. */
const decisive = (stop: PathStop, roles: readonly Switch['role'][]): Switch[] =>
  stop.variant.device.controls.filter((k): k is Switch => {
    if (k.kind !== 'positions' || !roles.includes(k.role)) return false
    const wanted = stop.stand.find((c) => c.control === k.key)
    return wanted !== undefined && k.positions.some((p) => !wanted.in.includes(p.key))
  })

/** How many positions do; where an automatic one does as well as the right one, nobody need be told. */
const serving = (stop: PathStop, control: Switch): number =>
  control.positions.filter((p) =>
    stop.stand.some((c) => c.control === control.key && c.in.includes(p.key)),
  ).length

/** How a unit stands with one switch in a position that does not serve. */
function turned(stop: PathStop, control: Switch): Condition[] {
  const wanted = stop.stand.find((c) => c.control === control.key)?.in ?? []
  return control.positions
    .filter((p) => !wanted.includes(p.key))
    .map((p) => stop.stand.map((c) => (c.control === control.key ? { ...c, in: [p.key] } : c)))
}

const listsScan = (row: AcceptRow, scan: ScanId): boolean =>
  row.scans === 'any' || row.scans.includes(scan)

/** A row decodes this colour, and does not merely show it grey; what is monochrome loses nothing anywhere. */
function decodes(all: readonly AcceptRow[], colour: Colour): boolean {
  const rows = all.filter((r) => r.outcome !== 'monochrome')
  if (!isEncoded(colour) || rows.some((r) => r.colours === 'any')) return true
  return (
    decode(
      colour,
      rows.flatMap((r) => (r.colours === 'any' ? [] : r.colours)),
    ) === 'colour'
  )
}

/** A standard switch of the display: on another position there is no colour, or a hiss for sound. */
const ofDisplay: Rule = (c) => {
  const end = display(c)
  const { scan, colour, carrier } = end.sig.core
  return decisive(end, ['standard']).flatMap((control) => {
    if (serving(end, control) > 1) return []
    const details = { name: named(end), control: control.label }
    const left = turned(end, control).map((stand) =>
      end.way.fn.accepts.filter((r) => together(r.while, stand) !== null),
    )
    const grey = left.some(
      (rows) =>
        !decodes(
          rows.filter((r) => listsScan(r, scan)),
          colour,
        ),
    )
    const hiss = left.some((rows) => {
      const systems = rows.flatMap((r) => r.systems ?? [])
      return carrier !== null && !systems.some((s) => sameSoundSpacing(s, carrier.system))
    })
    const negative = left.some((rows) => {
      const systems = rows.flatMap((r) => r.systems ?? [])
      return carrier !== null && systems.length > 0 && !systems.some((s) => sees(s, carrier.system))
    })
    return [
      ...(negative ? [caution('standard-negative', details)] : []),
      ...(grey ? [caution('standard-grey', details)] : []),
      ...(hiss ? [caution('standard-hiss', details)] : []),
    ]
  })
}

/** A receiver for one system sees what is modulated the same way up, and System A only its own. */
const sees = (own: RfSystemId, other: RfSystemId): boolean =>
  RF_SYSTEMS[own].polarity === RF_SYSTEMS[other].polarity && (own === 'A') === (other === 'A')

const isRgb = (form: string | null | undefined): boolean => form?.startsWith('rg') === true

/** One socket takes RGB with this sync or with that, and a switch says which. */
const syncKind: Rule = (c) => {
  const end = display(c)
  const { into } = end.way
  const others = end.variant.device.jacks.filter(
    (j) =>
      j.dir === 'in' &&
      isRgb(j.form) &&
      j.form !== into?.face.form &&
      j.contacts.some((x) => into?.ports.includes(x.port) === true),
  )
  if (!isRgb(into?.face.form) || others.length === 0) return []
  return decisive(end, ['mode', 'other', 'input', 'standard'])
    .slice(0, 1)
    .map((control) => caution('sync-kind', { name: named(end), control: control.label }))
}

/** A switch of the source: on another position it gives what this display does not follow. */
const ofSource: Rule = (c) => {
  const facts = display(c).variant.device.display
  if (!facts || boxes(c).length > 0) return []
  return decisive(source(c), ['scan', 'standard', 'mode', 'other']).flatMap((control) => {
    const rows = turned(source(c), control).flatMap((stand) =>
      fromSocket(c).filter((r) => together(r.while, stand) !== null),
    )
    return rows.flatMap((row) => against(c, { control, row, deflection: facts.deflection }))
  })
}

/** All that the source can give by the socket that is used, in whatever form. */
function fromSocket(c: CautionInput): PictureGive[] {
  const { way, variant } = source(c)
  const used = way.from?.ports ?? []
  return way.fn.gives
    .filter(({ jack }) => jackOf(variant.device, jack).contacts.some((x) => used.includes(x.port)))
    .flatMap((g) => g.picture ?? [])
}

/** What only draws faster has a caution of its own: a progressive setting doubles the line rate. */
const DOUBLED: readonly ScanId[] = ['525p60', '625p50']

interface Turned {
  readonly control: Switch
  readonly row: PictureGive
  readonly deflection: Deflection
}

function against(c: CautionInput, { control, row, deflection }: Turned): Caution[] {
  const { scan, colour } = row
  if (scan === 'same') return []
  const end = display(c)
  const details = { name: named(source(c)), control: control.label, set: named(end) }
  const rolls = !followsField(deflection, scan)
  // The two television rates differ by 0.7 %: what stops such a picture is its field rate.
  const bothTelevision = isTelevision(scan) && isTelevision(end.sig.core.scan)
  if (!followsLine(deflection, scan) && !(rolls && bothTelevision))
    return [
      isDoubled(c, scan)
        ? caution('scan-too-fast', { name: details.name, control: control.label })
        : caution('other-lines', { ...details, khz: SCANS[scan].lineKhz }),
    ]
  const rows = end.way.fn.accepts.filter((r) => listsScan(r, scan))
  const grey = colour !== 'same' && rows.length > 0 && !decodes(rows, colour)
  return [
    ...(rolls
      ? [caution('other-fields', { ...details, hz: Math.round(SCANS[scan].fieldHz) })]
      : []),
    ...(grey ? [caution('other-colour', details)] : []),
  ]
}

/** The progressive setting of a player. */
const isDoubled = (c: CautionInput, scan: ScanId): boolean =>
  source(c).variant.device.kind !== 'computer' &&
  DOUBLED.includes(scan) &&
  isTelevision(display(c).sig.core.scan)

/** Ordinary television lines, 15.6 to 15.75 kHz. */
const isTelevision = (scan: ScanId): boolean => SCANS[scan].lineKhz < 15.75

/** Trimmers that are known to stand wrong: a hold for another field rate, a level that is off. */
const trimmers: Rule = (c) =>
  c.stops.flatMap((s) =>
    s.variant.device.controls.flatMap((k): Caution[] => {
      if (k.kind !== 'trim' || k.stands === undefined || k.aim === undefined) return []
      if (k.stands === k.aim) return []
      const details = { name: named(s), control: k.label }
      if (k.quantity === 'vertical-hold') return [caution('turn-hold', details)]
      const isLevel = k.quantity === 'video-level' || k.quantity === 'sound-level'
      const tooHigh = k.quantity === 'video-level' && k.stands > k.aim
      return isLevel && !tooHigh ? [caution('set-level', details)] : []
    }),
  )

/** A wide picture that is told of a wide screen arrives squeezed on a narrow one. */
const shapes: Rule = (c) => {
  const start = source(c)
  const rows = start.way.out?.picture ?? []
  const squeezing = rows.find((r) => r.shape === 'squeezed')?.while ?? []
  const control = start.variant.device.controls.find((k) =>
    squeezing.some((w) => w.control === k.key),
  )
  return start.narrowScreen && control
    ? [caution('tell-shape', { name: named(start), control: control.label })]
    : []
}

/** A switched load: the last input on the line has it, and no other. */
const loads: Rule = (c) =>
  c.hookup.settings.some((s) => s.why === 'ends-line') || (c.hookup.ends ?? []).length > 0
    ? [caution('last-ends-line')]
    : []

/** Positions that spoil the picture or the sound while they stand elsewhere. */
export const POSITIONS: readonly Rule[] = [ofDisplay, syncKind, ofSource, trimmers, shapes, loads]
