import {
  PAGE_DEFAULT,
  type ModelDetail,
  type ModelPage,
  type ModelQuery,
  type ModelRevision,
  type NewModel,
} from '@coaxwain/contract'
import type { Model } from '@coaxwain/models'
import { AppError, notFound } from '../app-error'
import type { Together } from '../db/transact'
import { isDuplicateOf } from '../db/translate-db-error'
import type { Scope } from '../http/call'
import { fingerprint } from '../uid'
import { mustHold, orLate, type At } from '../versioned'
import { toModelDetail, toModelSummary } from './mapper'
import { mustBearFittings, mustBeSound, mustKeepKeys } from './model-rules'
import type { ModelRow, ModelsRepository } from './repository'

export type ModelsService = ReturnType<typeof createModelsService>

/** Revisions never change, so they may be kept; the least recently made go first. */
const MOST_KEPT = 2000

export interface RevisionRef {
  readonly id: number
  readonly revision: number
}

const refKey = ({ id, revision }: RevisionRef): string => `${id}:${revision}`

export function createModelsService(models: ModelsRepository, inOne: Together<ModelsRepository>) {
  const kept = new Map<string, Model>()

  const documents = async (refs: readonly RevisionRef[]): Promise<ReadonlyMap<string, Model>> => {
    const missing = new Map(refs.filter((r) => !kept.has(refKey(r))).map((r) => [refKey(r), r]))
    const found = await models.documents([...missing.values()])
    for (const [key, document] of found) kept.set(key, document)
    const wanted = new Map(
      refs.flatMap((r) => {
        const document = kept.get(refKey(r))
        return document ? [[refKey(r), document] as const] : []
      }),
    )
    for (const key of kept.keys()) {
      if (kept.size <= MOST_KEPT) break
      kept.delete(key)
    }
    return wanted
  }

  const documentOf = async (ref: RevisionRef): Promise<Model> => {
    const document = (await documents([ref])).get(refKey(ref))
    if (!document) throw new Error(`model ${ref.id} has no revision ${ref.revision}`)
    return document
  }

  const facetsOf = async (scope: Scope, row: ModelRow) => {
    const facets = (await models.facets(scope.collectionId, [row.id])).get(row.id)
    if (!facets) throw new Error(`no facets of model ${row.id}`)
    return facets
  }

  const detail = async (scope: Scope, row: ModelRow): Promise<ModelDetail> =>
    toModelDetail(row, await facetsOf(scope, row), await documentOf(row))

  /** Deleted own models can still be looked at, to bring them back. */
  const find = async (scope: Scope, uid: string): Promise<ModelRow> => {
    const row = await models.find(scope.collectionId, uid)
    if (!row) throw notFound()
    return row
  }

  const read = async (scope: Scope, uid: string): Promise<ModelDetail> =>
    detail(scope, await find(scope, uid))

  /** Shared models are nobody's to change from inside a collection. */
  const findOwn = async (scope: Scope, uid: string): Promise<ModelRow> => {
    const row = await find(scope, uid)
    if (row.homeKey === 0) throw new AppError('forbidden')
    return row
  }

  const mustStand = (row: ModelRow): ModelRow => {
    if (row.deletedAt) throw notFound()
    return row
  }

  return {
    documents,
    refKey,

    /** The model for a new unit or a filter, or null. */
    async findRef(scope: Scope, uid: string): Promise<ModelRow | null> {
      const row = await models.find(scope.collectionId, uid)
      return row && !row.deletedAt ? row : null
    },

    /** Leads and adapters by uid: any of them may be taken as being in the drawer. */
    async pieces(scope: Scope): Promise<Map<string, Model>> {
      const rows = await models.pieces(scope.collectionId)
      const found = await documents(rows)
      return new Map(
        rows.flatMap((row) => {
          const document = found.get(refKey(row))
          return document ? [[row.uid, document] as const] : []
        }),
      )
    },

    async list(scope: Scope, query: ModelQuery): Promise<ModelPage> {
      const { cursor, limit = PAGE_DEFAULT, sort = 'maker', ...filters } = query
      const page = await models.list(scope.collectionId, filters, { sort, limit, cursor })
      const ids = page.items.map((r) => r.id)
      const facets = await models.facets(scope.collectionId, ids)
      const items = page.items.flatMap((row) => {
        const found = facets.get(row.id)
        return found ? [toModelSummary(row, found)] : []
      })
      return { items, next: page.next, total: page.total }
    },

    read,

    async readRevision(scope: Scope, uid: string, revision: number): Promise<ModelRevision> {
      const row = await find(scope, uid)
      const found = await models.revision(row.id, revision)
      if (!found) throw notFound()
      return {
        model: uid,
        revision,
        document: found.document,
        madeAt: found.madeAt.toISOString(),
      }
    },

    async create(scope: Scope, uid: string, wish: NewModel): Promise<ModelDetail> {
      mustBeSound(wish.document)
      const madeFrom = fingerprint(wish.document)
      const home = scope.collectionId
      try {
        await inOne(async (repository) => {
          await repository.bumpShelf(home)
          if (await repository.find(home, uid)) throw new AppError('uid-taken')
          const by = scope.person.id
          await repository.insert({ uid, home, document: wish.document, madeFrom, by })
        })
      } catch (error) {
        const taken = error instanceof AppError && error.code === 'uid-taken'
        if (!taken && !isDuplicateOf(error, 'models_uid')) throw error
        const there = await models.find(home, uid)
        if (there?.madeFrom !== madeFrom) throw new AppError('uid-taken')
      }
      return read(scope, uid)
    },

    async change(scope: Scope, at: At, document: Model): Promise<ModelDetail> {
      mustBeSound(document)
      const row = mustStand(await findOwn(scope, at.uid))
      const before = await documentOf(row)
      const edit = async (repository: ModelsRepository): Promise<void> => {
        await repository.bumpShelf(scope.collectionId)
        const units = (await repository.unitCounts(scope.collectionId, row.id)).all
        if (before.type !== document.type && units > 0) {
          throw new AppError('model-in-use', { details: { units } })
        }
        const used = await repository.keysInUse(scope.collectionId, row.id)
        const ever = await repository.keysEver(row.id)
        const fittings = await repository.modificationsOfUnits(scope.collectionId, row.id)
        const target = { id: row.id, version: at.version }
        mustHold(await repository.update(scope.collectionId, target, document, scope.person.id))
        mustKeepKeys(before, document, used, ever)
        mustBearFittings(document, fittings)
      }
      await orLate(
        () => inOne(edit),
        () => read(scope, at.uid),
      )
      return read(scope, at.uid)
    },

    async remove(scope: Scope, at: At): Promise<void> {
      const row = mustStand(await findOwn(scope, at.uid))
      const remove = async (repository: ModelsRepository): Promise<void> => {
        await repository.bumpShelf(scope.collectionId)
        const units = (await repository.unitCounts(scope.collectionId, row.id)).standing
        if (units > 0) throw new AppError('model-in-use', { details: { units } })
        const target = { id: row.id, version: at.version }
        mustHold(await repository.setDeleted(scope.collectionId, target, true, scope.person.id))
      }
      await orLate(
        () => inOne(remove),
        () => read(scope, at.uid),
      )
    },

    async restore(scope: Scope, at: At): Promise<ModelDetail> {
      const row = await findOwn(scope, at.uid)
      const restore = async (repository: ModelsRepository): Promise<void> => {
        await repository.bumpShelf(scope.collectionId)
        const target = { id: row.id, version: at.version }
        mustHold(await repository.setDeleted(scope.collectionId, target, false, scope.person.id))
      }
      await orLate(
        () => inOne(restore),
        () => read(scope, at.uid),
      )
      return read(scope, at.uid)
    },
  }
}
