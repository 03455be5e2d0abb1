import type { Locale } from './locale'

/**
 * Words of the trade that differ between the two Englishes. A message writes `[aerial]`, `[Aerial]` or
 * `[aerials]`, and gets the word of its language in the same shape.
 */
export const WORDS: Readonly<Record<string, Readonly<Record<Locale, string>>>> = {
  aerial: { 'en-GB': 'aerial', 'en-US': 'antenna' },
  aerials: { 'en-GB': 'aerials', 'en-US': 'antennas' },
  earth: { 'en-GB': 'earth', 'en-US': 'ground' },
  earthed: { 'en-GB': 'earthed', 'en-US': 'grounded' },
  lead: { 'en-GB': 'lead', 'en-US': 'cable' },
  leads: { 'en-GB': 'leads', 'en-US': 'cables' },
  recorder: { 'en-GB': 'recorder', 'en-US': 'VCR' },
  recorders: { 'en-GB': 'recorders', 'en-US': 'VCRs' },
  socket: { 'en-GB': 'socket', 'en-US': 'jack' },
  sockets: { 'en-GB': 'sockets', 'en-US': 'jacks' },
  colour: { 'en-GB': 'colour', 'en-US': 'color' },
  colours: { 'en-GB': 'colours', 'en-US': 'colors' },
  grey: { 'en-GB': 'grey', 'en-US': 'gray' },
  mains: { 'en-GB': 'mains', 'en-US': 'line power' },
  licence: { 'en-GB': 'licence', 'en-US': 'license' },
  centre: { 'en-GB': 'centre', 'en-US': 'center' },
  catalogue: { 'en-GB': 'catalogue', 'en-US': 'catalog' },
}

const capital = (word: string): string => word.charAt(0).toUpperCase() + word.slice(1)

/** The word of a language in the shape in which it was asked for; unknown words are left in brackets. */
export function localWord(asked: string, locale: Locale): string {
  const lower = asked.charAt(0).toLowerCase() + asked.slice(1)
  const word = WORDS[lower]?.[locale]
  if (word === undefined) return `[${asked}]`
  return asked === lower ? word : capital(word)
}
