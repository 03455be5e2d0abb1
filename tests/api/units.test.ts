import { describe, expect, test } from 'vitest'
import { problemOf } from '../support/client'
import { useRig } from '../support/rig'
import { uidOf } from '../support/uids'
import { COLLECTION, MODELS, PLACES, UNITS } from '../support/world'

const rig = useRig()

const IN = `/collections/${COLLECTION}`
const UNIT = `${IN}/units/${UNITS.player}`

const uidsOf = (body: Record<string, unknown>): string[] =>
  (body['items'] as { uid: string }[]).map((i) => i.uid)

const shelfVersion = async (): Promise<number> => {
  const [row] = (await rig
    .db('collections')
    .where({ uid: COLLECTION })
    .select('shelf_version')) as {
    shelf_version: number
  }[]
  return row?.shelf_version ?? 0
}

describe('a unit', () => {
  test('is made with a number of its own, read with an ETag, changed, deleted and brought back', async () => {
    const client = await rig.as('collector')
    const made = await client.post(`${IN}/units`, {
      model: MODELS.player,
      label: 'Kitchen player',
      place: PLACES.shelf,
    })
    expect(made.status).toBe(201)
    expect(made.body).toMatchObject({
      number: 100,
      version: 1,
      placePath: [`Name of ${PLACES.room}`, `Name of ${PLACES.shelf}`],
      badge: { state: 'untested', tried: 0, of: 3 },
    })
    const path = `${IN}/units/${String(made.body['uid'])}`
    const read = await client.get(path)
    expect(read.headers.get('etag')).toBe('"1"')
    const changed = await client.patch(path, 1, { note: 'Hums.', place: null })
    expect(changed.body).toMatchObject({ version: 2, note: 'Hums.', place: null, placePath: [] })
    expect(changed.body['label']).toBe('Kitchen player')
    expect((await client.delete(path, 2)).status).toBe(204)
    expect((await client.patch(path, 3, { note: '' })).status).toBe(404)
    expect(uidsOf((await client.get(`${IN}/units`)).body)).not.toContain(made.body['uid'])
    expect(uidsOf((await client.get(`${IN}/units?deleted=true`)).body)).toEqual([made.body['uid']])
    const back = await client.send('POST', `${path}/restore`, { version: 3 })
    expect(back.body).toMatchObject({ version: 4, deletedAt: null, note: 'Hums.' })
  })

  test('tells a stale editor what it looks like now', async () => {
    const client = await rig.as('owner')
    await client.patch(UNIT, 1, { label: 'First' })
    const before = await shelfVersion()
    const late = await client.patch(UNIT, 1, { label: 'Second' })
    expect(late.status).toBe(412)
    expect(problemOf(late).current).toMatchObject({ version: 2, label: 'First' })
    expect(await shelfVersion()).toBe(before)
  })

  test('keeps states by form, port and function, with day, way and person', async () => {
    const client = await rig.as('restorer')
    const noted = await client.patch(`${UNIT}/states`, 1, {
      forms: [
        { jack: 'composite', port: 'video', state: 'dead', on: '2026-03-04', how: 'scope' },
        { jack: 'sound', port: 'left', state: 'works' },
      ],
      functions: [{ function: 'plays', state: 'intermittent' }],
    })
    expect(noted.status).toBe(200)
    expect(noted.body['forms']).toMatchObject([
      {
        jack: 'composite',
        port: 'video',
        state: 'dead',
        on: '2026-03-04',
        how: 'scope',
        by: 'Name of restorer',
      },
      {
        jack: 'sound',
        port: 'left',
        state: 'works',
        on: expect.stringMatching(/^\d{4}-\d\d-\d\d$/),
      },
    ])
    expect(noted.body['functions']).toMatchObject([{ function: 'plays', state: 'intermittent' }])
    expect(noted.body['badge']).toEqual({ state: 'dead', inThatState: 1, tried: 2, of: 3 })
    const cleared = await client.patch(`${UNIT}/states`, 2, {
      forms: [{ jack: 'composite', port: 'video', state: 'untested' }],
    })
    expect(cleared.body['badge']).toMatchObject({ state: 'works', tried: 1 })
  })

  test('may be set aside by a reseller, who can change nothing else of it', async () => {
    const client = await rig.as('reseller')
    expect((await client.patch(UNIT, 1, { holding: 'listed' })).body).toMatchObject({
      holding: 'listed',
    })
    const more = await client.patch(UNIT, 2, { holding: 'sold', label: 'Bargain' })
    expect(more.status).toBe(403)
    expect(problemOf(more).errors).toMatchObject([{ path: 'label', code: 'not-yours-to-change' }])
  })

  test('takes added ports, which can then be tested, searched and no longer taken away', async () => {
    const client = await rig.as('owner')
    const port = {
      key: 'extra',
      label: 'AV',
      connector: 'bnc-socket',
      mount: 'chassis',
      circuits: [{ circuit: 'cvbs', dir: 'out' }],
      origin: 'added',
      isolated: 'yes',
      at: { face: 'back', row: 1, column: 0 },
    }
    const jack = {
      key: 'composite-2',
      form: 'composite',
      dir: 'out',
      contacts: [{ circuit: 'cvbs', port: 'extra' }],
    }
    const modifications = [{ kind: 'added', ports: [port], jacks: [jack], functions: [] }]
    const fitted = await client.put(`${UNIT}/modifications`, 1, { modifications })
    expect(fitted.body).toMatchObject({ modifications, badge: { of: 4 } })
    const found = await client.get(`${IN}/units?connector=bnc-socket`)
    expect(uidsOf(found.body)).toEqual([UNITS.player])
    await client.patch(`${UNIT}/states`, 2, {
      forms: [{ jack: 'composite-2', port: 'extra', state: 'works' }],
    })
    const bare = await client.put(`${UNIT}/modifications`, 3, { modifications: [] })
    expect(bare.status).toBe(409)
    expect(problemOf(bare).code).toBe('part-in-use')
  })

  test('keeps where its controls stand', async () => {
    const client = await rig.as('owner')
    const path = `${IN}/units/${UNITS.monitor}/stands`
    expect((await client.put(path, 1, { stands: { input: 'b' } })).body['stands']).toEqual({
      input: 'b',
    })
    expect((await client.put(path, 2, { stands: {} })).body['stands']).toEqual({})
  })
})

