import { MOST_NEEDED_BY } from '@coaxwain/contract'
import type { Knex } from 'knex'
import { createPages, sqlInstant, type Page, type PageWish } from '../db/pages'
import { bumpShelf } from '../db/versions'
import { filterUnits, type UnitFilters } from './unit-filters.repository'
import { createUnitOverlays, keyColumns, type UnitKey } from './unit-overlays.repository'
import type { NewUnitRow, UnitFields, UnitRow } from './unit-rows'

const COLUMNS = {
  id: 'units.id',
  uid: 'units.uid',
  number: 'units.number',
  label: 'units.label',
  sortName: 'units.sort_name',
  serial: 'units.serial',
  note: 'units.note',
  quantity: 'units.quantity',
  working: 'units.working',
  holding: 'units.holding',
  placeId: 'units.place_id',
  remotePresent: 'units.remote_present',
  madeFrom: 'units.made_from',
  version: 'units.version',
  addedAt: 'units.created_at',
  changedAt: 'units.changed_at',
  deletedAt: 'units.deleted_at',
  modelId: 'models.id',
  modelUid: 'models.uid',
  modelType: 'models.type',
  modelKind: 'models.kind',
  maker: 'models.maker',
  modelName: 'models.name',
  market: 'models.market',
  revision: 'models.revision',
  placeName: 'places.name',
}

type RawRow = Omit<UnitRow, 'remotePresent'> & { readonly remotePresent: number }

const toRow = (row: RawRow): UnitRow => ({ ...row, remotePresent: row.remotePresent === 1 })

const { onPage, cutPage } = createPages<UnitRow>('units.uid', {
  name: { column: 'units.sort_name', value: (r) => r.sortName },
  added: { column: 'units.created_at', value: (r) => sqlInstant(r.addedAt) },
  changed: { column: 'units.changed_at', value: (r) => sqlInstant(r.changedAt) },
  place: { column: "coalesce(places.name, '')", value: (r) => r.placeName ?? '' },
})

const FIELDS: Readonly<Record<keyof UnitFields, string>> = {
  label: 'label',
  sortName: 'sort_name',
  serial: 'serial',
  note: 'note',
  quantity: 'quantity',
  working: 'working',
  holding: 'holding',
  placeId: 'place_id',
  remotePresent: 'remote_present',
}

const toColumns = (fields: UnitFields): Record<string, unknown> =>
  Object.fromEntries(
    Object.entries(FIELDS).flatMap(([field, column]) => {
      const value = fields[field as keyof UnitFields]
      return value === undefined ? [] : [[column, value]]
    }),
  )

export type UnitsRepository = ReturnType<typeof createUnitsRepository>

