import { describe, expect, test } from 'vitest'
import { faultsOf, problemOf, type Answer } from '../support/client'
import { checksum } from '../support/database'
import { useRig } from '../support/rig'
import { uidOf } from '../support/uids'
import { COLLECTION, UNITS } from '../support/world'

const rig = useRig()

const IN = `/collections/${COLLECTION}`

const tried = (state: string, rest: object = {}) => ({
  unit: UNITS.player,
  version: 1,
  changes: { forms: [{ jack: 'composite', port: 'video', state }] },
  ...rest,
})

const shown = (rest: object = {}) => ({
  unit: UNITS.monitor,
  version: 1,
  changes: { functions: [{ function: 'shows', state: 'works' }] },
  ...rest,
})

const send = async (...units: readonly object[]): Promise<Answer> =>
  (await rig.as('restorer')).post(`${IN}/unit-states`, { units })

const shelfVersion = async (): Promise<unknown> => {
  const row = (await rig.db('collections').where({ uid: COLLECTION }).first('shelf_version')) as {
    shelf_version: number
  }
  return row.shelf_version
}

describe('states of several units', () => {
  test('are noted together, and come back in the order of the request', async () => {
    const before = await shelfVersion()
    const answer = await send(shown(), tried('works'))
    expect(answer.status, answer.text).toBe(200)
    expect(answer.body['items']).toMatchObject([
      {
        uid: UNITS.monitor,
        version: 2,
        functions: [{ function: 'shows', state: 'works', by: 'Name of restorer' }],
      },
      {
        uid: UNITS.player,
        version: 2,
        forms: [
          {
            jack: 'composite',
            port: 'video',
            state: 'works',
            by: 'Name of restorer',
            on: expect.stringMatching(/^\d{4}-\d\d-\d\d$/),
          },
        ],
        badge: { state: 'works', tried: 1 },
      },
    ])
    expect(await shelfVersion()).toBe(Number(before) + 1)
    const client = await rig.as('viewer')
    const items = answer.body['items'] as object[]
    expect((await client.get(`${IN}/units/${UNITS.monitor}`)).body).toEqual(items[0])
    expect((await client.get(`${IN}/units/${UNITS.player}`)).body).toEqual(items[1])
  })

  test('take the place of what was noted before, and are taken away by untested', async () => {
    await send(tried('dead'), shown())
    const answer = await send(tried('untested', { version: 2 }), shown({ version: 2 }))
    expect(answer.body['items']).toMatchObject([
      { version: 3, forms: [] },
      { version: 3, functions: [{ state: 'works' }] },
    ])
  })

  test('sent again are told that the first sending has been done', async () => {
    await send(tried('works'), shown())
    const before = await checksum(rig.db)
    const again = await send(tried('works'), shown())
    expect(again.status).toBe(412)
    expect(problemOf(again).current).toMatchObject({
      uid: UNITS.player,
      version: 2,
      forms: [{ state: 'works' }],
    })
    expect(await checksum(rig.db)).toBe(before)
  })

  test('noted by ten at once are noted by one of them', async () => {
    const answers = await Promise.all(
      Array.from({ length: 10 }, (_, i) =>
        i % 2 === 0 ? send(tried('works'), shown()) : send(shown(), tried('works')),
      ),
    )
    expect(answers.map((a) => a.status).sort()).toEqual([200, ...Array<number>(9).fill(412)])
    expect(await rig.db('units').where({ version: 2 })).toHaveLength(2)
  })
})

describe('one bad among many leaves all as they were:', () => {
  const deleted = async (): Promise<void> => {
    await (await rig.as('owner')).delete(`${IN}/units/${UNITS.monitor}`, 1)
  }

  test.each<[string, object[], string[], number?]>([
    ['a unit of another collection', [shown({ unit: UNITS.foreign })], ['unit unknown-reference']],
    ['a unit that is nowhere', [shown({ unit: uidOf('nowhere') })], ['unit unknown-reference']],
    [
      'a function that the unit lacks',
      [shown({ changes: { functions: [{ function: 'flies', state: 'works' }] } })],
      ['changes.functions.0.function unknown-function'],
    ],
    [
      'a port that the form lacks',
      [shown({ changes: { forms: [{ jack: 'composite-a', port: 'gone', state: 'dead' }] } })],
      ['changes.forms.0.jack unknown-jack'],
    ],
    [
      'a lead, which has no such things',
      [{ unit: UNITS.lead, version: 1, changes: {} }],
      ['changes.forms devices-only'],
    ],
    ['a unit named twice', [tried('dead')], ['unit given-twice']],
    ['an unknown state', [tried('fine')], ['changes.forms.0.state not-in-list'], 400],
    ['a unit without a version', [shown({ version: undefined })], ['version required'], 400],
    ['a field that nobody knows', [shown({ by: 'me' })], ['by unknown-field'], 400],
  ])('%s', async (_, bad, faults, status = 422) => {
    const before = await checksum(rig.db)
    const answer = await send(tried('works'), ...bad)
    expect(answer.status, answer.text).toBe(status)
    expect(faultsOf(answer)).toEqual(faults.map((f) => `units.1.${f}`))
    expect(await checksum(rig.db)).toBe(before)
  })

  test('one that was deleted', async () => {
    await deleted()
    const before = await checksum(rig.db)
    const answer = await send(tried('works'), shown({ version: 2 }))
    expect(faultsOf(answer)).toEqual(['units.1.unit unknown-reference'])
    expect(await checksum(rig.db)).toBe(before)
  })

  test('one that was changed meanwhile, which is shown as it is now', async () => {
    const owner = await rig.as('owner')
    await owner.patch(`${IN}/units/${UNITS.monitor}`, 1, { note: 'Hums.' })
    const before = await checksum(rig.db)
    const answer = await send(tried('works'), shown())
    expect(answer.status).toBe(412)
    expect(problemOf(answer).current).toMatchObject({ uid: UNITS.monitor, note: 'Hums.' })
    expect(await checksum(rig.db)).toBe(before)
  })

  test('none at all, or more than fifty', async () => {
    expect(faultsOf(await send())).toEqual(['units too-few'])
    const many = Array.from({ length: 51 }, (_, i) => tried('works', { unit: uidOf(`u${i}`) }))
    expect(faultsOf(await send(...many))).toEqual(['units too-many'])
  })
})

test('a unit of another collection and one that is nowhere get the same answer', async () => {
  const bland = (a: Answer) => ({ ...a.body, requestId: '' })
  const foreign = await send(shown({ unit: UNITS.foreign }))
  expect(bland(foreign)).toEqual(bland(await send(shown({ unit: uidOf('nowhere') }))))
})
