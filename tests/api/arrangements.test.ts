import { checkHookup } from '@coaxwain/checker'
import { ensureDemo, passPhrasesFor } from '@coaxwain/api/demo-data'
import { createPasswords } from '@coaxwain/api/passwords'
import { ROLES, type ArrangementReply } from '@coaxwain/contract'
import { DEMO, demoUid, snapshotOf } from '@coaxwain/demo'
import {
  questionsOfUses,
  stepsOfArrangement,
  type ArrangementQuestion,
  type Link,
} from '@coaxwain/shelf'
import { describe, expect, test } from 'vitest'
import { Client, faultsOf, problemOf, type Answer } from '../support/client'
import { checksum } from '../support/database'
import { arrangementQuestion } from '../support/examples'
import { monitor } from '../support/models'
import { useRig } from '../support/rig'
import { COLLECTION, OTHER, UNITS } from '../support/world'

const rig = useRig()

const IN = `/collections/${COLLECTION}`
const ARRANGEMENTS = `${IN}/arrangements`
const NONE = { protection: 'none' } as const

const PLAYER = { unit: UNITS.player, playing: 'plays', material: NONE }

const send = async (question: unknown): Promise<Answer> =>
  (await rig.as('viewer')).post(ARRANGEMENTS, { question })

const replyOf = (answer: Answer): ArrangementReply => {
  expect(answer.status, answer.text).toBe(200)
  return answer.body as unknown as ArrangementReply
}

/** A second unit of a kind that the small world has already, or of a new kind. */
async function unitOf(document: object): Promise<string> {
  const owner = await rig.as('owner')
  const model = await owner.post(`${IN}/models`, { document })
  const unit = await owner.post(`${IN}/units`, { model: model.body['uid'] })
  expect(unit.status, unit.text).toBe(201)
  return String(unit.body['uid'])
}

describe('with the demonstration', () => {
  const collectionOf = (key: string) => {
    const found = DEMO.collections.find((c) => c.key === key)
    if (!found) throw new Error(`no collection ${key}`)
    return found
  }

  async function askDemo(key: string, question: ArrangementQuestion): Promise<ArrangementReply> {
    const phrases = passPhrasesFor(DEMO, {})
    expect(await ensureDemo(rig.db, await createPasswords(), DEMO, phrases)).toBe('loaded')
    const collection = collectionOf(key)
    const member = collection.members.find((m) => m.role === 'owner')
    const person = DEMO.people.find((p) => p.key === member?.person)
    const email = person?.email ?? ''
    const client = new Client(rig.api.address)
    const entered = await client.post('/session', { email, password: phrases[email] })
    expect(entered.status, entered.text).toBe(200)
    return replyOf(await client.post(`/collections/${collection.uid}/arrangements`, { question }))
  }

  const plugs = ({ from, to, pieces }: Link): string => JSON.stringify([from, pieces, to])

  /** Every use holds by itself, and nothing that it plugs is missing from what is plugged once. */
  function expectWhole(reply: ArrangementReply, key: string): void {
    const snapshot = snapshotOf(DEMO, key)
    for (const arrangement of reply.answer.arrangements) {
      const asked = questionsOfUses(reply.question)
      expect(arrangement.uses).toHaveLength(asked.length)
      arrangement.uses.forEach(({ hookup, source, display }, i) => {
        expect([source, display]).toEqual([asked[i]?.source.unit, asked[i]?.display.unit])
        expect(checkHookup(snapshot, asked[i]!, hookup)).toMatchObject({ ok: true })
      })
      const lying = new Set(arrangement.links.map(plugs))
      const used = arrangement.uses.flatMap((u) => u.hookup.links.map(plugs))
      expect(new Set(used)).toEqual(lying)
      const sockets = [...lying].flatMap((l) => {
        const [from, , to] = JSON.parse(l) as [object, unknown, object]
        return [JSON.stringify(from), JSON.stringify(to)]
      })
      expect(new Set(sockets).size).toBe(sockets.length)
    }
  }

  test('a disc player and a console stay joined to one set, each with its own positions', async () => {
    const [disc, console, set] = ['u-a-142', 'u-a-125', 'u-a-108'].map(demoUid)
    const reply = await askDemo(
      'alder-lane',
      arrangementQuestion({
        sources: [
          { unit: disc!, playing: 'disc', material: NONE },
          { unit: console!, playing: 'cartridge', material: NONE },
        ],
        displays: [{ unit: set! }],
      }),
    )
    expect(reply.answer).toMatchObject({ verdict: 'yes', complete: true })
    expectWhole(reply, 'alder-lane')
    const [first] = reply.answer.arrangements
    const [watching, playing] = first!.uses
    expect(watching!.off).toContain(console)
    expect(playing!.off).toContain(disc)
    const positions = (settings: readonly { unit: string; control: string; position: string }[]) =>
      settings.filter((s) => s.unit === set).map((s) => `${s.control} ${s.position}`)
    expect(positions(watching!.hookup.settings)).not.toEqual(positions(playing!.hookup.settings))

    const steps = stepsOfArrangement(first!, snapshotOf(DEMO, 'alder-lane'))!
    expect(steps.plug.map((s) => s.number)).toEqual(steps.plug.map((_, i) => i + 1))
    expect(steps.plug.some((s) => s.kind === 'set')).toBe(false)
    steps.uses.forEach((own, i) => {
      const { hookup } = first!.uses[i]!
      const runs = new Set(own.flatMap((s) => s.segments.map((g) => g.link)))
      expect(runs).toEqual(new Set(hookup.links.keys()))
      const set = own.filter((s) => s.kind === 'set')
      expect(set.flatMap((s) => s.settings).sort()).toEqual([...hookup.settings.keys()].sort())
      expect(set.map((s) => s.number)).toEqual(set.map((_, n) => steps.plug.length + n + 1))
    })
  })

  test('a recorder feeds two sets at once, with nothing left off', async () => {
    const [recorder, one, other] = ['u-m-10', 'u-m-3', 'u-m-4'].map(demoUid)
    const reply = await askDemo(
      'marram-row',
      arrangementQuestion({
        sources: [{ unit: recorder!, playing: 'tape', material: NONE }],
        displays: [{ unit: one! }, { unit: other! }],
      }),
    )
    expect(reply.answer).toMatchObject({ verdict: 'yes', complete: true })
    expectWhole(reply, 'marram-row')
    const [first] = reply.answer.arrangements
    expect(first!.uses.map((u) => [u.display, u.off])).toEqual([
      [one, []],
      [other, []],
    ])
  })
})

