import type { Knex } from 'knex'
import { afterAll, beforeAll, beforeEach, inject } from 'vitest'
import type { Client } from './client'
import { checksum, createTestDatabase, emptyMoving, emptyTables } from './database'
import { startApi, type RunningApi } from './server'
import { makeWorld, signIn, type Who } from './world'

export interface Rig {
  readonly db: Knex
  readonly api: RunningApi
  /** Signed in once in a test, and kept. */
  as(who: Who): Promise<Client>
}

/** A database for the file, an application on it, and the same small world before each test. */
export function useRig(choices: Parameters<typeof startApi>[1] = {}): Rig {
  let db: Knex
  let api: RunningApi
  const clients = new Map<Who, Promise<Client>>()

  beforeAll(async () => {
    const worker = process.env['VITEST_POOL_ID'] ?? '1'
    db = await createTestDatabase(inject('database'), `coaxwain_${process.pid}_${worker}`)
    api = await startApi(db, choices)
  })

  let world = ''

  beforeEach(async () => {
    await emptyMoving(db)
    if ((await checksum(db)) !== world) {
      await emptyTables(db)
      await makeWorld(db)
      world = await checksum(db)
    }
    clients.clear()
  })

  afterAll(async () => {
    await api.stop()
    await db.destroy()
  })

  return {
    get db() {
      return db
    },
    get api() {
      return api
    },
    as(who) {
      const known = clients.get(who) ?? signIn(api.address, who)
      clients.set(who, known)
      return known
    },
  }
}
