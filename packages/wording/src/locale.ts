export const LOCALES = ['en-GB', 'en-US'] as const
export type Locale = (typeof LOCALES)[number]

export const isLocale = (value: unknown): value is Locale =>
  (LOCALES as readonly unknown[]).includes(value)

/** The message language that serves a browser's list of languages best. */
export function chooseLocale(wanted: readonly string[]): Locale {
  for (const tag of wanted) {
    const exact = LOCALES.find((l) => l.toLowerCase() === tag.toLowerCase())
    if (exact) return exact
    if (tag.toLowerCase() === 'en') return 'en-GB'
  }
  return 'en-GB'
}
