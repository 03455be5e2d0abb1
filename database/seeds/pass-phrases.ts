import { randomInt } from 'node:crypto'
import { WORDS } from './words'

const WORDS_IN_PHRASE = 6

/** Six words of 256: 48 bits of chance, and long enough for the rules of the product. */
export const makePassPhrase = (): string =>
  Array.from({ length: WORDS_IN_PHRASE }, () => WORDS[randomInt(WORDS.length)]).join(' ')

/** Of everybody by e-mail address: what is known already stays, the rest is made now. */
export const completePassPhrases = (
  emails: readonly string[],
  known: Readonly<Record<string, string>>,
): Record<string, string> =>
  Object.fromEntries(emails.map((email) => [email, known[email] ?? makePassPhrase()]))
