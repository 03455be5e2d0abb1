import { readFileSync } from 'node:fs'
import { checkHookup } from '@coaxwain/checker'
import { findHookups } from '@coaxwain/matcher'
import { checkModel } from '@coaxwain/models'
import { ORDINARY_PARTS } from '@coaxwain/patterns'
import { describe, expect, it } from 'vitest'
import { toCaseAnswer } from './answer'
import type { CaseFile, HookupCase } from './form'
import { judge } from './judge'
import { translate } from './translate'

const casesIn = (file: string): readonly HookupCase[] => {
  const text = readFileSync(new URL(`./data/${file}`, import.meta.url), 'utf8')
  return (JSON.parse(text) as CaseFile).hookupCases ?? []
}

const solve = (c: HookupCase) => {
  const translated = translate(c)
  const answer = findHookups(translated.snapshot, translated.question, { parts: ORDINARY_PARTS })
  return { translated, answer, judged: judge(c, toCaseAnswer(c, answer, ORDINARY_PARTS)) }
}

/** Each case is solved once for all that is asked of its answer. */
const known = new Map<string, ReturnType<typeof solve>>()

function solved(c: HookupCase): ReturnType<typeof solve> {
  const made = known.get(c.id) ?? solve(c)
  known.set(c.id, made)
  return made
}

/** Warnings that nobody expected, a case on average. */
const MOST_NOISE = 0.7

describe.each([
  ['questions of the trade', 'hookup-cases.json'],
  ['questions from the bench', 'bench-cases.json'],
])('%s', (_, file) => {
  const cases = casesIn(file).map((c) => [c.id, c] as const)

  it.each(cases)('%s becomes models that hold together', (_, c) => {
    const { snapshot } = translate(c)
    expect(Object.values(snapshot.models).flatMap(checkModel)).toEqual([])
  })

  it.each(cases)('%s gets hookups that the checker accepts', (_, c) => {
    const { translated, answer } = solved(c)
    const findings = answer.hookups.flatMap(
      (h) => checkHookup(translated.snapshot, translated.question, h).findings,
    )
    expect(findings).toEqual([])
    expect(answer.complete).toBe(true)
  })

  it.each(cases)('%s is answered right', (_, c) => {
    expect(solved(c).judged.failures).toEqual([])
  })

  it('get few warnings that nobody expects', () => {
    const noise = cases.reduce((sum, [, c]) => sum + solved(c).judged.noise, 0)
    expect(noise / cases.length).toBeLessThan(MOST_NOISE)
  })
})
