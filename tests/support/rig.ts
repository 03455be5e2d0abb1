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

interface Keeping {
  /** People stay signed in from test to test, as long as nobody has changed the world or signed in or out. */
  readonly signedIn?: boolean
}

/** A database for the file, an application on it, and the same small world before each test. */
export function useRig(
  choices: Parameters<typeof startApi>[1] = {},
  { signedIn = false }: Keeping = {},
): Rig {
  let db: Knex
  let api: RunningApi
  const clients = new Map<Who, Promise<Client>>()

  beforeAll(async () => {
    const worker = process.env['VITEST_POOL_ID'] ?? '1'
    db = await createTestDatabase(inject('database'), `coaxwain_${process.pid}_${worker}`)
    api = await startApi(db, choices)
  })

  let world = ''

  const isUntouched = async (): Promise<boolean> => {
    const sessions = await db('sessions').count<[{ n: number }]>('* as n')
    return (await checksum(db)) === world && (!signedIn || sessions[0]?.n === clients.size)
  }

  beforeEach(async () => {
    const untouched = await isUntouched()
    if (untouched && signedIn) return
    clients.clear()
    await emptyMoving(db)
    if (untouched) return
    await emptyTables(db)
    await makeWorld(db)
    world = await checksum(db)
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
