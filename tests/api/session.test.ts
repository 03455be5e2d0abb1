import { expect, test } from 'vitest'
import { Client, problemOf } from '../support/client'
import { useRig } from '../support/rig'
import { emailOf, PASS_PHRASE } from '../support/world'

const rig = useRig()

const stranger = (): Client => new Client(rig.api.address)

test('a stranger learns that nobody is signed in, and no session is kept for that', async () => {
  const answer = await stranger().get('/session')
  expect(answer.status).toBe(200)
  expect(answer.body).toEqual({ mode: 'demo', person: null, memberships: [] })
  expect(answer.headers.get('set-cookie')).toBeNull()
  expect(await rig.db('sessions')).toHaveLength(0)
})

test('whoever signs in sees their memberships and gets a new session id', async () => {
  const client = stranger()
  client.cookie = 'coaxwain=s%3Achosen-by-me'
  const answer = await client.post('/session', {
    email: ` ${emailOf('owner').toUpperCase()} `,
    password: PASS_PHRASE,
  })
  expect(answer.status).toBe(200)
  expect(answer.body['person']).toMatchObject({ email: emailOf('owner'), name: 'Name of owner' })
  expect(answer.body['memberships']).toMatchObject([{ role: 'owner' }])
  expect(client.cookie).not.toContain('chosen-by-me')
  const flags = answer.headers.get('set-cookie') ?? ''
  expect(flags).toMatch(/HttpOnly/)
  expect(flags).toMatch(/SameSite=Lax/)
  expect(flags).toMatch(/Path=\//)
  expect(flags).not.toMatch(/Domain/i)
})

test('the session survives in the database, with a new id at each sign-in', async () => {
  const client = await rig.as('viewer')
  const before = client.cookie
  await client.post('/session', { email: emailOf('viewer'), password: PASS_PHRASE })
  expect(client.cookie).not.toBe(before)
  expect((await client.get('/collections')).status).toBe(200)
  const old = stranger()
  old.cookie = before
  expect((await old.get('/collections')).status).toBe(401)
})

test('signing out destroys the row, tells the browser to forget, and ends the old cookie', async () => {
  const client = await rig.as('owner')
  const cookie = client.cookie
  const answer = await client.delete('/session')
  expect(answer.status).toBe(204)
  expect(answer.headers.get('clear-site-data')).toBe('"cache", "storage"')
  expect(await rig.db('sessions')).toHaveLength(0)
  client.cookie = cookie
  expect((await client.get('/collections')).status).toBe(401)
})

test('a wrong pass phrase and an unknown address get the same answer', async () => {
  const wrong = await stranger().post('/session', {
    email: emailOf('owner'),
    password: 'not the right words at all',
  })
  const unknown = await stranger().post('/session', {
    email: 'nobody@example.org',
    password: 'not the right words at all',
  })
  expect(wrong.status).toBe(401)
  const bland = ({ body }: typeof wrong) => ({ ...body, requestId: '' })
  expect(bland(unknown)).toEqual(bland(wrong))
  const names = ({ headers }: typeof wrong) => [...headers.keys()].sort()
  expect(names(unknown)).toEqual(names(wrong))
})

test('the times for known and unknown addresses cannot be told apart', { retry: 2 }, async () => {
  const client = stranger()
  const time = async (email: string): Promise<number> => {
    await rig.db('limits').delete()
    const start = performance.now()
    await client.post('/session', { email, password: 'not the right words at all' })
    return performance.now() - start
  }
  const known: number[] = []
  const unknown: number[] = []
  for (let i = 0; i < 40; i += 1) {
    known.push(await time(emailOf('owner')))
    unknown.push(await time(`nobody-${i}@example.org`))
  }
  const median = (times: number[]): number => times.sort((a, b) => a - b)[20] ?? 0
  expect(Math.abs(median(known) - median(unknown))).toBeLessThan(20)
})

test('after ten failures an account has to wait, even with the right phrase from elsewhere', async () => {
  const inside = await rig.as('owner')
  const wrong = { email: emailOf('owner'), password: 'not the right words at all' }
  for (let i = 0; i < 10; i += 1)
    expect((await stranger().post('/session', wrong)).status).toBe(401)
  const right = { email: emailOf('owner'), password: PASS_PHRASE }
  const blocked = await stranger().post('/session', right)
  expect(blocked.status).toBe(429)
  expect(problemOf(blocked).code).toBe('too-many-requests')
  const wait = Number(blocked.headers.get('retry-after'))
  expect(wait).toBeGreaterThan(0)
  expect(wait).toBeLessThanOrEqual(60)
  const other = await stranger().post('/session', { ...right, email: emailOf('viewer') })
  expect(other.status).toBe(200)
  const known = await inside.post('/session', right)
  expect(known.status).toBe(200)
})

test('many guesses at once gain nothing', async () => {
  const wrong = { email: emailOf('owner'), password: 'not the right words at all' }
  const answers = await Promise.all(
    Array.from({ length: 25 }, () => stranger().post('/session', wrong)),
  )
  const tried = answers.filter((a) => a.status === 401).length
  expect(tried).toBeLessThanOrEqual(11)
  expect(answers.filter((a) => a.status === 429)).toHaveLength(25 - tried)
})

test('fifty failures from one address stop further tries from it', async () => {
  const answers = []
  for (let i = 0; i < 51; i += 1) {
    const body = { email: `guess-${i}@example.org`, password: 'not the right words at all' }
    answers.push((await stranger().post('/session', body)).status)
  }
  expect(answers.slice(0, 50).every((status) => status === 401)).toBe(true)
  expect(answers[50]).toBe(429)
})

test('a session that does not know since when somebody is signed in is over', async () => {
  const client = await rig.as('owner')
  expect((await client.get('/collections')).status).toBe(200)
  await rig.db('sessions').update({ sess: rig.db.raw("json_remove(sess, '$.startedAt')") })
  expect((await client.get('/collections')).status).toBe(401)
})

test('an idle session of a day and any session of thirty days is over', async () => {
  const client = await rig.as('owner')
  const month = 30 * 24 * 3600 * 1000
  const [row] = (await rig.db('sessions').select('sid', 'sess')) as {
    sid: string
    sess: string | object
  }[]
  const content = (typeof row?.sess === 'string' ? JSON.parse(row.sess) : row?.sess) as Record<
    string,
    unknown
  >
  const old = JSON.stringify({ ...content, startedAt: Date.now() - month - 1000 })
  await rig.db('sessions').update({ sess: old })
  expect((await client.get('/collections')).status).toBe(401)
  const again = await (await rig.as('viewer')).get('/collections')
  expect(again.status).toBe(200)
  await rig.db('sessions').update({ expired: new Date(Date.now() - 1000) })
  expect((await (await rig.as('viewer')).get('/collections')).status).toBe(401)
})

test('a change of role holds from the very next request on', async () => {
  const client = await rig.as('collector')
  const path = (await client.get('/collections')).body['items'] as { uid: string }[]
  const places = `/collections/${path[0]?.uid}/places`
  expect((await client.post(places, { name: 'Loft' })).status).toBe(201)
  await rig.db('memberships').where({ role: 'collector' }).update({ role: 'viewer' })
  expect((await client.post(places, { name: 'Cellar' })).status).toBe(403)
  await rig.db('memberships').where({ role: 'viewer' }).delete()
  expect((await client.get(places)).status).toBe(404)
})
