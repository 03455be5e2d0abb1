import {
  PAGE_DEFAULT,
  type HookupDetail,
  type HookupPage,
  type HookupQuery,
  type NewHookup,
} from '@coaxwain/contract'
import type { Hookup, Question, Snapshot } from '@coaxwain/shelf'
import { questionMustFit, type Checker } from '../answers/service'
import { AppError, notFound } from '../app-error'
import type { Together } from '../db/transact'
import { isDuplicateOf } from '../db/translate-db-error'
import type { Scope } from '../http/call'
import type { SnapshotService } from '../snapshot/service'
import { fingerprint } from '../uid'
import { mustHold, orLate, type At } from '../versioned'
import {
  hookupMustFit,
  pieceFingerprint,
  standing,
  unitFingerprint,
  usedParts,
  usedPieces,
  usedUnits,
} from './bearing'
import { toHookupDetail, toHookupSummary } from './mapper'
import type { HookupRow, HookupsRepository } from './repository'

export type HookupsService = ReturnType<typeof createHookupsService>

interface Needs {
  readonly hookups: HookupsRepository
  readonly inOne: Together<HookupsRepository>
  readonly snapshots: SnapshotService
  readonly checkHookup: Checker
}

function bearingsOf(snapshot: Snapshot, question: Question, hookup: Hookup) {
  const byUid = new Map(snapshot.units.map((u) => [u.uid, u]))
  return {
    units: usedUnits(question, hookup).flatMap((uid) => {
      const unit = byUid.get(uid)
      return unit ? [{ unit: uid, fingerprint: unitFingerprint(snapshot, unit, hookup) }] : []
    }),
    parts: usedParts(hookup),
    pieces: [...usedPieces(hookup)].map(([model, copies]) => ({
      unit: model,
      copies,
      fingerprint: pieceFingerprint(snapshot, model),
    })),
  }
}

export function createHookupsService({ hookups, inOne, snapshots, checkHookup }: Needs) {
  const standings = async (scope: Scope, rows: readonly HookupRow[]) => {
    const [snapshot, bearings] = await Promise.all([
      snapshots.read(scope),
      hookups.bearings(
        scope.collectionId,
        rows.map((r) => r.id),
      ),
    ])
    return (row: HookupRow) =>
      standing(snapshot, {
        question: row.question,
        hookup: row.hookup,
        ...(bearings.get(row.id) ?? { units: [], pieces: [] }),
      })
  }

  /** Whatever a client sends is judged like an answer of our own. */
  const mustPassCheck = (snapshot: Snapshot, { question, hookup }: NewHookup): void => {
    const { ok, findings } = checkHookup(snapshot, question, hookup)
    if (ok) return
    throw new AppError('hookup-refused', {
      errors: findings.map((f) => ({
        path: 'hookup',
        code: 'check-failed',
        details: { name: f.code },
      })),
    })
  }

  const find = async (scope: Scope, uid: string): Promise<HookupRow> => {
    const row = await hookups.find(scope.collectionId, uid)
    if (!row) throw notFound()
    return row
  }

  const read = async (scope: Scope, uid: string): Promise<HookupDetail> => {
    const row = await find(scope, uid)
    return toHookupDetail(row, (await standings(scope, [row]))(row))
  }

  const edit = async (
    scope: Scope,
    at: At,
    job: (repository: HookupsRepository, by: number) => Promise<boolean>,
  ): Promise<void> => {
    await find(scope, at.uid)
    await orLate(
      () => inOne(async (repository) => mustHold(await job(repository, scope.person.id))),
      () => read(scope, at.uid),
    )
  }

  return {
    read,

    async list(scope: Scope, query: HookupQuery): Promise<HookupPage> {
      const { cursor, limit = PAGE_DEFAULT, sort = '-saved', ...filters } = query
      const page = await hookups.list(scope.collectionId, filters, { sort, limit, cursor })
      const now = await standings(scope, page.items)
      return {
        items: page.items.map((row) => toHookupSummary(row, now(row))),
        next: page.next,
        total: page.total,
      }
    },

    async save(scope: Scope, uid: string, wish: NewHookup): Promise<HookupDetail> {
      const { uid: _, ...content } = wish
      const madeFrom = fingerprint(content)
      const again = await hookups.find(scope.collectionId, uid)
      if (again) {
        if (again.madeFrom !== madeFrom) throw new AppError('uid-taken')
        return read(scope, uid)
      }
      const snapshot = await snapshots.read(scope)
      questionMustFit(snapshot, wish.question)
      hookupMustFit(snapshot, wish.hookup)
      mustPassCheck(snapshot, wish)
      const row = {
        uid,
        title: wish.title,
        question: wish.question,
        hookup: wish.hookup,
        madeFrom,
        by: scope.person.id,
        ...bearingsOf(snapshot, wish.question, wish.hookup),
      }
      try {
        await inOne((repository) => repository.insert(scope.collectionId, row))
      } catch (error) {
        if (!isDuplicateOf(error, 'hookups_uid')) throw error
        const there = await hookups.find(scope.collectionId, uid)
        if (there?.madeFrom !== madeFrom) throw new AppError('uid-taken')
      }
      return read(scope, uid)
    },

    async rename(scope: Scope, at: At, title: string): Promise<HookupDetail> {
      if ((await find(scope, at.uid)).deletedAt) throw notFound()
      await edit(scope, at, (repository, by) =>
        repository.rename(scope.collectionId, { ...at, by }, title),
      )
      return read(scope, at.uid)
    },

    async remove(scope: Scope, at: At): Promise<void> {
      if ((await find(scope, at.uid)).deletedAt) throw notFound()
      await edit(scope, at, (repository, by) =>
        repository.setDeleted(scope.collectionId, { ...at, by }, true),
      )
    },

    async restore(scope: Scope, at: At): Promise<HookupDetail> {
      await edit(scope, at, (repository, by) =>
        repository.setDeleted(scope.collectionId, { ...at, by }, false),
      )
      return read(scope, at.uid)
    },
  }
}
