import type { Knex } from 'knex'
import { MIGRATIONS } from './migrations/index'
import type { Migration } from './migrations/migration'

export interface DatabaseSettings {
  readonly host: string
  readonly port: number
  readonly user: string
  readonly password: string
  readonly database: string
}

export const migrationSource: Knex.MigrationSource<Migration> = {
  getMigrations: () => Promise.resolve([...MIGRATIONS]),
  getMigrationName: (migration) => migration.name,
  getMigration: (migration) => Promise.resolve({ up: migration.up, down: migration.down }),
}

export const CONNECT_MS = 5000

export const knexConfig = (settings: DatabaseSettings): Knex.Config => ({
  client: 'mysql2',
  connection: {
    ...settings,
    timezone: 'Z',
    connectTimeout: CONNECT_MS,
    supportBigNumbers: true,
    // Knex's types know the boolean only; the driver takes a list.
    dateStrings: ['DATE'] as unknown as boolean,
  },
  pool: { min: 0, max: 10, idleTimeoutMillis: 30_000 },
  acquireConnectionTimeout: CONNECT_MS,
  migrations: { migrationSource, tableName: 'migrations', disableTransactions: true },
})
