import type { Carriers, Give, ModelFunction, PictureGive, RfGive } from '@coaxwain/models'
import type { Material } from '@coaxwain/shelf'
import {
  channelsIn,
  FORM_MHZ,
  poorer,
  RF_SYSTEMS,
  SOUND_RANK,
  type Channel,
  type Colour,
  type PictureForm,
  type ScanId,
  type Sound,
} from '@coaxwain/signal'
import type { Stage } from './bench'
import type { TakenIn } from './taking'
import type { Wave } from './wave'

const formOf = (stage: Stage, give: Give): PictureForm => stage.jack(give.jack)?.form as PictureForm

const embedsSound = (form: PictureForm): boolean => form === 'rf' || form === 'hdmi'

/** Luma bandwidth of an output; of a carrier its system decides. */
const widthMhz = (fn: ModelFunction, form: PictureForm, colour: Colour): number =>
  Math.min(fn.bandwidthMhz ?? Infinity, form === 'rf' ? Infinity : formMhz(form, colour))

function formMhz(form: PictureForm, colour: Colour): number {
  if (form !== 'composite') return FORM_MHZ[form]
  if (colour === 'secam') return 3.5
  return ['pal', 'pal-n', 'pal-60'].includes(colour) ? 5 : FORM_MHZ.composite
}

// ---------------------------------------------------------------- the source

/** The wave that a source puts out by one output under the positions set, if it is the one claimed. */
export function played(stage: Stage, give: Give, claimed: Wave): Wave | null {
  const { fn, bench } = stage
  const { material } = bench.question
  if (!stage.isSetToAct() || !stage.settles(give.while)) return null
  const row = (give.picture ?? [])
    .filter((r) => isRecorded(r, material) && stage.settles(r.while))
    .find((r) => isClaimed(r, material, claimed))
  if (!row) return null
  const form = formOf(stage, give)
  const { scan, colour } = claimed
  const wave: Wave = {
    form,
    scan,
    colour,
    poorest: form,
    lumaMhz: widthMhz(fn, form, colour),
    protection: material.protection,
    shape: row.shape ?? material.shape ?? '4:3',
    direct: fn.storesFields !== true,
    riding: ridingSound(stage, give, form),
    volts: give.volts ?? [],
    system: null,
    visionMhz: null,
  }
  return form === 'rf' ? modulated(stage, give.rf ?? [], wave) : wave
}

function ridingSound(stage: Stage, give: Give, form: PictureForm): Sound {
  const own = embedsSound(form) ? ownSound(stage.fn, stage.bench.question.material) : 'none'
  const carried = form === 'rf' ? (give.rf?.[0]?.sound ?? 'none') : own
  return SOUND_RANK[carried] < SOUND_RANK[own] ? carried : own
}

/** Made anew whatever was recorded, or recorded in just this scan. */
const isRecorded = (row: PictureGive, material: Material): boolean =>
  material.scan === undefined ||
  row.converts === true ||
  row.scan === 'same' ||
  row.scan === material.scan

const isClaimed = (row: PictureGive, material: Material, claimed: Wave): boolean =>
  (row.scan === 'same' ? material.scan : row.scan) === claimed.scan &&
  (row.colour === 'same' ? material.colour : row.colour) === claimed.colour

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

// ---------------------------------------------------------------- a box on the way

/** What a function has inside it when it comes to give. */
export interface Inner {
  readonly wave: Wave
  readonly taken: TakenIn
  readonly lumaOnly: boolean
  readonly riding: Sound
  /** What the hookup says leaves here, to choose between rows that no switch tells apart. */
  readonly claimed: Wave | null
}

/** What leaves by an output, or null with a finding. */
export function giveOut(stage: Stage, give: Give, inner: Inner): Wave | null {
  const row = stage.settles(give.while) ? rowNow(stage, give, inner) : null
  if (!row) {
    stage.report('output-not-given', { jack: give.jack })
    return null
  }
  const next = remade(stage, give, row, inner)
  return next.form === 'rf' && give.rf ? modulated(stage, give.rf, next) : next
}

const SAME: PictureGive = { scan: 'same', colour: 'same' }

