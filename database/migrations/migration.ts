import type { Knex } from 'knex'

/** One migration as Knex runs it; the name has no file ending, so that source and bundle agree on it. */
export interface Migration {
  readonly name: string
  readonly up: (db: Knex) => Promise<void>
  readonly down: (db: Knex) => Promise<void>
}
