import type { WhenWrong } from '@coaxwain/checker'
import type { Hookup, Question } from '@coaxwain/shelf'
import { onScopeDispose, shallowRef, watch } from 'vue'
import { cutSnapshot } from '../format/cut-snapshot'
import { useSnapshot } from '../stores/snapshot'
import type { WhenWrongAsked } from '../workers/when-wrong'

/**
 * What a person would see if a control stood otherwise, worked out beside the page. Null until it is known.
 * Another hookup ends the work on the one before.
 */
export function useWhenWrong(hookup: () => Hookup, question: () => Question) {
  const store = useSnapshot()
  const wrongs = shallowRef<readonly WhenWrong[] | null>(null)
  let worker: Worker | null = null

  function stop(): void {
    worker?.terminate()
    worker = null
  }

  function start(): void {
    stop()
    wrongs.value = null
    const asked: WhenWrongAsked = {
      snapshot: cutSnapshot(store.snapshot, hookup(), question()),
      question: question(),
      hookup: hookup(),
    }
    worker = new Worker(new URL('../workers/when-wrong.ts', import.meta.url), { type: 'module' })
    worker.addEventListener('message', ({ data }: MessageEvent<readonly WhenWrong[]>) => {
      wrongs.value = data
      stop()
    })
    worker.postMessage(asked)
  }

  watch(hookup, start, { immediate: true })
  onScopeDispose(stop)

  return { wrongs }
}
