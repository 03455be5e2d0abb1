import { demoUid } from '../uid'
import type { DemoPerson } from '../demo-data'

/** Names and addresses are invented; example.org and example.com are kept free for such use (RFC 2606). */
const person = (
  key: string,
  name: string,
  email: string,
  rest: Partial<Pick<DemoPerson, 'locale' | 'site'>> = {},
): DemoPerson => ({
  uid: demoUid(`p-${key}`),
  key,
  name,
  email,
  locale: 'en-GB',
  site: null,
  ...rest,
})

export const MAREN = 'maren'
export const TOBIN = 'tobin'
export const INES = 'ines'
export const DESMOND = 'desmond'
export const WILMA = 'wilma'
export const RAFE = 'rafe'
export const NESSA = 'nessa'

export const PEOPLE: readonly DemoPerson[] = [
  person(MAREN, 'Maren Ashlow', 'maren.ashlow@example.org', { locale: 'en-US' }),
  person(TOBIN, 'Tobin Sedgeley', 'tobin.sedgeley@example.org', { locale: 'en-US' }),
  person(INES, 'Ines Farrowby', 'ines.farrowby@example.org'),
  person(DESMOND, 'Desmond Quaye-Lind', 'desmond.quaye-lind@example.org', { locale: 'en-US' }),
  person(WILMA, 'Wilma Orchardson', 'wilma.orchardson@example.org'),
  person(RAFE, 'Rafe Lindell', 'rafe.lindell@example.com'),
  person('priya', 'Priya Sundelin', 'priya.sundelin@example.com', { site: 'catalogue-editor' }),
  person('anton', 'Anton Valekamp', 'anton.valekamp@example.com', { site: 'administrator' }),
  person(NESSA, 'Nessa Thorngill', 'nessa.thorngill@example.com'),
]
