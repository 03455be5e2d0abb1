import type { DemoSignIns, Membership, Mode, Session } from '@coaxwain/contract'
import { AppError } from '../app-error'
import type { SignInLimits } from '../db/limits'
import { fingerprint } from '../uid'
import { toMembership, toPerson } from './mapper'
import type { Passwords } from './passwords'
import type { KnownPerson, PeopleRepository } from './repository'

export interface SignInAttempt {
  readonly email: string
  readonly password: string
  readonly address: string
  /** Whoever is signed in already in the session that asks. */
  readonly signedIn: KnownPerson | null
}

export type PeopleService = ReturnType<typeof createPeopleService>

interface Needs {
  readonly people: PeopleRepository
  readonly passwords: Passwords
  readonly limits: SignInLimits
  readonly mode: Mode
}

const sameEmail = (email: string): string => email.trim().toLowerCase()

export function createPeopleService({ people, passwords, limits, mode }: Needs) {
  const membershipsOf = async (personId: number): Promise<Membership[]> =>
    (await people.membershipsOf(personId)).map(toMembership)

  /** The same work for a known and an unknown address. */
  const check = async (email: string, password: string): Promise<KnownPerson | null> => {
    const found = await people.findByEmail(email)
    const right = found
      ? await passwords.matches(found.passwordHash, password)
      : await passwords.matchesNobody(password)
    if (!found || !right || (found.person.isDemo && mode !== 'demo')) return null
    if (passwords.isOutdated(found.passwordHash)) {
      await people.setPasswordHash(found.person.id, await passwords.hash(password))
    }
    return found.person
  }

  return {
    find: (id: number): Promise<KnownPerson | null> => people.findById(id),

    async session(person: KnownPerson | null): Promise<Session> {
      return {
        mode,
        person: person && toPerson(person),
        memberships: person ? await membershipsOf(person.id) : [],
      }
    },

    async signIn(attempt: SignInAttempt): Promise<KnownPerson> {
      const email = sameEmail(attempt.email)
      const tried = {
        account: fingerprint(email),
        address: attempt.address,
        knownSession: attempt.signedIn?.email === email,
      }
      const refusal = await limits.beforeTry(tried)
      if (refusal) {
        throw new AppError('too-many-requests', {
          details: { minutes: Math.ceil(refusal.retryAfterSeconds / 60) },
          retryAfterSeconds: refusal.retryAfterSeconds,
        })
      }
      const person = await check(email, attempt.password)
      if (!person) throw new AppError('sign-in-failed')
      await limits.afterSuccess(tried)
      return person
    },

    /** A server never runs beside accounts whose pass phrases were printed somewhere. */
    async refuseDemoPeople(): Promise<void> {
      if (await people.hasDemoPeople()) {
        throw new Error('The database holds people of the demonstration; a server refuses them.')
      }
    },

    async demoSignIns(): Promise<DemoSignIns> {
      const found = await people.listDemoPeople()
      const items = await Promise.all(
        found.map(async (p) => ({
          name: p.name,
          email: p.email,
          memberships: await membershipsOf(p.id),
        })),
      )
      return { items }
    },
  }
}
