import { ok, type Result } from '@coaxwain/result'
import { defineStore } from 'pinia'
import { computed, ref } from 'vue'

/** Whether everything that was entered is on the server. */
export const useSaving = defineStore('saving', () => {
  const pending = ref(0)
  const lastFailed = ref(false)

  const state = computed(() =>
    pending.value > 0 ? 'saving' : lastFailed.value ? 'not-saved' : 'saved',
  )

  /** Follows one write from its start to its end. */
  async function track<T, P>(write: Promise<Result<T, P>>): Promise<Result<T, P>> {
    pending.value++
    try {
      const result = await write
      lastFailed.value = !result.ok
      return result
    } finally {
      pending.value--
    }
  }

  /** What failed has been given up or put right. */
  const settle = (): Result<void, never> => {
    lastFailed.value = false
    return ok(undefined)
  }

  return { state, track, settle }
})
