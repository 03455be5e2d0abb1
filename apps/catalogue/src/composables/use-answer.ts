import type { AnswerReply } from '@coaxwain/contract'
import type { Question } from '@coaxwain/shelf'
import { onScopeDispose, ref, shallowRef, watch } from 'vue'
import type { Failure } from '../api/failure'
import { questionToQuery } from '../format/question-query'
import { useAnnouncer } from '../stores/announcer'
import { useEngine } from '../stores/engine'
import { useHookups } from '../stores/hookups'
import { useSnapshot } from '../stores/snapshot'
import { useFailure } from './use-failure'
import { useWords } from './use-words'

/** The answer to a question that changes; the last answer stays until the next one is there. */
export function useAnswer(collection: () => string, question: () => Question | null) {
  const { say } = useWords()
  const { tell } = useFailure()
  const store = useHookups()
  const snapshot = useSnapshot()
  const engine = useEngine()
  const announcer = useAnnouncer()

  const reply = shallowRef<AnswerReply | null>(null)
  const failure = shallowRef<Failure | null>(null)
  const busy = ref(false)
  /** The server could not be reached: what is shown was worked out here. */
  const away = ref(false)
  let running: AbortController | null = null

  /** What an answer names must be known here, so the shelf is read again if it has changed meanwhile. */
  async function fromServer(asked: Question, signal: AbortSignal) {
    const ready = await snapshot.ensure(collection())
    if (!ready.ok) return ready
    engine.prepare()
    const answered = await store.ask(collection(), asked, signal)
    if (!answered.ok || snapshot.isAt(answered.value)) return answered
    const fresh = await snapshot.load(collection())
    return fresh.ok ? answered : fresh
  }

  /** A change of the question that is answered on the page is worked out here, so that it is there at once. */
  async function fetchAnswer(asked: Question, signal: AbortSignal) {
    if (reply.value && snapshot.isAt(reply.value)) {
      return store.askWhatIf(collection(), asked, signal)
    }
    return fromServer(asked, signal)
  }

  /** Without the network, from the shelf that is held here, if it is. */
  async function instead(asked: Question, problem: Failure, signal: AbortSignal) {
    if (problem.kind !== 'offline' || signal.aborted) return null
    return store.askHere(collection(), asked, signal)
  }

  function take(answered: AnswerReply, withoutServer: boolean): void {
    away.value = withoutServer
    reply.value = answered
    const count = answered.answer.hookups.length
    announcer.tell(count > 0 ? say('answer.found', { count }) : say('answer.none'))
  }

  async function ask(): Promise<void> {
    running?.abort()
    const asked = question()
    if (!asked) return
    const mine = new AbortController()
    running = mine
    busy.value = true
    failure.value = null
    const answered = await fetchAnswer(asked, mine.signal)
    const here = answered.ok ? null : await instead(asked, answered.problem, mine.signal)
    if (running !== mine || mine.signal.aborted) return
    busy.value = false
    if (answered.ok) return take(answered.value, away.value && reply.value !== null)
    if (here) return take(here, true)
    failure.value = answered.problem
    tell(answered.problem)
  }

  function stop(): void {
    running?.abort()
    running = null
    busy.value = false
  }

  watch(
    () => {
      const asked = question()
      return asked ? JSON.stringify(questionToQuery(asked)) : ''
    },
    ask,
    { immediate: true },
  )
  onScopeDispose(stop)

  return { reply, failure, busy, away, ask, stop }
}
