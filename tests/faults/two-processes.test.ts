import { spawn, type ChildProcess } from 'node:child_process'
import { setTimeout as wait } from 'node:timers/promises'
import { fileURLToPath } from 'node:url'
import { connectDatabase } from '@coaxwain/database'
import type { Knex } from 'knex'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { endProcess } from '../../scripts/lib/processes.mjs'
import { Client } from '../support/client'
import {
  restartTestServer,
  settingsOf,
  startTestServer,
  stopTestServer,
  type TestServer,
} from '../support/database'
import { COLLECTION, emailOf, makeWorld, signIn, UNITS } from '../support/world'

const root = fileURLToPath(new URL('../..', import.meta.url))
const READY_MS = 20_000

interface Process {
  readonly child: ChildProcess
  readonly log: string[]
  readonly listening: Promise<string>
}

/** The real server, as its own process, from source. */
function startProcess(server: TestServer): Process {
  const log: string[] = []
  const child = spawn(process.execPath, ['--import', 'tsx', 'apps/api/src/server.ts'], {
    cwd: root,
    stdio: ['ignore', 'pipe', 'pipe', 'ipc'],
    env: {
      PATH: process.env['PATH'],
      PORT: '0',
      COAXWAIN_MODE: 'demo',
      COAXWAIN_SECRET: 'two processes share this one, long enough',
      COAXWAIN_DISPOSABLE_DATABASE: '1',
      COAXWAIN_DB_HOST: server.host,
      COAXWAIN_DB_PORT: String(server.port),
      COAXWAIN_DB_USER: server.user,
      COAXWAIN_DB_PASSWORD: server.password,
      COAXWAIN_DB_NAME: server.database,
    },
  })
  child.stdout?.on('data', (chunk: Buffer) => log.push(chunk.toString()))
  child.stderr?.on('data', (chunk: Buffer) => log.push(chunk.toString()))
  const listening = new Promise<string>((resolve, reject) => {
    child.once('message', (message) => {
      resolve(`http://127.0.0.1:${(message as { listening: number }).listening}`)
    })
    child.once('exit', (status) =>
      reject(new Error(`ended with ${String(status)}: ${log.join('')}`)),
    )
  })
  listening.catch(() => undefined)
  return { child, log, listening }
}

/** Up and running, and without a database. */
async function saysItWaits({ child, log }: Process): Promise<void> {
  const until = performance.now() + READY_MS
  while (!log.join('').includes('waiting for the database')) {
    if (child.exitCode !== null || performance.now() > until) throw new Error(log.join(''))
    await wait(50)
  }
}

let server: TestServer
let db: Knex
let one: Process
let two: Process
let first: string
let second: string

beforeAll(async () => {
  server = await startTestServer()
  await endProcess(server.pid)
  one = startProcess(server)
  two = startProcess(server)
  await Promise.all([saysItWaits(one), saysItWaits(two)])
  server = await restartTestServer(server.folder)
  const started = performance.now()
  ;[first, second] = await Promise.all([one.listening, two.listening])
  expect(performance.now() - started).toBeLessThan(READY_MS)
  db = connectDatabase(settingsOf(server))
  await makeWorld(db)
}, 60_000)

afterAll(async () => {
  await Promise.all([one, two].map(({ child }) => endProcess(child.pid ?? 0)))
  await db.destroy()
  await stopTestServer(server)
})

test('both waited for the database, and exactly one migrated', () => {
  const migrated = [one, two].filter(({ log }) => log.join('').includes('"migrated"'))
  expect(migrated).toHaveLength(1)
})

test('a session opened at one holds at the other, and ends at both at once', async () => {
  const client = await signIn(first, 'owner')
  const same = new Client(second)
  same.cookie = client.cookie
  expect((await same.get('/collections')).status).toBe(200)
  expect((await same.delete('/session')).status).toBe(204)
  expect((await client.get('/collections')).status).toBe(401)
})

test('failed sign-ins are counted together', async () => {
  const wrong = { email: emailOf('viewer'), password: 'not the right words at all' }
  for (let i = 0; i < 10; i += 1) {
    const address = i % 2 === 0 ? first : second
    expect((await new Client(address).post('/session', wrong)).status).toBe(401)
  }
  for (const address of [first, second]) {
    expect((await new Client(address).post('/session', wrong)).status).toBe(429)
  }
})

test('a change made through one is seen through the other on the next request', async () => {
  const client = await signIn(first, 'collector')
  const other = new Client(second)
  other.cookie = client.cookie
  const path = `/collections/${COLLECTION}/units/${UNITS.player}`
  for (let version = 1; version < 11; version += 1) {
    const [writer, reader] = version % 2 === 0 ? [client, other] : [other, client]
    const before = await reader.get(`/collections/${COLLECTION}/snapshot`)
    expect(
      (await writer.patch(path, version, { working: version % 2 ? 'works' : 'faulty' })).status,
    ).toBe(200)
    const after = await reader.get(`/collections/${COLLECTION}/snapshot`, {
      'if-none-match': before.headers.get('etag') ?? '',
    })
    expect(after.status).toBe(200)
    expect(after.text).not.toBe(before.text)
  }
})

test('edits of one version through both have one winner', async () => {
  const client = await signIn(first, 'restorer')
  const other = new Client(second)
  other.cookie = client.cookie
  const path = `/collections/${COLLECTION}/units/${UNITS.monitor}`
  const answers = await Promise.all(
    Array.from({ length: 20 }, (_, i) =>
      (i % 2 === 0 ? client : other).patch(path, 1, { label: `Edit ${i}` }),
    ),
  )
  expect(answers.map((a) => a.status).sort()).toEqual([200, ...Array<number>(19).fill(412)])
})

test('a server that is told to stop answers what it has begun and ends well', async () => {
  const client = await signIn(second, 'owner')
  const running = client.get(`/collections/${COLLECTION}/snapshot`)
  const ended = new Promise<number | null>((resolve) => two.child.once('exit', resolve))
  await wait(5)
  two.child.kill('SIGTERM')
  expect((await running).status).toBe(200)
  expect(await ended).toBe(0)
})
