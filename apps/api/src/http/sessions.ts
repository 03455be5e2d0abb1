import type { Mode } from '@coaxwain/contract'
import type { RequestHandler } from 'express'
import session, { type Store } from 'express-session'
import { randomBytes } from 'node:crypto'
import type { Authenticator } from './sign-in'

const IDLE_MS = 24 * 60 * 60 * 1000
const ABSOLUTE_MS = 30 * 24 * 60 * 60 * 1000
const ID_BYTES = 32

/** Over plain HTTP a browser refuses names and flags that stand for TLS. */
export const cookieName = (mode: Mode): string =>
  mode === 'server' ? '__Host-coaxwain' : 'coaxwain'

export interface SessionNeeds {
  readonly mode: Mode
  readonly secret: string
  readonly store: Store
  readonly authenticator: Authenticator
}

/** A session in which somebody is signed in and that does not know since when counts as too old. */
const endTooOld: RequestHandler = (req, _res, next) => {
  const { passport, startedAt = 0 } = req.session
  if (passport === undefined || Date.now() - startedAt < ABSOLUTE_MS) next()
  else req.session.regenerate(next)
}

/** Idle limit by the stored expiry, moved on with each request; absolute limit by the start. */
export const sessions = ({
  mode,
  secret,
  store,
  authenticator,
}: SessionNeeds): RequestHandler[] => [
  session({
    name: cookieName(mode),
    secret,
    store,
    genid: () => randomBytes(ID_BYTES).toString('base64url'),
    resave: false,
    saveUninitialized: false,
    rolling: true,
    unset: 'keep',
    cookie: {
      httpOnly: true,
      sameSite: 'lax',
      path: '/',
      secure: mode === 'server',
      maxAge: IDLE_MS,
    },
  }),
  endTooOld,
  authenticator.session() as RequestHandler,
]
