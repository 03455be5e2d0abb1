import type { AcceptRow, Jack, TunedControl } from '@coaxwain/models'
import type { Link, Setting } from '@coaxwain/shelf'
import {
  arrivalAt,
  channelsIn,
  decode,
  findChannel,
  isEncoded,
  samePolarity,
  sameSoundSpacing,
  type Channel,
  type Circuit,
  type PictureForm,
  type RfSystemId,
  type SwitchVolt,
} from '@coaxwain/signal'
import type { Stage } from './bench'
import type { Wave } from './wave'

/** The links that end at the ports of a jack, by the circuit that each port expects. */
function arriving(
  { bench, unit }: Stage,
  jack: Jack,
): { link: Link; from: Circuit; to: Circuit }[] {
  return jack.contacts.flatMap((contact) =>
    bench.hookup.links
      .filter((l) => l.to.unit === unit && l.to.port === contact.port)
      .flatMap((link) =>
        link.circuits
          .filter((c) => c.to === contact.circuit)
          .map((c) => ({ link, from: c.from, to: c.to })),
      ),
  )
}

/** What of a picture reaches a jack. */
export interface PictureIn {
  readonly jack: Jack
  readonly wave: Wave
  readonly lumaOnly: boolean
  /** Switching voltages that come along. */
  readonly volts: readonly SwitchVolt[]
}

/** Composite video beside red, green and blue is there as sync; what picture is on it nobody says. */
const TAKES_RGB: ReadonlySet<PictureForm> = new Set(['rgbs', 'rgsb', 'rgbhv'])

/** What of a picture reaches a jack by the wires that are there, or null where it makes no picture. */
export function pictureInto(stage: Stage, jack: Jack, wave: Wave): PictureIn | null {
  const arrives = new Map(arriving(stage, jack).map((a) => [a.to, a.from]))
  const form = jack.form as PictureForm
  if (wave.form === 'rgbs' && !TAKES_RGB.has(form)) return null
  const whole = { jack, wave, lumaOnly: false, volts: voltsInto(stage, jack, wave.volts) }
  if (form === 'hdmi' || form === 'dvi' || form === 'rf') {
    const [only] = [...arrives.values()]
    return only === (form === 'rf' ? 'rf' : 'tmds') ? whole : null
  }
  const arrival = arrivalAt(form, named(jack, arrives))
  if (arrival.kind === 'whole') return whole
  return arrival.kind === 'luma-only' ? { ...whole, lumaOnly: true } : null
}

/** What arrives, by the circuits that the form expects: RGB may take its sync on a composite contact. */
function named(jack: Jack, arrives: ReadonlyMap<Circuit, Circuit>): Map<Circuit, Circuit> {
  const found = new Map<Circuit, Circuit>()
  for (const { circuit } of jack.contacts) {
    const from = arrives.get(circuit)
    if (from) found.set(circuit === 'cvbs' && jack.form === 'rgbs' ? 'csync' : circuit, from)
  }
  return found
}

function voltsInto(stage: Stage, jack: Jack, given: readonly SwitchVolt[]): SwitchVolt[] {
  const [first] = arriving(stage, jack)
  if (!first) return []
  const pieces = first.link.pieces.map((p) => stage.bench.view.piece(p.model))
  const passes = pieces.every((p) => p?.wires.some((w) => w.a.circuit === 'switch-volts'))
  return [...(passes ? given : []), ...pieces.flatMap((p) => p?.suppliesVolts ?? [])]
}

export interface TakenIn {
  readonly colour: boolean
  readonly reducedHeight: boolean
  readonly heard: boolean
}

/** What a function without rows takes. */
const ANYTHING: readonly AcceptRow[] = [{ scans: 'any', colours: 'any' }]

/**
 * What a function makes of a picture: the first row that decodes its colour, else the first that takes it
 * grey. Null with a finding where it is not tuned to it, or takes no such picture.
 */
