import type { AnswerReply } from '@coaxwain/contract'
import type { Question } from '@coaxwain/shelf'
import { onScopeDispose, ref, shallowRef, watch } from 'vue'
import type { Failure } from '../api/failure'
import { questionToQuery } from '../format/question-query'
import { useAnnouncer } from '../stores/announcer'
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
  const announcer = useAnnouncer()

  const reply = shallowRef<AnswerReply | null>(null)
  const failure = shallowRef<Failure | null>(null)
  const busy = ref(false)
  let running: AbortController | null = null

  /** What an answer names must be known here, so the shelf is read again if it has changed meanwhile. */
  async function fetchAnswer(asked: Question, signal: AbortSignal) {
    const ready = await snapshot.ensure(collection())
    if (!ready.ok) return ready
    const answered = await store.ask(collection(), asked, signal)
    if (!answered.ok || snapshot.isAt(answered.value)) return answered
    const fresh = await snapshot.load(collection())
    return fresh.ok ? answered : fresh
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
    if (running !== mine || mine.signal.aborted) return
    busy.value = false
    if (!answered.ok) {
      failure.value = answered.problem
      return tell(answered.problem)
    }
    reply.value = answered.value
    const count = answered.value.answer.hookups.length
    announcer.tell(count > 0 ? say('answer.found', { count }) : say('answer.none'))
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

  return { reply, failure, busy, ask, stop }
}
