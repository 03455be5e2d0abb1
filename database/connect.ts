import knex, { type Knex } from 'knex'
import { knexConfig, type DatabaseSettings } from './knexfile'
import { sessionSettings } from './session-settings'

/** How long one statement may take: by our own clock, and by that of the server. */
interface Patience {
  readonly silenceMs: number
  readonly statementSeconds: number
}

/** A silent server is given up in time to answer a request within six seconds. */
const REQUESTS: Patience = { silenceMs: 5000, statementSeconds: 10 }

/** A large table may take its time to be rebuilt, and nobody waits for an answer. */
const MIGRATIONS: Patience = { silenceMs: 30 * 60_000, statementSeconds: 0 }

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
function limitSilence(connection: DriverConnection, silenceMs: number): void {
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
    return plain({ ...options, timeout: silenceMs } as { sql: string }, ...rest, watched)
  }
}

type Prepared = (error: Error | null, connection: unknown) => void

const prepare =
  ({ silenceMs, statementSeconds }: Patience) =>
  (connection: DriverConnection, done: Prepared): void => {
    // A lost server is reported by the statement that was under way; without a listener it would end the process.
    connection.on('error', () => undefined)
    connection.stream.on('error', () => undefined)
    limitSilence(connection, silenceMs)
    const settings = sessionSettings(statementSeconds)
    const next = (i: number): void => {
      const sql = settings[i]
      if (sql === undefined) {
        done(null, connection)
        return
      }
      connection.query(sql, (error: Error | null) => {
        if (!error) {
          next(i + 1)
          return
        }
        // The pool forgets a connection that could not be prepared, and would leave it open.
        connection.destroy()
        done(error, connection)
      })
    }
    next(0)
  }

const nothing = (): void => undefined

/** Whoever asked hears of a failed connection; the console need not. */
const QUIET = { warn: nothing, error: nothing, deprecate: nothing, debug: nothing }

function connect(settings: DatabaseSettings, patience: Patience): Knex {
  const config = knexConfig(settings)
  return knex({ ...config, log: QUIET, pool: { ...config.pool, afterCreate: prepare(patience) } })
}

/** A pool that connects when first asked, with the session settings on every connection. */
export const connectDatabase = (settings: DatabaseSettings): Knex => connect(settings, REQUESTS)

/** The same for work on the schema, which may take long. */
export const connectForMigration = (settings: DatabaseSettings): Knex =>
  connect(settings, MIGRATIONS)
