import type {
  AcceptRow,
  Condition,
  Control,
  DeviceModel,
  Give,
  Jack,
  Key,
  ModelFunction,
  PictureGive,
  RfGive,
} from '@coaxwain/models'
import { POWER_KEY } from '@coaxwain/models'
import type { Hookup, Link, Material, Uid } from '@coaxwain/shelf'
import {
  arrivalAt,
  channelsIn,
  decode,
  findChannel,
  FORM_MHZ,
  isEncoded,
  poorer,
  RF_SYSTEMS,
  samePolarity,
  sameSoundSpacing,
  type Circuit,
  type PictureForm,
  type RfSystemId,
  type ScanId,
  type Sound,
  type SwitchVolt,
} from '@coaxwain/signal'
import { finding, type Finding } from './finding'
import type { Positions, ShelfView } from './shelf-view'
import type { Wave } from './wave'

export interface Bench {
  readonly hookup: Hookup
  readonly view: ShelfView
  readonly positions: Positions
  readonly found: Finding[]
}

/**
 * Whether a condition holds by the settings. A control that the hookup leaves open may stand anywhere,
 * so every one of its positions must do.
 */
export function settled(bench: Bench, unit: Uid, condition: Condition | undefined): boolean {
  return (condition ?? []).every(({ control: key, in: wanted }) => {
    const control = bench.view.device(unit)?.controls.find((c) => c.key === key)
    const at = bench.positions.of(unit, key) ?? (key === POWER_KEY ? 'on' : null)
    if (at !== null) return wanted.includes(at)
    if (!control || (control.kind !== 'positions' && control.kind !== 'auto')) return false
    const all = control.positions.every((p) => wanted.includes(p.key))
    if (!all) bench.found.push(finding('position-left-open', { unit, control: key }))
    return all
  })
}

/** Only asks; leaves no finding behind. */
const holdsNow = (bench: Bench, unit: Uid, condition: Condition | undefined): boolean =>
  settled({ ...bench, found: [] }, unit, condition)

