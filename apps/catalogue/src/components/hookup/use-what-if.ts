import type { AnswerReply } from '@coaxwain/contract'
import type { Answer, Hookup } from '@coaxwain/shelf'
import { computed, onScopeDispose, ref, shallowRef, watch } from 'vue'
import { useCollection } from '../../composables/use-collection'
import { useWords } from '../../composables/use-words'
import { useHookups } from '../../stores/hookups'
import { useSnapshot } from '../../stores/snapshot'
import { answerEffect, effectWords, firstHookup, wayOutWords } from './effect-words'
import { whatIfs, withSwitched, type WhatIf } from './what-if'

export interface PreviewedWhatIf extends WhatIf {
  /** What throwing the switch would change, or what it has changed; empty until that is known. */
  readonly explains: string
}

/**
 * The switches of an answer. Once somebody looks at them, each is tried in turn, so that its line can say what
 * it would change, and throwing it is answered at once.
 */
export function useWhatIf(
  reply: () => AnswerReply,
  hookup: () => Hookup | null,
  asking: () => boolean,
) {
  const { say } = useWords()
  const collection = useCollection()
  const store = useHookups()
  const shelf = useSnapshot()

  const wanted = ref(false)
  const tried = shallowRef<ReadonlyMap<string, Answer | null>>(new Map())
  let running: AbortController | null = null

  const plain = computed(() => whatIfs(reply().question, hookup(), shelf.lookup, say))
  const keys = computed(() => plain.value.map((item) => item.key).join(' '))

  /** One after another: a preview gives way to what somebody asks. */
  async function tryAll(): Promise<void> {
    running?.abort()
    const mine = new AbortController()
    running = mine
    for (const { key } of plain.value) {
      const question = withSwitched(reply().question, key)
      const answered = await store.askWhatIf(collection.value, question, mine.signal)
      if (mine.signal.aborted) return
      // The switch works without its preview; a failure is told when it is thrown.
      const answer = answered.ok ? answered.value.answer : null
      tried.value = new Map(tried.value).set(key, answer)
    }
  }

  watch(
    [wanted, reply, keys, asking],
    ([want], [, before]) => {
      if (reply() !== before) tried.value = new Map()
      if (asking()) running?.abort()
      else if (want) void tryAll()
    },
    { immediate: true },
  )
  onScopeDispose(() => running?.abort())

  function explain(item: WhatIf): string {
    const answer = tried.value.get(item.key)
    if (!answer) return wanted.value && answer === undefined ? say('what-if.asking') : ''
    const effect = effectOf(item, answer)
    return answer.complete || effect === '' ? effect : say('what-if.so-far', { effect })
  }

  function effectOf(item: WhatIf, answer: Answer): string {
    const { source, display } = reply().question
    const context = { ends: [source.unit, display.unit], lookup: shelf.lookup, say }
    const shown = hookup()
    if (!shown) return wayOutWords(answer, context)
    if (!item.on) return answerEffect(shown, answer, context)
    const without = firstHookup(answer)
    return without ? effectWords(without, shown, context) : ''
  }

  const items = computed(() =>
    plain.value.map((item): PreviewedWhatIf => ({ ...item, explains: explain(item) })),
  )

  return { items, wanted }
}
