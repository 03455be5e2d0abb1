import type { HookupCheckReply } from '@coaxwain/contract'
import type { Chain, Question } from '@coaxwain/shelf'
import { onScopeDispose, ref, shallowRef, watch } from 'vue'
import { call } from '../api/client'
import type { Failure } from '../api/failure'

const PAUSE_MS = 200

/** What the check says of a chain that changes; what it said last stays until the next is there. */
export function useCheck(
  collection: () => string,
  asked: () => { readonly question: Question; readonly chain: Chain } | null,
) {
  const reply = shallowRef<HookupCheckReply | null>(null)
  /** The chain that the reply is about. */
  const about = shallowRef<Chain | null>(null)
  const failure = shallowRef<Failure | null>(null)
  const busy = ref(false)
  let running: AbortController | null = null
  let timer: ReturnType<typeof setTimeout> | undefined

  async function check(): Promise<void> {
    running?.abort()
    const body = asked()
    if (!body) {
      reply.value = null
      busy.value = false
      return
    }
    const mine = new AbortController()
    running = mine
    const answer = await call('checkChain', {
      params: { collection: collection() },
      body,
      signal: mine.signal,
    })
    if (running !== mine || mine.signal.aborted) return
    busy.value = false
    failure.value = answer.ok ? null : answer.problem
    if (!answer.ok) return
    about.value = body.chain
    reply.value = answer.value
  }

  function soon(): void {
    clearTimeout(timer)
    busy.value = asked() !== null
    timer = setTimeout(() => void check(), PAUSE_MS)
  }

  watch(() => JSON.stringify(asked()), soon, { immediate: true })
  onScopeDispose(() => {
    clearTimeout(timer)
    running?.abort()
  })

  return { reply, about, failure, busy, check }
}
