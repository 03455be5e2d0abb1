import type { Details, MessageCode } from '@coaxwain/wording'
import { storeToRefs } from 'pinia'
import type { Speak } from '../format/words'
import { usePreferences } from '../stores/preferences'

/** The words of the page in the reader's language. A template that calls `say` follows a change of language. */
export function useWords() {
  const preferences = usePreferences()
  const { locale } = storeToRefs(preferences)
  const say: Speak = (code: MessageCode, details?: Details) => preferences.say(code, details)
  return { say, locale }
}
