import { createLogger } from '@coaxwain/api/logger'
import { beforeEach, expect, test } from 'vitest'
import { Client } from '../support/client'
import { useRig } from '../support/rig'
import { COLLECTION, emailOf, MODELS, PASS_PHRASE } from '../support/world'

const lines: string[] = []
const rig = useRig({
  logger: createLogger('debug', { write: (line: string) => void lines.push(line) }),
  matcher: () => {
    throw Object.assign(new Error(`insert into people values ('${PASS_PHRASE}')`), {
      errno: 4242,
      sql: PASS_PHRASE,
    })
  },
})

beforeEach(() => {
  lines.length = 0
})

const requests = (): Record<string, unknown>[] =>
  lines
    .map((line) => JSON.parse(line) as Record<string, unknown>)
    .filter((entry) => entry['msg'] === 'request')

test('every request leaves one line with its id, outcome and time', async () => {
  const client = await rig.as('owner')
  const answer = await client.get(`/collections/${COLLECTION}/units?q=kitchen`)
  const entry = requests().at(-1)
  expect(entry).toMatchObject({
    method: 'GET',
    path: `/api/v1/collections/${COLLECTION}/units`,
    status: 200,
    requestId: answer.headers.get('x-request-id'),
  })
  expect(entry?.['ms']).toBeTypeOf('number')
  expect(requests()).toHaveLength(2)
})

test('no line holds a pass phrase, a cookie, a search or the text of a statement', async () => {
  const client = await rig.as('owner')
  await client.get(`/collections/${COLLECTION}/units?q=secret-search`)
  await new Client(rig.api.address).post('/session', {
    email: emailOf('viewer'),
    password: 'a wrong phrase that is typed',
  })
  await client.post(`/collections/${COLLECTION}/units`, { model: MODELS.player, note: 3 })
  const text = lines.join('')
  expect(text).not.toContain(PASS_PHRASE)
  expect(text).not.toContain('a wrong phrase that is typed')
  expect(text).not.toContain((client.cookie ?? '').split('=')[1])
  expect(text).not.toContain('secret-search')
  expect(text).not.toMatch(/cookie|authorization|argon2/i)
})

test('a failure that nobody foresaw is logged without its text and told without a word of it', async () => {
  const client = await rig.as('owner')
  const { question } = await import('../support/examples')
  const answer = await client.post(`/collections/${COLLECTION}/answers`, { question: question() })
  expect(answer.status).toBe(500)
  expect(answer.body).toMatchObject({ code: 'internal', retryable: false })
  expect(answer.text).not.toMatch(/insert|people|seven plain words/)
  const failure = lines.find((line) => line.includes('request failed')) ?? ''
  expect(failure).toContain('4242')
  expect(failure).toContain(String(answer.headers.get('x-request-id')))
  expect(lines.join('')).not.toContain(PASS_PHRASE)
  expect((await client.get(`/collections/${COLLECTION}/units`)).status).toBe(200)
})