/** The links that end at the ports of a jack, by the circuit that each port expects. */
function arriving(
  bench: Bench,
  unit: Uid,
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

/** Switching voltages that reach a jack along with its picture. */
export function voltsAt(
  bench: Bench,
  unit: Uid,
  jack: Jack,
  given: readonly SwitchVolt[],
): SwitchVolt[] {
  const [first] = arriving(bench, unit, jack)
  if (!first) return []
  const pieces = first.link.pieces.map((p) => bench.view.piece(p.model))
  const passes = pieces.every((p) => p?.wires.some((w) => w.a.circuit === 'switch-volts'))
  return [...(passes ? given : []), ...pieces.flatMap((p) => p?.suppliesVolts ?? [])]
}

export interface PictureIn {
  readonly wave: Wave
  readonly lumaOnly: boolean
}

/** What of a picture reaches a jack by the wires that are there. */
export function pictureInto(bench: Bench, unit: Uid, jack: Jack, wave: Wave): PictureIn | null {
  const arrives = new Map(arriving(bench, unit, jack).map((a) => [a.to, a.from]))
  const form = jack.form as PictureForm
  if (form === 'hdmi' || form === 'dvi' || form === 'rf') {
    const [only] = [...arrives.values()]
    const right = form === 'rf' ? only === 'rf' : only === 'tmds'
    return right ? { wave, lumaOnly: false } : null
  }
  const expected = new Map(jack.contacts.map((c) => [c.circuit, arrives.get(c.circuit)]))
  const named = new Map<Circuit, Circuit>()
  for (const [to, from] of expected)
    if (from) named.set(to === 'cvbs' && form === 'rgbs' ? 'csync' : to, from)
  const arrival = arrivalAt(form, named)
  if (arrival.kind === 'whole') return { wave, lumaOnly: false }
  return arrival.kind === 'luma-only' ? { wave, lumaOnly: true } : null
}

// ---------------------------------------------------------------- inputs

export interface TakenIn {
  readonly colour: boolean
  readonly reducedHeight: boolean
  readonly heard: boolean
}

/** The first row that matches under the positions that the hookup sets decides. */
export function take(
  bench: Bench,
  unit: Uid,
  fn: ModelFunction,
  jack: Jack,
  input: PictureIn,
  volts: readonly SwitchVolt[],
): TakenIn | null {
  const { wave } = input
  if (fn.tunedBy !== undefined && !isTuned(bench, unit, fn.tunedBy, wave)) {
    bench.found.push(finding('not-tuned', { unit, function: fn.key }))
    return null
  }
  const rows: readonly AcceptRow[] =
    fn.accepts.length > 0 ? fn.accepts : [{ scans: 'any', colours: 'any' }]
  let grey: TakenIn | null = null
  for (const row of rows) {
    if (row.jacks && !row.jacks.includes(jack.key)) continue
    if (!holdsNow(bench, unit, row.while)) continue
    if (row.volts && !row.volts.every((v) => volts.includes(v))) continue
    if (row.scans !== 'any' && !row.scans.includes(wave.scan)) continue
    const reception = fn.tunedBy === undefined ? 'heard' : receive(row, wave)
    if (reception === 'nothing') continue
    const colour = coloured(row, input)
    if (colour === 'nothing') continue
    const taken: TakenIn = {
      colour: colour === 'colour' && row.outcome !== 'monochrome',
      reducedHeight: row.outcome === 'reduced-height',
      heard: reception === 'heard' && row.outcome !== 'silent',
    }
    if (colour === 'colour') return taken
    grey ??= taken
  }
  return grey
}

function isTuned(bench: Bench, unit: Uid, key: Key, wave: Wave): boolean {
  const control = bench.view.device(unit)?.controls.find((c) => c.key === key)
  const set = bench.hookup.settings.find((s) => s.unit === unit && s.control === key)
  if (control?.kind !== 'tuned-to' || wave.visionMhz === null) return false
  if (!set?.plan) return false
  const channel = findChannel(set.plan, set.position)
  if (!channel || channel.visionMhz === null) return false
  const reach = control.reaches.find(
    (r) =>
      r.part.plan === set.plan &&
      channelsIn(r.part).some((c) => c.name === set.position) &&
      holdsNow(bench, unit, r.while),
  )
  if (!reach) return false
  const stepless = control.way !== 'numbers' && control.way !== 'turret'
  const near = Math.abs(channel.visionMhz - wave.visionMhz) <= control.pullInMhz
  return (
    near || (stepless && wave.visionMhz >= channel.lowerMhz && wave.visionMhz <= channel.upperMhz)
  )
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

// ---------------------------------------------------------------- outputs

const limitMhz = (form: PictureForm, colour: Wave['colour']): number => {
  if (form === 'rf') return Infinity
  if (form !== 'composite') return FORM_MHZ[form]
  if (colour === 'secam') return 3.5
  return ['pal', 'pal-n', 'pal-60'].includes(colour) ? 5 : FORM_MHZ.composite
}

/** The picture row that an output uses now: what equals the input, else the same scan, else any. */
function rowNow(
  bench: Bench,
  unit: Uid,
  give: Give,
  scan: ScanId,
  colour: Wave['colour'],
  want: Wave | null,
): PictureGive | null {
  const rows = (give.picture ?? [{ scan: 'same', colour: 'same' }]).filter((r) =>
    holdsNow(bench, unit, r.while),
  )
  const rank = (r: PictureGive): number => {
    const scanSame = r.scan === 'same' || r.scan === scan
    const colourSame = r.colour === 'same' || r.colour === colour
    return scanSame && colourSame ? 0 : scanSame ? 1 : 2
  }
  const best = Math.min(...rows.map(rank))
  const candidates = rows.filter((r) => rank(r) === best)
  const claimed = candidates.find((r) => want && (r.scan === 'same' ? scan : r.scan) === want.scan)
  return claimed ?? candidates[0] ?? null
}

export interface Inner {
  readonly wave: Wave
  readonly taken: TakenIn
  readonly lumaOnly: boolean
  readonly riding: Sound
  /** What the hookup says leaves here, to choose between rows that no switch tells apart. */
  readonly claimed: Wave | null
}

/** What leaves by an output, or null with a finding. */
export function giveOut(
  bench: Bench,
  unit: Uid,
  fn: ModelFunction,
  give: Give,
  inner: Inner,
): Wave | null {
  const device = bench.view.device(unit)!
  const form = device.jacks.find((j) => j.key === give.jack)?.form as PictureForm
  if (!settled(bench, unit, give.while)) {
    bench.found.push(finding('output-not-given', { unit, jack: give.jack }))
    return null
  }
  const { wave } = inner
  const row = rowNow(bench, unit, give, wave.scan, wave.colour, inner.claimed)
  if (!row) {
    bench.found.push(finding('output-not-given', { unit, jack: give.jack }))
    return null
  }
  const scan = row.scan === 'same' ? wave.scan : row.scan
  const turned = row.colour === 'same' ? wave.colour : inner.taken.colour ? row.colour : 'mono'
  const colour = inner.lumaOnly ? 'mono' : turned
  const next: Wave = {
    ...wave,
    form,
    scan,
    colour,
    poorest: poorer(inner.lumaOnly ? 'luma-only' : wave.poorest, form),
    lumaMhz: Math.min(wave.lumaMhz, fn.bandwidthMhz ?? Infinity, limitMhz(form, colour)),
    shape: row.shape ?? wave.shape,
    direct: wave.direct && fn.storesFields !== true && scan === wave.scan,
    riding: form === 'rf' || form === 'hdmi' ? inner.riding : 'none',
    volts: give.volts ?? [],
  }
  if (form !== 'rf') return { ...next, system: null, visionMhz: null }
  return give.rf ? modulate(bench, unit, device, give.rf, next) : next
}

export function modulate(
  bench: Bench,
  unit: Uid,
  device: DeviceModel,
  gives: readonly RfGive[],
  wave: Wave,
): Wave | null {
  const rf = gives.find((r) => holdsNow(bench, unit, r.while))
  if (!rf) return null
  const lines = RF_SYSTEMS[rf.system].lines
  const carries: Record<number, readonly ScanId[]> = {
    525: ['525i60', '262p60'],
    625: ['625i50', '312p50'],
    405: ['405i50'],
    819: ['819i50'],
  }
  if (!carries[lines]?.includes(wave.scan)) {
    bench.found.push(finding('system-does-not-carry', { unit, system: rf.system }))
    return null
  }
  const visionMhz = sentOn(bench, unit, device, rf)
  if (visionMhz === null) {
    bench.found.push(finding('channel-not-offered', { unit }))
    return null
  }
  const folded: Sound = rf.sound === 'mono' && wave.riding === 'stereo' ? 'mono' : wave.riding
  return {
    ...wave,
    system: rf.system,
    visionMhz,
    lumaMhz: Math.min(wave.lumaMhz, RF_SYSTEMS[rf.system].videoMhz),
    riding: rf.sound === 'none' ? 'none' : folded,
  }
}

function sentOn(bench: Bench, unit: Uid, device: DeviceModel, rf: RfGive): number | null {
  if ('part' in rf.channel) return channelsIn(rf.channel.part)[0]?.visionMhz ?? null
  const key = rf.channel.control
  const control: Control | undefined = device.controls.find((c) => c.key === key)
  if (control?.kind !== 'channel') return null
  const offered = channelsIn(control.carriers.part)
  const name =
    bench.positions.of(unit, key) ?? (offered.length === 1 ? offered[0]?.name : undefined)
  return offered.find((c) => c.name === name)?.visionMhz ?? null
}

// ---------------------------------------------------------------- the source

/** The wave that a source puts out by one output under the positions set, as the hookup claims it. */
export function played(
  bench: Bench,
  unit: Uid,
  fn: ModelFunction,
  give: Give,
  material: Material,
  claimed: Wave,
): Wave | null {
  const form = bench.view.jack(unit, give.jack)?.form as PictureForm
  if (!settled(bench, unit, fn.while) || !settled(bench, unit, give.while)) return null
  const rows = (give.picture ?? []).filter((r) => {
    const scan = r.scan === 'same' ? material.scan : r.scan
    const recorded = material.scan === undefined || r.converts === true || scan === material.scan
    return recorded && settled(bench, unit, r.while)
  })
  const row = rows.find(
    (r) =>
      (r.scan === 'same' ? material.scan : r.scan) === claimed.scan &&
      (r.colour === 'same' ? material.colour : r.colour) === claimed.colour,
  )
  if (!row) {
    bench.found.push(finding('output-not-given', { unit, jack: give.jack }))
    return null
  }
  const wave: Wave = {
    form,
    scan: claimed.scan,
    colour: claimed.colour,
    poorest: form,
    lumaMhz: Math.min(limitMhz(form, claimed.colour), fn.bandwidthMhz ?? Infinity),
    protection: material.protection,
    shape: row.shape ?? material.shape ?? '4:3',
    direct: fn.storesFields !== true,
    riding: form === 'rf' || form === 'hdmi' ? ownSound(fn, material) : 'none',
    volts: give.volts ?? [],
    system: null,
    visionMhz: null,
  }
  if (form !== 'rf') return wave
  return modulate(bench, unit, bench.view.device(unit)!, give.rf ?? [], {
    ...wave,
    riding: ridden(give),
  })
}

const ridden = (give: Give): Sound => {
  const [rf] = give.rf ?? []
  return rf ? rf.sound : 'none'
}

/** What sound a source makes of itself. */
export function ownSound(fn: ModelFunction, material: Material): Sound {
  const gives = fn.gives.filter(
    (g) => g.sound !== undefined || g.rf?.some((r) => r.sound !== 'none'),
  )
  if (gives.length === 0) return 'none'
  const stereo = gives.some((g) => g.sound === 'stereo' || g.rf?.some((r) => r.sound === 'stereo'))
  if (material.sound === undefined) return stereo ? 'stereo' : 'mono'
  if (material.sound === 'none') return 'none'
  return stereo ? material.sound : 'mono'
}