export function take(stage: Stage, input: PictureIn): TakenIn | null {
  const { accepts, tunedBy, key } = stage.fn
  const { scan, colour, visionMhz } = input.wave
  if (tunedBy !== undefined && !isTuned(stage, tunedBy, visionMhz)) {
    stage.report('not-tuned', { function: key })
    return null
  }
  const rows = (accepts.length > 0 ? accepts : ANYTHING)
    .filter((row) => acts(stage, row, input))
    .flatMap((row) => takenBy(row, input, tunedBy !== undefined) ?? [])
  const row = rows.find((r) => r.decoded) ?? rows[0]
  if (!row) stage.report('not-taken', { function: key, scan, colour })
  return row?.taken ?? null
}

const acts = (stage: Stage, row: AcceptRow, { jack, wave, volts }: PictureIn): boolean =>
  (row.jacks?.includes(jack.key) ?? true) &&
  (row.volts?.every((v) => volts.includes(v)) ?? true) &&
  (row.scans === 'any' || row.scans.includes(wave.scan)) &&
  stage.holds(row.while)

function takenBy(
  row: AcceptRow,
  input: PictureIn,
  tuned: boolean,
): { decoded: boolean; taken: TakenIn } | null {
  const reception = tuned ? receive(row, input.wave) : 'heard'
  const colour = coloured(row, input)
  if (reception === 'nothing' || colour === 'nothing') return null
  const decoded = colour === 'colour'
  return {
    decoded,
    taken: {
      colour: decoded && row.outcome !== 'monochrome',
      reducedHeight: row.outcome === 'reduced-height',
      heard: reception === 'heard' && row.outcome !== 'silent',
    },
  }
}

function receive(row: AcceptRow, wave: Wave): 'heard' | 'silent' | 'nothing' {
  const sent = wave.system
  if (!sent) return 'nothing'
  const listed: readonly RfSystemId[] = row.systems ?? []
  const seen = listed.some((s) => samePolarity(s, sent) && (s === 'A') === (sent === 'A'))
  if (!seen) return 'nothing'
  return listed.some((s) => sameSoundSpacing(s, sent)) ? 'heard' : 'silent'
}

function coloured(row: AcceptRow, { wave, lumaOnly }: PictureIn): 'colour' | 'grey' | 'nothing' {
  if (lumaOnly || wave.colour === 'mono') return 'grey'
  if (row.colours === 'any') return 'colour'
  if (isEncoded(wave.colour))
    return decode(wave.colour, row.colours) === 'colour' ? 'colour' : 'grey'
  return row.colours.includes(wave.colour) ? 'colour' : 'nothing'
}

/** Whether a tuner is set to a channel that it reaches, and the carrier lies where it catches it. */
function isTuned(stage: Stage, key: string, visionMhz: number | null): boolean {
  const control = stage.device.controls.find((c) => c.key === key)
  const set = stage.bench.hookup.settings.find((s) => s.unit === stage.unit && s.control === key)
  const channel = set?.plan && findChannel(set.plan, set.position)
  if (control?.kind !== 'tuned-to' || !set || !channel || visionMhz === null) return false
  return reaches(stage, control, set) && isNear(control, channel, visionMhz)
}

const reaches = (stage: Stage, control: TunedControl, { plan, position }: Setting): boolean =>
  control.reaches.some(
    (r) =>
      r.part.plan === plan &&
      channelsIn(r.part).some((c) => c.name === position) &&
      stage.holds(r.while),
  )

/** A tuner without steps is moved to the carrier anywhere within its channel. */
function isNear(control: TunedControl, channel: Channel, visionMhz: number): boolean {
  if (channel.visionMhz === null) return false
  const stepless = control.way !== 'numbers' && control.way !== 'turret'
  const within = visionMhz >= channel.lowerMhz && visionMhz <= channel.upperMhz
  const near = Math.abs(channel.visionMhz - visionMhz) <= control.pullInMhz
  return near || (stepless && within)
}
