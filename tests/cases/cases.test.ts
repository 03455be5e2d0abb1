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

const file = JSON.parse(
  readFileSync(new URL('./data/hookup-cases.json', import.meta.url), 'utf8'),
) as CaseFile
const cases = file.hookupCases ?? []

const solve = (c: HookupCase) => {
  const translated = translate(c)
  return {
    translated,
    answer: findHookups(translated.snapshot, translated.question, { parts: ORDINARY_PARTS }),
  }
}

describe('questions of the trade', () => {
  it.each(cases.map((c) => [c.id, c] as const))('%s becomes models that hold together', (_, c) => {
    const { snapshot } = translate(c)
    expect(Object.values(snapshot.models).flatMap(checkModel)).toEqual([])
  })

  it.each(cases.map((c) => [c.id, c] as const))(
    '%s gets hookups that the checker accepts',
    (_, c) => {
      const { translated, answer } = solve(c)
      const findings = answer.hookups.flatMap(
        (h) => checkHookup(translated.snapshot, translated.question, h).findings,
      )
      expect(findings).toEqual([])
      expect(answer.complete).toBe(true)
    },
  )

  it('are right in verdict, chain, quality and settings in at least half of the cases', () => {
    const right = cases.filter((c) => {
      const { answer } = solve(c)
      const { failures } = judge(c, toCaseAnswer(c, answer, ORDINARY_PARTS))
      return failures.every((f) => f.startsWith('warning missing'))
    })
    expect(right.length).toBeGreaterThanOrEqual(cases.length / 2)
  })
})
