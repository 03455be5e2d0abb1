import { mhz } from '@coaxwain/quantities'
import {
  COLOUR_SYSTEMS,
  DIGITAL_FACTS,
  lineHzOf,
  RF_SYSTEM_IDS,
  RF_SYSTEMS,
  SECAM_TAPE_METHODS,
  vsbPilot,
  type DigitalSystem,
  type EncodedColour,
  type RfSystem,
} from '@coaxwain/signal'
import { describe, expect, it } from 'vitest'
import { numbersIn, readTable, type CsvRow } from './csv'

/** Each row with its source in the last columns but one. */
const rows = readTable('tv-systems')

const ofType = (type: string): readonly CsvRow[] => rows.filter((r) => r['record_type'] === type)

const figure = (row: CsvRow, column: string): number =>
  numbersIn(row[column] ?? '')[0] ?? Number.NaN

const plain = (source: string): string => source.replaceAll(', no source', '')

// ---------------------------------------------------------------- systems on air

const onAir = ofType('rf-system').map((row): [string, CsvRow, RfSystem] => [
  row['id'] ?? '',
  row,
  RF_SYSTEMS[row['id'] as keyof typeof RF_SYSTEMS],
])

it('every system of the published table is known, and no other', () => {
  expect(onAir.map(([id]) => id).sort()).toEqual([...RF_SYSTEM_IDS].sort())
})

describe.each(onAir)('system %s', (_id, row, system) => {
  it('scans as the table says', () => {
    expect(system.lines).toBe(figure(row, 'lines'))
    expect(system.fieldHz).toBeCloseTo(figure(row, 'field_hz'), 2)
    expect(lineHzOf(system.id)).toBeCloseTo(figure(row, 'line_hz'), 1)
  })

  it('takes the spectrum that the table says', () => {
    expect(system.channelMhz).toBe(figure(row, 'channel_mhz'))
    expect(system.videoMhz).toBe(figure(row, 'video_bandwidth_mhz'))
    expect(system.vestigeMhz).toBe(figure(row, 'vestigial_sideband_mhz'))
    // E has its sound on either side.
    const sound = (row['sound_offset_mhz'] ?? '').replace('+-', '')
    expect(system.soundMhz).toBe(Number(sound))
  })

  it('is modulated as the table says', () => {
    expect(system.polarity).toBe(row['vision_polarity'])
    expect((row['sound_modulation'] ?? '').startsWith(system.soundModulation)).toBe(true)
    expect(numbersIn(row['white_percent'] ?? '')).toContain(system.whitePercent)
    expect(system.blankingPercent).toBe(figure(row, 'blanking_percent'))
  })

  it('has the further sound carriers of the table', () => {
    const said = row['additional_sound'] ?? ''
    const same = /^as ([A-Z])$/u.exec(said)?.[1]
    const expected = same
      ? RF_SYSTEMS[same as keyof typeof RF_SYSTEMS].moreSoundMhz
      : numbersIn(said.replaceAll('+', ' '))
    expect([...system.moreSoundMhz].sort()).toEqual([...expected].sort())
  })

  it('has the source of the table', () => {
    expect(plain(system.source).replace(', from memory', '')).toBe(row['source'])
  })
})

// ---------------------------------------------------------------- digital

const DIGITAL: readonly (readonly [string, DigitalSystem])[] = [
  ['ATSC', 'atsc'],
  ['DVB-T/T2', 'dvb-t'],
  ['ISDB-T', 'isdb-t'],
]

it('every digital system of the table is known', () => {
  expect(DIGITAL.map(([id]) => id)).toEqual(ofType('digital').map((r) => r['id']))
})

describe.each(DIGITAL)('%s', (id, system) => {
  const row = ofType('digital').find((r) => r['id'] === id)!
  const facts = DIGITAL_FACTS[system]

  it('has the widths, the modulation and the source of the table', () => {
    expect([...facts.widthsMhz]).toEqual(numbersIn(row['channel_mhz'] ?? ''))
    expect(facts.modulation).toBe(row['sound_modulation'] || row['vision_polarity'])
    expect(facts.source).toBe(row['source'])
  })
})

