import { defineStore } from 'pinia'
import { ref } from 'vue'

/** What assistive technology is told without the focus moving: facts politely, failures at once. */
export const useAnnouncer = defineStore('announcer', () => {
  const polite = ref('')
  const urgent = ref('')

  /** The same words twice are two announcements: a trailing space makes them differ. */
  const fresh = (before: string, words: string): string => (before === words ? `${words} ` : words)

  function tell(words: string): void {
    polite.value = fresh(polite.value, words)
  }

  function warn(words: string): void {
    urgent.value = fresh(urgent.value, words)
  }

  return { polite, urgent, tell, warn }
})
