import type { Hookup, Question, Uid } from '@coaxwain/shelf'
import type { Knex } from 'knex'
import { parseJson } from '../db/json'
import { createPages, sqlInstant, type Page, type PageWish } from '../db/pages'
import type { Bearing, UsedPart } from './bearing'

export interface HookupRow {
  readonly id: number
  readonly uid: string
  readonly title: string
  readonly question: Question
  readonly hookup: Hookup
  readonly madeFrom: string | null
  readonly version: number
  readonly savedAt: Date
  readonly changedAt: Date
  readonly deletedAt: Date | null
}

export interface HookupFilters {
  readonly unit?: string | undefined
  readonly deleted?: boolean | undefined
}

export interface NewHookupRow {
  readonly uid: string
  readonly title: string
  readonly question: Question
  readonly hookup: Hookup
  readonly madeFrom: string
  readonly by: number
  readonly units: readonly Bearing[]
  readonly parts: readonly UsedPart[]
  readonly pieces: readonly (Bearing & { readonly copies: number })[]
}

const COLUMNS = {
  id: 'hookups.id',
  uid: 'hookups.uid',
  title: 'hookups.title',
  question: 'hookups.question',
  hookup: 'hookups.hookup',
  madeFrom: 'hookups.made_from',
  version: 'hookups.version',
  savedAt: 'hookups.created_at',
  changedAt: 'hookups.changed_at',
  deletedAt: 'hookups.deleted_at',
}

type RawRow = Omit<HookupRow, 'question' | 'hookup'> & {
  readonly question: unknown
  readonly hookup: unknown
}

const toRow = (row: RawRow): HookupRow => ({
  ...row,
  question: parseJson<Question>(row.question),
  hookup: parseJson<Hookup>(row.hookup),
})

const { onPage, cutPage } = createPages<HookupRow>('hookups.uid', {
  title: { column: 'hookups.title', value: (r) => r.title },
  saved: { column: 'hookups.created_at', value: (r) => sqlInstant(r.savedAt) },
})

export type HookupsRepository = ReturnType<typeof createHookupsRepository>

interface At {
  readonly uid: string
  readonly version: number
  readonly by: number
}

