import type { ArrangementReply } from '@coaxwain/contract'
import type { ArrangementQuestion } from '@coaxwain/shelf'
import { onScopeDispose, ref, shallowRef, watch } from 'vue'
import { call } from '../api/client'
import type { Failure } from '../api/failure'
import { useAnnouncer } from '../stores/announcer'
import { useSnapshot } from '../stores/snapshot'
import { useFailure } from './use-failure'
import { useWords } from './use-words'

/** The answer to a question about several ends at once. */
export function useArrangement(
  collection: () => string,
  question: () => ArrangementQuestion | null,
) {
  const { say } = useWords()
  const { tell } = useFailure()
  const snapshot = useSnapshot()
  const announcer = useAnnouncer()

  const reply = shallowRef<ArrangementReply | null>(null)
  const failure = shallowRef<Failure | null>(null)
  const busy = ref(false)
  let running: AbortController | null = null

  /** What an answer names must be known here, so the shelf is read again if it has changed meanwhile. */
  async function fetchAnswer(asked: ArrangementQuestion, signal: AbortSignal) {
    const ready = await snapshot.ensure(collection())
    if (!ready.ok) return ready
    const answered = await call('arrange', {
      params: { collection: collection() },
      body: { question: asked },
      signal,
    })
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
    const { arrangements, complete } = answered.value.answer
    const none = complete ? 'arrangement.none' : 'arrangement.none-yet'
    announcer.tell(
      arrangements.length > 0
        ? say('arrangement.found', { count: arrangements.length })
        : say(none),
    )
  }

  function stop(): void {
    running?.abort()
    running = null
    busy.value = false
  }

  watch(() => JSON.stringify(question()), ask, { immediate: true })
  onScopeDispose(stop)

  return { reply, failure, busy, ask, stop }
}
