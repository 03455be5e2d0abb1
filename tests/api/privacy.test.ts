import { ROUTES, type Route, type RouteName } from '@coaxwain/contract'
import { expect, test } from 'vitest'
import { addressOf, EXAMPLES, HOOKUP, question, hookup, type Example } from '../support/examples'
import { player } from '../support/models'
import { useRig } from '../support/rig'
import { COLLECTION, MODELS, OTHER, UNITS } from '../support/world'

const rig = useRig()

const MARK = 'Zwiebelturm'
const IN = `/collections/${COLLECTION}`

/** The word in every text that a collection can hold. */
async function plant(): Promise<void> {
  const owner = await rig.as('owner')
  const body = { uid: HOOKUP.hookup, title: MARK, question: question(), hookup: hookup() }
  expect((await owner.post(`${IN}/hookups`, body)).status).toBe(201)
  await owner.put(`${IN}/models/${MODELS.own}`, 1, {
    document: player({ maker: MARK, name: MARK, aliases: [MARK] }),
  })
  await owner.post(`${IN}/places`, { name: MARK })
  await owner.patch(`${IN}/units/${UNITS.player}`, 1, { label: MARK, note: MARK, serial: MARK })
  await owner.patch(`${IN}/units/${UNITS.player}/states`, 2, {
    functions: [{ function: 'plays', state: 'works', how: MARK }],
  })
  await rig.db('collections').where({ uid: COLLECTION }).update({ name: MARK })
}

test('nothing of one collection shows in anything that another can fetch', async () => {
  await plant()
  const owner = await rig.as('owner')
  const own = await owner.get(`${IN}/units`)
  expect(own.text).toContain(MARK)

  const neighbour = await rig.as('neighbour')
  for (const name of Object.keys(ROUTES) as RouteName[]) {
    const route: Route = ROUTES[name]
    if (route.method !== 'GET') continue
    const example = EXAMPLES[name] as Example<RouteName>
    for (const collection of [COLLECTION, OTHER]) {
      const path = addressOf(route.path, { ...example.params, collection }, { ...example.query })
      expect((await neighbour.get(path)).text, path).not.toContain(MARK)
    }
  }
  for (const query of [`q=${MARK}`, `model=${MODELS.own}`, `place=${UNITS.player}`]) {
    const answer = await neighbour.get(`/collections/${OTHER}/units?${query}`)
    expect(answer.text).not.toContain(MARK)
  }
})

test('a model of one collection may be looked up by its id nowhere else', async () => {
  const neighbour = await rig.as('neighbour')
  const answer = await neighbour.get(`/collections/${OTHER}/models/${MODELS.own}`)
  expect(answer.status).toBe(404)
  const made = await neighbour.post(`/collections/${OTHER}/units`, { model: MODELS.own })
  expect(made.status).toBe(422)
})

test('answers hold no number of a row', async () => {
  const owner = await rig.as('owner')
  for (const path of ['/units', '/models', '/places', '/snapshot', '/hookups']) {
    const { text } = await owner.get(IN + path)
    expect(text).not.toMatch(/"(id|collectionId|collection_id|modelId|placeId)":/)
  }
})