export const createUnitsRepository = (db: Knex) => {
  const neededByCount = db('hookup_units')
    .join('hookups', 'hookups.id', 'hookup_units.hookup_id')
    .whereRaw(
      'hookup_units.collection_id = units.collection_id and hookup_units.unit_id = units.id',
    )
    .whereNull('hookups.deleted_at')
    .count('*')

  const columns = () => ({ ...COLUMNS, neededByCount: neededByCount.clone() })

  return {
    ...createUnitOverlays(db),

    async list(
      collectionId: number,
      filters: UnitFilters,
      wish: PageWish,
    ): Promise<Page<UnitRow> & { total: number }> {
      const [rows, counted] = await Promise.all([
        onPage(filterUnits(db, collectionId, filters).select(columns()), wish) as Promise<RawRow[]>,
        filterUnits(db, collectionId, filters).count('* as n').first() as Promise<{ n: number }>,
      ])
      return { ...cutPage(rows.map(toRow), wish), total: counted.n }
    },

    /** Every unit that has not been deleted. */
    async all(collectionId: number): Promise<UnitRow[]> {
      const rows = (await filterUnits(db, collectionId, {})
        .orderBy('units.id')
        .select(columns())) as RawRow[]
      return rows.map(toRow)
    },

    /** Also finds what was deleted. */
    async find(collectionId: number, uids: readonly string[]): Promise<UnitRow[]> {
      const rows = (await db('units')
        .join('models', 'models.id', 'units.model_id')
        .leftJoin('places', 'places.id', 'units.place_id')
        .where('units.collection_id', collectionId)
        .whereIn('units.uid', [...uids])
        .select(columns())) as RawRow[]
      return rows.map(toRow)
    },

    /** The first saved hookups by the id of the unit that they use; its count tells of them all. */
    async neededBy(
      collectionId: number,
      unitIds: readonly number[],
    ): Promise<Map<number, { uid: string; title: string }[]>> {
      const ranked = db('hookup_units')
        .join('hookups', (on) =>
          on
            .on('hookups.collection_id', 'hookup_units.collection_id')
            .andOn('hookups.id', 'hookup_units.hookup_id'),
        )
        .where('hookup_units.collection_id', collectionId)
        .whereIn('hookup_units.unit_id', [...unitIds])
        .whereNull('hookups.deleted_at')
        .select(
          'hookup_units.unit_id as unitId',
          'hookups.uid',
          'hookups.title',
          db.raw(
            'row_number() over (partition by hookup_units.unit_id order by hookups.title, hookups.uid) as nth',
          ),
        )
      const rows = (await db(ranked.as('ranked'))
        .where('ranked.nth', '<=', MOST_NEEDED_BY)
        .orderBy(['ranked.unitId', 'ranked.nth'])
        .select('ranked.unitId', 'ranked.uid', 'ranked.title')) as {
        unitId: number
        uid: string
        title: string
      }[]
      const found = new Map<number, { uid: string; title: string }[]>()
      for (const { unitId, ...hookup } of rows) {
        found.set(unitId, [...(found.get(unitId) ?? []), hookup])
      }
      return found
    },

    /** Keys of the unit that a saved hookup names. */
    async keysInHookups(key: UnitKey): Promise<string[]> {
      const rows = (await db('hookup_unit_parts')
        .where(keyColumns(key))
        .distinct('part_key as key')) as { key: string }[]
      return rows.map((r) => r.key)
    },

    async placeId(collectionId: number, uid: string): Promise<number | null> {
      const row = (await db('places')
        .where({ collection_id: collectionId, uid })
        .whereNull('deleted_at')
        .first('id')) as { id: number } | undefined
      return row?.id ?? null
    },

    /** The latest revision; null when the model was deleted. */
    async modelRevision(modelId: number): Promise<number | null> {
      const row = (await db('models')
        .where({ id: modelId })
        .whereNull('deleted_at')
        .first('revision')) as { revision: number } | undefined
      return row?.revision ?? null
    },

    /** The next number of the collection; its row is locked by the bump before. */
    async takeNumber(collectionId: number): Promise<number> {
      const row = (await db('collections')
        .where({ id: collectionId })
        .first('next_unit_number as number')) as { number: number }
      await db('collections').where({ id: collectionId }).increment('next_unit_number', 1)
      return row.number
    },

    bumpShelf: (collectionId: number): Promise<void> => bumpShelf(db, collectionId),

    async insert(collectionId: number, unit: NewUnitRow): Promise<number> {
      const [id] = await db('units').insert({
        collection_id: collectionId,
        uid: unit.uid,
        number: unit.number,
        model_id: unit.modelId,
        model_home_key: unit.modelHomeKey,
        ...toColumns(unit),
        made_from: unit.madeFrom,
        created_by: unit.by,
        changed_by: unit.by,
      })
      if (id === undefined) throw new Error('no id after insert')
      return id
    },

    /** One conditional statement; false when somebody was quicker or the unit is gone. */
    async update(
      collectionId: number,
      at: { readonly uid: string; readonly version: number; readonly by: number },
      fields: UnitFields,
    ): Promise<boolean> {
      const changed = await db('units')
        .where({ collection_id: collectionId, uid: at.uid, version: at.version })
        .whereNull('deleted_at')
        .update({
          ...toColumns(fields),
          version: db.raw('version + 1'),
          changed_at: db.raw('current_timestamp(3)'),
          changed_by: at.by,
        })
      return changed === 1
    },

    async setDeleted(
      collectionId: number,
      at: { readonly uid: string; readonly version: number; readonly by: number },
      deleted: boolean,
    ): Promise<boolean> {
      const query = db('units').where({
        collection_id: collectionId,
        uid: at.uid,
        version: at.version,
      })
      void (deleted ? query.whereNull('deleted_at') : query.whereNotNull('deleted_at'))
      const changed = await query.update({
        deleted_at: deleted ? db.raw('current_timestamp(3)') : null,
        version: db.raw('version + 1'),
        changed_at: db.raw('current_timestamp(3)'),
        changed_by: at.by,
      })
      return changed === 1
    },
  }
}
