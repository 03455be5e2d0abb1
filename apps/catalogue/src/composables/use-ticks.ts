import { computed, ref, watch } from 'vue'

const PREFIX = 'coaxwain.ticks.'

function read(key: string): number[] {
  try {
    const kept: unknown = JSON.parse(sessionStorage.getItem(PREFIX + key) ?? '[]')
    return Array.isArray(kept) ? kept.filter((n) => typeof n === 'number') : []
  } catch {
    return []
  }
}

/** Steps that are done, kept while the tab lives: a reload in the middle of the work loses nothing. */
export function useTicks(key: () => string, numbers: () => readonly number[]) {
  const done = ref<number[]>([])

  watch(
    key,
    (value) => {
      done.value = read(value)
    },
    { immediate: true },
  )

  const now = computed(() => numbers().find((n) => !done.value.includes(n)) ?? null)

  function toggle(number: number): void {
    done.value = done.value.includes(number)
      ? done.value.filter((n) => n !== number)
      : [...done.value, number]
    try {
      sessionStorage.setItem(PREFIX + key(), JSON.stringify(done.value))
    } catch {
      // Without storage the ticks last as long as the page.
    }
  }

  return { done, now, toggle }
}
