import { setTimeout as wait } from 'node:timers/promises'
import type { Knex } from 'knex'
import { isRaceLost } from './translate-db-error'

const RETRIES = 3
const LEAST_WAIT_MS = 20
const MOST_WAIT_MS = 200
/** Whoever waits for the answer has gone by then. */
const PATIENCE_MS = 4000

/**
 * Runs a job in a transaction. When it loses a race the whole job runs again on fresh data, so it
 * must do nothing but talk to its transaction. A commit that fails is never repeated.
 */
export async function transact<T>(
  db: Knex,
  job: (trx: Knex.Transaction) => Promise<T>,
): Promise<T> {
  const start = performance.now()
  for (let tries = 0; ; tries += 1) {
    try {
      return await db.transaction(job)
    } catch (error) {
      const late = performance.now() - start > PATIENCE_MS
      if (!isRaceLost(error) || tries >= RETRIES || late) throw error
      await wait(LEAST_WAIT_MS + Math.random() * (MOST_WAIT_MS - LEAST_WAIT_MS))
    }
  }
}

/** How services get several statements done together without knowing of transactions. */
export type Together<Repository> = <T>(job: (repository: Repository) => Promise<T>) => Promise<T>

export const together =
  <Repository>(db: Knex, create: (trx: Knex) => Repository): Together<Repository> =>
  (job) =>
    transact(db, (trx) => job(create(trx)))
