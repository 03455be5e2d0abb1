import { expect, test } from 'vitest'
import { z } from 'zod'
import { toFieldErrors } from './field-errors'

const faults = (schema: z.ZodType, value: unknown): string[] => {
  const found = schema.safeParse(value, { reportInput: true })
  if (found.success) throw new Error('it was taken')
  return toFieldErrors(found.error).map((e) => `${e.path} ${e.code}`)
}

const schema = z.strictObject({
  name: z.string().min(2).max(4),
  count: z.int().min(1).max(9),
  kind: z.enum(['a', 'b']),
  list: z.array(z.strictObject({ ok: z.boolean() })).max(2),
  either: z.union([z.literal('any'), z.array(z.enum(['x', 'y']))]),
})

const right = { name: 'abc', count: 3, kind: 'a', list: [], either: 'any' }

test.each<[string, object, string[]]>([
  ['a missing field', { name: undefined }, ['name required']],
  ['a missing choice', { kind: undefined }, ['kind required']],
  ['a wrong type', { name: 7 }, ['name wrong-type']],
  ['too long a text', { name: 'abcde' }, ['name too-long']],
  ['too short a text', { name: 'a' }, ['name too-short']],
  ['too big a number', { count: 10 }, ['count too-big']],
  ['too small a number', { count: 0 }, ['count too-small']],
  ['a fraction', { count: 1.5 }, ['count wrong-type']],
  ['an unknown choice', { kind: 'c' }, ['kind not-in-list']],
  ['too many items', { list: [1, 2, 3].map(() => ({ ok: true })) }, ['list too-many']],
  ['a fault inside a list', { list: [{ ok: 1 }] }, ['list.0.ok wrong-type']],
  ['an unknown field deep inside', { list: [{ ok: true, x: 1 }] }, ['list.0.x unknown-field']],
  ['a fault in the likelier reading', { either: ['x', 'z'] }, ['either.1 not-in-list']],
  ['no reading at all', { either: 5 }, ['either bad-format']],
])('%s is told with its path', (_, change, expected) => {
  expect(faults(schema, { ...right, ...change })).toEqual(expected)
})

test('a key comes back in part only', () => {
  const found = schema.safeParse({ ...right, ['k'.repeat(5000)]: 1 }, { reportInput: true })
  const [fault] = found.error ? toFieldErrors(found.error) : []
  expect(fault).toEqual({
    path: 'k'.repeat(60),
    code: 'unknown-field',
    details: { name: 'k'.repeat(60) },
  })
})
