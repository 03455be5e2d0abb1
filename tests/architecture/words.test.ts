import { FIELD_FAULTS, PROBLEMS } from '@coaxwain/contract'
import { hasSentence, LOCALES, MESSAGES, sentence } from '@coaxwain/wording'
import { describe, expect, test } from 'vitest'
import { AppError } from '@coaxwain/api/app-error'
import { toProblem } from '@coaxwain/api/problem'

/** Something for every detail that a message of the API may ask for. */
const DETAILS = {
  limit: 3,
  minutes: 2,
  units: 1,
  places: 2,
  name: 'VIDEO 1',
  wanted: 'string',
  choices: 'a, b',
}

const INTERNALS = /select |mysql|knex|maria|stack|undefined|null|\/src\/|\{|\}|\[|\]/i

describe.each(Object.keys(PROBLEMS))('the problem %s', (code) => {
  test.each(LOCALES)('has a status and a plain sentence in %s', (locale) => {
    const problem = toProblem(
      new AppError(code as keyof typeof PROBLEMS, { details: DETAILS }),
      'an-id',
      locale,
    )
    expect(hasSentence(`problem.${code}`)).toBe(true)
    expect(problem.status).toBe(PROBLEMS[code as keyof typeof PROBLEMS].status)
    expect(problem.title).not.toBe('Error')
    expect(problem.detail).toMatch(/^[A-Z].*\.$/)
    expect(problem.detail).not.toMatch(INTERNALS)
    expect(problem.detail).not.toMatch(/oops|sorry|error/i)
  })
})

test.each(FIELD_FAULTS)('the field fault %s has a sentence in every language', (code) => {
  for (const locale of LOCALES) {
    const text = sentence(`field.${code}`, DETAILS, locale)
    expect(hasSentence(`field.${code}`)).toBe(true)
    expect(text).toMatch(/^[^{}[\]]+\.$/)
  }
})

test('every message is whole in every language', () => {
  for (const code of Object.keys(MESSAGES)) {
    for (const locale of LOCALES) {
      expect(sentence(code, {}, locale), code).not.toMatch(/\[[A-Za-z]+\]/)
    }
  }
})
