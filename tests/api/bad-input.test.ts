import { describe, expect, test } from 'vitest'
import { faultsOf, problemOf, type Answer, type Client, type Sending } from '../support/client'
import { checksum } from '../support/database'
import { hookup, question } from '../support/examples'
import { player } from '../support/models'
import { useRig } from '../support/rig'
import { COLLECTION, MODELS, PLACES, UNITS } from '../support/world'

const rig = useRig()

const IN = `/collections/${COLLECTION}`
const UNIT = `${IN}/units/${UNITS.player}`

interface Wrong {
  readonly what: string
  readonly method: string
  readonly path: string
  readonly sending: Sending
  readonly status: number
  readonly faults?: readonly string[]
  readonly code?: string
}

const post = (
  what: string,
  path: string,
  body: unknown,
  ...expected: [faults: string[], status?: number]
): Wrong => ({
  what,
  method: 'POST',
  path: IN + path,
  sending: { body },
  status: expected[1] ?? 400,
  faults: expected[0],
})

const deep = (levels: number): unknown => (levels === 0 ? 1 : { a: deep(levels - 1) })

const newModel = (change: (document: ReturnType<typeof player>) => object): unknown => ({
  document: { ...player(), ...change(player()) },
})

const WRONG: readonly Wrong[] = [
  post('a number where a text belongs', '/places', { name: 0 }, ['name wrong-type']),
  post('an object where a text belongs', '/places', { name: { a: 1 } }, ['name wrong-type']),
  post('null where a text belongs', '/places', { name: null }, ['name wrong-type']),
  post('a list instead of the body', '/places', [], [' wrong-type']),
  post('a missing field', '/places', {}, ['name required']),
  post('a blank name', '/places', { name: ' \u3000 ' }, ['name blank']),
  post('an over-long name', '/places', { name: 'x'.repeat(81) }, ['name too-long']),
  post('a name of two lines', '/places', { name: 'a\nb' }, ['name several-lines']),
  post('a NUL in a name', '/places', { name: 'a\u0000b' }, ['name control-character']),
  post('half a character', '/places', { name: 'a\ud800' }, ['name control-character']),
  post('an unknown field', '/places', { name: 'Loft', role: 'owner' }, ['role unknown-field']),
  post(
    'fields that are not for a client to set',
    '/units',
    { model: MODELS.player, id: 1, collectionId: 2, version: 9, createdAt: 'x', price: 1 },
    ['id', 'collectionId', 'version', 'createdAt', 'price'].map((f) => `${f} unknown-field`),
  ),
  post('an unknown state', '/units', { model: MODELS.player, working: 'fine' }, [
    'working not-in-list',
  ]),
  post('an id of the wrong form', '/units', { model: '17' }, ['model bad-format']),
  post('a number as an id', '/units', { model: 0 }, ['model wrong-type']),
  post('a quantity below one', '/units', { model: MODELS.lead, quantity: 0 }, [
    'quantity too-small',
  ]),
  post('a quantity that is no whole number', '/units', { model: MODELS.lead, quantity: 1.5 }, [
    'quantity wrong-type',
  ]),
  post(
    'three of a device',
    '/units',
    { model: MODELS.player, quantity: 3 },
    ['quantity quantity-of-device'],
    422,
  ),
  post(
    "another collection's model",
    '/units',
    { model: MODELS.foreign },
    ['model unknown-reference'],
    422,
  ),
  post(
    "another collection's place",
    '/units',
    { model: MODELS.player, place: PLACES.foreign },
    ['place unknown-reference'],
    422,
  ),
  post(
    "another collection's place as parent",
    '/places',
    { name: 'Box', parent: PLACES.foreign },
    ['parent unknown-reference'],
    422,
  ),
  post(
    'a function that names a jack that is not there',
    '/models',
    newModel(({ functions }) => ({
      functions: [{ ...functions[0], gives: [{ jack: 'nowhere', sound: 'stereo' }] }],
    })),
    ['document.functions.0.gives.0.jack unknown-jack'],
    422,
  ),
  post(
    'a form over a port that is not there',
    '/models',
    newModel(({ jacks }) => ({
      jacks: [jacks[0], { ...jacks[1], contacts: [{ circuit: 'audio-l', port: 'gone' }] }],
    })),
    ['document.jacks.1.contacts.0 unknown-port'],
    422,
  ),
  post(
    'an unknown connector',
    '/models',
    newModel(({ ports }) => ({ ports: [{ ...ports[0], connector: 'magic-socket' }] })),
    ['document.ports.0.connector not-in-list'],
  ),
  post(
    'an unknown kind of control',
    '/models',
    newModel(() => ({ controls: [{ key: 'a', label: 'A', kind: 'telepathy' }] })),
    ['document.controls.0.kind bad-format'],
  ),
  post('a model of no type', '/models', { document: { format: 1 } }, ['document.type required']),
  post(
    'a key that means something to the language',
    '/models',
    newModel(({ ports }) => ({ ports: [{ ...ports[0], key: 'constructor' }] })),
    ['document.ports.0.key bad-format'],
  ),
  post(
    'a question about a unit of another collection',
    '/answers',
    { question: question({ source: { unit: UNITS.foreign, playing: 'plays' } }) },
    ['question.source.unit unknown-reference'],
    422,
  ),
  post(
    'a question about a function that is not there',
    '/answers',
    { question: question({ source: { unit: UNITS.player, playing: 'sings' } }) },
    ['question.source.playing unknown-function'],
    422,
  ),
  post(
    'a hookup through a unit of another collection',
    '/hookups',
    {
      title: 'Stolen',
      question: question(),
      hookup: {
        ...hookup(),
        links: hookup().links.map((l) => ({ ...l, to: { unit: UNITS.foreign, port: 'video' } })),
      },
    },
    ['hookup unknown-reference'],
    422,
  ),
  {
    what: 'a hookup that claims what it does not do',
    method: 'POST',
    path: `${IN}/hookups`,
    sending: {
      body: {
        title: 'Too good',
        question: question(),
        hookup: { ...hookup(), picture: { ...hookup().picture, quality: 'rgbhv' } },
      },
    },
    status: 422,
    code: 'hookup-refused',
  },
  {
    what: 'a state of a jack that is not there',
    method: 'PATCH',
    path: `${UNIT}/states`,
    sending: { version: 1, body: { forms: [{ jack: 'nowhere', port: 'video', state: 'dead' }] } },
    status: 422,
    faults: ['forms.0.jack unknown-jack'],
  },
  {
    what: 'the same state twice',
    method: 'PATCH',
    path: `${UNIT}/states`,
    sending: {
      version: 1,
      body: {
        functions: [
          { function: 'plays', state: 'dead' },
          { function: 'plays', state: 'works' },
        ],
      },
    },
    status: 422,
    faults: ['functions.1 given-twice'],
  },
  {
    what: 'a day that is not in the calendar',
    method: 'PATCH',
    path: `${UNIT}/states`,
    sending: {
      version: 1,
      body: { functions: [{ function: 'plays', state: 'dead', on: '2026-02-30' }] },
    },
    status: 400,
    faults: ['functions.0.on bad-format'],
  },
  {
    what: 'a position that a switch does not have',
    method: 'PUT',
    path: `${IN}/units/${UNITS.monitor}/stands`,
    sending: { version: 1, body: { stands: { input: 'z', volume: 'up' } } },
    status: 422,
    faults: ['stands.input unknown-position', 'stands.volume unknown-control'],
  },
  {
    what: 'an added function that names a jack that is not there',
    method: 'PUT',
    path: `${UNIT}/modifications`,
    sending: {
      version: 1,
      body: {
        modifications: [
          {
            kind: 'added',
            ports: [],
            jacks: [],
            functions: [{ ...player().functions[0], key: 'extra', needs: ['nowhere'] }],
          },
        ],
      },
    },
    status: 422,
    faults: ['modifications.0.functions.0.needs.0 unknown-jack'],
  },
  {
    what: 'states of a lead',
    method: 'PATCH',
    path: `${IN}/units/${UNITS.lead}/states`,
    sending: { version: 1, body: { functions: [{ function: 'plays', state: 'dead' }] } },
    status: 422,
    faults: ['forms devices-only'],
  },
  {
    what: 'a query field given twice',
    method: 'GET',
    path: `${IN}/units?kind=monitor&kind=console`,
    sending: {},
    status: 400,
    faults: ['query.kind not-in-list'],
  },
  {
    what: 'nested brackets in a query',
    method: 'GET',
    path: `${IN}/units?kind[$ne]=monitor`,
    sending: {},
    status: 400,
    faults: ['query.kind[$ne] unknown-field'],
  },
  {
    what: 'a page of a thousand',
    method: 'GET',
    path: `${IN}/units?limit=1000`,
    sending: {},
    status: 400,
    faults: ['query.limit too-big'],
  },
  {
    what: 'an order by a column of the database',
    method: 'GET',
    path: `${IN}/units?sort=password_hash`,
    sending: {},
    status: 400,
    faults: ['query.sort not-in-list'],
  },
  {
    what: 'a cursor that was not made here',
    method: 'GET',
    path: `${IN}/units?cursor=abcdef`,
    sending: {},
    status: 400,
    faults: ['query.cursor bad-format'],
  },
  {
    what: 'what is no JSON',
    method: 'POST',
    path: `${IN}/places`,
    sending: { raw: '{"name":' },
    status: 400,
    code: 'malformed-json',
  },
  {
    what: 'JSON that is called something else',
    method: 'POST',
    path: `${IN}/places`,
    sending: { raw: '{"name":"a"}', headers: { 'content-type': 'text/plain' } },
    status: 415,
    code: 'wrong-content-type',
  },
  {
    what: 'a body of a megabyte',
    method: 'POST',
    path: `${IN}/places`,
    sending: { body: { name: 'x'.repeat(1_000_000) } },
    status: 413,
    code: 'too-large',
  },
  {
    what: 'a body that is nested too deep',
    method: 'POST',
    path: `${IN}/places`,
    sending: { body: { name: deep(40) } },
    status: 400,
    code: 'too-deep',
  },
  {
    what: 'a list of more than a thousand',
    method: 'POST',
    path: `${IN}/answers`,
    sending: { body: { question: { avoid: Array.from({ length: 1001 }, () => 1) } } },
    status: 400,
    faults: ['question.avoid too-many'],
  },
  {
    what: 'keys aimed at the prototype',
    method: 'POST',
    path: `${IN}/places`,
    sending: { raw: '{"name":"a","__proto__":{"admin":true}}' },
    status: 400,
    faults: ['__proto__ unknown-field'],
  },
  {
    what: 'a field with a name of thousands of letters, which comes back in part',
    method: 'POST',
    path: `${IN}/places`,
    sending: { body: { name: 'a', ['k'.repeat(5000)]: 1 } },
    status: 400,
    faults: [`${'k'.repeat(60)} unknown-field`],
  },
  {
    what: 'an edit without a version',
    method: 'PATCH',
    path: UNIT,
    sending: { body: { label: 'x' } },
    status: 428,
    code: 'version-missing',
  },
  {
    what: 'an edit of whatever version there is',
    method: 'PATCH',
    path: UNIT,
    sending: { body: { label: 'x' }, headers: { 'if-match': '*' } },
    status: 428,
    code: 'version-missing',
  },
  {
    what: 'a method that the address does not know',
    method: 'PUT',
    path: `${IN}/places`,
    sending: { body: { name: 'x' } },
    status: 405,
    code: 'method-not-allowed',
  },
  {
    what: 'a body where none belongs',
    method: 'DELETE',
    path: UNIT,
    sending: { version: 1, body: { really: true } },
    status: 400,
    code: 'invalid-request',
  },
  {
    what: 'an address that does not exist',
    method: 'GET',
    path: `${IN}/nothing`,
    sending: {},
    status: 404,
    code: 'not-found',
  },
]

