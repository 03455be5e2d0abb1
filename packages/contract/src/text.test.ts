import { describe, expect, test } from 'vitest'
import { key, line, name, prose, uid } from './text'

const takes = (schema: { safeParse(v: unknown): { success: boolean } }, value: unknown): boolean =>
  schema.safeParse(value).success

describe('texts', () => {
  test('are brought to one form and otherwise kept letter for letter', () => {
    expect(name(20).parse(' e\u0301 \u{1f4fa} ')).toBe(' \u00e9 \u{1f4fa} ')
    expect(prose(20).parse('a\tb\nc')).toBe('a\tb\nc')
  })

  test.each(['\u0000', '\u0007', '\r', '\u001b', '\u007f', '\u0085', '\ud800', '\udfff'])(
    'with the character %j are refused',
    (character) => {
      expect(takes(prose(20), `a${character}b`)).toBe(false)
    },
  )

  test('are counted after they were brought to one form', () => {
    expect(takes(line(1), 'e\u0301')).toBe(true)
    expect(takes(line(1), 'ab')).toBe(false)
  })

  test('of one line hold no tab and no line break, names something to read', () => {
    expect(takes(line(20), 'a\tb')).toBe(false)
    expect(takes(name(20), '   ')).toBe(false)
    expect(takes(line(20), '')).toBe(true)
  })
})

describe('ids and keys', () => {
  test('an id is 22 letters of base64url', () => {
    expect(takes(uid, 'A'.repeat(22))).toBe(true)
    for (const wrong of ['A'.repeat(21), 'A'.repeat(23), `${'A'.repeat(21)}=`, 0, null, {}]) {
      expect(takes(uid, wrong)).toBe(false)
    }
  })

  test.each(['__proto__', 'constructor', 'prototype', '', '-a', 'a b', 'a/b', 'a'.repeat(61)])(
    'a key is never %j',
    (wrong) => {
      expect(takes(key, wrong)).toBe(false)
    },
  )
})
