import { expect, test } from 'vitest'
import { WORDS } from './words'

test('there are 256 different words, so each stands for eight bits', () => {
  expect(new Set(WORDS).size).toBe(256)
  expect(WORDS).toHaveLength(256)
})
