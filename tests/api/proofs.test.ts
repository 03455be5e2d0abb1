import { createLogger } from '@coaxwain/api/logger'
import { checkProofs } from '@coaxwain/checker'
import type { ProveReply } from '@coaxwain/contract'
import type { ProveQuestion } from '@coaxwain/shelf'
import { afterEach, describe, expect, test, vi } from 'vitest'
import { faultsOf, problemOf, type Answer } from '../support/client'
import { proveQuestion } from '../support/examples'
import { useRig } from '../support/rig'
import { uidOf } from '../support/uids'
import { COLLECTION, UNITS } from '../support/world'

const logger = createLogger('silent')
const logged = vi.spyOn(logger, 'error')
let refuses = false

const rig = useRig({
  logger,
  proofChecker: (...asked) =>
    refuses ? { ok: false, findings: [[{ code: 'untried-beside' }]] } : checkProofs(...asked),
})

afterEach(() => {
  refuses = false
  logged.mockClear()
})

const IN = `/collections/${COLLECTION}`

const send = async (question: unknown): Promise<Answer> =>
  (await rig.as('viewer')).post(`${IN}/proofs`, { question })

async function ask(rest: Partial<ProveQuestion> = {}): Promise<ProveReply> {
  const answer = await send(proveQuestion(rest))
  expect(answer.status, answer.text).toBe(200)
  return answer.body as unknown as ProveReply
}

/** Notes that the monitor shows what comes in, and that the lead is good. */
async function tryMonitor(): Promise<void> {
  await rig.db('units').where({ uid: UNITS.lead }).update({ working: 'works' })
  const works = { state: 'works' }
  const changes = {
    forms: [
      { jack: 'composite-in', port: 'video-in', ...works },
      { jack: 'sound-in', port: 'left-in', ...works },
      { jack: 'sound-in', port: 'right-in', ...works },
    ],
    functions: [{ function: 'shows', ...works }],
  }
  const noted = await (
    await rig.as('owner')
  ).post(`${IN}/unit-states`, { units: [{ unit: UNITS.monitor, version: 1, changes }] })
  expect(noted.status, noted.text).toBe(200)
}

describe('a unit that nobody has tried', () => {
  test('is tried on a set that is known to work', async () => {
    await tryMonitor()
    const { answer } = await ask()
    expect(answer).toMatchObject({ complete: true, left: [] })
    expect(answer.proofs).toHaveLength(1)
    expect(answer.proofs[0]).toMatchObject({
      question: { source: { unit: UNITS.player }, display: { unit: UNITS.monitor } },
      seen: [{ jack: 'composite', port: 'video' }, { function: 'plays' }],
      heard: [
        { jack: 'sound', port: 'left' },
        { jack: 'sound', port: 'right' },
      ],
      several: true,
    })
  })

  test('has one of its forms tried by itself', async () => {
    await tryMonitor()
    const signal = { jack: 'sound', port: 'right' }
    const { answer } = await ask({ signal })
    expect(answer.proofs).toHaveLength(1)
    expect(answer.proofs[0]?.heard).toContainEqual(signal)
  })

  test('is not tried on what is untried itself, and what is missing is said', async () => {
    const { answer } = await ask()
    expect(answer.proofs).toEqual([])
    expect(new Set(answer.left.map((l) => l.code))).toEqual(new Set(['no-tried-lead']))
  })

  test('is not tried on a unit that is to be avoided', async () => {
    await tryMonitor()
    const { answer } = await ask({ avoid: [UNITS.monitor] })
    expect(answer.proofs).toEqual([])
    expect(new Set(answer.left.map((l) => l.code))).toEqual(new Set(['no-tried-display']))
  })
})

describe('a question that does not fit the shelf', () => {
  test.each([
    ['a unit that is not there', { unit: uidOf('nowhere') }, 'question.unit unknown-reference'],
    ['a unit of the neighbours', { unit: UNITS.foreign }, 'question.unit unknown-reference'],
    ['a lead', { unit: UNITS.lead }, 'question.unit unknown-reference'],
    [
      'a form that it does not have',
      { signal: { jack: 'scart', port: 'video' } },
      'question.signal.jack unknown-jack',
    ],
    [
      'a form on another port',
      { signal: { jack: 'composite', port: 'left' } },
      'question.signal.port unknown-port',
    ],
    [
      'a function that it does not have',
      { signal: { function: 'tunes' } },
      'question.signal.function unknown-function',
    ],
    [
      'a unit to avoid that is not there',
      { avoid: [uidOf('nowhere')] },
      'question.avoid.0 unknown-reference',
    ],
  ])('%s is refused', async (_what, rest, fault) => {
    const answer = await send(proveQuestion(rest))
    expect([answer.status, problemOf(answer).code]).toEqual([422, 'question-unsound'])
    expect(faultsOf(answer)).toEqual([fault])
  })

  test('a signal that is neither a form nor a function is refused', async () => {
    const answer = await send({ ...proveQuestion(), signal: { port: 'video' } })
    expect(answer.status, answer.text).toBe(400)
    expect(faultsOf(answer)[0]).toMatch(/^question\.signal\./)
  })
})

test('what the check refuses is not shown, and is logged', async () => {
  await tryMonitor()
  refuses = true
  const answer = await send(proveQuestion())
  expect([answer.status, problemOf(answer).code]).toEqual([500, 'answer-refused'])
  const [told] = logged.mock.calls.map(([first]) => first as unknown as { refused?: object })
  expect(told?.refused).toMatchObject({ findings: [{ code: 'untried-beside' }] })
})
