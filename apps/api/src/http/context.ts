import { chooseLocale, type Locale } from '@coaxwain/wording'
import type { Request } from 'express'
import type { KnownPerson } from '../people/repository'

declare global {
  // eslint-disable-next-line @typescript-eslint/no-namespace -- the form in which Express lets itself be extended
  namespace Express {
    // The session machinery calls whoever is signed in a user; the fields are ours.
    interface User extends KnownPerson {
      /** Written by the merge of the two declarations only. */
      readonly brand?: never
    }
  }
}

declare module 'express-session' {
  interface SessionData {
    /** Present while somebody is signed in. */
    passport?: unknown
    startedAt?: number
  }
}

export const personOf = (req: Request): KnownPerson | null => req.user ?? null

/** The language of whoever is signed in, else that of the browser. */
export function localeOf(req: Request): Locale {
  const person = personOf(req)
  if (person) return person.locale
  const wanted = req.get('accept-language') ?? ''
  return chooseLocale(wanted.split(',').map((tag) => (tag.split(';')[0] ?? '').trim()))
}

export const requestIdOf = (req: Request): string => String(req.id)
