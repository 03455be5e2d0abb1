import type { AcceptRow } from '@coaxwain/models'
import {
  DEFLECTION_50,
  DEFLECTION_60,
  LINES_525,
  LINES_625,
  NTSC_LINE,
  NTSC_SET,
  PAL_LINE,
  PAL_SET,
} from '@coaxwain/models/build'
import type { Colour, Deflection, PlanId, RfSystemId, ScanId } from '@coaxwain/signal'
import type { FormMarket } from './model-form'

/** What a device of a market gives and takes unless somebody knows better. */
export interface MarketFacts {
  readonly scan: ScanId
  readonly colour: Colour
  readonly scans: readonly ScanId[]
  readonly system: RfSystemId
  /** Systems whose sound its sets hear. */
  readonly heard: readonly RfSystemId[]
  readonly lineInput: readonly AcceptRow[]
  readonly setInput: readonly AcceptRow[]
  readonly deflection: Deflection
  readonly plan: PlanId
}

const OF_525 = {
  scan: '525i60',
  scans: LINES_525,
  system: 'M',
  heard: ['M'],
  lineInput: NTSC_LINE,
  setInput: NTSC_SET,
  deflection: DEFLECTION_60,
} as const

const OF_625 = {
  scan: '625i50',
  colour: 'pal',
  scans: LINES_625,
  lineInput: PAL_LINE,
  setInput: PAL_SET,
  deflection: DEFLECTION_50,
} as const

export const MARKET_FACTS: Readonly<Record<FormMarket, MarketFacts>> = {
  '525-m': { ...OF_525, colour: 'ntsc-m', plan: 'us-broadcast' },
  '525-japan': { ...OF_525, colour: 'ntsc-j', plan: 'japan-broadcast' },
  '625-bg': { ...OF_625, system: 'G', heard: ['B', 'G'], plan: 'ccir-west-europe' },
  '625-i': { ...OF_625, system: 'I', heard: ['I'], plan: 'uk-uhf' },
  '625-dk': { ...OF_625, system: 'K', heard: ['D', 'K'], plan: 'oirt-east-europe' },
}
