import { pendingMigrations } from '@coaxwain/database'
import type { Knex } from 'knex'

export type HealthRepository = ReturnType<typeof createHealthRepository>

export const createHealthRepository = (db: Knex) => ({
  async answers(): Promise<boolean> {
    await db.raw('select 1')
    return true
  },
  pendingMigrations: (): Promise<string[]> => pendingMigrations(db),
})
