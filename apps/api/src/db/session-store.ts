import { ConnectSessionKnexStore } from 'connect-session-knex'
import { Store, type SessionData } from 'express-session'
import type { Knex } from 'knex'

type Done = (error?: unknown) => void

const CLEAN_EVERY_MS = 15 * 60_000

/**
 * Sessions in the database. The store underneath both calls back and throws, and forgets to call back
 * when a touch fails; here every outcome is told exactly once.
 */
export class SessionStore extends Store {
  readonly #inner: ConnectSessionKnexStore

  constructor(db: Knex, onCleanUpError: (error: unknown) => void) {
    super()
    this.#inner = new ConnectSessionKnexStore({
      knex: db,
      tableName: 'sessions',
      createTable: false,
      cleanupInterval: CLEAN_EVERY_MS,
      onDbCleanupError: onCleanUpError,
    })
  }

  override get(sid: string, done: (error: unknown, session?: SessionData | null) => void): void {
    this.#inner
      .get(sid, () => undefined)
      .then(
        (session: unknown) => done(null, session as SessionData | null),
        (error: unknown) => done(error),
      )
  }

  override set(sid: string, session: SessionData, done: Done = () => undefined): void {
    this.#inner.set(sid, session).then(() => done(), done)
  }

  override touch(sid: string, session: SessionData, done: Done = () => undefined): void {
    this.#inner.touch(sid, session).then(() => done(), done)
  }

  override destroy(sid: string, done: Done = () => undefined): void {
    this.#inner.destroy(sid).then(() => done(), done)
  }
}
