import { nextTick } from 'vue'

/** Keeps what a person has just touched where it is in the window, and the focus on it, while the page changes. */
export function useSteady() {
  let held: { readonly id: string; readonly top: number } | null = null

  const topOf = (id: string): number | null =>
    document.getElementById(id)?.getBoundingClientRect().top ?? null

  function hold(id: string): void {
    const top = topOf(id)
    held = top === null ? null : { id, top }
  }

  async function settle(): Promise<void> {
    if (!held) return
    const { id, top } = held
    held = null
    await nextTick()
    if (document.activeElement === document.body) {
      document
        .getElementById(id)
        ?.querySelector<HTMLElement>('input')
        ?.focus({ preventScroll: true })
    }
    const now = topOf(id)
    if (now !== null) window.scrollBy({ top: now - top, behavior: 'instant' })
  }

  return { hold, settle }
}