export const createHookupsRepository = (db: Knex) => {
  const filtered = (collectionId: number, filters: HookupFilters): Knex.QueryBuilder => {
    const query = db('hookups').where('hookups.collection_id', collectionId)
    void (filters.deleted === true
      ? query.whereNotNull('hookups.deleted_at')
      : query.whereNull('hookups.deleted_at'))
    if (filters.unit !== undefined) {
      void query.whereExists(
        db('hookup_units')
          .join('units', 'units.id', 'hookup_units.unit_id')
          .select(db.raw('1'))
          .whereRaw('hookup_units.hookup_id = hookups.id')
          .where({ 'units.collection_id': collectionId, 'units.uid': filters.unit }),
      )
    }
    return query
  }

  const idsOf = async (
    table: 'units' | 'models',
    uids: readonly Uid[],
    within: (query: Knex.QueryBuilder) => Knex.QueryBuilder,
  ): Promise<Map<Uid, { id: number; homeKey: number }>> => {
    const home = table === 'models' ? 'home_key' : 'model_home_key'
    const rows = (await within(db(table).whereIn('uid', [...uids])).select(
      'id',
      'uid',
      `${home} as homeKey`,
    )) as { id: number; uid: Uid; homeKey: number }[]
    return new Map(rows.map((r) => [r.uid, r]))
  }

  const write = async (query: Knex.QueryBuilder, set: Record<string, unknown>, by: number) =>
    (await query.update({
      ...set,
      version: db.raw('version + 1'),
      changed_at: db.raw('current_timestamp(3)'),
      changed_by: by,
    })) === 1

  const at = (collectionId: number, { uid, version }: At): Knex.QueryBuilder =>
    db('hookups').where({ collection_id: collectionId, uid, version })

  return {
    async list(
      collectionId: number,
      filters: HookupFilters,
      wish: PageWish,
    ): Promise<Page<HookupRow> & { total: number }> {
      const [rows, counted] = await Promise.all([
        onPage(filtered(collectionId, filters).select(COLUMNS), wish) as Promise<RawRow[]>,
        filtered(collectionId, filters).count('* as n').first() as Promise<{ n: number }>,
      ])
      return { ...cutPage(rows.map(toRow), wish), total: counted.n }
    },

    /** Also finds what was deleted. */
    async find(collectionId: number, uid: string): Promise<HookupRow | null> {
      const row = (await db('hookups')
        .where({ 'hookups.collection_id': collectionId, 'hookups.uid': uid })
        .first(COLUMNS)) as RawRow | undefined
      return row ? toRow(row) : null
    },

    /** What units and pieces were like when each hookup was saved. */
    async bearings(
      collectionId: number,
      hookupIds: readonly number[],
    ): Promise<Map<number, { units: Bearing[]; pieces: Bearing[] }>> {
      const of = async (table: string, on: string, key: string) =>
        (await db(table)
          .join(on, `${on}.id`, `${table}.${key}`)
          .where(`${table}.collection_id`, collectionId)
          .whereIn(`${table}.hookup_id`, [...hookupIds])
          .orderBy(`${table}.id`)
          .select(
            `${table}.hookup_id as hookupId`,
            `${on}.uid as unit`,
            `${table}.fingerprint`,
          )) as {
          hookupId: number
          unit: Uid
          fingerprint: string
        }[]
      const [units, pieces] = await Promise.all([
        of('hookup_units', 'units', 'unit_id'),
        of('hookup_pieces', 'models', 'model_id'),
      ])
      const ofHookup = (id: number) => (row: { hookupId: number }) => row.hookupId === id
      return new Map(
        hookupIds.map((id) => [
          id,
          { units: units.filter(ofHookup(id)), pieces: pieces.filter(ofHookup(id)) },
        ]),
      )
    },

    async insert(collectionId: number, hookup: NewHookupRow): Promise<void> {
      const [id] = await db('hookups').insert({
        collection_id: collectionId,
        uid: hookup.uid,
        title: hookup.title,
        question: JSON.stringify(hookup.question),
        hookup: JSON.stringify(hookup.hookup),
        made_from: hookup.madeFrom,
        created_by: hookup.by,
        changed_by: hookup.by,
      })
      const units = await idsOf(
        'units',
        hookup.units.map((u) => u.unit),
        (query) => query.where('collection_id', collectionId),
      )
      const models = await idsOf(
        'models',
        hookup.pieces.map((p) => p.unit),
        (query) => query.whereIn('home_key', [0, collectionId]),
      )
      const idOf = (known: Map<Uid, { id: number }>, uid: Uid): number => {
        const found = known.get(uid)
        if (!found) throw new Error(`nothing has the uid ${uid}`)
        return found.id
      }
      const whole = { collection_id: collectionId, hookup_id: id }
      const { source, display } = hookup.question
      const role = (uid: Uid) =>
        uid === source.unit ? 'source' : uid === display.unit ? 'display' : 'box'
      await db('hookup_units').insert(
        hookup.units.map((u) => ({
          ...whole,
          unit_id: idOf(units, u.unit),
          part: role(u.unit),
          fingerprint: u.fingerprint,
        })),
      )
      const parts = hookup.parts.map((p) => ({
        ...whole,
        unit_id: idOf(units, p.unit),
        part: p.part,
        part_key: p.key,
      }))
      if (parts.length > 0) await db('hookup_unit_parts').insert(parts)
      const assumed = new Set(hookup.question.assumedLeads)
      const pieces = hookup.pieces.map((p) => ({
        ...whole,
        model_id: idOf(models, p.unit),
        model_home_key: models.get(p.unit)?.homeKey,
        copies: p.copies,
        is_assumed: assumed.has(p.unit),
        fingerprint: p.fingerprint,
      }))
      if (pieces.length > 0) await db('hookup_pieces').insert(pieces)
    },

    rename: (collectionId: number, where: At, title: string): Promise<boolean> =>
      write(at(collectionId, where).whereNull('deleted_at'), { title }, where.by),

    setDeleted: (collectionId: number, where: At, deleted: boolean): Promise<boolean> => {
      const query = at(collectionId, where)
      void (deleted ? query.whereNull('deleted_at') : query.whereNotNull('deleted_at'))
      return write(query, { deleted_at: deleted ? db.raw('current_timestamp(3)') : null }, where.by)
    },
  }
}
