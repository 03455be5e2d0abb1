import {
  chromaLines,
  FORM_MHZ,
  LADDER_STEPS,
  lumaLines,
  PICTURE_LADDER,
  RF_SYSTEMS,
  TIER,
  type LadderStep,
} from '@coaxwain/signal'
import { describe, expect, it } from 'vitest'
import { readTable, type CsvRow } from './csv'
import { got } from './inputs'

/** Each row with its source in the last columns but one. */
const rows = readTable('signal-forms')

const known = rows.map((row): [LadderStep, CsvRow] => [row['id'] as LadderStep, row])

const plain = (source: string): string => source.replaceAll(', no source', '')

it('every row of the published ladder is a step that is known, and no other', () => {
  expect(known.map(([id]) => id)).toEqual([...LADDER_STEPS])
})

describe.each(known)('%s', (id, row) => {
  const fact = PICTURE_LADDER[id]

  it('has the rank, the bandwidths and the source of the table', () => {
    expect(fact.rank).toBe(Number(row['rank_best_is_high']))
    expect(fact.lumaMhz).toBe(Number(row['luma_bandwidth_mhz']))
    expect(fact.chromaMhz).toBe(Number(row['chroma_bandwidth_mhz']))
    expect([plain(fact.source), fact.confidence]).toEqual([row['source'], row['confidence']])
  })

  // Derived by 2 B t x 3/4, never read from the table.
  it('shows the lines of the table', () => {
    expect(Math.abs(got(lumaLines(id)) - Number(row['tv_lines_per_picture_height']))).toBeLessThan(
      1,
    )
    expect(Math.abs(got(chromaLines(id)) - Number(row['chroma_tv_lines']))).toBeLessThan(1)
  })
})

describe('the ladder', () => {
  const rank = (step: LadderStep): number => PICTURE_LADDER[step].rank

  it('falls from step to step', () => {
    const ranks = LADDER_STEPS.map(rank)
    expect(ranks).toEqual([...ranks].sort((a, b) => b - a))
  })

  it('stands behind the bandwidths of the forms', () => {
    expect(FORM_MHZ.component).toBe(PICTURE_LADDER.ypbpr.lumaMhz)
    expect(FORM_MHZ.rgbs).toBe(PICTURE_LADDER.rgb.lumaMhz)
    expect(FORM_MHZ['s-video']).toBe(PICTURE_LADDER.svideo.lumaMhz)
    expect(FORM_MHZ.composite).toBe(PICTURE_LADDER['composite-ntsc-comb'].lumaMhz)
    expect(FORM_MHZ.rf).toBe(PICTURE_LADDER['rf-m'].lumaMhz)
  })

  it('lets no system through by more than its channel', () => {
    expect(PICTURE_LADDER['rf-m'].lumaMhz).toBe(RF_SYSTEMS.M.videoMhz)
    expect(PICTURE_LADDER['rf-i'].lumaMhz).toBe(RF_SYSTEMS.I.videoMhz)
    expect(PICTURE_LADDER['rf-bg'].lumaMhz).toBe(RF_SYSTEMS.G.videoMhz)
    expect(PICTURE_LADDER['rf-dk-l'].lumaMhz).toBeLessThan(RF_SYSTEMS.D.videoMhz)
  })

  /** Component and RGB share a tier: nobody sees the difference at the usual distance. */
  it('runs the same way as the tiers', () => {
    const pairs = [
      ['component', 'ypbpr'],
      ['s-video', 'svideo'],
      ['composite', 'composite-ntsc-comb'],
      ['rf', 'rf-m'],
    ] as const
    const byTier = [...pairs].sort(([a], [b]) => TIER[b] - TIER[a])
    const byRank = [...pairs].sort(([, a], [, b]) => rank(b) - rank(a))
    expect(byTier).toEqual(byRank)
  })
})
