import { mhz, type Mhz, type QuantityProblem } from '@coaxwain/quantities'
import type { Result } from '@coaxwain/result'
import { ACTIVE_LINE, horizontalTvLines } from '../video/tv-lines'
import type { FactConfidence } from './confidence'

export const LADDER_STEPS = [
  'rgb',
  'ypbpr',
  'svideo',
  'optical-analogue',
  'composite-pal-comb',
  'composite-ntsc-comb',
  'tape-s',
  'composite-pal-notch',
  'composite-secam',
  'rf-dk-l',
  'rf-i',
  'composite-ntsc-notch',
  'rf-bg',
  'rf-m',
  'tape-vhs',
] as const

/** Ways in which a standard-definition picture travels or is kept. */
export type LadderStep = (typeof LADDER_STEPS)[number]

/** What a step leaves of a picture. */
export interface LadderFact {
  /** An ordering, not a measurement: higher is better. */
  readonly rank: number
  readonly lumaMhz: number
  readonly chromaMhz: number
  /** By which raster its detail is counted in lines. */
  readonly raster: 525 | 625
  readonly crossTalk: 'none' | 'as-composite' | 'low' | 'some' | 'dots'
  readonly source: string
  readonly confidence: FactConfidence
}

const LORE = 'common practice, no source'
const BT601 = 'ITU-R BT.601 luma filter'
const BT470 = 'ITU-R BT.470; common practice'
const FCC = '47 CFR 73.682(a)(20)(iii); common practice'
const MODULATOR = 'open-source TV modulator configuration; ITU-R BT.470'
const MEMORY_OF_STANDARD = 'one source (agrees with memory of the standard)'

type Columns = readonly [
  rank: number,
  lumaMhz: number,
  chromaMhz: number,
  raster: LadderFact['raster'],
  crossTalk: LadderFact['crossTalk'],
]

const fact = (columns: Columns, source: string, confidence: FactConfidence): LadderFact => {
  const [rank, lumaMhz, chromaMhz, raster, crossTalk] = columns
  return { rank, lumaMhz, chromaMhz, raster, crossTalk, source, confidence }
}

export const PICTURE_LADDER: Readonly<Record<LadderStep, LadderFact>> = {
  rgb: fact([100, 5.75, 5.75, 525, 'none'], BT601, 'from memory'),
  ypbpr: fact([95, 5.75, 2.75, 525, 'none'], 'ITU-R BT.601 filters', 'from memory'),
  svideo: fact([80, 5, 1.3, 525, 'none'], FCC, 'common practice'),
  'optical-analogue': fact(
    [70, 5.3, 1.3, 525, 'as-composite'],
    'common practice; from memory',
    'from memory',
  ),
  'composite-pal-comb': fact([65, 5, 1.3, 625, 'low'], BT470, 'common practice'),
  'composite-ntsc-comb': fact([62, 4.2, 1.3, 525, 'low'], FCC, 'common practice'),
  'tape-s': fact(
    [60, 5, 0.4, 525, 'none'],
    'public format pages (400-420 lines, chroma 0.4 MHz)',
    'two independent sources agree',
  ),
  'composite-pal-notch': fact([55, 3.8, 1, 625, 'dots'], LORE, 'common practice'),
  'composite-secam': fact([52, 3.5, 1, 625, 'some'], LORE, 'common practice'),
  'rf-dk-l': fact([50, 5, 1, 625, 'as-composite'], BT470, 'common practice'),
  'rf-i': fact([49, 5.5, 1.3, 625, 'as-composite'], MODULATOR, MEMORY_OF_STANDARD),
  'composite-ntsc-notch': fact([48, 3, 0.6, 525, 'dots'], LORE, 'common practice'),
  'rf-bg': fact([45, 5, 1, 625, 'as-composite'], MODULATOR, MEMORY_OF_STANDARD),
  'rf-m': fact(
    [40, 4.2, 0.6, 525, 'as-composite'],
    '47 CFR 73.682, 73.687',
    'two independent sources agree',
  ),
  'tape-vhs': fact(
    [30, 3, 0.4, 525, 'some'],
    'public format pages (3 MHz, 0.4 MHz, 240 lines)',
    'two independent sources agree',
  ),
}

const inLines = (bandwidth: Mhz, raster: 525 | 625): Result<number, QuantityProblem> =>
  horizontalTvLines(bandwidth, ACTIVE_LINE[raster])

/** Luma detail of a step in TV lines per picture height; derived from its bandwidth. */
export const lumaLines = (step: LadderStep): Result<number, QuantityProblem> =>
  inLines(mhz(PICTURE_LADDER[step].lumaMhz), PICTURE_LADDER[step].raster)

/** Colour detail of a step in TV lines per picture height; derived from its bandwidth. */
export const chromaLines = (step: LadderStep): Result<number, QuantityProblem> =>
  inLines(mhz(PICTURE_LADDER[step].chromaMhz), PICTURE_LADDER[step].raster)
