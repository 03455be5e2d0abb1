import { snapshotEtag } from '@coaxwain/contract'
import type { Snapshot } from '@coaxwain/shelf'
import { AppError } from '../app-error'
import type { Scope } from '../http/call'
import type { ModelsService } from '../models/service'
import type { UnitsService } from '../units/service'
import type { SnapshotRepository } from './repository'

export type SnapshotService = ReturnType<typeof createSnapshotService>

interface Needs {
  readonly versions: SnapshotRepository
  readonly units: UnitsService
  readonly models: ModelsService
}

const MOST_KEPT = 20
const TRIES = 5

const same = (
  a: { shelfVersion: number; catalogueVersion: number },
  b: { shelfVersion: number; catalogueVersion: number },
): boolean => a.shelfVersion === b.shelfVersion && a.catalogueVersion === b.catalogueVersion

export function createSnapshotService({ versions, units, models }: Needs) {
  /** Keyed by collection and versions, so that no process can hold a stale one. */
  const kept = new Map<string, Snapshot>()

  const build = async (scope: Scope): Promise<Snapshot> => {
    for (let tries = 0; tries < TRIES; tries += 1) {
      const before = await versions.versions(scope.collectionId)
      const key = `${scope.collectionId} ${snapshotEtag(before.shelfVersion, before.catalogueVersion)}`
      const known = kept.get(key)
      if (known) return known
      const [shelf, pieces] = await Promise.all([units.everything(scope), models.pieces(scope)])
      // Every write bumps a version, so equal versions before and after mean that nothing moved between.
      if (!same(before, await versions.versions(scope.collectionId))) continue
      const found: Snapshot = {
        ...before,
        models: Object.fromEntries([...pieces, ...shelf.models]),
        units: shelf.units,
      }
      kept.set(key, found)
      for (const oldest of kept.keys()) {
        if (kept.size <= MOST_KEPT) break
        kept.delete(oldest)
      }
      return found
    }
    throw new AppError('busy', { retryAfterSeconds: 1 })
  }

  return {
    read: build,

    async etag(scope: Scope): Promise<string> {
      const now = await versions.versions(scope.collectionId)
      return snapshotEtag(now.shelfVersion, now.catalogueVersion)
    },
  }
}
