import type { FormState, FunctionState, Modification } from '@coaxwain/shelf'
import type { Knex } from 'knex'
import { parseJson } from '../db/json'
import { cutPage, onPage, sqlInstant, type Page, type PageWish } from '../db/pages'
import { bumpShelf } from '../db/versions'
import { addedParts } from './added-parts'
import { filterUnits, type UnitFilters } from './unit-filters.repository'
import type {
  FormFound,
  FunctionFound,
  NewUnitRow,
  Overlays,
  UnitFields,
  UnitRow,
} from './unit-rows'

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
  modelDeletedAt: 'models.deleted_at',
  placeName: 'places.name',
}

type RawRow = Omit<UnitRow, 'remotePresent' | 'modelDeleted'> & {
  readonly remotePresent: number
  readonly modelDeletedAt: Date | null
}

const toRow = ({ modelDeletedAt, ...row }: RawRow): UnitRow => ({
  ...row,
  remotePresent: row.remotePresent === 1,
  modelDeleted: modelDeletedAt !== null,
})

const SORT_VALUES: Readonly<Record<string, (row: UnitRow) => string>> = {
  'units.sort_name': (r) => r.sortName,
  'units.created_at': (r) => sqlInstant(r.addedAt),
  'units.changed_at': (r) => sqlInstant(r.changedAt),
  "coalesce(places.name, '')": (r) => r.placeName ?? '',
}

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

interface Evidence {
  readonly on: string | null
  readonly how: string | null
  readonly by: string | null
}

const toEvidence = ({ on, how, by }: Evidence) => ({
  ...(on === null ? {} : { on }),
  ...(how === null ? {} : { how }),
  ...(by === null ? {} : { by }),
})

const EVIDENCE = { state: 'state', on: 'found_on', how: 'how', by: 'by_name' }

const foundColumns = (found: FormFound | FunctionFound) => ({
  state: found.state,
  found_on: found.on,
  how: found.how,
  by_person_id: found.byId,
  by_name: found.byName,
})

export type UnitsRepository = ReturnType<typeof createUnitsRepository>

/** Where a unit is: its collection, and itself. */
export interface UnitKey {
  readonly collectionId: number
  readonly unitId: number
}

const keyColumns = (key: UnitKey) => ({ collection_id: key.collectionId, unit_id: key.unitId })

