import { expect, test } from 'vitest'
import { toEtag, versionOf } from './etag'

test('a version comes back out of its tag', () => {
  expect(versionOf(toEtag(17))).toBe(17)
})

test.each(['', '*', '17', 'W/"17"', '"0"', '"-1"', '"1", "2"', '"one"'])(
  '%j is no tag of ours',
  (header) => {
    expect(versionOf(header)).toBeNull()
  },
)
