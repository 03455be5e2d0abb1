import type { Role } from '@coaxwain/contract'
import type { OffAir } from '@coaxwain/shelf'
import type { Knex } from 'knex'

export interface CollectionRow {
  readonly id: number
  readonly uid: string
  readonly name: string
  readonly role: Role
  readonly market: string
  readonly currency: string
  readonly shelfVersion: number
}

export interface MemberRow {
  readonly uid: string
  readonly name: string
  readonly role: Role
  readonly since: Date
}

export type CollectionsRepository = ReturnType<typeof createCollectionsRepository>

export const createCollectionsRepository = (db: Knex) => {
  const ofPerson = (personId: number): Knex.QueryBuilder =>
    db('memberships')
      .join('collections', 'collections.id', 'memberships.collection_id')
      .where('memberships.person_id', personId)
      .whereNull('collections.deleted_at')
      .select(
        'collections.id',
        'collections.uid',
        'collections.name',
        'memberships.role',
        'collections.market',
        'collections.currency',
        'collections.shelf_version as shelfVersion',
      )

  return {
    async list(personId: number): Promise<CollectionRow[]> {
      return (await ofPerson(personId).orderBy([
        'collections.name',
        'collections.uid',
      ])) as CollectionRow[]
    },

    /** Null for a collection that is not there and for one that the person does not belong to. */
    async find(personId: number, uid: string): Promise<CollectionRow | null> {
      const row = (await ofPerson(personId).where('collections.uid', uid).first()) as
        CollectionRow | undefined
      return row ?? null
    },

    async offAir(collectionIds: readonly number[]): Promise<Map<number, OffAir[]>> {
      const rows = (await db('off_air_channels')
        .whereIn('off_air_channels.collection_id', [...collectionIds])
        .orderBy(['collection_id', 'position'])
        .select(
          'collection_id as collectionId',
          'plan',
          'channel',
          'kind',
          'level_dbmv as level',
        )) as (OffAir & { collectionId: number; level: string | null })[]
      const found = new Map<number, OffAir[]>()
      for (const { collectionId, level, ...station } of rows) {
        const whole = level === null ? station : { ...station, levelDbmv: Number(level) }
        found.set(collectionId, [...(found.get(collectionId) ?? []), whole])
      }
      return found
    },

    async members(collectionId: number): Promise<MemberRow[]> {
      return (await db('memberships')
        .join('people', 'people.id', 'memberships.person_id')
        .where('memberships.collection_id', collectionId)
        .orderBy('memberships.id')
        .select(
          'people.uid',
          'people.name',
          'memberships.role',
          'memberships.since',
        )) as MemberRow[]
    },
  }
}
