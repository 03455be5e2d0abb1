import { minimumLossPad, mhz, ohm, picofarad, reflect } from '@coaxwain/quantities'
import {
  ADAPTER_FACTS,
  ADAPTER_IDS,
  combineYc,
  type AdapterFact,
  type AdapterId,
  type Circuit,
} from '@coaxwain/signal'
import { describe, expect, it } from 'vitest'
import { ROWS } from './adapters/rows'
import type { Outcome, Trial } from './adapters/trials'
import { ask, type Asked } from './bench/world'
import { numbersIn, readTable, type CsvRow } from './csv'
import { got } from './inputs'

/** Each row with its source in the last columns but one. */
const rows = readTable('adapters')

const isKnown = (id: string | undefined): id is AdapterId =>
  ADAPTER_IDS.some((known) => known === id)

const known = rows.flatMap((row): [AdapterId, CsvRow, AdapterFact][] => {
  const id = row['id']
  return isKnown(id) ? [[id, row, ADAPTER_FACTS[id]]] : []
})

it('every row of the published table is an adapter that is known', () => {
  expect(known.map(([id]) => id)).toEqual(rows.map((r) => r['id']))
  expect([...ADAPTER_IDS].sort()).toEqual(known.map(([id]) => id).sort())
})

// ---------------------------------------------------------------- the facts against the table

const plain = (source: string): string => source.replaceAll(', no source', '')

/** How the table writes a direction. */
const WAYS: readonly (readonly [RegExp, AdapterFact['way']])[] = [
  [/^both/u, 'both'],
  [/^as (switched|wired|built)|^set by/u, 'as-made'],
  [/^(inputs to output|in to out|to |into the set|INTO|OUT|out|one source|directional)/u, 'a-to-b'],
  [/ONLY$|^reverse of the above/u, 'a-to-b'],
  [/^-$/u, 'none'],
]

function waySaid(text: string): AdapterFact['way'] {
  const found = WAYS.find(([pattern]) => pattern.test(text))
  if (!found) throw new Error(`the table says ${text}, which is not understood`)
  return found[1]
}

/** What of a text speaks of each circuit. RGB never goes without its sync. */
const WORDS: Partial<Record<Circuit, RegExp>> = {
  rf: /RF|whatever/u,
  cvbs: /composite|baseband|all|RGB/u,
  y: /component|YPbPr|Y\/C|luma/u,
  c: /Y\/C/u,
  pb: /component|YPbPr/u,
  pr: /component|YPbPr/u,
  r: /RGB|all/u,
  g: /RGB|all/u,
  b: /RGB|all/u,
  hsync: /RGBHV|sync/u,
  vsync: /RGBHV|sync/u,
  'audio-l': /audio|stereo|all/u,
  'audio-r': /audio|stereo|all/u,
  'audio-mono': /audio|all/u,
  'switch-volts': /all/u,
}

describe.each(known)('%s', (_id, row, fact) => {
  it('has the source and the confidence of the table', () => {
    expect(plain(fact.source)).toBe(row['source'])
    expect(fact.confidence).toBe(row['confidence'])
  })

  it('needs power where the table says so, and goes the way that it says', () => {
    expect(fact.passive).toBe(row['passive'] !== 'no')
    expect(fact.way).toBe(waySaid(row['direction'] ?? ''))
  })

  it('carries what the table says', () => {
    const said = [row['carries'], row['from'], row['to']].join(' ')
    expect(fact.carries.filter((c) => !WORDS[c]?.test(said))).toEqual([])
  })

  it('costs only what stands in the table', () => {
    const text = [row['insertion_loss_db'], row['to'], row['effect_and_caveats']].join(' ')
    const said = numbersIn(text).map(Math.abs)
    const figures = fact.loss.flatMap((l) => l.db).map(Math.abs)
    expect(figures.filter((figure) => !said.includes(figure))).toEqual([])
  })
})

describe('losses that follow from theory', () => {
  it('of 300 ohm joined straight to 75', () => {
    const { mismatchLoss } = got(reflect(ohm(300), ohm(75)))
    expect(ADAPTER_FACTS['direct-300-75'].loss[0]?.db[0]).toBeCloseTo(mismatchLoss ?? 0, 2)
  })

  it('of a resistive pad from 300 to 75 ohm', () => {
    const { loss } = got(minimumLossPad(ohm(300), ohm(75)))
    expect(ADAPTER_FACTS['pad-300-75'].loss[0]?.db[0]).toBeCloseTo(loss, 2)
  })

  it('of luma and chroma joined by 470 pF', () => {
    const { luma, chroma } = got(combineYc(picofarad(470), mhz(3.579545)))
    const [least, most] = ADAPTER_FACTS['svideo-composite'].loss[0]?.db ?? []
    expect(least).toBeCloseTo(Math.abs(luma), 1)
    expect(most).toBeCloseTo(Math.abs(chroma), 1)
  })
})

// ---------------------------------------------------------------- forwards and backwards, by the engine

function outcomeOf({ best }: Asked, wanted: Outcome): Outcome {
  if (!best) return 'nothing'
  if (['stereo', 'mono', 'silence'].includes(wanted)) {
    const { sound } = best.sound
    return sound === 'stereo' || sound === 'mono' ? sound : 'silence'
  }
  return best.picture.colour ? 'colour' : 'grey'
}

const trials = known.flatMap(([id]) =>
  ROWS[id].map((t): [string, Trial] => [`${id}: ${t.title}`, t]),
)

describe('the engine', () => {
  it.each(trials)('%s', (_title, { world, outcome }) => {
    const asked = ask(world)
    expect(asked.findings).toEqual([])
    expect(asked.answer.complete).toBe(true)
    expect(outcomeOf(asked, outcome)).toBe(outcome)
  })

  it('is asked about every row in both directions', () => {
    const once = known.filter(([id]) => ROWS[id].length < 2).map(([id]) => id)
    expect(once).toEqual([])
  })
})
