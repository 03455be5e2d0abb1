import type { Knex } from 'knex'
import { bumpShelf } from '../db/versions'

/** A place and what it stands in. */
export interface PlaceNode {
  readonly id: number
  readonly uid: string
  readonly parentId: number | null
  readonly name: string
}

export interface PlaceRow extends PlaceNode {
  readonly version: number
  readonly madeFrom: string | null
  readonly deleted: boolean
  readonly units: number
}

type RawRow = Omit<PlaceRow, 'deleted'> & { readonly deleted: number }

interface NewPlaceRow {
  readonly uid: string
  readonly name: string
  readonly parentId: number | null
  readonly madeFrom: string
}

export type PlacesRepository = ReturnType<typeof createPlacesRepository>

export const createPlacesRepository = (db: Knex) => {
  const unitCount = db('units')
    .whereRaw('units.collection_id = places.collection_id and units.place_id = places.id')
    .whereNull('units.deleted_at')
    .count('*')

  const all = (collectionId: number): Knex.QueryBuilder =>
    db('places')
      .where('places.collection_id', collectionId)
      .select(
        'places.id',
        'places.uid',
        'places.parent_id as parentId',
        'places.name',
        'places.version',
        'places.made_from as madeFrom',
        db.raw('places.deleted_at is not null as deleted'),
        unitCount.clone().as('units'),
      )

  const toRow = (row: RawRow): PlaceRow => ({ ...row, deleted: row.deleted === 1 })

  return {
    async list(collectionId: number): Promise<PlaceRow[]> {
      const rows = (await all(collectionId)
        .whereNull('places.deleted_at')
        .orderBy(['places.name', 'places.uid'])) as RawRow[]
      return rows.map(toRow)
    },

    /** The same without counting, for paths. */
    async nodes(collectionId: number): Promise<PlaceNode[]> {
      return (await db('places')
        .where('places.collection_id', collectionId)
        .whereNull('places.deleted_at')
        .select(
          'places.id',
          'places.uid',
          'places.parent_id as parentId',
          'places.name',
        )) as PlaceNode[]
    },

    async find(collectionId: number, uid: string): Promise<PlaceRow | null> {
      const row = (await all(collectionId).where('places.uid', uid).first()) as RawRow | undefined
      return row ? toRow(row) : null
    },

    bumpShelf: (collectionId: number): Promise<void> => bumpShelf(db, collectionId),

    async insert(collectionId: number, place: NewPlaceRow): Promise<void> {
      await db('places').insert({
        collection_id: collectionId,
        uid: place.uid,
        name: place.name,
        parent_id: place.parentId,
        made_from: place.madeFrom,
      })
    },

    /** False when somebody was quicker. */
    async update(
      collectionId: number,
      at: { readonly uid: string; readonly version: number },
      change: { readonly name?: string; readonly parentId?: number | null },
    ): Promise<boolean> {
      const changed = await db('places')
        .where({ collection_id: collectionId, uid: at.uid, version: at.version })
        .whereNull('deleted_at')
        .update({
          ...(change.name === undefined ? {} : { name: change.name }),
          ...(change.parentId === undefined ? {} : { parent_id: change.parentId }),
          version: db.raw('version + 1'),
          changed_at: db.raw('current_timestamp(3)'),
        })
      return changed === 1
    },

    async remove(
      collectionId: number,
      at: { readonly uid: string; readonly version: number },
    ): Promise<boolean> {
      const changed = await db('places')
        .where({ collection_id: collectionId, uid: at.uid, version: at.version })
        .whereNull('deleted_at')
        .update({
          deleted_at: db.raw('current_timestamp(3)'),
          version: db.raw('version + 1'),
          changed_at: db.raw('current_timestamp(3)'),
        })
      return changed === 1
    },
  }
}
