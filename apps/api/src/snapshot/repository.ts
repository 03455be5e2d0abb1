import type { Knex } from 'knex'
import { versionsOf } from '../db/versions'

export type SnapshotRepository = ReturnType<typeof createSnapshotRepository>

export const createSnapshotRepository = (db: Knex) => ({
  versions: (collectionId: number) => versionsOf(db, collectionId),
})
