import { MARKETS } from '@coaxwain/models'
import { z } from 'zod'
import { offAir } from './question'
import { role } from './roles'
import { instant, line, name, uid, version } from './text'

export const localeCode = z.enum(['en-GB', 'en-US'])

export const PASSWORD_LENGTH = { least: 15, most: 128 } as const

/** As a person counts: what is one letter on screen may be two in memory. */
export const passwordLength = (password: string): number => Array.from(password).length

export const signIn = z.strictObject({
  email: line(254).min(1),
  /** Never cut, and nothing longer is hashed. */
  password: z
    .string()
    .min(1)
    .refine((p) => passwordLength(p) <= PASSWORD_LENGTH.most, {
      params: { code: 'too-long', details: { limit: PASSWORD_LENGTH.most } },
    }),
})
export type SignIn = z.infer<typeof signIn>

export const person = z.strictObject({
  uid,
  name: name(80),
  email: z.string(),
  locale: localeCode,
})
export type Person = z.infer<typeof person>

export const membership = z.strictObject({
  collection: z.strictObject({ uid, name: name(120) }),
  role,
})
export type Membership = z.infer<typeof membership>

export const MODES = ['demo', 'server'] as const
export const mode = z.enum(MODES)
export type Mode = z.infer<typeof mode>

/** Who is looking. `person` is null for a stranger. */
export const session = z.strictObject({
  mode,
  person: person.nullable(),
  memberships: z.array(membership),
})
export type Session = z.infer<typeof session>

/** People of the demonstration; the pass phrases stand in the terminal, never here. */
export const demoSignIns = z.strictObject({
  items: z.array(
    z.strictObject({ name: name(80), email: z.string(), memberships: z.array(membership) }),
  ),
})
export type DemoSignIns = z.infer<typeof demoSignIns>

export const collection = z.strictObject({
  uid,
  name: name(120),
  role,
  market: z.enum(MARKETS),
  /** ISO 4217; one for all prices of the collection. */
  currency: z.string().length(3),
  /** Stations received where the collection stands; goes into questions. */
  offAir: z.array(offAir),
  /** Grows with every change that an answer may rest on. */
  shelfVersion: version,
})
export type Collection = z.infer<typeof collection>

export const collections = z.strictObject({ items: z.array(collection) })

export const member = z.strictObject({ uid, name: name(80), role, since: instant })
export type Member = z.infer<typeof member>

export const members = z.strictObject({ items: z.array(member) })
