import type { WhenWrong } from '@coaxwain/checker'
import type { Hookup, Question } from '@coaxwain/shelf'
import { onScopeDispose, shallowRef, watch } from 'vue'
import { useEngine } from '../stores/engine'

/**
 * What a person would see if a control stood otherwise, worked out beside the page. Null until it is known.
 * Another hookup ends the work on the one before.
 */
export function useWhenWrong(hookup: () => Hookup, question: () => Question) {
  const engine = useEngine()
  const wrongs = shallowRef<readonly WhenWrong[] | null>(null)
  let running: AbortController | null = null

  async function start(): Promise<void> {
    running?.abort()
    const mine = new AbortController()
    running = mine
    wrongs.value = null
    const found = await engine.whenWrong(question(), hookup(), mine.signal)
    if (!mine.signal.aborted) wrongs.value = found
  }

  watch(hookup, start, { immediate: true })
  onScopeDispose(() => running?.abort())

  return { wrongs }
}