describe('digital carriers', () => {
  it('have their middle where the table says', () => {
    expect(DIGITAL_FACTS.atsc.centreMhz(6)).toBe(3)
    expect(DIGITAL_FACTS['dvb-t'].centreMhz(8)).toBe(4)
    expect(DIGITAL_FACTS['isdb-t'].centreMhz(6)).toBeCloseTo(3 + 1 / 7, 9)
  })

  it('have the pilot where the table says', () => {
    const row = ofType('digital').find((r) => r['id'] === 'ATSC')!
    expect(numbersIn(row['notes'] ?? '')).toContain(vsbPilot(mhz(0)))
  })
})

// ---------------------------------------------------------------- colour

const COLOURS: readonly (readonly [string, EncodedColour])[] = [
  ['NTSC-M', 'ntsc-m'],
  ['NTSC-J', 'ntsc-j'],
  ['NTSC-4.43', 'ntsc-443'],
  ['PAL-B/G/H/I/D/K', 'pal'],
  ['PAL-M', 'pal-m'],
  ['PAL-N', 'pal-n'],
  ['PAL-60', 'pal-60'],
  ['SECAM (B/G/D/K/K1/L)', 'secam'],
]

const TAPE = 'SECAM tape variant'

it('every colour system of the table is known', () => {
  const ids = ofType('colour-system').map((r) => r['id'])
  expect([...COLOURS.map(([id]) => id), TAPE].sort()).toEqual([...ids].sort())
  expect(Object.keys(COLOUR_SYSTEMS).sort()).toEqual(COLOURS.map(([, c]) => c).sort())
})

describe.each(COLOURS)('%s', (id, colour) => {
  const row = ofType('colour-system').find((r) => r['id'] === id)!
  const system = COLOUR_SYSTEMS[colour]

  it('has the lines and the subcarriers of the table', () => {
    expect(system.lines).toBe(figure(row, 'lines'))
    const said = [...(row['colour_subcarrier'] ?? '').matchAll(/(\d[\d.]*) Hz/gu)]
    const alternate = /and (\d+) Hz/u.exec(row['colour_subcarrier'] ?? '')?.[1]
    expect([...system.subcarrierHz]).toEqual(said.map((m) => Number(m[1])))
    expect(alternate === undefined).toBe(system.subcarrierHz.length === 1)
  })

  it('has the set-up of the table', () => {
    const said = row['setup'] ?? ''
    const expected = said === 'none' ? 0 : said.startsWith('0 or') ? null : figure(row, 'setup')
    expect(system.setUpPercent).toBe(expected)
  })

  it('has the source of the table', () => {
    const named = (row['source'] ?? '').split('; ')
    expect(named.filter((n) => !system.source.includes(n))).toEqual([])
  })
})

describe('subcarriers', () => {
  // Multiples of the line rate that the table gives in brackets.
  it.each([
    ['ntsc-m', 455 / 2, 0],
    ['pal', 283.75, 25],
    ['pal-m', 227.25, 0],
    ['pal-n', 229.25, 25],
  ] as const)('of %s are %d lines and %d Hz', (colour, lines, more) => {
    const { subcarrierHz, lines: raster } = COLOUR_SYSTEMS[colour]
    const line = lineHzOf(raster === 525 ? 'M' : 'B')
    expect(Math.abs(subcarrierHz[0]! - (line * lines + more))).toBeLessThan(0.5)
  })

  it('of SECAM are 272 and 282 lines', () => {
    expect(COLOUR_SYSTEMS.secam.subcarrierHz).toEqual([272, 282].map((n) => n * lineHzOf('L')))
  })

  it('of SECAM are recorded in two ways that do not go together', () => {
    const row = ofType('colour-system').find((r) => r['id'] === TAPE)!
    const words = SECAM_TAPE_METHODS.map((m) => m.replace('-', ' '))
    expect(words.filter((w) => !(row['notes'] ?? '').includes(w))).toEqual([])
  })
})
