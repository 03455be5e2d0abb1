import type { ProveReply } from '@coaxwain/contract'
import type { ProveQuestion } from '@coaxwain/shelf'
import { ref, shallowRef, watch } from 'vue'
import { call } from '../api/client'
import { useAnnouncer } from '../stores/announcer'
import { useSnapshot } from '../stores/snapshot'
import { useAsking } from './use-asking'
import { useWords } from './use-words'

/** Test chains for one unit: asked for once it is wanted, and again whenever more is known of the unit. */
export function useProofs(
  collection: () => string,
  unit: () => { readonly uid: string; readonly version: number },
) {
  const { say } = useWords()
  const snapshot = useSnapshot()
  const announcer = useAnnouncer()
  const reply = shallowRef<ProveReply | null>(null)
  const wanted = ref(false)

  const fetch = (asked: ProveQuestion, signal: AbortSignal) =>
    snapshot.whileKnown(collection(), () =>
      call('prove', { params: { collection: collection() }, body: { question: asked }, signal }),
    )

  function take(answered: ProveReply): void {
    reply.value = answered
    const count = answered.answer.proofs.length
    announcer.tell(count > 0 ? say('prove.found', { count }) : say('prove.none'))
  }

  const asking = useAsking({
    question: (): ProveQuestion | null =>
      wanted.value ? { format: 1, unit: unit().uid, avoid: [] } : null,
    keyOf: (question) => JSON.stringify([question, unit().version]),
    fetch,
    take,
  })

  /** Another unit has chains of its own. */
  watch(
    () => unit().uid,
    () => {
      wanted.value = false
      reply.value = null
    },
  )

  function stop(): void {
    asking.stop()
    wanted.value = reply.value !== null
  }

  return { ...asking, reply, wanted, stop }
}
