import type { Knex } from 'knex'
import type { Role } from '@coaxwain/contract'

export interface KnownPerson {
  readonly id: number
  readonly uid: string
  readonly email: string
  readonly name: string
  readonly locale: 'en-GB' | 'en-US'
  readonly isDemo: boolean
}

export interface MembershipRow {
  readonly collectionUid: string
  readonly collectionName: string
  readonly role: Role
}

export type PeopleRepository = ReturnType<typeof createPeopleRepository>

interface PersonRow {
  id: number
  uid: string
  email: string
  name: string
  locale: 'en-GB' | 'en-US'
  is_demo: number
}

const COLUMNS = ['id', 'uid', 'email', 'name', 'locale', 'is_demo'].map((c) => `people.${c}`)

const toPerson = (row: PersonRow): KnownPerson => ({
  id: row.id,
  uid: row.uid,
  email: row.email,
  name: row.name,
  locale: row.locale,
  isDemo: row.is_demo === 1,
})

export const createPeopleRepository = (db: Knex) => ({
  async findById(id: number): Promise<KnownPerson | null> {
    const row = (await db('people').where('people.id', id).first(COLUMNS)) as PersonRow | undefined
    return row ? toPerson(row) : null
  },

  async findByEmail(email: string): Promise<{ person: KnownPerson; passwordHash: string } | null> {
    const row = (await db('people')
      .where('people.email', email)
      .first([...COLUMNS, 'people.password_hash'])) as
      (PersonRow & { password_hash: string }) | undefined
    return row ? { person: toPerson(row), passwordHash: row.password_hash } : null
  },

  async setPasswordHash(id: number, passwordHash: string): Promise<void> {
    await db('people').where('people.id', id).update({ password_hash: passwordHash })
  },

  async membershipsOf(personId: number): Promise<MembershipRow[]> {
    return (await db('memberships')
      .join('collections', 'collections.id', 'memberships.collection_id')
      .where('memberships.person_id', personId)
      .whereNull('collections.deleted_at')
      .orderBy(['collections.name', 'collections.uid'])
      .select(
        'collections.uid as collectionUid',
        'collections.name as collectionName',
        'memberships.role',
      )) as MembershipRow[]
  },

  async listDemoPeople(): Promise<KnownPerson[]> {
    const rows = (await db('people')
      .where('people.is_demo', true)
      .orderBy('people.id')
      .select(COLUMNS)) as PersonRow[]
    return rows.map(toPerson)
  },

  /** A person, a collection and the tie between them; all of it or nothing. */
  async createOwner(owner: {
    readonly personUid: string
    readonly collectionUid: string
    readonly email: string
    readonly name: string
    readonly passwordHash: string
    readonly collection: string
  }): Promise<void> {
    const [personId] = await db('people').insert({
      uid: owner.personUid,
      email: owner.email,
      name: owner.name,
      password_hash: owner.passwordHash,
    })
    const [collectionId] = await db('collections').insert({
      uid: owner.collectionUid,
      name: owner.collection,
    })
    await db('memberships').insert({
      person_id: personId,
      collection_id: collectionId,
      role: 'owner',
    })
  },

  async hasDemoPeople(): Promise<boolean> {
    return (await db('people').where('people.is_demo', true).first('people.id')) !== undefined
  },
})
