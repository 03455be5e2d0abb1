import { format, type Details } from './format'
import type { Locale } from './locale'
import { APP } from './messages/app'
import { ARRANGEMENT } from './messages/arrangement'
import { ASK } from './messages/ask'
import { CAUTIONS } from './messages/cautions'
import { CHECK } from './messages/check'
import { GENERAL } from './messages/general'
import { HOOKUP, OBSTACLES, PURCHASES } from './messages/hookup'
import { MODELS } from './messages/models'
import { PROBLEMS } from './messages/problems'
import { PROVE } from './messages/prove'
import { SCREENS } from './messages/screens'
import { SHELF } from './messages/shelf'

export type { Details } from './format'
export { chooseLocale, isLocale, LOCALES, type Locale } from './locale'

/** Every message by its code. Each file under `messages/` holds one area; codes are unique over all. */
export const MESSAGES = {
  ...GENERAL,
  ...APP,
  ...ASK,
  ...ARRANGEMENT,
  ...PROVE,
  ...HOOKUP,
  ...CAUTIONS,
  ...CHECK,
  ...OBSTACLES,
  ...PURCHASES,
  ...MODELS,
  ...SHELF,
  ...SCREENS,
  ...PROBLEMS,
} as const

export type MessageCode = keyof typeof MESSAGES

export const hasSentence = (code: string): code is MessageCode => Object.hasOwn(MESSAGES, code)

/** The sentence for a code; a code without one gets the general sentence, never a bare code. */
export const sentence = (code: string, details: Details, locale: Locale): string =>
  hasSentence(code)
    ? format(MESSAGES[code], details, locale, (term) => sentence(term, {}, locale))
    : format(MESSAGES['general.unknown'], { code }, locale)
