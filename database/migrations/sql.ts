import type { Knex } from 'knex'
import type { Migration } from './migration'

/** Letters that are compared as they stand: ids and keys. */
export const CODE = 'character set ascii collate ascii_bin'

export const TABLE_END = 'engine=InnoDB default charset=utf8mb4 collate=utf8mb4_unicode_ci'

/**
 * Tables made in order and dropped in the opposite one. Each statement may be repeated, because the
 * engine commits after each, and a killed run begins again.
 */
export const tables = (name: string, wanted: Readonly<Record<string, string>>): Migration => ({
  name,
  async up(db: Knex) {
    for (const [table, columns] of Object.entries(wanted)) {
      await db.raw(`create table if not exists ${table} (${columns}) ${TABLE_END}`)
    }
  },
  async down(db: Knex) {
    for (const table of Object.keys(wanted).reverse()) {
      await db.raw(`drop table if exists ${table}`)
    }
  },
})
