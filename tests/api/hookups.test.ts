import { describe, expect, test } from 'vitest'
import { problemOf } from '../support/client'
import { hookup, question } from '../support/examples'
import { useRig } from '../support/rig'
import { uidOf } from '../support/uids'
import { COLLECTION, MODELS, UNITS } from '../support/world'

const rig = useRig()

const IN = `/collections/${COLLECTION}`
const UID = uidOf('saved')
const SAVED = `${IN}/hookups/${UID}`

const save = async (title = 'Player to monitor') => {
  const client = await rig.as('owner')
  const body = { uid: UID, title, question: question(), hookup: hookup() }
  return client.post(`${IN}/hookups`, body)
}

const labelNow = async (): Promise<unknown> =>
  (await (await rig.as('viewer')).get(SAVED)).body['label']

describe('an answer', () => {
  test('comes from the units on the shelf, with the versions that it rests on', async () => {
    const client = await rig.as('viewer')
    const { status, body } = await client.post(`${IN}/answers`, { question: question() })
    expect(status).toBe(200)
    expect(body['answer']).toMatchObject({ verdict: 'yes', complete: true })
    expect(body['shelfVersion']).toBe(1)
  })

  test('avoids a port as soon as it is marked dead', async () => {
    const client = await rig.as('owner')
    await client.patch(`${IN}/units/${UNITS.player}/states`, 1, {
      forms: [{ jack: 'composite', port: 'video', state: 'dead' }],
    })
    const { body } = await client.post(`${IN}/answers`, { question: question() })
    expect(body['answer']).toMatchObject({ verdict: 'none', hookups: [] })
  })
})

describe('an answer that the check refuses', () => {
  const strict = useRig({ checker: () => ({ ok: false, findings: [{ code: 'wire-missing' }] }) })

  test('is never shown', async () => {
    const client = await strict.as('owner')
    const answer = await client.post(`${IN}/answers`, { question: question() })
    expect(answer.status).toBe(500)
    expect(problemOf(answer).code).toBe('answer-refused')
    expect(problemOf(answer).detail).toContain('fault of ours')
  })
})