/** The picture row that an output uses now: what equals the input, else the same scan, else any. */
function rowNow(stage: Stage, give: Give, { wave, claimed }: Inner): PictureGive | null {
  const rows = (give.picture ?? [SAME]).filter((r) => stage.holds(r.while))
  const scanOf = (r: PictureGive): ScanId => (r.scan === 'same' ? wave.scan : r.scan)
  const rank = (r: PictureGive): number => {
    if (scanOf(r) !== wave.scan) return 2
    return r.colour === 'same' || r.colour === wave.colour ? 0 : 1
  }
  const best = Math.min(...rows.map(rank))
  const candidates = rows.filter((r) => rank(r) === best)
  return candidates.find((r) => scanOf(r) === claimed?.scan) ?? candidates[0] ?? null
}

/** The wave after a function has turned it into the form and the row of an output. */
function remade(stage: Stage, give: Give, row: PictureGive, inner: Inner): Wave {
  const { wave, lumaOnly } = inner
  const form = formOf(stage, give)
  const scan = row.scan === 'same' ? wave.scan : row.scan
  const colour = colourLeft(row, inner)
  return {
    ...wave,
    form,
    scan,
    colour,
    poorest: poorer(lumaOnly ? 'luma-only' : wave.poorest, form),
    lumaMhz: Math.min(wave.lumaMhz, widthMhz(stage.fn, form, colour)),
    shape: row.shape ?? wave.shape,
    direct: wave.direct && stage.fn.storesFields !== true && scan === wave.scan,
    riding: embedsSound(form) ? inner.riding : 'none',
    volts: give.volts ?? [],
    ...(form === 'rf' ? {} : { system: null, visionMhz: null }),
  }
}

function colourLeft(row: PictureGive, { wave, taken, lumaOnly }: Inner): Colour {
  if (lumaOnly) return 'mono'
  if (row.colour === 'same') return wave.colour
  return taken.colour ? row.colour : 'mono'
}

// ---------------------------------------------------------------- carriers

const TELEVISION: readonly ScanId[] = ['525i60', '262p60', '625i50', '312p50']

/**
 * Scans that a modulator for a system of so many lines sends: one for 525 or 625 knows nothing of lines and sends
 * both, with the non-interlaced pictures of either raster (common practice, no source).
 */
const CARRIED: Readonly<Record<405 | 525 | 625 | 819, readonly ScanId[]>> = {
  525: TELEVISION,
  625: TELEVISION,
  405: ['405i50'],
  819: ['819i50'],
}

/** A wave on the carrier that is put out under the positions set. */
function modulated(stage: Stage, gives: readonly RfGive[], wave: Wave): Wave | null {
  const rf = gives.find((r) => stage.holds(r.while))
  if (!rf) return null
  const system = RF_SYSTEMS[rf.system]
  if (!CARRIED[system.lines].includes(wave.scan)) {
    stage.report('system-does-not-carry', { system: rf.system })
    return null
  }
  const visionMhz = sentOn(stage, rf)
  if (visionMhz === null) {
    stage.report('channel-not-offered')
    return null
  }
  const folded: Sound = rf.sound === 'mono' && wave.riding === 'stereo' ? 'mono' : wave.riding
  return {
    ...wave,
    system: rf.system,
    visionMhz,
    lumaMhz: Math.min(wave.lumaMhz, system.videoMhz),
    riding: rf.sound === 'none' ? 'none' : folded,
  }
}

/** The vision carrier: fixed, or by the channel that is set; a control with one channel needs no setting. */
function sentOn({ bench, unit, device }: Stage, rf: RfGive): number | null {
  if ('part' in rf.channel) return channelsIn(rf.channel.part)[0]?.visionMhz ?? null
  const key = rf.channel.control
  const control = device.controls.find((c) => c.key === key)
  if (control?.kind !== 'channel') return null
  const offered = offeredBy(control.carriers)
  const name = bench.positions.of(unit, key) ?? (offered.length === 1 ? offered[0]?.name : null)
  return offered.find((c) => c.name === name)?.visionMhz ?? null
}

/** Channels of the plan; of a screw that is turned, those whose carrier lies in its span. */
export const offeredBy = (carriers: Carriers): readonly Channel[] =>
  channelsIn(carriers.part).filter(
    ({ visionMhz }) =>
      carriers.kind === 'channels' ||
      (visionMhz !== null && visionMhz >= carriers.lowMhz && visionMhz <= carriers.highMhz),
  )
