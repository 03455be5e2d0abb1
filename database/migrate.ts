import type { Knex } from 'knex'
import { migrationSource } from './knexfile'

const LOCK_TABLE = `
  create table if not exists migration_turns (
    id tinyint unsigned not null primary key
  ) engine=InnoDB default charset=utf8mb4 collate=utf8mb4_unicode_ci`

const PATIENCE_MS = 120_000
const LOCK_WAIT_TIMEOUT = 1205

const isLockTimeout = (error: unknown): boolean =>
  (error as { errno?: number }).errno === LOCK_WAIT_TIMEOUT

/**
 * Waits for its turn. The turn is a row lock held by an open transaction, so it ends with its holder,
 * however that ends.
 */
async function takeTurn(turn: Knex.Transaction): Promise<void> {
  const until = Date.now() + PATIENCE_MS
  for (;;) {
    try {
      await turn('migration_turns').select('id').where({ id: 1 }).forUpdate()
      return
    } catch (error) {
      if (!isLockTimeout(error) || Date.now() > until) throw error
    }
  }
}

/**
 * Brings the schema up to date. Any number of processes may call it at once: one works, the others
 * wait and then find nothing to do.
 */
export async function migrate(db: Knex): Promise<string[]> {
  await db.raw(LOCK_TABLE)
  await db.raw('insert ignore into migration_turns (id) values (1)')
  return db.transaction(async (turn) => {
    await takeTurn(turn)
    // A run that was killed leaves Knex's own lock behind; whoever has the turn may take it away.
    await db.migrate.forceFreeMigrationsLock({ migrationSource })
    const [, done] = (await db.migrate.latest({ migrationSource })) as [number, string[]]
    return done
  })
}

export const rollBackAll = async (db: Knex): Promise<void> => {
  await db.migrate.rollback({ migrationSource }, true)
}

/** Names of migrations that are known here and not yet in the database. */
export async function pendingMigrations(db: Knex): Promise<string[]> {
  const [, pending] = (await db.migrate.list({ migrationSource })) as [
    unknown[],
    { name: string }[],
  ]
  return pending.map((m) => m.name)
}
