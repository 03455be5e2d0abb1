import { AppError } from '../app-error'

/** Driver and server numbers; names are wrong for numbers of MariaDB's own. */
const DUPLICATE = 1062
const ROW_CHANGED_SINCE = 1020
const LOCK_TIMEOUT = 1205
const DEADLOCK = 1213
const STATEMENT_TIMEOUT = 1969
/** Too many connections, shutdown in progress, connection killed. */
const SERVER_AWAY: readonly number[] = [1040, 1053, 1927, 1129]

const CONNECTION_CODES: readonly string[] = [
  'ECONNREFUSED',
  'ECONNRESET',
  'ETIMEDOUT',
  'EPIPE',
  'ENOENT',
  'PROTOCOL_CONNECTION_LOST',
  'PROTOCOL_SEQUENCE_TIMEOUT',
  'PROTOCOL_PACKETS_OUT_OF_ORDER',
]
const CONNECTION_WORDS = /closed state|Unable to acquire a connection|Timeout acquiring|aborted/

interface DriverError {
  readonly errno?: number
  readonly code?: string
  readonly name?: string
  readonly message?: string
  readonly fatal?: boolean
}

const errnoOf = (error: unknown): number => (error as DriverError).errno ?? 0

/** Losing a race that is worth running again from the start. */
export const isRaceLost = (error: unknown): boolean =>
  [ROW_CHANGED_SINCE, LOCK_TIMEOUT, DEADLOCK].includes(errnoOf(error))

/** A row with that key is already there; `index` is one of our own names. */
export const isDuplicateOf = (error: unknown, index: string): boolean =>
  errnoOf(error) === DUPLICATE && ((error as DriverError).message ?? '').includes(`'${index}'`)

export function isDatabaseAway(error: unknown): boolean {
  const { code, name, message, fatal, errno } = error as DriverError
  return (
    CONNECTION_CODES.includes(code ?? '') ||
    SERVER_AWAY.includes(errno ?? 0) ||
    name === 'KnexTimeoutError' ||
    (fatal === true && code !== undefined) ||
    CONNECTION_WORDS.test(message ?? '')
  )
}

/** The only reader of driver errors. What it does not know stays what it is, and ends as a bland 500. */
export function translateDbError(error: unknown): unknown {
  if (error instanceof AppError || !(error instanceof Error)) return error
  if (isDatabaseAway(error)) {
    return new AppError('database-unavailable', { retryAfterSeconds: 5, cause: error })
  }
  switch (errnoOf(error)) {
    case ROW_CHANGED_SINCE:
    case DEADLOCK:
      return new AppError('edited-meanwhile', { cause: error })
    case LOCK_TIMEOUT:
    case STATEMENT_TIMEOUT:
      return new AppError('busy', { retryAfterSeconds: 5, cause: error })
    default:
      return error
  }
}
