import { expect, test } from 'vitest'
import type { AppError } from '../app-error'
import { guardBody } from './body-guard'

const nested = (levels: number): unknown => (levels === 0 ? 1 : [nested(levels - 1)])

test('twenty levels pass, twenty-one do not', () => {
  expect(() => guardBody(nested(20))).not.toThrow()
  expect(() => guardBody(nested(21))).toThrow('too-deep')
})

test('a thousand items pass, one more does not', () => {
  expect(() => guardBody({ list: Array(1000).fill(0) })).not.toThrow()
  expect(() => guardBody({ list: Array(1001).fill(0) })).toThrow('invalid-request')
})

test.each(['__proto__', 'constructor', 'prototype'])('the key %s is refused anywhere', (key) => {
  expect(() => guardBody(JSON.parse(`{"a":[{"${key}":{}}]}`))).toThrow('invalid-request')
})

test.each([{ constructor: 1 }, Array(1001).fill(0)])(
  'a path of long keys comes back in part only',
  (end) => {
    const long = 'k'.repeat(5000)
    let found: unknown
    try {
      guardBody({ [long]: { [long]: end } })
    } catch (error) {
      found = error
    }
    const [fault] = (found as AppError).errors
    expect(fault?.path).toMatch(/^k{60}\.k{60}(\.constructor)?$/)
  },
)
