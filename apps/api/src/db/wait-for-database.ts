import { setTimeout as wait } from 'node:timers/promises'
import type { Knex } from 'knex'
import type { Logger } from 'pino'
import { isDatabaseAway } from './translate-db-error'

const BETWEEN_MS = 500
const SAY_EVERY = 20

/** Server and database may be started in any order. */
export async function waitForDatabase(db: Knex, logger: Logger): Promise<void> {
  for (let tries = 0; ; tries += 1) {
    try {
      await db.raw('select 1')
      return
    } catch (error) {
      if (!isDatabaseAway(error)) throw error
      if (tries % SAY_EVERY === 0) logger.warn('waiting for the database')
      await wait(BETWEEN_MS)
    }
  }
}
