import { stepsOf, type Hookup, type Question } from '@coaxwain/shelf'
import { computed } from 'vue'
import { toDrawing } from './to-drawing'
import { useSnapshot } from '../../stores/snapshot'
import { useWords } from '../../composables/use-words'

/** A hookup with everything that its drawing, steps and settings need. */
export function useSheet(hookup: () => Hookup, question: () => Question) {
  const store = useSnapshot()
  const { say } = useWords()

  const steps = computed(() => stepsOf(hookup(), store.snapshot))
  const drawn = (carried: boolean) =>
    toDrawing({
      hookup: hookup(),
      question: question(),
      lookup: store.lookup,
      steps: steps.value,
      say,
      carried,
    })
  const drawing = computed(() => drawn(true))
  const plainDrawing = computed(() => drawn(false))

  return { steps, drawing, plainDrawing }
}
