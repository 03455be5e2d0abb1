import { MOST_ENDS } from '@coaxwain/contract'
import { questionsOfUses, type ArrangementQuestion, type Question } from '@coaxwain/shelf'
import type { LocationQuery } from 'vue-router'
import { queryToQuestion, questionToQuery } from './question-query'

/** Stands in no key and in no id. */
const SEPARATOR = '~'

const SOURCE_PARTS = ['source', 'playing', 'scan', 'system', 'shape', 'protection'] as const
const DISPLAY_PARTS = ['display', 'input'] as const
const DEMANDS = ['colour', 'stereo', 'aim', 'avoid'] as const

type Part = (typeof SOURCE_PARTS | typeof DISPLAY_PARTS)[number]

const pack = (query: Readonly<Record<string, string>>, parts: readonly Part[]): string =>
  parts.map((part) => query[part] ?? '').join(SEPARATOR)

const unpack = (text: string, parts: readonly Part[]): Record<string, string | undefined> =>
  Object.fromEntries(text.split(SEPARATOR).map((value, i) => [parts[i] ?? '', value || undefined]))

/** An arrangement as it stands in the address of its answer: its sources and displays one by one. */
export function arrangementToQuery(
  question: ArrangementQuestion,
): Record<string, string | string[]> {
  const uses = questionsOfUses(question).map(questionToQuery)
  const [first = {}] = uses
  const once = (packed: string[]): string[] => [...new Set(packed)]
  return {
    source: once(uses.map((use) => pack(use, SOURCE_PARTS))),
    display: once(uses.map((use) => pack(use, DISPLAY_PARTS))),
    ...Object.fromEntries(DEMANDS.flatMap((d) => (first[d] === undefined ? [] : [[d, first[d]]]))),
  }
}

/** A question with one of each end, to which more may come. */
export function questionToArrangement(question: Question): ArrangementQuestion {
  const { source, material, display, demands, ...rest } = question
  const { keepAerial: _, ...wanted } = demands
  return {
    ...rest,
    demands: wanted,
    sources: [{ ...source, material }],
    displays: [display],
  }
}

/** Null when the address does not hold a whole question. */
export function queryToArrangement(query: LocationQuery): ArrangementQuestion | null {
  const all = (key: string): string[] =>
    [query[key]].flat().filter((v): v is string => typeof v === 'string')
  const sources = all('source').map((text) => unpack(text, SOURCE_PARTS))
  const displays = all('display').map((text) => unpack(text, DISPLAY_PARTS))
  const demands = Object.fromEntries(DEMANDS.map((d) => [d, all(d)[0]]))
  const asked = sources.flatMap((source) =>
    displays.map((display) => queryToQuestion({ ...demands, ...source, ...display })),
  )
  const uses = asked.filter((q): q is Question => q !== null)
  const [first] = uses
  const plural = sources.length > 1 && displays.length > 1
  if (!first || plural || uses.length < asked.length || uses.length > MOST_ENDS) return null
  const each = uses.map(questionToArrangement)
  const start = questionToArrangement(first)
  return displays.length > 1
    ? { ...start, displays: each.flatMap((q) => q.displays) }
    : { ...start, sources: each.flatMap((q) => q.sources) }
}
