import { sentence, type Details, type Locale, type MessageCode } from '@coaxwain/wording'

/** Speaks one language: a code and its details become a sentence. */
export type Speak = (code: MessageCode, details?: Details) => string

export const sayIn =
  (locale: Locale): Speak =>
  (code, details = {}) =>
    sentence(code, details, locale)

/** First letter upper case; for words that open a line. */
export const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1)
