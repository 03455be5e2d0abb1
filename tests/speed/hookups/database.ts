import type { Knex } from 'knex'
import { DISPLAY, START, type ArcMap } from '@coaxwain/matcher'
import { LIMITS } from '@coaxwain/shelf'
import {
  createTestDatabase,
  settingsOf,
  startTestServer,
  stopTestServer,
} from '../../support/database'
import { costOf } from './graph'

/** Rows sent at once. */
const CHUNK = 2000
/** Into each box, out of the source and into the display. */
const MOST_HOPS = LIMITS.boxesInLeg + 2
/** For a million arcs and more, with their index. */
const ROOM_BYTES = 1 << 30
/** Before the driver gives a silent server up. */
const PATIENCE_SECONDS = 4

/**
 * In how few hops the display is reached, by one recursive query over indexed joins. Costs along the way would
 * make every path a row of its own, which no server finishes.
 */
const QUERY = `
  with recursive reached (node, hops) as (
    select ?, 0
    union distinct
    select arcs.to_node, reached.hops + 1
    from reached join arcs on arcs.from_node = reached.node
    where reached.hops < ?
  )
  select min(hops) as hops from reached where node = ?`

export interface DatabaseRun {
  readonly ms: number
  /** It took longer than anybody would wait, and was stopped. */
  readonly stopped: boolean
}

/** Asks a MariaDB of its own the same questions, by the same arcs. */
export async function askDatabase(maps: readonly ArcMap[]): Promise<DatabaseRun[]> {
  const server = await startTestServer()
  const db = await createTestDatabase(settingsOf(server), 'coaxwain_speed')
  try {
    const runs: DatabaseRun[] = []
    // One connection for each, since it keeps the room that its table in memory may take.
    for (const map of maps) runs.push(await db.transaction((trx) => ask(trx, map)))
    return runs
  } finally {
    await db.destroy()
    await stopTestServer(server)
  }
}

async function ask(db: Knex, { arcs }: ArcMap): Promise<DatabaseRun> {
  await db.raw('set session max_heap_table_size = ?', [ROOM_BYTES])
  await db.raw('drop table if exists arcs')
  await db.raw(`create table arcs (
    from_node int unsigned not null, to_node int unsigned not null, cost int unsigned not null,
    key (from_node, to_node, cost)) engine = memory`)
  for (let i = 0; i < arcs.length; i += CHUNK) {
    await db('arcs').insert(
      arcs
        .slice(i, i + CHUNK)
        .map((arc) => ({ from_node: arc.from, to_node: arc.to, cost: costOf(arc) })),
    )
  }
  const start = performance.now()
  const stopped = await db
    .raw(`set statement max_statement_time = ${PATIENCE_SECONDS} for ${QUERY}`, [
      START,
      MOST_HOPS,
      DISPLAY,
    ])
    .then(() => false)
    .catch((error: unknown) => {
      if ((error as { errno?: number }).errno === STATEMENT_TIMEOUT) return true
      throw error
    })
  return { ms: performance.now() - start, stopped }
}

const STATEMENT_TIMEOUT = 1969
