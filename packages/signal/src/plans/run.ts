import type { RfSystemId } from '../systems'

export const PLAN_IDS = [
  'us-broadcast',
  'us-cable-std',
  'us-cable-irc',
  'us-cable-hrc',
  'ccir-west-europe',
  'uk-uhf',
  'uk-405',
  'ireland',
  'france',
  'oirt-east-europe',
  'italy-vhf',
  'japan-broadcast',
  'japan-cable',
  'australia',
  'australia-digital',
  'new-zealand',
  'china-broadcast',
] as const

export type PlanId = (typeof PLAN_IDS)[number]

/** How sure a row is: two sources agree, one source, sources conflict and the regulation wins, or memory. */
export type Confidence = 'two' | 'one' | 'regulation' | 'memory'

/** One channel of a plan. All frequencies in MHz; carriers are null where a plan is digital only. */
export interface Channel {
  readonly plan: PlanId
  readonly name: string
  readonly lowerMhz: number
  readonly upperMhz: number
  readonly visionMhz: number | null
  readonly soundMhz: number | null
  readonly system: RfSystemId | 'DVB-T'
  readonly band: string
  /** Whether broadcasters still use it off air; not a permission to transmit. */
  readonly allocated: string
  readonly source: string
  readonly confidence: Confidence
  readonly note: string | null
}

/** Equally spaced neighbours of a plan that share every attribute; offsets count from the lower edge. */
export interface Run {
  /** `14..69` with one prefix and whole numbers, or names separated by commas. */
  readonly names: string
  readonly lowerMhz: number
  readonly stepMhz?: number
  readonly widthMhz: number
  /** 1.25 MHz unless stated. */
  readonly visionAboveMhz?: number | null
  readonly soundAboveMhz: number | null
  readonly system: RfSystemId | 'DVB-T'
  readonly band: string
  readonly allocated: string
  readonly source: string
  readonly confidence: Confidence
  readonly note?: string
}

export interface PlanRuns {
  readonly plan: PlanId
  readonly channels: readonly Channel[]
}

/** `E2..E4` is E2, E3, E4; `1,4` is 1 and 4. */
export function expandNames(names: string): string[] {
  const span = /^(\D*)(\d+)\.\.\1(\d+)$/.exec(names)
  if (!span) return names.split(',')
  const [, prefix = '', first = '', last = ''] = span
  const width = first.startsWith('0') ? first.length : 0
  return Array.from(
    { length: Number(last) - Number(first) + 1 },
    (_, i) => prefix + String(Number(first) + i).padStart(width, '0'),
  )
}

/** Frequencies are kept to 0.1 kHz, the precision of the published tables. */
const round = (mhz: number): number => Math.round(mhz * 10_000) / 10_000

export function defineRuns(
  plan: PlanId,
  sources: Readonly<Record<string, string>>,
  runs: readonly Run[],
): PlanRuns {
  const channels = runs.flatMap((run) => {
    const source = sources[run.source]
    if (source === undefined) throw new Error(`${plan}: no source ${run.source}`)
    const vision = run.visionAboveMhz === undefined ? 1.25 : run.visionAboveMhz
    return expandNames(run.names).map((name, i): Channel => {
      const lower = run.lowerMhz + i * (run.stepMhz ?? 0)
      return {
        plan,
        name,
        lowerMhz: round(lower),
        upperMhz: round(lower + run.widthMhz),
        visionMhz: vision === null ? null : round(lower + vision),
        soundMhz: run.soundAboveMhz === null ? null : round(lower + run.soundAboveMhz),
        system: run.system,
        band: run.band,
        allocated: run.allocated,
        source,
        confidence: run.confidence,
        note: run.note ?? null,
      }
    })
  })
  return { plan, channels }
}
