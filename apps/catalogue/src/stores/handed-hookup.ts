import type { Hookup, Question } from '@coaxwain/shelf'
import { defineStore } from 'pinia'

/** A hookup on its way from the page that shows it to the page on which it is wired differently. */
export const useHandedHookup = defineStore('handed-hookup', () => {
  let handed: { readonly question: Question; readonly hookup: Hookup } | null = null

  function hand(question: Question, hookup: Hookup): void {
    handed = { question, hookup }
  }

  /** Taken once: whoever comes back later finds what they have entered since. */
  function take() {
    const taken = handed
    handed = null
    return taken
  }

  return { hand, take }
})
