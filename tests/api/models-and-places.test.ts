import type { Port } from '@coaxwain/models'
import { describe, expect, test } from 'vitest'
import { faultsOf, problemOf } from '../support/client'
import { player } from '../support/models'
import { useRig } from '../support/rig'
import { uidOf } from '../support/uids'
import { COLLECTION, MODELS, OTHER, PLACES, UNITS } from '../support/world'

const rig = useRig()

const IN = `/collections/${COLLECTION}`
const OWN = `${IN}/models/${MODELS.own}`

const extraPort: Port = {
  key: 's-video',
  label: 'S-VIDEO',
  connector: 'svideo4-socket',
  mount: 'chassis',
  circuits: [
    { circuit: 'y', dir: 'out' },
    { circuit: 'c', dir: 'out' },
  ],
  origin: 'factory',
  isolated: 'yes',
  at: { face: 'back', row: 0, column: 3 },
}

describe('models', () => {
  test('of the catalogue and of the collection are listed, those of others are not', async () => {
    const { body } = await (await rig.as('viewer')).get(`${IN}/models`)
    const uids = (body['items'] as { uid: string }[]).map((m) => m.uid)
    expect(uids).toContain(MODELS.player)
    expect(uids).toContain(MODELS.own)
    expect(uids).not.toContain(MODELS.foreign)
    expect(body['total']).toBe(5)
  })

  test('tell in lists what they connect to, do, and how many there are', async () => {
    const { body } = await (await rig.as('viewer')).get(`${IN}/models?function=modulates`)
    expect(body['items']).toMatchObject([
      {
        uid: MODELS.modulator,
        own: false,
        connectors: ['f-socket', 'phono-socket'],
        forms: ['composite', 'rf'],
        functions: ['modulates'],
        units: 1,
      },
    ])
  })

  test('get a new revision with each change, and the old ones stay as they were', async () => {
    const client = await rig.as('owner')
    const before = await client.get(OWN)
    const changed = await client.put(OWN, 1, {
      document: player({ name: 'Own model', ports: [...player().ports, extraPort] }),
    })
    expect(changed.body).toMatchObject({ revision: 2, version: 2 })
    expect(changed.body['connectors']).toContain('svideo4-socket')
    const first = await client.get(`${OWN}/revisions/1`)
    expect(first.body['document']).toEqual(before.body['document'])
    expect((await client.get(`${OWN}/revisions/9`)).status).toBe(404)
  })

  test('of the catalogue cannot be changed from inside a collection', async () => {
    const client = await rig.as('owner')
    const answer = await client.put(`${IN}/models/${MODELS.player}`, 1, { document: player() })
    expect(answer.status).toBe(403)
  })

  test('keep a port that something names, unless it is only retired', async () => {
    const client = await rig.as('owner')
    const unit = await client.post(`${IN}/units`, { model: MODELS.own })
    const path = `${IN}/units/${String(unit.body['uid'])}`
    await client.patch(`${path}/states`, 1, {
      forms: [{ jack: 'composite', port: 'video', state: 'works' }],
    })
    const whole = player({ name: 'Own model' })
    const without = {
      ...whole,
      ports: whole.ports.filter((p) => p.key !== 'video'),
      jacks: whole.jacks.filter((j) => j.key !== 'composite'),
      functions: whole.functions.map((f) => ({
        ...f,
        gives: f.gives.filter((g) => g.jack !== 'composite'),
      })),
    }
    const gone = await client.put(OWN, 1, { document: without })
    expect(gone.status).toBe(409)
    expect(faultsOf(gone).sort()).toEqual(['document.jacks in-use', 'document.ports in-use'])
    const retired = {
      ...whole,
      ports: whole.ports.map((p) => (p.key === 'video' ? { ...p, retired: true } : p)),
    }
    expect((await client.put(OWN, 1, { document: retired })).status).toBe(200)
  })

  test('never use a key again for something else', async () => {
    const client = await rig.as('owner')
    const plain = player({ name: 'Own model' })
    const more = { ...plain, ports: [...plain.ports, extraPort] }
    await client.put(OWN, 1, { document: more })
    await client.put(OWN, 2, { document: plain })
    const again = await client.put(OWN, 3, { document: more })
    expect(again.status).toBe(409)
    expect(problemOf(again).code).toBe('key-reused')
  })

  test('take no part that clashes with what was added to a unit', async () => {
    const client = await rig.as('owner')
    const unit = await client.post(`${IN}/units`, { model: MODELS.own })
    const added = { ...extraPort, origin: 'added' }
    const fitted = await client.put(`${IN}/units/${String(unit.body['uid'])}/modifications`, 1, {
      modifications: [{ kind: 'added', ports: [added], jacks: [], functions: [] }],
    })
    expect(fitted.status, fitted.text).toBe(200)
    const whole = player({ name: 'Own model' })
    const clash = await client.put(OWN, 1, {
      document: { ...whole, ports: [...whole.ports, extraPort] },
    })
    expect(clash.status).toBe(409)
    expect(faultsOf(clash)).toEqual(['document clashes-with-fitting'])
    expect(problemOf(clash).errors[0]?.detail).toContain('s-video')
    const other = { ...extraPort, key: 's-video-2' }
    const apart = await client.put(OWN, 1, {
      document: { ...whole, ports: [...whole.ports, other] },
    })
    expect(apart.status, apart.text).toBe(200)
  })

  test('with units are not deleted; without, they go and come back', async () => {
    const client = await rig.as('owner')
    const unit = await client.post(`${IN}/units`, { model: MODELS.own })
    const refused = await client.delete(OWN, 1)
    expect(refused.status).toBe(409)
    expect(problemOf(refused).detail).toContain('1 unit is')
    await client.delete(`${IN}/units/${String(unit.body['uid'])}`, 1)
    expect((await client.delete(OWN, 1)).status).toBe(204)
    const { body } = await client.get(`${IN}/models?deleted=true`)
    expect(body['items']).toMatchObject([{ uid: MODELS.own }])
    expect((await client.post(`${IN}/units`, { model: MODELS.own })).status).toBe(422)
    expect((await client.send('POST', `${OWN}/restore`, { version: 2 })).status).toBe(200)
    expect((await client.post(`${IN}/units`, { model: MODELS.own })).status).toBe(201)
  })

  test('of the longest names are paged through like all others', async () => {
    const client = await rig.as('owner')
    const maker = '\u8a66'.repeat(80)
    for (const end of ['1', '2', '3']) {
      const document = player({ maker, name: '\u9a13'.repeat(79) + end })
      expect((await client.post(`${IN}/models`, { document })).status).toBe(201)
    }
    const seen: string[] = []
    let cursor = ''
    do {
      const { status, body } = await client.get(`${IN}/models?limit=1${cursor}`)
      expect(status).toBe(200)
      seen.push(...(body['items'] as { name: string }[]).map((m) => m.name.slice(-1)))
      cursor = body['next'] === null ? '' : `&cursor=${String(body['next'])}`
    } while (cursor !== '')
    expect(seen.slice(-3)).toEqual(['1', '2', '3'])
    expect(seen).toHaveLength(8)
  })

  test('sent twenty times at once are made once', async () => {
    const client = await rig.as('owner')
    const body = { uid: uidOf('made-once'), document: player({ name: 'Once' }) }
    const answers = await Promise.all(
      Array.from({ length: 20 }, () => client.post(`${IN}/models`, body)),
    )
    expect(new Set(answers.map((a) => a.text)).size).toBe(1)
    expect(answers[0]?.status).toBe(201)
    expect(await rig.db('models').where({ uid: body.uid })).toHaveLength(1)
  })
})

