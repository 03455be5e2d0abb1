import { checkArrangement } from '@coaxwain/checker'
import { createLogger } from '@coaxwain/api/logger'
import { afterEach, expect, test, vi } from 'vitest'
import { problemOf } from '../support/client'
import { arrangementQuestion } from '../support/examples'
import { useRig } from '../support/rig'
import { COLLECTION, UNITS } from '../support/world'

const logger = createLogger('silent')
const logged = vi.spyOn(logger, 'error')
let refuses = true

const rig = useRig({
  logger,
  arrangementChecker: (...asked) =>
    refuses
      ? { ok: false, findings: [{ code: 'nothing-across', use: 0 }] }
      : checkArrangement(...asked),
})

afterEach(() => logged.mockClear())

const ask = async () =>
  (await rig.as('viewer')).post(`/collections/${COLLECTION}/arrangements`, {
    question: arrangementQuestion(),
  })

test('what the check refuses is not shown: it is logged with the question of its use', async () => {
  refuses = true
  const answer = await ask()
  expect([answer.status, problemOf(answer).code]).toEqual([500, 'answer-refused'])
  const [told] = logged.mock.calls.map(([first]) => first as unknown as { refused?: object })
  expect(told?.refused).toMatchObject({
    question: { source: { unit: UNITS.player }, display: { unit: UNITS.monitor } },
    findings: [{ code: 'nothing-across' }],
  })
})

test('what it lets stand is shown, and nothing is logged', async () => {
  refuses = false
  const answer = await ask()
  expect(answer.status, answer.text).toBe(200)
  expect(logged).not.toHaveBeenCalled()
})
