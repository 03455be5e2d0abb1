import type { Collection, Member } from '@coaxwain/contract'
import { notFound } from '../app-error'
import type { Scope } from '../http/call'
import type { KnownPerson } from '../people/repository'
import { toCollection, toMember } from './mapper'
import type { CollectionsRepository } from './repository'

export type CollectionsService = ReturnType<typeof createCollectionsService>

export const createCollectionsService = (collections: CollectionsRepository) => ({
  /** What the person may do there, as of now; the same answer for foreign and absent collections. */
  async scopeOf(person: KnownPerson, collectionUid: string): Promise<Scope> {
    const row = await collections.find(person.id, collectionUid)
    if (!row) throw notFound()
    return { collectionId: row.id, collectionUid: row.uid, role: row.role, person }
  },

  async list(person: KnownPerson): Promise<Collection[]> {
    const rows = await collections.list(person.id)
    const offAir = await collections.offAir(rows.map((r) => r.id))
    return rows.map((row) => toCollection(row, offAir.get(row.id) ?? []))
  },

  async read(scope: Scope): Promise<Collection> {
    const row = await collections.find(scope.person.id, scope.collectionUid)
    if (!row) throw notFound()
    const offAir = await collections.offAir([row.id])
    return toCollection(row, offAir.get(row.id) ?? [])
  },

  async members(scope: Scope): Promise<Member[]> {
    return (await collections.members(scope.collectionId)).map(toMember)
  },
})
