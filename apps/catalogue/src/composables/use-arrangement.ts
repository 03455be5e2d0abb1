import type { ArrangementReply } from '@coaxwain/contract'
import type { ArrangementQuestion } from '@coaxwain/shelf'
import { shallowRef } from 'vue'
import { call } from '../api/client'
import { useAnnouncer } from '../stores/announcer'
import { useSnapshot } from '../stores/snapshot'
import { useAsking } from './use-asking'
import { useWords } from './use-words'

/** The answer to a question about several ends at once. */
export function useArrangement(
  collection: () => string,
  question: () => ArrangementQuestion | null,
) {
  const { say } = useWords()
  const snapshot = useSnapshot()
  const announcer = useAnnouncer()
  const reply = shallowRef<ArrangementReply | null>(null)

  const fetch = (asked: ArrangementQuestion, signal: AbortSignal) =>
    snapshot.whileKnown(collection(), () =>
      call('arrange', {
        params: { collection: collection() },
        body: { question: asked },
        signal,
      }),
    )

  function take(answered: ArrangementReply): void {
    reply.value = answered
    const { arrangements, complete } = answered.answer
    const none = complete ? 'arrangement.none' : 'arrangement.none-yet'
    announcer.tell(
      arrangements.length > 0
        ? say('arrangement.found', { count: arrangements.length })
        : say(none),
    )
  }

  return { reply, ...useAsking({ question, keyOf: JSON.stringify, fetch, take }) }
}
