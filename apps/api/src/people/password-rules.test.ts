import { describe, expect, test } from 'vitest'
import { passwordFault } from './password-rules'

const about = { email: 'marigold.fenwick@example.org', collections: ['Thornbury attic'] }

describe('a pass phrase', () => {
  test.each([
    'plover kettle rowan zinc',
    'correct-ish horse, wrong battery',
    '\u05e9\u05dc\u05d5\u05dd \u05e2\u05d5\u05dc\u05dd \u05d9\u05e4\u05d4 \u05de\u05d0\u05d5\u05d3',
    'no digits nor capitals are asked for',
    'x'.repeat(3) + 'ylophone in the garden',
  ])('may be %j', (phrase) => {
    expect(passwordFault(phrase, about)).toBeNull()
  })

  test.each([
    ['fourteen chars', 'too-short'],
    ['a'.repeat(15), 'repeats'],
    ['abcabcabcabcabcabc', 'repeats'],
    ['seven letters seven letters ', 'repeats'],
    ['passwordpassword1', 'common'],
    ['Password123456789!', 'common'],
    ['qwertyuiopasdfgh', 'common'],
    ['123456789012345', 'common'],
    ['iloveyouforever1', 'common'],
    ['correcthorsebatterystaple', 'common'],
    ['coaxwain-coaxwain-1', 'personal'],
    ['marigold.fenwick.2026', 'personal'],
    ['THORNBURY ATTIC 1', 'personal'],
    ['x1'.repeat(65), 'too-long'],
  ])('is never %j (%s)', (phrase, fault) => {
    expect(passwordFault(phrase, about)).toBe(fault)
  })
})
