import { setTimeout as wait } from 'node:timers/promises'
import { connectDatabase, migrate } from '@coaxwain/database'
import type { Knex } from 'knex'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { Client, problemOf, type Answer } from '../support/client'
import {
  restartTestServer,
  settingsOf,
  startTestServer,
  stopTestServer,
  type TestServer,
} from '../support/database'
import { startApi, type RunningApi } from '../support/server'
import { COLLECTION, makeWorld, MODELS, signIn, UNITS } from '../support/world'

const FROZEN_MS = 15_000
const GONE_MS = 15_000
const ANSWER_MS = 6000
const RECOVERY_MS = 10_000
const GROWTH_BYTES = 100 * 1024 * 1024

let server: TestServer
let db: Knex
let api: RunningApi

beforeAll(async () => {
  server = await startTestServer(true)
  await migrate(settingsOf(server))
  db = connectDatabase(settingsOf(server))
  await makeWorld(db)
  api = await startApi(db)
})

afterAll(async () => {
  await api.stop()
  await db.destroy()
  await stopTestServer(server)
})

interface Timed {
  readonly answer: Answer
  readonly ms: number
}

const timed = async (act: Promise<Answer>): Promise<Timed> => {
  const start = performance.now()
  return { answer: await act, ms: performance.now() - start }
}

/** Reads and writes of a member, and a stranger who tries to sign in, all at once. */
const everything = (client: Client, made: { sent: number }): Promise<Timed>[] => {
  const stranger = new Client(api.address)
  const credentials = { email: 'owner@example.org', password: 'no matter what, it is wrong' }
  made.sent += 1
  return [
    timed(client.get(`/collections/${COLLECTION}/units`)),
    timed(client.get(`/collections/${COLLECTION}/snapshot`)),
    timed(client.post(`/collections/${COLLECTION}/units`, { model: MODELS.lead, label: 'gone' })),
    timed(client.get('/session')),
    timed(stranger.post('/session', credentials)),
  ]
}

async function hammerFor(ms: number, client: Client, made: { sent: number }): Promise<Timed[]> {
  const until = performance.now() + ms
  const all: Promise<Timed>[] = []
  while (performance.now() < until) {
    all.push(...everything(client, made))
    await wait(1000)
  }
  return Promise.all(all)
}

function mustAllSayUnavailable(answers: readonly Timed[]): void {
  expect(answers.length).toBeGreaterThan(20)
  for (const { answer, ms } of answers) {
    expect(answer.status, answer.text).toBe(503)
    expect(Number(answer.headers.get('retry-after'))).toBeGreaterThan(0)
    expect(['busy', 'database-unavailable']).toContain(problemOf(answer).code)
    expect(problemOf(answer).retryable).toBe(true)
    expect(ms).toBeLessThan(ANSWER_MS)
  }
}

const health = async (path: string): Promise<number> => (await fetch(api.address + path)).status

/** Half frozen, half killed: every request is told so in time, and work goes on when it is back. */
test('the database is away for thirty seconds', { timeout: 90_000 }, async () => {
  const client = await signIn(api.address, 'owner')
  const made = { sent: 0 }
  expect((await client.get(`/collections/${COLLECTION}/units/${UNITS.player}`)).status).toBe(200)
  const memory = process.memoryUsage().rss

  process.kill(server.pid, 'SIGSTOP')
  const frozen = await hammerFor(FROZEN_MS - ANSWER_MS, client, made)
  mustAllSayUnavailable(frozen)
  expect(await health('/healthz')).toBe(200)
  expect(await health('/readyz')).toBe(503)

  process.kill(server.pid, 'SIGKILL')
  await wait(200)
  const gone = await hammerFor(GONE_MS, client, made)
  mustAllSayUnavailable(gone)
  expect(await health('/healthz')).toBe(200)
  expect(await health('/readyz')).toBe(503)
  expect(process.memoryUsage().rss - memory).toBeLessThan(GROWTH_BYTES)

  server = await restartTestServer(server.folder, true)
  const back = performance.now()
  for (;;) {
    const { answer } = await timed(client.get(`/collections/${COLLECTION}/units`))
    if (answer.status === 200) break
    expect(answer.status).toBe(503)
    expect(performance.now() - back).toBeLessThan(RECOVERY_MS)
    await wait(200)
  }
  const after = await Promise.all(
    Array.from({ length: 30 }, () => client.get(`/collections/${COLLECTION}/units`)),
  )
  expect(after.every((a) => a.status === 200)).toBe(true)
  expect(await health('/readyz')).toBe(200)
  const fresh = await client.post(`/collections/${COLLECTION}/units`, { model: MODELS.lead })
  expect(fresh.status).toBe(201)
  const kept = (await db('units').where({ label: 'gone' }).count('* as n').first()) as { n: number }
  expect(kept.n).toBe(0)
})
