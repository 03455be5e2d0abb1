import type { Locale } from '@coaxwain/wording'

/** A day as a person writes it; takes an instant or a plain date. Only plain dates are free of time zones. */
export function dayOf(value: string, locale: Locale): string {
  const plain = /^\d{4}-\d{2}-\d{2}$/.test(value)
  return new Intl.DateTimeFormat(locale, {
    day: 'numeric',
    month: 'long',
    year: 'numeric',
    ...(plain ? { timeZone: 'UTC' } : {}),
  }).format(new Date(plain ? `${value}T00:00:00Z` : value))
}

/** A moment of the reader's own clock. */
export const momentOf = (value: Date, locale: Locale): string =>
  new Intl.DateTimeFormat(locale, { dateStyle: 'long', timeStyle: 'short' }).format(value)
