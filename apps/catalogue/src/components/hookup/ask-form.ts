import type { DeviceModel } from '@coaxwain/models'
import type { Aim, Question } from '@coaxwain/shelf'
import type { Colour, Protection, ScanId } from '@coaxwain/signal'

/** What is typed and chosen on the page that asks. */
export interface AskForm {
  source: string
  playing: string
  display: string
  /** Scan and colour of the recording, as one choice. */
  standard: string
  protection: Protection
  wide: boolean
  colour: boolean
  stereo: boolean
  keepAerial: boolean
  aim: Aim
}

export const emptyAsk = (): AskForm => ({
  source: '',
  playing: '',
  display: '',
  standard: '',
  protection: 'none',
  wide: false,
  colour: false,
  stereo: false,
  keepAerial: false,
  aim: 'watch',
})

export interface Standard {
  readonly value: string
  readonly scan: ScanId
  readonly colour: Colour
}

export const playingFunctions = (device: DeviceModel | undefined) =>
  device?.functions.filter((f) => f.kind === 'plays') ?? []

/** The standards that a source can give, where it gives more than one. */
export function standardsOf(device: DeviceModel | undefined, playing: string): Standard[] {
  const fn = device?.functions.find((f) => f.key === playing)
  const found = new Map<string, Standard>()
  for (const row of fn?.gives.flatMap((g) => g.picture ?? []) ?? []) {
    if (row.scan === 'same' || row.colour === 'same') continue
    const encoded = row.colour !== 'rgb' && row.colour !== 'ypbpr' && row.colour !== 'digital'
    const value = `${row.scan} ${row.colour}`
    if (encoded) found.set(value, { value, scan: row.scan, colour: row.colour })
  }
  return found.size > 1 ? [...found.values()] : []
}

export function toQuestion(form: AskForm): Question {
  const [scan, colour] = form.standard.split(' ') as [ScanId?, Colour?]
  return {
    format: 1,
    source: { unit: form.source, playing: form.playing },
    material: {
      protection: form.protection,
      ...(scan && colour ? { scan, colour } : {}),
      ...(form.wide ? { shape: 'squeezed' as const } : {}),
    },
    display: { unit: form.display },
    demands: {
      aim: form.aim,
      ...(form.colour ? { colour: true } : {}),
      ...(form.stereo ? { stereo: true } : {}),
      ...(form.keepAerial ? { keepAerial: true } : {}),
    },
    avoid: [],
    offAir: [],
    assumedLeads: [],
  }
}

export const fromQuestion = (q: Question): AskForm => ({
  source: q.source.unit,
  playing: q.source.playing,
  display: q.display.unit,
  standard: q.material.scan && q.material.colour ? `${q.material.scan} ${q.material.colour}` : '',
  protection: q.material.protection,
  wide: q.material.shape === 'squeezed',
  colour: q.demands.colour ?? false,
  stereo: q.demands.stereo ?? false,
  keepAerial: q.demands.keepAerial ?? false,
  aim: q.demands.aim ?? 'watch',
})
