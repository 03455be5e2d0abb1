import type { ModelQuery } from '@coaxwain/contract'
import type { Model } from '@coaxwain/models'
import type { Knex } from 'knex'
import { createPages, likePatterns, sqlInstant, type Page, type PageWish } from '../db/pages'
import { parseJson } from '../db/json'
import { bumpShelf } from '../db/versions'
import { createModelUses } from './model-uses.repository'
import { PART_TABLES, partKeys, partRows, type PartKey } from './parts'

export interface ModelRow {
  readonly id: number
  readonly uid: string
  readonly homeKey: number
  readonly type: 'device' | 'piece'
  readonly kind: string
  readonly maker: string
  readonly name: string
  readonly market: string
  readonly year: number | null
  readonly revision: number
  readonly version: number
  readonly sortName: string
  readonly madeFrom: string | null
  readonly changedAt: Date
  readonly deletedAt: Date | null
}

export interface ModelFacets {
  readonly aliases: string[]
  readonly connectors: string[]
  readonly forms: string[]
  readonly functions: string[]
  readonly units: number
}

const COLUMNS = {
  id: 'models.id',
  uid: 'models.uid',
  homeKey: 'models.home_key',
  type: 'models.type',
  kind: 'models.kind',
  maker: 'models.maker',
  name: 'models.name',
  market: 'models.market',
  year: 'models.year',
  revision: 'models.revision',
  version: 'models.version',
  sortName: 'models.sort_name',
  madeFrom: 'models.made_from',
  changedAt: 'models.changed_at',
  deletedAt: 'models.deleted_at',
}

const { onPage, cutPage } = createPages<ModelRow>('models.uid', {
  maker: { column: 'models.sort_name', value: (r) => r.sortName },
  changed: { column: 'models.changed_at', value: (r) => sqlInstant(r.changedAt) },
})

export type ModelsRepository = ReturnType<typeof createModelsRepository>

type Filters = Omit<ModelQuery, 'cursor' | 'limit' | 'sort'>

const sortNameOf = (model: Model): string => `${model.maker} ${model.name}`.slice(0, 170)

const factsOf = (model: Model) => ({
  type: model.type,
  kind: model.kind,
  maker: model.maker,
  name: model.name,
  market: model.market,
  year: model.year ?? null,
  fact_source: model.factSource,
  sort_name: sortNameOf(model),
})

/** Query tables of the latest revision, and the list of all keys ever made. */
async function writeParts(db: Knex, id: number, revision: number, model: Model): Promise<void> {
  for (const table of [...PART_TABLES].reverse()) await db(table).where({ model_id: id }).delete()
  await db('model_aliases').where({ model_id: id }).delete()
  for (const [table, rows] of Object.entries(partRows(model))) {
    const whole = rows.map((row) => ({ model_id: id, ...row }))
    if (whole.length > 0) await db(table).insert(whole)
  }
  const keys = partKeys(model).map(({ part, key }) => ({
    model_id: id,
    part,
    part_key: key,
    last_revision: revision,
  }))
  if (keys.length > 0) await db('model_keys').insert(keys).onConflict().merge(['last_revision'])
}

