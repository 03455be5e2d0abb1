import { API_ROOT, ROLES, ROUTES, type Route, type RouteName } from '@coaxwain/contract'
import { describe, expect, test } from 'vitest'
import { Client, problemOf, type Answer } from '../support/client'
import { checksum } from '../support/database'
import { addressOf, EXAMPLES, HOOKUP, type Example } from '../support/examples'
import { useRig } from '../support/rig'
import { OTHER, type Who } from '../support/world'
import { ACCESS } from './access-table'

const rig = useRig({}, { signedIn: true })

const NAMES = Object.keys(ROUTES) as RouteName[]
const VISITORS = ['stranger', 'outsider', 'neighbour', ...ROLES] as const
type Visitor = (typeof VISITORS)[number]

const clientOf = (visitor: Visitor): Promise<Client> =>
  visitor === 'stranger' ? Promise.resolve(new Client(rig.api.address)) : rig.as(visitor as Who)

/** What a request works on must be there; the owner sees to that. */
async function makeReady(route: Route, example: Example<RouteName>): Promise<void> {
  const owner = await rig.as('owner')
  const saved = `/collections/${HOOKUP.collection}/hookups`
  if (example.before === 'delete') {
    const path = addressOf(route.path.replace('/restore', ''), example.params)
    expect((await owner.delete(path, 1)).status).toBe(204)
  }
  if (example.before?.startsWith('save') === true) {
    const { body } = EXAMPLES.saveHookup
    expect((await owner.post(saved, { ...body, uid: HOOKUP.hookup })).status).toBe(201)
  }
  if (example.before === 'save-and-delete-hookup') {
    expect((await owner.delete(`${saved}/${HOOKUP.hookup}`, 1)).status).toBe(204)
  }
}

const call = (client: Client, route: Route, example: Example<RouteName>): Promise<Answer> =>
  client.send(route.method, addressOf(route.path, example.params, example.query), {
    ...(example.body === undefined ? {} : { body: example.body }),
    ...(example.version === undefined ? {} : { version: example.version }),
  })

function expectedStatus(name: RouteName, visitor: Visitor): number {
  const access = ACCESS[name]
  const { status } = ROUTES[name]
  if (access === 'anyone') return status
  if (visitor === 'stranger') return 401
  if (access === 'signed-in') return status
  if (visitor === 'outsider' || visitor === 'neighbour') return 404
  return access.includes(visitor) ? status : 403
}

describe.each(NAMES)('%s', (name) => {
  test.each(VISITORS)('answers a %s as the table says', async (visitor) => {
    const route: Route = ROUTES[name]
    const example = EXAMPLES[name] as Example<RouteName>
    await makeReady(route, example)
    const client = await clientOf(visitor)
    const before = await checksum(rig.db)
    const answer = await call(client, route, example)
    expect(answer.status, answer.text).toBe(expectedStatus(name, visitor))
    if (answer.status >= 400) {
      expect(problemOf(answer).status).toBe(answer.status)
      expect(await checksum(rig.db)).toBe(before)
    } else if (route.method === 'GET') {
      expect(await checksum(rig.db)).toBe(before)
    }
  })
})

describe('the tables', () => {
  test('name every route, and no other', () => {
    expect(Object.keys(ACCESS).sort()).toEqual([...NAMES].sort())
    expect(Object.keys(EXAMPLES).sort()).toEqual([...NAMES].sort())
  })

  test('are all that the server has mounted', () => {
    const known = new Set(
      (Object.values(ROUTES) as Route[]).map((r) => `${r.method} ${API_ROOT}${r.path}`),
    )
    const ours = rig.api.mounted.filter((m) => m.includes(API_ROOT))
    expect(ours.length).toBeGreaterThan(30)
    expect(ours.filter((m) => !known.has(m))).toEqual([])
    expect([...known].filter((k) => !ours.includes(k))).toEqual([])
  })
})

describe('a thing of another collection', () => {
  const swapped = NAMES.filter((n) => ROUTES[n].path.split(':').length > 2)

  test.each(swapped)('is to %s as if it were not there', async (name) => {
    const route: Route = ROUTES[name]
    const example = EXAMPLES[name] as Example<RouteName>
    await makeReady(route, example)
    const neighbour = await rig.as('neighbour')
    const before = await checksum(rig.db)
    const absent = Object.fromEntries(
      Object.entries(example.params).map(([k, v]) => [
        k,
        k === 'collection' ? OTHER : k === 'revision' ? (v as string) : 'nothing_of_that_name_A',
      ]),
    )
    const foreign = { ...example.params, collection: OTHER }
    const [there, nowhere] = [
      await call(neighbour, route, { ...example, params: foreign as never }),
      await call(neighbour, route, { ...example, params: absent as never }),
    ]
    expect(there.status).toBe(404)
    const bland = (a: Answer) => ({ ...a.body, requestId: '' })
    expect(bland(there)).toEqual(bland(nowhere))
    const names = (a: Answer) => [...a.headers.keys()].sort()
    expect(names(there)).toEqual(names(nowhere))
    expect(await checksum(rig.db)).toBe(before)
  })
})
