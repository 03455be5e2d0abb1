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

interface Versions {
  readonly shelfVersion: number
  readonly catalogueVersion: number
}

const same = (a: Versions, b: Versions): boolean =>
  a.shelfVersion === b.shelfVersion && a.catalogueVersion === b.catalogueVersion

export function createSnapshotService({ versions, units, models }: Needs) {
  /** Keyed by collection and versions, so that no process can hold a stale one. */
  const kept = new Map<string, Snapshot>()
  /** Whoever asks for one that is being put together waits for that. */
  const underWay = new Map<string, Promise<Snapshot | null>>()

  const keep = (key: string, snapshot: Snapshot): Snapshot => {
    kept.set(key, snapshot)
    for (const oldest of kept.keys()) {
      if (kept.size <= MOST_KEPT) break
      kept.delete(oldest)
    }
    return snapshot
  }

  /** Null when something moved meanwhile: every write bumps a version. */
  const build = async (scope: Scope, at: Versions, key: string): Promise<Snapshot | null> => {
    const [shelf, pieces] = await Promise.all([units.everything(scope), models.pieces(scope)])
    if (!same(at, await versions.versions(scope.collectionId))) return null
    return keep(key, {
      ...at,
      models: Object.fromEntries([...pieces, ...shelf.models]),
      units: shelf.units,
    })
  }

  const read = async (scope: Scope): Promise<Snapshot> => {
    for (let tries = 0; tries < TRIES; tries += 1) {
      const at = await versions.versions(scope.collectionId)
      const key = `${scope.collectionId} ${snapshotEtag(at.shelfVersion, at.catalogueVersion)}`
      const known = kept.get(key)
      if (known) return known
      const running = underWay.get(key) ?? build(scope, at, key).finally(() => underWay.delete(key))
      underWay.set(key, running)
      const found = await running
      if (found) return found
    }
    throw new AppError('busy', { retryAfterSeconds: 1 })
  }

  return {
    read,

    async etag(scope: Scope): Promise<string> {
      const now = await versions.versions(scope.collectionId)
      return snapshotEtag(now.shelfVersion, now.catalogueVersion)
    },
  }
}
