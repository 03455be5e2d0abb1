import { expect, test } from 'vitest'
import type { FromEngine } from './messages'
import { createQueue, type Course } from './queue'

/** Keeps a slice busy and never comes to an end by itself before so many slices. */
function* busy(id: number, slices: number): Course {
  for (let n = 1; n <= slices; n++) {
    const until = performance.now() + 31
    while (performance.now() < until);
    yield n
  }
  return { kind: 'refused', id }
}

const said = (messages: readonly FromEngine[]): string[] =>
  messages.map(({ kind, id }) => `${kind} ${id}`)

const pause = (ms: number): Promise<void> => new Promise((resolve) => setTimeout(resolve, ms))

test('short work does not wait for the end of long work', async () => {
  const messages: FromEngine[] = []
  const queue = createQueue((m) => messages.push(m))
  queue.add(1, busy(1, 6))
  queue.add(2, busy(2, 1))
  await pause(400)
  const order = said(messages)
  expect(order.indexOf('refused 2')).toBeLessThan(order.indexOf('refused 1'))
  expect(order.filter((m) => m === 'progress 1')).toHaveLength(6)
})

test('what is called off says nothing more, and what comes after it begins', async () => {
  const messages: FromEngine[] = []
  const queue = createQueue((m) => messages.push(m))
  queue.add(1, busy(1, 1000))
  queue.cancel(1)
  const before = messages.length
  queue.add(2, busy(2, 1))
  await pause(300)
  expect(said(messages.slice(before))).toEqual(['progress 2', 'refused 2'])
})