describe('the list of units', () => {
  const find = async (query: string): Promise<string[]> => {
    const answer = await (await rig.as('viewer')).get(`${IN}/units?${query}`)
    expect(answer.status, answer.text).toBe(200)
    return uidsOf(answer.body).sort()
  }

  test.each([
    ['rfOut=uhf', [UNITS.modulator]],
    ['rfOut=vhf', []],
    ['rfOutFromMhz=470&rfOutToMhz=480', [UNITS.modulator]],
    ['rfOutFromMhz=600&rfOutToMhz=700', []],
    ['rfOutFromMhz=0&rfOutToMhz=100', []],
    ['rfOutFromMhz=0', [UNITS.modulator]],
    ['connector=f-socket', [UNITS.modulator]],
    ['connector=phono-plug', [UNITS.lead]],
    ['form=composite&dir=in', [UNITS.modulator, UNITS.monitor]],
    ['form=composite&dir=out', [UNITS.player]],
    ['function=shows', [UNITS.monitor]],
    ['kind=lead', [UNITS.lead]],
    ['type=piece', [UNITS.lead]],
    ['working=works', []],
    ['state=dead', []],
    ['state=untested', [UNITS.modulator, UNITS.monitor, UNITS.player]],
    ['holding=sold', []],
    [`place=${PLACES.room}`, [UNITS.player]],
    [`place=${PLACES.shelf}`, []],
    ['q=player+one', [UNITS.player]],
    ['q=testmaker+lead', [UNITS.lead]],
    [`model=${MODELS.monitor}`, [UNITS.monitor]],
    ['present=true&type=piece', [UNITS.lead]],
  ])('finds by %s', async (query, expected) => {
    expect(await find(query)).toEqual([...expected].sort())
  })

  test('answers what puts out RF on UHF with one indexed statement', async () => {
    const [plan] = (await rig.db.raw(
      `explain select units.uid from units join models on models.id = units.model_id
       where units.collection_id = 1 and units.deleted_at is null and exists (
         select 1 from model_rf_outputs where model_rf_outputs.model_id = units.model_id
           and model_rf_outputs.low_mhz <= 3000 and model_rf_outputs.high_mhz >= 300)`,
    )) as [{ table: string; type: string; possible_keys: string | null }[]]
    const scanned = plan.filter((row) => row.type === 'ALL' && row.possible_keys === null)
    expect(scanned).toEqual([])
  })

  test.each(['name', '-name', 'added', '-added', 'changed', '-changed', 'place', '-place'])(
    'pages by %s without leaving out or repeating any',
    async (sort) => {
      const client = await rig.as('owner')
      for (let i = 0; i < 9; i += 1) {
        await client.post(`${IN}/units`, { model: MODELS.lead, label: `Lead ${i % 3}` })
      }
      const seen: string[] = []
      let cursor = ''
      for (let page = 0; page < 10; page += 1) {
        const { body } = await client.get(
          `${IN}/units?sort=${sort}&limit=4${cursor === '' ? '' : `&cursor=${cursor}`}`,
        )
        expect(body['total']).toBe(13)
        seen.push(...uidsOf(body))
        if (body['next'] === null) break
        cursor = String(body['next'])
      }
      expect(seen).toHaveLength(13)
      expect(new Set(seen).size).toBe(13)
      const whole = await client.get(`${IN}/units?sort=${sort}&limit=200`)
      expect(seen).toEqual(uidsOf(whole.body))
    },
  )
})