describe('a saved hookup', () => {
  test('is read, listed, renamed, deleted and brought back', async () => {
    const client = await rig.as('collector')
    expect((await save()).body).toMatchObject({ version: 1, label: 'still-right' })
    const { body } = await client.get(`${IN}/hookups`)
    expect(body).toMatchObject({
      total: 1,
      items: [{ uid: UID, source: UNITS.player, display: UNITS.monitor, label: 'still-right' }],
    })
    const renamed = await client.patch(SAVED, 1, { title: 'Sofa' })
    expect(renamed.body).toMatchObject({ title: 'Sofa', version: 2 })
    expect((await client.delete(SAVED, 2)).status).toBe(204)
    expect((await client.get(`${IN}/hookups`)).body['total']).toBe(0)
    const back = await client.send('POST', `${SAVED}/restore`, { version: 3 })
    expect(back.body).toMatchObject({ version: 4, deletedAt: null })
  })

  test('shows at its units that they are needed', async () => {
    await save()
    const client = await rig.as('viewer')
    const unit = await client.get(`${IN}/units/${UNITS.player}`)
    expect(unit.body).toMatchObject({
      neededByCount: 1,
      neededBy: [{ uid: UID, title: 'Player to monitor' }],
    })
    const using = await client.get(`${IN}/hookups?unit=${UNITS.monitor}`)
    expect(using.body['total']).toBe(1)
    expect((await client.get(`${IN}/hookups?unit=${UNITS.modulator}`)).body['total']).toBe(0)
  })

  test('is named at its units among the first fifty, and counted with all others', async () => {
    await save()
    type Row = Record<string, unknown>
    const { id, ...first } = (await rig.db('hookups').first()) as Row & { id: number }
    const uses = (await rig.db('hookup_units').where({ hookup_id: id })) as Row[]
    for (let i = 0; i < 60; i += 1) {
      const title = `Copy ${String(i).padStart(2, '0')}`
      const [copy] = await rig.db('hookups').insert({ ...first, uid: uidOf(`copy-${i}`), title })
      const rows = uses.map(({ id: _, ...use }) => ({ ...use, hookup_id: copy }))
      await rig.db('hookup_units').insert(rows)
    }
    const { body } = await (await rig.as('viewer')).get(`${IN}/units/${UNITS.player}`)
    expect(body['neededByCount']).toBe(61)
    const titles = (body['neededBy'] as { title: string }[]).map((h) => h.title)
    expect([titles.length, titles[0], titles[49]]).toEqual([50, 'Copy 00', 'Copy 49'])
  })

  test('stays right when what it uses has been tried and works', async () => {
    await save()
    const client = await rig.as('owner')
    await client.patch(`${IN}/units/${UNITS.player}/states`, 1, {
      forms: [{ jack: 'composite', port: 'video', state: 'works' }],
      functions: [{ function: 'plays', state: 'works' }],
    })
    expect(await labelNow()).toBe('still-right')
  })

  test('stays right while nothing that bears on it changes', async () => {
    await save()
    const client = await rig.as('owner')
    await client.patch(`${IN}/units/${UNITS.player}`, 1, { note: 'Moved.', holding: 'spare' })
    await client.patch(`${IN}/units/${UNITS.modulator}`, 1, { working: 'faulty' })
    expect(await labelNow()).toBe('still-right')
  })

  test('is changed when a socket that it uses has been tried since', async () => {
    await save()
    const client = await rig.as('owner')
    await client.patch(`${IN}/units/${UNITS.player}/states`, 1, {
      forms: [{ jack: 'composite', port: 'video', state: 'dead' }],
    })
    const { body } = await client.get(SAVED)
    expect(body).toMatchObject({ label: 'changed', changedUnits: [UNITS.player] })
  })

  test.each([
    ['deleted', (path: string) => ({ method: 'DELETE', path, body: undefined })],
    ['sold', (path: string) => ({ method: 'PATCH', path, body: { holding: 'sold' } })],
  ])('misses a unit that was %s', async (_, act) => {
    await save()
    const client = await rig.as('owner')
    const { method, path, body } = act(`${IN}/units/${UNITS.player}`)
    await client.send(method, path, { version: 1, ...(body === undefined ? {} : { body }) })
    expect((await client.get(SAVED)).body).toMatchObject({
      label: 'unit-missing',
      missingUnits: [UNITS.player],
    })
  })

  test('misses leads that are no longer in the drawer', async () => {
    await save()
    const client = await rig.as('owner')
    await client.delete(`${IN}/units/${UNITS.lead}`, 1)
    expect((await client.get(SAVED)).body).toMatchObject({
      label: 'unit-missing',
      missingPieces: [MODELS.lead],
    })
  })

  test('sent twenty times at once is kept once', async () => {
    const answers = await Promise.all(Array.from({ length: 20 }, () => save()))
    expect(new Set(answers.map((a) => a.status))).toEqual(new Set([201]))
    expect(new Set(answers.map((a) => a.text)).size).toBe(1)
    expect(await rig.db('hookups')).toHaveLength(1)
    expect((await save('Another title')).status).toBe(409)
  })
})

describe('the snapshot', () => {
  test('is sent again only when the shelf has changed', async () => {
    const client = await rig.as('viewer')
    const first = await client.get(`${IN}/snapshot`)
    const etag = first.headers.get('etag') ?? ''
    expect(etag).toBe('"s1-c1"')
    expect(first.body['units']).toHaveLength(4)
    expect((await client.get(`${IN}/snapshot`, { 'if-none-match': etag })).status).toBe(304)
    await (await rig.as('owner')).patch(`${IN}/units/${UNITS.player}`, 1, { working: 'works' })
    const second = await client.get(`${IN}/snapshot`, { 'if-none-match': etag })
    expect(second.status).toBe(200)
    expect(second.headers.get('etag')).toBe('"s2-c1"')
  })
})
