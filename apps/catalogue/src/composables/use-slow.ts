import { onScopeDispose, ref, watch } from 'vue'

const SLOW_MS = 300

/** Whether something has gone on for so long that a person wants to see that it does. */
export function useSlow(busy: () => boolean) {
  const slow = ref(false)
  let timer: ReturnType<typeof setTimeout> | undefined

  watch(
    busy,
    (now) => {
      clearTimeout(timer)
      slow.value = false
      if (now) timer = setTimeout(() => (slow.value = true), SLOW_MS)
    },
    { immediate: true },
  )
  onScopeDispose(() => clearTimeout(timer))

  return slow
}
