import { setTimeout as wait } from 'node:timers/promises'
import type { Knex } from 'knex'
import { connectForMigration } from './connect'
import { migrationSource, type DatabaseSettings } from './knexfile'

const LOCK_TABLE = `
  create table if not exists migration_turns (
    id tinyint unsigned not null primary key
  ) engine=InnoDB default charset=utf8mb4 collate=utf8mb4_unicode_ci`

const PATIENCE_MS = 10 * 60_000
const BETWEEN_MS = 100

/** Waits for its turn. The turn is a row lock held by an open transaction, so it ends with its holder, however that ends. */
async function takeTurn(turn: Knex.Transaction): Promise<void> {
  const until = performance.now() + PATIENCE_MS
  for (;;) {
    // To skip what is locked rather than to wait for it: a wait would end in a broken transaction.
    const [mine] = (await turn('migration_turns')
      .select('id')
      .where({ id: 1 })
      .forUpdate()
      .skipLocked()) as { id: number }[]
    if (mine) return
    if (performance.now() > until)
      throw new Error('another process has been migrating for too long')
    await wait(BETWEEN_MS)
  }
}

async function makeTurn(db: Knex): Promise<void> {
  await db.raw(LOCK_TABLE)
  if (await db('migration_turns').first('id')) return
  await db.raw('insert ignore into migration_turns (id) values (1)')
}

async function migrateInTurn(db: Knex): Promise<string[]> {
  await makeTurn(db)
  return db.transaction(async (turn) => {
    await takeTurn(turn)
    // A run that was killed leaves Knex's own lock behind; whoever has the turn may take it away.
    await db.migrate.forceFreeMigrationsLock({ migrationSource })
    const [, done] = (await db.migrate.latest({ migrationSource })) as [number, string[]]
    return done
  })
}

/**
 * Brings the schema up to date. Any number of processes may call it at once: one works, the others
 * wait and then find nothing to do.
 */
export async function migrate(settings: DatabaseSettings): Promise<string[]> {
  const db = connectForMigration(settings)
  try {
    return await migrateInTurn(db)
  } finally {
    await db.destroy()
  }
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
