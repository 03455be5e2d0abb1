import knex, { type Knex } from 'knex'
import { knexConfig, type DatabaseSettings } from './knexfile'
import { SESSION_SETTINGS } from './session-settings'

/** A silent server is given up after this long; a request must be answered within six seconds. */
const SILENCE_MS = 5000

type Callback = (error: Error | null, ...rest: unknown[]) => void

/** The parts of the driver's connection that are used here. */
interface DriverConnection {
  query(sql: string | { sql: string }, ...rest: unknown[]): unknown
  destroy(): void
  on(event: 'error', listener: () => void): void
  stream: { on(event: 'error', listener: () => void): void }
}

/**
 * Every statement gets a time limit. When it passes, the connection is thrown away: an answer that
 * comes later would be taken for that of the next statement.
 */
function limitSilence(connection: DriverConnection): void {
  const plain = connection.query.bind(connection)
  connection.query = (sql, ...rest) => {
    const options = typeof sql === 'string' ? { sql } : sql
    const callback = rest.pop()
    if (typeof callback !== 'function') {
      return plain(options, ...rest, ...(callback === undefined ? [] : [callback]))
    }
    const watched: Callback = (error, ...results) => {
      if (error && (error as { code?: string }).code === 'PROTOCOL_SEQUENCE_TIMEOUT') {
        connection.destroy()
      }
      ;(callback as Callback)(error, ...results)
    }
    return plain({ ...options, timeout: SILENCE_MS } as { sql: string }, ...rest, watched)
  }
}

function prepare(connection: DriverConnection, done: (error: Error | null, c: unknown) => void) {
  // A lost server is reported by the statement that was under way; without a listener it would end the process.
  connection.on('error', () => undefined)
  connection.stream.on('error', () => undefined)
  limitSilence(connection)
  const next = (i: number): void => {
    const sql = SESSION_SETTINGS[i]
    if (sql === undefined) {
      done(null, connection)
      return
    }
    connection.query(sql, (error: Error | null) => {
      if (error) done(error, connection)
      else next(i + 1)
    })
  }
  next(0)
}

const nothing = (): void => undefined

/** Whoever asked hears of a failed connection; the console need not. */
const QUIET = { warn: nothing, error: nothing, deprecate: nothing, debug: nothing }

/** A pool that connects when first asked, with the session settings on every connection. */
export function connectDatabase(settings: DatabaseSettings): Knex {
  const config = knexConfig(settings)
  return knex({ ...config, log: QUIET, pool: { ...config.pool, afterCreate: prepare } })
}
