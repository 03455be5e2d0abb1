import { inputsOf, jackOf, type Give, type Key, type ModelFunction } from '@coaxwain/models'
import type { Setting, Stop } from '@coaxwain/shelf'
import {
  FORM_MHZ,
  isPictureForm,
  RF_SYSTEMS,
  TIER,
  type PictureForm,
  type PictureSignal,
} from '@coaxwain/signal'
import type { Bench, Box, Leant } from './bench'
import type { Wire } from './layout'
import { holdsIn, sentBy, settingsOf, standsOf, type Doing, type Positions } from './stands'

/** A unit of a chain at work. */
export interface Working extends Doing {
  readonly settings: readonly Setting[]
  /** What it is said to put out, where that decides which of its rows is meant. */
  readonly claim: PictureSignal | null
  /** The vision carrier on the lead that leaves. */
  readonly visionMhz: number | null
}

/** Units in a row with the wires between them, and the pieces that these need at least. */
export interface Chain {
  readonly stops: readonly Working[]
  readonly wires: readonly Wire[]
  readonly pieces: number
}

/** Picture outputs of a function. */
export const pictureGives = ({ device }: Box, fn: ModelFunction): Give[] =>
  fn.gives.filter((g) => isPictureForm(jackOf(device, g.jack).form))

/** Picture inputs without which a function does nothing. */
export const pictureInputs = ({ device }: Box, fn: ModelFunction): Key[] =>
  [...fn.needs, ...(fn.oneOf ?? [])].filter((key) => isPictureForm(jackOf(device, key).form))

export const soundInputs = ({ device }: Box, fn: ModelFunction): Key[] =>
  inputsOf(fn).filter((key) => jackOf(device, key).form === 'sound')

export const soundGives = ({ device }: Box, fn: ModelFunction): Give[] =>
  fn.gives.filter((g) => g.sound !== undefined && jackOf(device, g.jack).form === 'sound')

/** The source with each of its outputs, in each way in which it can be set. */
export function startsOf(bench: Bench): Chain[] {
  const { source, question } = bench
  const fn = source.device.functions.find((f) => f.key === question.source.playing)
  if (!fn) throw new Error(`${source.device.name} does not play ${question.source.playing}`)
  return pictureGives(source, fn)
    .map((give) => ({ box: source, fn, in: null, give }))
    .flatMap((doing) => standsOf(doing).flatMap((stand) => leaving(bench, doing, stand, [])))
    .map((stop) => ({ stops: [stop], wires: [], pieces: 0 }))
}

/** A stop under its positions, once for each row that may be meant and each channel that makes a difference. */
export function leaving(
  bench: Bench,
  doing: Doing,
  stand: Positions,
  tuning: readonly Setting[],
): Working[] {
  const { box, give } = doing
  const settings = [...settingsOf(box, stand), ...tuning]
  const still = { ...doing, settings, visionMhz: null }
  if (!give) return [{ ...still, claim: null }]
  const claims = doing.in === null ? playedBy(bench, doing, give) : madeAnew(doing, give, stand)
  const sent = give.rf ? sentBy(bench, box, give, stand) : [{ visionMhz: null, settings: [] }]
  return claims.flatMap((claim) =>
    sent.map((s) => ({
      ...still,
      claim,
      settings: [...settings, ...s.settings],
      visionMhz: s.visionMhz,
    })),
  )
}

const signal = (
  form: PictureForm,
  shown: Pick<PictureSignal, 'scan' | 'colour'>,
): PictureSignal => ({
  form,
  ...shown,
  poorest: form,
  lumaMhz: FORM_MHZ[form],
  protection: 'none',
  shape: '4:3',
  direct: true,
  delayMs: 0,
  carrier: null,
})

const distinct = <T>(things: readonly T[]): T[] => [
  ...new Map(things.map((t) => [JSON.stringify(t), t])).values(),
]

/** What a source may be said to play by one output. */
function playedBy({ question: { material } }: Bench, { box }: Doing, give: Give): PictureSignal[] {
  const form = jackOf(box.device, give.jack).form as PictureForm
  const shown = (give.picture ?? []).flatMap((row) => {
    const scan = row.scan === 'same' ? material.scan : row.scan
    const colour = row.colour === 'same' ? material.colour : row.colour
    return scan && colour ? [{ scan, colour }] : []
  })
  return distinct(shown).map((s) => signal(form, s))
}

/** Rows that could be meant at once are told apart by their scan. */
function madeAnew({ box }: Doing, give: Give, stand: Positions): (PictureSignal | null)[] {
  const rows = (give.picture ?? []).filter((r) => holdsIn(r.while, stand))
  const scans = distinct(rows.flatMap((r) => (r.scan === 'same' ? [] : [r.scan])))
  if (rows.length < 2 || scans.length === 0) return [null]
  const form = jackOf(box.device, give.jack).form as PictureForm
  return [null, ...scans.map((scan) => signal(form, { scan, colour: 'mono' }))]
}

export const stopOf = ({ box, fn, in: input, give, claim }: Working): Stop => ({
  unit: box.unit.uid,
  function: fn.key,
  in: input,
  out: give?.jack ?? null,
  picture: claim,
  sound: 'none',
})

/** Everything that the picture leans on along a chain. */
export const leantOn = (stops: readonly Doing[]): Leant[] =>
  stops.flatMap(({ box, fn, in: input, give }) => [
    { box, fn: fn.key },
    ...[input, give?.jack ?? null].flatMap((key) =>
      key === null
        ? []
        : jackOf(box.device, key).contacts.map(({ port }) => ({ box, jack: key, port })),
    ),
  ])

/** No picture is better than the poorest form it has been through, nor has more luma bandwidth than that. */
export function boundOf(stops: readonly Doing[]): { tier: number; lumaMhz: number } {
  let [tier, lumaMhz] = [Infinity, Infinity]
  for (const { box, fn, give } of stops) {
    lumaMhz = Math.min(lumaMhz, fn.bandwidthMhz ?? Infinity)
    if (!give) continue
    const form = jackOf(box.device, give.jack).form as PictureForm
    tier = Math.min(tier, TIER[form])
    lumaMhz = Math.min(lumaMhz, widestMhz(form, give))
  }
  return { tier, lumaMhz }
}

/** Composite of the 625-line systems keeps 5 MHz (ITU-R BT.470). */
const WIDEST_COMPOSITE_MHZ = 5

function widestMhz(form: PictureForm, give: Give): number {
  if (form === 'composite') return WIDEST_COMPOSITE_MHZ
  if (form !== 'rf') return FORM_MHZ[form]
  const widths = (give.rf ?? []).map((r) => RF_SYSTEMS[r.system].videoMhz)
  return widths.length === 0 ? Infinity : Math.max(...widths)
}