describe('many at once', () => {
  test('twenty edits of one version: one wins, nineteen are told how it is now', async () => {
    const client = await rig.as('owner')
    const answers = await Promise.all(
      Array.from({ length: 20 }, (_, i) => client.patch(UNIT, 1, { label: `Edit ${i}` })),
    )
    expect(answers.filter((a) => a.status === 200)).toHaveLength(1)
    const late = answers.filter((a) => a.status === 412)
    expect(late).toHaveLength(19)
    for (const a of late) expect(problemOf(a).current).toMatchObject({ version: 2 })
  })

  test('twenty who each try again until it works all get their change in', async () => {
    const client = await rig.as('owner')
    const appendMark = async (mark: string): Promise<void> => {
      for (;;) {
        const now = await client.get(UNIT)
        const note = `${String(now.body['note'])}${mark}`
        const done = await client.patch(UNIT, Number(now.body['version']), { note })
        if (done.status === 200) return
        expect(done.status).toBe(412)
      }
    }
    const marks = Array.from({ length: 20 }, (_, i) => `[${i}]`)
    await Promise.all(marks.map(appendMark))
    const { body } = await client.get(UNIT)
    expect(body['version']).toBe(21)
    for (const mark of marks) expect(body['note']).toContain(mark)
  })

  test.each([2, 20])(
    '%i sendings of one new unit make one row and give equal answers',
    async (n) => {
      const client = await rig.as('owner')
      const body = { uid: uidOf('made-once'), model: MODELS.player, label: 'Once' }
      const answers = await Promise.all(
        Array.from({ length: n }, () => client.post(`${IN}/units`, body)),
      )
      expect(new Set(answers.map((a) => a.status))).toEqual(new Set([201]))
      expect(new Set(answers.map((a) => a.text)).size).toBe(1)
      expect(await rig.db('units').where({ uid: body.uid })).toHaveLength(1)
      const other = await client.post(`${IN}/units`, { ...body, label: 'Another' })
      expect(other.status).toBe(409)
      expect(problemOf(other).code).toBe('uid-taken')
    },
  )

  test('the same with an idempotency key instead of an id', async () => {
    const client = await rig.as('owner')
    const send = (key: string) =>
      client.post(`${IN}/units`, { model: MODELS.player }, { headers: { 'idempotency-key': key } })
    const answers = await Promise.all(Array.from({ length: 20 }, () => send('one')))
    expect(new Set(answers.map((a) => a.text)).size).toBe(1)
    expect((await send('two')).text).not.toBe(answers[0]?.text)
  })

  test('numbers are given once each', async () => {
    const client = await rig.as('owner')
    const answers = await Promise.all(
      Array.from({ length: 20 }, () => client.post(`${IN}/units`, { model: MODELS.lead })),
    )
    expect(answers.every((a) => a.status === 201)).toBe(true)
    expect(new Set(answers.map((a) => a.body['number'])).size).toBe(20)
  })
})
