import type { Together } from '../db/transact'
import { isDuplicateOf } from '../db/translate-db-error'
import { randomUid } from '../uid'
import { passwordFault, type PasswordFault } from './password-rules'
import type { Passwords } from './passwords'
import type { PeopleRepository } from './repository'

export interface NewOwner {
  readonly email: string
  readonly name: string
  readonly collection: string
  readonly passPhrase: string
}

export type OwnerFault = PasswordFault | 'email-taken' | 'email-malformed'

const EMAIL = /^[^\s@<>,;]+@[^\s@<>,;]+$/

/** The first person of a server, with a collection of their own; or why it cannot be. */
export async function addOwner(
  inOne: Together<PeopleRepository>,
  passwords: Passwords,
  wish: NewOwner,
): Promise<OwnerFault | null> {
  const email = wish.email.trim().toLowerCase()
  if (!EMAIL.test(email)) return 'email-malformed'
  const fault = passwordFault(wish.passPhrase, { email, collections: [wish.collection] })
  if (fault) return fault
  const owner = {
    personUid: randomUid(),
    collectionUid: randomUid(),
    email,
    name: wish.name,
    collection: wish.collection,
    passwordHash: await passwords.hash(wish.passPhrase),
  }
  try {
    await inOne((people) => people.createOwner(owner))
    return null
  } catch (error) {
    if (isDuplicateOf(error, 'people_email')) return 'email-taken'
    throw error
  }
}
