import { onScopeDispose, ref, watch } from 'vue'
import { useSession } from '../stores/session'

const PREFIX = 'coaxwain.draft.'

/**
 * Keeps what is typed in a form on this device, for each person and each form, until it is saved.
 * It outlives reloads, failures and an expired session. Nothing secret may go in.
 */
export function useDraft<T extends object>(name: () => string, form: T) {
  const session = useSession()
  const restored = ref(false)
  const fresh = JSON.stringify(form)
  const key = (): string => `${PREFIX}${session.person?.uid ?? ''}.${name()}`

  function restore(): void {
    try {
      const kept = localStorage.getItem(key())
      if (kept === null) return
      Object.assign(form, JSON.parse(kept))
      restored.value = true
    } catch {
      discard()
    }
  }

  function keep(): void {
    if (session.person === null) return
    const now = JSON.stringify(form)
    try {
      if (now === base) localStorage.removeItem(key())
      else localStorage.setItem(key(), now)
    } catch {
      // Storage that is full or forbidden: the form itself still holds everything.
    }
  }

  function discard(): void {
    restored.value = false
    try {
      localStorage.removeItem(key())
    } catch {
      // As above.
    }
  }

  let base = fresh

  /** What the form holds now counts as saved: only differences from it are kept. */
  function setBase(): void {
    base = JSON.stringify(form)
  }

  const stop = watch(form, keep, { deep: true, flush: 'post' })
  onScopeDispose(stop)

  return { restored, restore, discard, setBase }
}