export const createModelsRepository = (db: Knex) => {
  const visible = (collectionId: number): Knex.QueryBuilder =>
    db('models').whereIn('models.home_key', [0, collectionId])

  const has = (table: string, where: Readonly<Record<string, unknown>>): Knex.QueryBuilder =>
    db(table).select(db.raw('1')).whereRaw(`${table}.model_id = models.id`).where(where)

  const filtered = (collectionId: number, filters: Filters): Knex.QueryBuilder => {
    const query = visible(collectionId)
    void (filters.deleted === true
      ? query.whereNotNull('models.deleted_at').where('models.home_key', collectionId)
      : query.whereNull('models.deleted_at'))
    for (const pattern of likePatterns(filters.q ?? '')) {
      void query.where((q) =>
        q
          .where('models.sort_name', 'like', pattern)
          .orWhereRaw('convert(models.kind using utf8mb4) like ?', [pattern])
          .orWhereExists(has('model_aliases', {}).where('model_aliases.alias', 'like', pattern)),
      )
    }
    if (filters.type) void query.where('models.type', filters.type)
    if (filters.kind) void query.where('models.kind', filters.kind)
    if (filters.market) void query.where('models.market', filters.market)
    if (filters.own !== undefined) {
      void query.where('models.home_key', filters.own ? collectionId : 0)
    }
    if (filters.function) {
      void query.whereExists(has('model_functions', { 'model_functions.kind': filters.function }))
    }
    if (filters.connector) {
      const connector = filters.connector
      void query.where((q) =>
        q
          .whereExists(
            has('model_ports', { 'model_ports.connector': connector, is_retired: false }),
          )
          .orWhereExists(has('model_plugs', { 'model_plugs.connector': connector })),
      )
    }
    return query
  }

  const grouped = async (query: Knex.QueryBuilder): Promise<Map<number, string[]>> => {
    const found = new Map<number, string[]>()
    for (const { id, value } of (await query) as { id: number; value: string }[]) {
      found.set(id, [...(found.get(id) ?? []), value])
    }
    return found
  }

  const valuesOf = (table: string, column: string, ids: readonly number[]): Knex.QueryBuilder =>
    db(table)
      .whereIn(`${table}.model_id`, ids)
      .distinct(`${table}.model_id as id`, `${table}.${column} as value`)

  const writeRevision = async (
    id: number,
    number: number,
    document: Model,
    by: number | null,
  ): Promise<void> => {
    await db('model_revisions').insert({
      model_id: id,
      number,
      document: JSON.stringify(document),
      made_by: by,
    })
    await writeParts(db, id, number, document)
  }

  return {
    ...createModelUses(db),

    async list(
      collectionId: number,
      filters: Filters,
      wish: PageWish,
    ): Promise<Page<ModelRow> & { total: number }> {
      const [rows, counted] = await Promise.all([
        onPage(filtered(collectionId, filters).select(COLUMNS), wish) as Promise<ModelRow[]>,
        filtered(collectionId, filters).count('* as n').first() as Promise<{ n: number }>,
      ])
      return { ...cutPage(rows, wish), total: counted.n }
    },

    /** Every lead and adapter that a collection sees. */
    async pieces(collectionId: number): Promise<ModelRow[]> {
      return (await filtered(collectionId, { type: 'piece' })
        .orderBy('models.id')
        .select(COLUMNS)) as ModelRow[]
    },

    /** Also finds what was deleted. */
    async find(collectionId: number, uid: string): Promise<ModelRow | null> {
      const row = (await visible(collectionId).where('models.uid', uid).first(COLUMNS)) as
        ModelRow | undefined
      return row ?? null
    },

    async facets(collectionId: number, ids: readonly number[]): Promise<Map<number, ModelFacets>> {
      const units = db('units')
        .where('units.collection_id', collectionId)
        .whereIn('units.model_home_key', [0, collectionId])
        .whereIn('units.model_id', ids)
        .whereNull('units.deleted_at')
        .groupBy('units.model_id')
        .select('units.model_id as id', db.raw('cast(sum(units.quantity) as unsigned) as value'))
      const [aliases, ports, plugs, forms, functions, counts] = await Promise.all([
        grouped(
          db('model_aliases')
            .whereIn('model_aliases.model_id', ids)
            .orderBy('model_aliases.position')
            .select('model_aliases.model_id as id', 'model_aliases.alias as value'),
        ),
        grouped(valuesOf('model_ports', 'connector', ids).where('model_ports.is_retired', false)),
        grouped(valuesOf('model_plugs', 'connector', ids)),
        grouped(valuesOf('model_jacks', 'form', ids)),
        grouped(valuesOf('model_functions', 'kind', ids)),
        grouped(units),
      ])
      return new Map(
        ids.map((id) => [
          id,
          {
            aliases: aliases.get(id) ?? [],
            connectors: [...new Set([...(ports.get(id) ?? []), ...(plugs.get(id) ?? [])])].sort(),
            forms: (forms.get(id) ?? []).sort(),
            functions: (functions.get(id) ?? []).sort(),
            units: Number(counts.get(id)?.[0] ?? 0),
          },
        ]),
      )
    },

    /** Documents by `id:revision`. */
    async documents(
      wanted: readonly { readonly id: number; readonly revision: number }[],
    ): Promise<Map<string, Model>> {
      if (wanted.length === 0) return new Map()
      const rows = (await db('model_revisions')
        .whereIn(
          ['model_revisions.model_id', 'model_revisions.number'],
          wanted.map((w) => [w.id, w.revision]),
        )
        .select('model_id as id', 'number', 'document')) as {
        id: number
        number: number
        document: unknown
      }[]
      return new Map(rows.map((r) => [`${r.id}:${r.number}`, parseJson<Model>(r.document)]))
    },

    async revision(
      modelId: number,
      number: number,
    ): Promise<{ document: Model; madeAt: Date } | null> {
      const row = (await db('model_revisions')
        .where({ model_id: modelId, number })
        .first('document', 'made_at as madeAt')) as { document: unknown; madeAt: Date } | undefined
      return row ? { document: parseJson<Model>(row.document), madeAt: row.madeAt } : null
    },

    bumpShelf: (collectionId: number): Promise<void> => bumpShelf(db, collectionId),

    async insert(model: {
      readonly uid: string
      /** Null for the shared catalogue. */
      readonly home: number | null
      readonly document: Model
      readonly madeFrom: string | null
      readonly by: number | null
    }): Promise<number> {
      const [id] = await db('models').insert({
        uid: model.uid,
        home_collection_id: model.home,
        home_key: model.home ?? 0,
        ...factsOf(model.document),
        made_from: model.madeFrom,
        created_by: model.by,
        changed_by: model.by,
      })
      if (id === undefined) throw new Error('no id after insert')
      await writeRevision(id, 1, model.document, model.by)
      return id
    },

    /** Moves an own model to its next revision; false when somebody was quicker. */
    async update(
      collectionId: number,
      at: { readonly id: number; readonly version: number },
      document: Model,
      by: number,
    ): Promise<boolean> {
      const changed = await db('models')
        .where({ id: at.id, home_key: collectionId, version: at.version })
        .whereNull('deleted_at')
        .update({
          ...factsOf(document),
          revision: db.raw('revision + 1'),
          version: db.raw('version + 1'),
          changed_at: db.raw('current_timestamp(3)'),
          changed_by: by,
        })
      if (changed !== 1) return false
      const row = (await db('models').where({ id: at.id }).first('revision')) as {
        revision: number
      }
      await writeRevision(at.id, row.revision, document, by)
      await db('units')
        .where({ collection_id: collectionId, model_home_key: collectionId, model_id: at.id })
        .where('label', '')
        .update({ sort_name: sortNameOf(document) })
      return true
    },

    async setDeleted(
      collectionId: number,
      at: { readonly id: number; readonly version: number },
      deleted: boolean,
      by: number,
    ): Promise<boolean> {
      const query = db('models').where({
        id: at.id,
        home_key: collectionId,
        version: at.version,
      })
      void (deleted ? query.whereNull('deleted_at') : query.whereNotNull('deleted_at'))
      const changed = await query.update({
        deleted_at: deleted ? db.raw('current_timestamp(3)') : null,
        version: db.raw('version + 1'),
        changed_at: db.raw('current_timestamp(3)'),
        changed_by: by,
      })
      return changed === 1
    },

    /** Keys of a model that were made at any time. */
    async keysEver(modelId: number): Promise<PartKey[]> {
      return (await db('model_keys')
        .where({ model_id: modelId })
        .select('part', 'part_key as key')) as PartKey[]
    },
  }
}
