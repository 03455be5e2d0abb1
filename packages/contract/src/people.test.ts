import { expect, test } from 'vitest'
import { signIn } from './people'

const takes = (password: string): boolean =>
  signIn.safeParse({ email: 'a@example.org', password }).success

test('a pass phrase of 128 letters is taken, whatever each takes in memory, and one more is not', () => {
  for (const letter of ['x', '\u00e9', '\u{1f4fa}']) {
    expect(takes(letter.repeat(128))).toBe(true)
    expect(takes(letter.repeat(129))).toBe(false)
  }
})
