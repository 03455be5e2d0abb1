import type { Knex } from 'knex'

/**
 * First statement of everything that changes what an answer may rest on. It also queues the writers
 * of one collection, always in this order, so that they do not deadlock.
 */
export const bumpShelf = async (trx: Knex, collectionId: number): Promise<void> => {
  await trx('collections').where({ id: collectionId }).increment('shelf_version', 1)
}

export const versionsOf = async (
  db: Knex,
  collectionId: number,
): Promise<{ shelfVersion: number; catalogueVersion: number }> => {
  const row = (await db('collections')
    .join('catalogue', 'catalogue.id', db.raw('1'))
    .where('collections.id', collectionId)
    .first('collections.shelf_version as shelf', 'catalogue.version as catalogue')) as
    { shelf: number; catalogue: number } | undefined
  if (!row) throw new Error(`no collection ${collectionId}`)
  return { shelfVersion: row.shelf, catalogueVersion: row.catalogue }
}
