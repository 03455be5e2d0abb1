import type { Locale } from './locale'
import { localWord } from './words'

export type Details = Readonly<Record<string, string | number>>

/**
 * Fills a message. `{name}` is a detail; `{colour:name}` is one that holds a code, or a list of codes, of the
 * family `colour`; `{n|# socket|# sockets}` chooses by number, `#` being the number; `[aerial]` is a word of
 * the language. Nothing is ever evaluated, and details are never looked into again.
 */
export function format(
  template: string,
  details: Details,
  locale: Locale,
  term: (code: string) => string = (code) => code,
): string {
  const worded = template.replace(/\[([A-Za-z]+)\]/g, (_, word: string) => localWord(word, locale))
  const fill = (slot: Slot): string | null => {
    const value = details[slot.name]
    if (value === undefined) return null
    if (slot.family !== undefined) {
      const codes = String(value).split(', ')
      return codes.map((code) => term(`${slot.family}.${code}`)).join(', ')
    }
    if (slot.one === undefined) return shown(value, locale)
    const form = String(value === 1 ? slot.one : slot.many)
    return form.replaceAll('#', shown(value, locale))
  }
  return worded.replace(SLOT, (...match) => fill(match.at(-1) as Slot) ?? String(match[0]))
}

/** The parts of a slot of a template. */
interface Slot {
  readonly family?: string
  readonly name: string
  readonly one?: string
  readonly many?: string
}

const SLOT = /\{(?:(?<family>[a-z]+):)?(?<name>\w+)(?:\|(?<one>[^|{}]*)\|(?<many>[^|{}]*))?\}/g

/** Numbers by the language's rules, with a true minus sign; text as it is. */
const shown = (value: string | number, locale: Locale): string =>
  typeof value === 'number'
    ? new Intl.NumberFormat(locale, { maximumFractionDigits: 2 })
        .format(value)
        .replace('-', '\u2212')
    : value
