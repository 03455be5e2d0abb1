import type { Question } from '@coaxwain/shelf'
import { computed } from 'vue'
import { fullName } from '../format/lookup'
import { useSnapshot } from '../stores/snapshot'
import { useWords } from './use-words'

/** The two ends of a question as a title, in full and short. */
export function useAnswerTitle(question: () => Question | null) {
  const { say } = useWords()
  const store = useSnapshot()

  const ends = computed(() => {
    const asked = question()
    const source = asked && store.lookup.device(asked.source.unit)
    const display = asked && store.lookup.device(asked.display.unit)
    return source && display ? { source, display } : null
  })
  const title = computed(() =>
    ends.value
      ? say('answer.title', {
          source: fullName(ends.value.source),
          display: fullName(ends.value.display),
        })
      : say('page.answer'),
  )
  const shortTitle = computed(() =>
    ends.value
      ? say('answer.short', { source: ends.value.source.name, display: ends.value.display.name })
      : null,
  )

  return { title, shortTitle }
}
