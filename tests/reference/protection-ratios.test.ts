import { mhz } from '@coaxwain/quantities'
import {
  CABLE_PRODUCT_RATIO,
  DVB_MODES,
  PROTECTION_ROWS,
  protectionRatio,
  RF_SYSTEM_IDS,
  singleCarrierRatio,
  SOUND_RATIO,
  type Encounter,
  type Hearing,
  type Service,
} from '@coaxwain/signal'
import { describe, expect, it } from 'vitest'
import { readTable, type CsvRow } from './csv'
import { got } from './inputs'

/** Each row with its source in the last columns but two. */
const rows = readTable('protection-ratios')

const HEARINGS: readonly (readonly [Hearing, string])[] = [
  ['planning', 'ratio_db_tropospheric_or_planning'],
  ['continuous', 'ratio_db_continuous'],
]

/** Every service that a cell names; a cell without letters means all of 625 lines. */
function services(text: string): Service[] {
  if (/ATSC/u.test(text)) return ['atsc']
  if (/DVB-T/u.test(text)) return ['dvb-t']
  const letters = text
    .split(/[\s(),/]+/u)
    .filter((word): word is Service => RF_SYSTEM_IDS.some((id) => id === word))
  return letters.length > 0 ? letters : ['B', 'G', 'I', 'D', 'K', 'L']
}

/** `n-1`, `n+-1`, `n`. */
function channels(text: string): number[] {
  if (text === 'n') return [0]
  const far = Number(text.replace(/^n(\+-|[+-])/u, ''))
  if (text.startsWith('n+-')) return [far, -far]
  return [text.startsWith('n-') ? -far : far]
}

function offset(relation: string): Encounter['offset'] {
  if (relation.includes('10 kHz')) return '10-khz'
  if (relation.includes('8/12')) return '8/12-line'
  return relation.includes('4/12') ? '4/12-line' : 'none'
}

function meetings(row: CsvRow): Omit<Encounter, 'hearing'>[] {
  const relation = row['relation'] ?? ''
  const band = /VHF/u.test(`${relation} ${row['wanted']}`)
    ? 'VHF'
    : /UHF/u.test(relation)
      ? 'UHF'
      : undefined
  const isSame = row['unwanted'] === 'same'
  return services(row['wanted'] ?? '').flatMap((wanted) =>
    (isSame ? [wanted] : services(row['unwanted'] ?? '')).flatMap((unwanted) =>
      channels(row['unwanted_channel'] ?? '').map((away) => ({
        wanted,
        unwanted,
        channels: away,
        mode: DVB_MODES.find((m) => (row['wanted'] ?? '').includes(m)),
        band,
        offset: offset(relation),
        medium: relation.includes('cable') ? ('cable' as const) : ('air' as const),
      })),
    ),
  )
}

const isCurve = (row: CsvRow): boolean => (row['unwanted'] ?? '').startsWith('single carrier')
const isSound = (row: CsvRow): boolean => (row['unwanted'] ?? '') === 'FM sound'
const isProduct = (row: CsvRow): boolean => (row['unwanted'] ?? '').startsWith('any discrete')

/** AM sound against AM sound on VHF is tabulated without a system: L and its mirror. */
const amSound = (row: CsvRow): boolean => row['unwanted'] === 'AM sound'

const named = (row: CsvRow, i: number): [string, CsvRow] => [
  `${i + 2}: ${row['wanted']} against ${row['unwanted']}, ${row['relation']}`,
  row,
]

const between = rows.map(named).filter(([, r]) => !isCurve(r) && !isSound(r) && !isProduct(r))

describe.each(between)('line %s', (_title, row) => {
  it.each(HEARINGS)('needs the ratio of the table, %s', (hearing, column) => {
    const said = row[column] || row['ratio_db_tropospheric_or_planning']
    const asked = meetings(amSound(row) ? { ...row, wanted: 'L', unwanted: 'L' } : row)
    expect(asked.length).toBeGreaterThan(0)
    for (const meeting of asked) {
      expect(got(protectionRatio({ ...meeting, hearing }))).toBe(Number(said))
    }
  })
})

describe('figures of their own', () => {
  it.each(rows.filter(isCurve).map((r) => [r['unwanted_channel'] ?? '', r] as const))(
    'a single carrier at %s',
    (place, row) => {
      for (const [hearing, column] of HEARINGS) {
        expect(got(singleCarrierRatio(mhz(parseFloat(place)), hearing))).toBe(Number(row[column]))
      }
    },
  )

  it('of sound against sound, and of products on a cable', () => {
    const [sound] = rows.filter(isSound)
    for (const [hearing, column] of HEARINGS)
      expect(SOUND_RATIO[hearing]).toBe(Number(sound?.[column]))
    const [product] = rows.filter(isProduct)
    expect(CABLE_PRODUCT_RATIO).toBe(Number(product?.['ratio_db_tropospheric_or_planning']))
  })
})

it('no ratio stands in the facts that is not in the table', () => {
  const said = new Set(rows.map((r) => Number(r['ratio_db_tropospheric_or_planning'])))
  expect(PROTECTION_ROWS.filter((r) => !said.has(r.planningDb))).toEqual([])
  expect(PROTECTION_ROWS.length).toBe(between.length)
})