describe('places', () => {
  const list = async () =>
    (await (await rig.as('owner')).get(`${IN}/places`)).body['items'] as {
      uid: string
      path: string[]
      units: number
    }[]

  test('make a tree, with the units that stand in each', async () => {
    const places = await list()
    expect(places.map((p) => [p.uid, p.path.length, p.units]).sort()).toEqual(
      [
        [PLACES.room, 1, 1],
        [PLACES.shelf, 2, 0],
      ].sort(),
    )
  })

  test('move, but never into themselves', async () => {
    const client = await rig.as('owner')
    const box = await client.post(`${IN}/places`, { name: 'Box', parent: PLACES.shelf })
    expect(box.body).toMatchObject({ name: 'Box', parent: PLACES.shelf, version: 1 })
    const loop = await client.patch(`${IN}/places/${PLACES.room}`, 1, { parent: box.body['uid'] })
    expect(loop.status).toBe(409)
    expect(problemOf(loop).code).toBe('place-within-itself')
    const up = await client.patch(`${IN}/places/${PLACES.shelf}`, 1, { parent: null })
    expect(up.body).toMatchObject({ parent: null, version: 2 })
  })

  test('stand twenty deep in one another at most, moved ones with all that they hold', async () => {
    const client = await rig.as('owner')
    const chain = async (length: number): Promise<string[]> => {
      const made: string[] = []
      for (let i = 0; i < length; i += 1) {
        const body = { name: `Box ${i}`, parent: made.at(-1) ?? null }
        const box = await client.post(`${IN}/places`, body)
        expect(box.status, box.text).toBe(201)
        made.push(String(box.body['uid']))
      }
      return made
    }
    const high = await chain(20)
    const deeper = await client.post(`${IN}/places`, { name: 'Tin', parent: high.at(-1) })
    expect(faultsOf(deeper)).toEqual(['parent too-many'])
    const [low] = await chain(3)
    const move = (parent: string | undefined) => client.patch(`${IN}/places/${low}`, 1, { parent })
    expect(faultsOf(await move(high[17]))).toEqual(['parent too-many'])
    expect((await move(high[16])).status).toBe(200)
  })

  test('are deleted only when nothing stands there', async () => {
    const client = await rig.as('owner')
    const full = await client.delete(`${IN}/places/${PLACES.room}`, 1)
    expect(full.status).toBe(409)
    expect(problemOf(full).details).toEqual({ units: 1, places: 1 })
    await client.delete(`${IN}/places/${PLACES.shelf}`, 1)
    await client.patch(`${IN}/units/${UNITS.player}`, 1, { place: null })
    expect((await client.delete(`${IN}/places/${PLACES.room}`, 1)).status).toBe(204)
    expect(await list()).toEqual([])
  })
})

