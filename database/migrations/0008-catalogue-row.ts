import type { Migration } from './migration'

export const catalogueRow: Migration = {
  name: '0008-catalogue-row',
  async up(db) {
    await db.raw('insert ignore into catalogue (id, version) values (1, 1)')
  },
  async down(db) {
    await db.raw('delete from catalogue')
  },
}
