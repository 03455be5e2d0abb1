import type { Result } from '@coaxwain/result'
import { onScopeDispose, ref, shallowRef, watch } from 'vue'
import type { Failure } from '../api/failure'
import { useFailure } from './use-failure'

interface Asking<Q, A> {
  readonly question: () => Q | null
  /** A question that says the same gives the same text, and is not asked again. */
  readonly keyOf: (question: Q) => string
  readonly fetch: (question: Q, signal: AbortSignal) => Promise<Result<A, Failure>>
  readonly take: (answer: A) => void
}

/** Asks whenever the question changes. The newest one counts: what an older one still brings is left aside. */
export function useAsking<Q, A>({ question, keyOf, fetch, take }: Asking<Q, A>) {
  const { tell } = useFailure()
  const failure = shallowRef<Failure | null>(null)
  const busy = ref(false)
  let running: AbortController | null = null

  function stop(): void {
    running?.abort()
    running = null
    busy.value = false
  }

  async function ask(): Promise<void> {
    stop()
    failure.value = null
    const asked = question()
    if (asked === null) return
    const mine = new AbortController()
    running = mine
    busy.value = true
    const answered = await fetch(asked, mine.signal)
    if (running !== mine || mine.signal.aborted) return
    busy.value = false
    if (answered.ok) return take(answered.value)
    failure.value = answered.problem
    tell(answered.problem)
  }

  watch(
    () => {
      const asked = question()
      return asked === null ? '' : keyOf(asked)
    },
    ask,
    { immediate: true },
  )
  onScopeDispose(stop)

  return { failure, busy, ask, stop }
}