describe('the database itself', () => {
  test('refuses a unit of a model of another collection', async () => {
    const id = async (table: string, uid: string): Promise<number> =>
      ((await rig.db(table).where({ uid }).first('id')) as { id: number }).id
    const collection = await id('collections', COLLECTION)
    const other = await id('collections', OTHER)
    const row = {
      collection_id: collection,
      uid: uidOf('crossing'),
      number: 999,
      model_id: await id('models', MODELS.foreign),
      sort_name: 'x',
    }
    for (const home of [0, collection, other]) {
      await expect(rig.db('units').insert({ ...row, model_home_key: home })).rejects.toThrow()
    }
  })

  test('refuses a unit in a place of another collection, and a state across collections', async () => {
    const foreign = (await rig.db('places').where({ uid: PLACES.foreign }).first('id')) as {
      id: number
    }
    await expect(
      rig.db('units').where({ uid: UNITS.player }).update({ place_id: foreign.id }),
    ).rejects.toThrow()
    const unit = (await rig.db('units').where({ uid: UNITS.player }).first()) as {
      id: number
      collection_id: number
    }
    await expect(
      rig.db('unit_form_states').insert({
        collection_id: unit.collection_id + 1,
        unit_id: unit.id,
        jack_key: 'composite',
        port_key: 'video',
        state: 'works',
      }),
    ).rejects.toThrow()
  })
})
