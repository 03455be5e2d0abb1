import type { AnswerReply } from '@coaxwain/contract'
import { ok, type Result } from '@coaxwain/result'
import type { Question } from '@coaxwain/shelf'
import { ref, shallowRef } from 'vue'
import type { Failure } from '../api/failure'
import { questionToQuery } from '../format/question-query'
import { useAnnouncer } from '../stores/announcer'
import { useEngine } from '../stores/engine'
import { useHookups } from '../stores/hookups'
import { useSnapshot } from '../stores/snapshot'
import { useAsking } from './use-asking'
import { useWords } from './use-words'

interface Answered {
  readonly reply: AnswerReply
  readonly away: boolean
}

/** The answer to a question that changes; the last answer stays until the next one is there. */
export function useAnswer(collection: () => string, question: () => Question | null) {
  const { say } = useWords()
  const store = useHookups()
  const snapshot = useSnapshot()
  const engine = useEngine()
  const announcer = useAnnouncer()

  const reply = shallowRef<AnswerReply | null>(null)
  /** The server could not be reached: what is shown was worked out here. */
  const away = ref(false)

  /** A change of the question that is answered on the page is worked out here, so that it is there at once. */
  async function fetchAnswer(asked: Question, signal: AbortSignal) {
    if (reply.value && snapshot.isAt(reply.value)) {
      return store.askWhatIf(collection(), asked, signal)
    }
    return snapshot.whileKnown(collection(), () => {
      engine.prepare()
      return store.ask(collection(), asked, signal)
    })
  }

  /** Without the network, from the shelf that is held here, if it is. */
  async function fetch(asked: Question, signal: AbortSignal): Promise<Result<Answered, Failure>> {
    const answered = await fetchAnswer(asked, signal)
    if (answered.ok) return ok({ reply: answered.value, away: away.value && reply.value !== null })
    if (answered.problem.kind !== 'offline' || signal.aborted) return answered
    const here = await store.askHere(collection(), asked, signal)
    return here ? ok({ reply: here, away: true }) : answered
  }

  function take(answered: Answered): void {
    away.value = answered.away
    reply.value = answered.reply
    const count = answered.reply.answer.hookups.length
    announcer.tell(count > 0 ? say('answer.found', { count }) : say('answer.none'))
  }

  const keyOf = (asked: Question): string => JSON.stringify(questionToQuery(asked))
  return { reply, away, ...useAsking({ question, keyOf, fetch, take }) }
}
