import { loadVideo, ohm, voltPp } from '@coaxwain/quantities'
import {
  contactOf,
  fastBlanking,
  functionSwitch,
  SCART_CROSSED,
  SCART_PINS,
  type Circuit,
  type ScartPin,
} from '@coaxwain/signal'
import { describe, expect, it } from 'vitest'
import { numbersIn, readTable, type CsvRow } from './csv'
import { got } from './inputs'

/** Two published pin tables agree on them. */
const rows = readTable('scart-pins')

const known = rows.map((row): [number, CsvRow, ScartPin] => {
  const pin = Number(row['pin'])
  const fact = SCART_PINS[pin]
  if (!fact) throw new Error(`no pin ${pin}`)
  return [pin, row, fact]
})

it('every pin of the published table is known, and no other', () => {
  expect(Object.keys(SCART_PINS).map(Number)).toEqual(known.map(([pin]) => pin))
})

/** How the table writes what a pin carries. */
const SIGNALS: readonly (readonly [RegExp, readonly Circuit[]])[] = [
  [/ground|shell|control data/u, []],
  [/^audio right/u, ['audio-r']],
  [/^audio left\/mono/u, ['audio-l', 'audio-mono']],
  [/^blue/u, ['b']],
  [/^green/u, ['g']],
  [/^red, or chroma/u, ['r', 'c']],
  [/switching|blanking/u, ['switch-volts']],
  [/^composite, or sync, or Y/u, ['cvbs', 'csync', 'y']],
]

const WAYS: Readonly<Record<string, ScartPin['way']>> = {
  out: 'out',
  in: 'in',
  'in (set) / out (source)': 'source-to-set',
  bidirectional: 'both',
}

describe.each(known)('pin %d', (_pin, row, fact) => {
  it('carries what the table says, the way that it says', () => {
    const said = SIGNALS.find(([pattern]) => pattern.test(row['signal'] ?? ''))
    expect([...fact.circuits]).toEqual(said?.[1])
    const way = WAYS[row['direction_at_the_equipment'] ?? '']
    const silent = row['signal'] === 'shell' ? 'shell' : 'ground'
    expect(fact.way).toBe(way ?? silent)
  })

  it('has the level and the impedance of the table', () => {
    if (fact.volts !== undefined) {
      expect(numbersIn(row['level'] ?? '')).toContain(fact.volts)
    }
    const said = row['impedance'] ?? ''
    const size = (numbersIn(said)[0] ?? Number.NaN) * (said.includes('kohm') ? 1000 : 1)
    if (typeof fact.ohm === 'number') expect(fact.ohm).toBe(size)
    else if (fact.ohm && 'below' in fact.ohm) expect([said[0], fact.ohm.below]).toEqual(['<', size])
    else if (fact.ohm) expect([said[0], fact.ohm.above]).toEqual(['>', size])
    else expect(size).toBeNaN()
  })
})

describe('the lead', () => {
  it('crosses outputs to inputs of the same circuits', () => {
    for (const [out, into] of SCART_CROSSED) {
      expect([SCART_PINS[out]?.way, SCART_PINS[into]?.way]).toEqual(['out', 'in'])
      expect(SCART_PINS[out]?.circuits).toEqual(SCART_PINS[into]?.circuits)
    }
    const outs = known.filter(([, , fact]) => fact.way === 'out').map(([pin]) => pin)
    expect(SCART_CROSSED.map(([out]) => out)).toEqual(outs)
  })

  it('returns every circuit by a ground', () => {
    const grounds = known.flatMap(([, , fact]) => fact.ground ?? [])
    expect(grounds.filter((pin) => SCART_PINS[pin]?.way !== 'ground')).toEqual([])
  })
})

describe('circuits in a 21-pin plug', () => {
  const circuits = [...new Set(known.flatMap(([, , fact]) => fact.circuits))].filter(
    (c) => c !== 'switch-volts',
  )
  const shareAPin = (a: Circuit, b: Circuit): boolean =>
    known.some(([, , fact]) => fact.circuits.includes(a) && fact.circuits.includes(b))

  it.each(circuits)('%s meets what shares its pin, and nothing else', (a) => {
    const met = circuits.filter((b) => contactOf('scart-plug', a) === contactOf('scart-socket', b))
    expect(met).toEqual(circuits.filter((b) => shareAPin(a, b)))
  })
})

describe('switching voltages', () => {
  it.each([
    [0, 'internal'],
    [2, 'internal'],
    [5, 'external-wide'],
    [8, 'external-wide'],
    [9.5, 'external'],
    [12, 'external'],
    [3, null],
    [13, null],
    [-1, null],
  ] as const)('of %d V on pin 8', (volts, expected) => {
    expect(functionSwitch(volts)).toBe(expected)
  })

  it.each([
    [0.4, 'composite'],
    [0.7, null],
    [1, 'rgb'],
    [3, 'rgb'],
    [5, null],
  ] as const)('of %d V on pin 16', (volts, expected) => {
    expect(fastBlanking(volts)).toBe(expected)
  })

  it('say external and 4:3, or wide, as the table does', () => {
    const said = numbersIn((rows[7]?.['level'] ?? '').replaceAll('-', ' '))
    const bands = ['internal', 'external-wide', 'external'] as const
    const [internal, wide, narrow] = [
      [said[0], said[1]],
      [said[2], said[3]],
      [said.at(-4), said.at(-3)],
    ]
    expect(internal?.map((v) => functionSwitch(v ?? -1))).toEqual([bands[0], bands[0]])
    expect(wide?.map((v) => functionSwitch(v ?? -1))).toEqual([bands[1], bands[1]])
    expect(narrow?.map((v) => functionSwitch(v ?? -1))).toEqual([bands[2], bands[2]])
  })

  // 5 V through 100 ohm into 75 ohm is 2.14 V.
  it('of a 5 V supply through 100 ohm choose RGB', () => {
    const fed = { emf: voltPp(5), impedance: ohm(100), nominal: voltPp(1) }
    const { level } = got(loadVideo(fed, [ohm(75)]))
    expect(level).toBeCloseTo(2.14, 2)
    expect(fastBlanking(level)).toBe('rgb')
  })
})