const send = (client: Client, { method, path, sending }: Wrong): Promise<Answer> =>
  client.send(method, path, sending)

describe('the API', () => {
  test.each(WRONG)(
    'refuses $what, with a sentence and a path, and keeps nothing',
    async (wrong) => {
      const client = await rig.as('owner')
      const before = await checksum(rig.db)
      const answer = await send(client, wrong)
      expect(answer.status, answer.text).toBe(wrong.status)
      const problem = problemOf(answer)
      expect(answer.headers.get('content-type')).toContain('application/problem+json')
      expect(problem.detail).toMatch(/^[A-Z][^{}[\]]+\.$/)
      expect(problem.requestId).toBe(answer.headers.get('x-request-id'))
      for (const error of problem.errors) expect(error.detail).toMatch(/^[^{}]+\.$/)
      if (wrong.faults) expect(faultsOf(answer)).toEqual(wrong.faults)
      if (wrong.code !== undefined) expect(problem.code).toBe(wrong.code)
      expect(answer.text).not.toMatch(/select |insert |node_modules|at .*\.ts/i)
      expect(await checksum(rig.db)).toBe(before)
    },
  )

  test('takes hostile names as plain text and gives them back letter for letter', async () => {
    const client = await rig.as('owner')
    const names = [
      '<img src=x onerror=alert(1)>',
      '{{7*7}}',
      "Robert'); drop table units;--",
      '%_\\',
      '\u202eright to left \u05d0\u05d1',
      '\u{1f4fa} e\u0301',
      '../../etc/passwd',
    ]
    for (const label of names) {
      const made = await client.post(`${IN}/units`, { model: MODELS.player, label })
      expect(made.status).toBe(201)
      expect(made.body['label']).toBe(label.normalize('NFC'))
      const found = await client.get(`${IN}/units?q=${encodeURIComponent(label)}`)
      expect(found.body['items']).toMatchObject([{ label: label.normalize('NFC') }])
    }
    expect((await client.get(`${IN}/units?q=%25`)).body['total']).toBe(1)
  })

  test('answers the next request as before after one aimed at the prototype', async () => {
    const client = await rig.as('owner')
    await client.send('POST', `${IN}/places`, {
      raw: '{"name":"a","constructor":{"prototype":{"admin":true}}}',
    })
    expect(({} as Record<string, unknown>)['admin']).toBeUndefined()
    expect((await client.post(`${IN}/places`, { name: 'Loft' })).status).toBe(201)
  })

  test('speaks the language of whoever is signed in', async () => {
    const client = await rig.as('owner')
    await rig.db('people').update({ locale: 'en-US' })
    const british = player()
    const document = { ...british, functions: [{ ...british.functions[0], needs: ['x'] }] }
    const answer = await client.post(`${IN}/models`, {
      document: {
        ...document,
        jacks: [{ ...british.jacks[0], contacts: [{ circuit: 'cvbs', port: 'x' }] }],
      },
    })
    expect(
      problemOf(answer)
        .errors.map((e) => e.detail)
        .join(' '),
    ).toContain('jack')
    expect(
      problemOf(answer)
        .errors.map((e) => e.detail)
        .join(' '),
    ).not.toContain('socket')
  })
})