describe('a question', () => {
  test('about things that the shelf does not join is answered with none, and that is complete', async () => {
    const second = await unitOf(monitor({ name: 'Second' }))
    const reply = replyOf(
      await send(arrangementQuestion({ displays: [{ unit: UNITS.monitor }, { unit: second }] })),
    )
    expect(reply.answer).toMatchObject({ verdict: 'none', complete: true, arrangements: [] })
  })

  test('about one of each is answered as one use, and writes nothing', async () => {
    const before = await checksum(rig.db)
    const reply = replyOf(await send(arrangementQuestion()))
    expect(reply.answer.arrangements[0]?.uses).toHaveLength(1)
    expect(await checksum(rig.db)).toEqual(before)
  })

  test.each([
    [
      'an unknown unit',
      { sources: [PLAYER, { ...PLAYER, unit: COLLECTION }] },
      ['question.sources.1.unit unknown-reference'],
    ],
    [
      'a unit of another collection',
      { displays: [{ unit: UNITS.foreign }] },
      ['question.displays.0.unit unknown-reference'],
    ],
    [
      'a lead as a set',
      { displays: [{ unit: UNITS.monitor }, { unit: UNITS.lead }] },
      ['question.displays.1.unit unknown-reference'],
    ],
    [
      'a function that the source has not',
      { sources: [{ ...PLAYER, playing: 'sings' }] },
      ['question.sources.0.playing unknown-function'],
    ],
    [
      'an input that the set has not',
      { displays: [{ unit: UNITS.monitor, input: 'aux' }] },
      ['question.displays.0.input unknown-function'],
    ],
    ['a source twice', { sources: [PLAYER, PLAYER] }, ['question.sources.1.unit given-twice']],
    [
      'a set twice',
      { displays: [{ unit: UNITS.monitor }, { unit: UNITS.monitor }] },
      ['question.displays.1.unit given-twice'],
    ],
    [
      'several of both',
      {
        sources: [PLAYER, { ...PLAYER, unit: UNITS.modulator, playing: 'modulates' }],
        displays: [{ unit: UNITS.monitor }, { unit: UNITS.player }],
      },
      ['question.displays several-of-both'],
    ],
    [
      'a unit to avoid that is not here',
      { avoid: [UNITS.foreign] },
      ['question.avoid.0 unknown-reference'],
    ],
  ])('with %s is unsound, and says where', async (_, rest, faults) => {
    const answer = await send(arrangementQuestion(rest))
    expect([answer.status, problemOf(answer).code]).toEqual([422, 'question-unsound'])
    expect(faultsOf(answer)).toEqual(faults)
  })

  const many = <T>(item: T): T[] => Array.from({ length: 5 }, () => item)

  test.each([
    ['no source', { sources: [] }, ['question.sources too-few']],
    ['five sources', { sources: many(PLAYER) }, ['question.sources too-many']],
    ['no set', { displays: [] }, ['question.displays too-few']],
    ['five sets', { displays: many({ unit: UNITS.monitor }) }, ['question.displays too-many']],
    [
      'an aerial to keep',
      { demands: { keepAerial: true } },
      ['question.demands.keepAerial unknown-field'],
    ],
    [
      'a source without its material',
      { sources: [{ unit: UNITS.player, playing: 'plays' }] },
      ['question.sources.0.material required'],
    ],
  ])('with %s is refused as badly formed', async (_, rest, faults) => {
    const answer = await send({ ...arrangementQuestion(), ...rest })
    expect(answer.status, answer.text).toBe(400)
    expect(faultsOf(answer)).toEqual(faults)
  })
})

describe('a collection', () => {
  test.each(ROLES)('answers its %s', async (role) => {
    const client = await rig.as(role)
    replyOf(await client.post(ARRANGEMENTS, { question: arrangementQuestion() }))
  })

  test('of others is not there, whatever is asked', async () => {
    const foreign = `/collections/${OTHER}/arrangements`
    const answer = await (await rig.as('owner')).post(foreign, { question: arrangementQuestion() })
    expect([answer.status, problemOf(answer).code]).toEqual([404, 'not-found'])
    const neighbour = await rig.as('neighbour')
    expect((await neighbour.post(ARRANGEMENTS, { question: {} })).status).toBe(404)
  })
})