export const createUnitsRepository = (db: Knex) => {
  const neededByCount = db('hookup_units')
    .join('hookups', 'hookups.id', 'hookup_units.hookup_id')
    .whereRaw(
      'hookup_units.collection_id = units.collection_id and hookup_units.unit_id = units.id',
    )
    .whereNull('hookups.deleted_at')
    .count('*')

  const columns = () => ({ ...COLUMNS, neededByCount: neededByCount.clone() })

  const overlayRows = async <Row extends { unitId: number }>(
    table: string,
    columns: Readonly<Record<string, string>>,
    scope: { readonly collectionId: number; readonly unitIds: readonly number[] | 'all' },
  ): Promise<Map<number, Row[]>> => {
    const query = db(table)
      .where(`${table}.collection_id`, scope.collectionId)
      .orderBy(`${table}.id`)
      .select({ unitId: `${table}.unit_id`, ...columns })
    if (scope.unitIds !== 'all') void query.whereIn(`${table}.unit_id`, [...scope.unitIds])
    const found = new Map<number, Row[]>()
    for (const row of (await query) as Row[]) {
      found.set(row.unitId, [...(found.get(row.unitId) ?? []), row])
    }
    return found
  }

  return {
    async list(
      collectionId: number,
      filters: UnitFilters,
      wish: PageWish,
    ): Promise<Page<UnitRow> & { total: number }> {
      const [rows, counted] = await Promise.all([
        onPage(filterUnits(db, collectionId, filters).select(columns()), wish) as Promise<RawRow[]>,
        filterUnits(db, collectionId, filters).count('* as n').first() as Promise<{ n: number }>,
      ])
      const value = SORT_VALUES[wish.order.column]
      if (!value) throw new Error(`no sort value for ${wish.order.column}`)
      return { ...cutPage(rows.map(toRow), wish, value), total: counted.n }
    },

    /** Every unit that has not been deleted. */
    async all(collectionId: number): Promise<UnitRow[]> {
      const rows = (await filterUnits(db, collectionId, {})
        .orderBy('units.id')
        .select(columns())) as RawRow[]
      return rows.map(toRow)
    },

    /** Also finds what was deleted. */
    async find(collectionId: number, uid: string): Promise<UnitRow | null> {
      const row = (await db('units')
        .join('models', 'models.id', 'units.model_id')
        .leftJoin('places', 'places.id', 'units.place_id')
        .where({ 'units.collection_id': collectionId, 'units.uid': uid })
        .first(columns())) as RawRow | undefined
      return row ? toRow(row) : null
    },

    async overlays(
      collectionId: number,
      unitIds: readonly number[] | 'all',
    ): Promise<(unitId: number) => Overlays> {
      const scope = { collectionId, unitIds }
      const [forms, functions, modifications, stands] = await Promise.all([
        overlayRows<
          { unitId: number; jack: string; port: string; state: FormState['state'] } & Evidence
        >('unit_form_states', { jack: 'jack_key', port: 'port_key', ...EVIDENCE }, scope),
        overlayRows<{ unitId: number; function: string; state: FunctionState['state'] } & Evidence>(
          'unit_function_states',
          { function: 'function_key', ...EVIDENCE },
          scope,
        ),
        overlayRows<{ unitId: number; document: unknown }>(
          'unit_modifications',
          { document: 'document' },
          scope,
        ),
        overlayRows<{ unitId: number; control: string; position: string }>(
          'unit_stands',
          { control: 'control_key', position: 'position' },
          scope,
        ),
      ])
      return (id) => ({
        forms: (forms.get(id) ?? []).map((f) => ({
          jack: f.jack,
          port: f.port,
          state: f.state,
          ...toEvidence(f),
        })),
        functions: (functions.get(id) ?? []).map((f) => ({
          function: f.function,
          state: f.state,
          ...toEvidence(f),
        })),
        modifications: (modifications.get(id) ?? []).map((m) =>
          parseJson<Modification>(m.document),
        ),
        stands: Object.fromEntries((stands.get(id) ?? []).map((s) => [s.control, s.position])),
      })
    },

    async neededBy(key: UnitKey): Promise<{ uid: string; title: string }[]> {
      return (await db('hookup_units')
        .join('hookups', (on) =>
          on
            .on('hookups.collection_id', 'hookup_units.collection_id')
            .andOn('hookups.id', 'hookup_units.hookup_id'),
        )
        .where({
          'hookup_units.collection_id': key.collectionId,
          'hookup_units.unit_id': key.unitId,
        })
        .whereNull('hookups.deleted_at')
        .orderBy(['hookups.title', 'hookups.uid'])
        .select('hookups.uid', 'hookups.title')) as { uid: string; title: string }[]
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

    async modelStands(modelId: number): Promise<boolean> {
      return (
        (await db('models').where({ id: modelId }).whereNull('deleted_at').first('id')) !==
        undefined
      )
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

    async setFormStates(key: UnitKey, found: readonly FormFound[]): Promise<void> {
      for (const f of found) {
        const at = { ...keyColumns(key), jack_key: f.jack, port_key: f.port }
        await db('unit_form_states').where(at).delete()
        if (f.state !== 'untested') {
          await db('unit_form_states').insert({ ...at, ...foundColumns(f) })
        }
      }
    },

    async setFunctionStates(key: UnitKey, found: readonly FunctionFound[]): Promise<void> {
      for (const f of found) {
        const at = { ...keyColumns(key), function_key: f.function }
        await db('unit_function_states').where(at).delete()
        if (f.state !== 'untested') {
          await db('unit_function_states').insert({ ...at, ...foundColumns(f) })
        }
      }
    },

    async setModifications(key: UnitKey, wanted: readonly Modification[]): Promise<void> {
      await db('unit_modifications').where(keyColumns(key)).delete()
      await db('unit_added_parts').where(keyColumns(key)).delete()
      if (wanted.length === 0) return
      await db('unit_modifications').insert(
        wanted.map((m, position) => ({
          ...keyColumns(key),
          position,
          kind: m.kind,
          document: JSON.stringify(m),
        })),
      )
      const parts = wanted.flatMap(addedParts)
      if (parts.length > 0) {
        await db('unit_added_parts').insert(parts.map((p) => ({ ...keyColumns(key), ...p })))
      }
    },

    async setStands(key: UnitKey, stands: Readonly<Record<string, string>>): Promise<void> {
      await db('unit_stands').where(keyColumns(key)).delete()
      const rows = Object.entries(stands).map(([control, position]) => ({
        ...keyColumns(key),
        control_key: control,
        position,
      }))
      if (rows.length > 0) await db('unit_stands').insert(rows)
    },
  }
}
