import { API_ROOT, type Mode } from '@coaxwain/contract'
import compression from 'compression'
import express, { type Express } from 'express'
import type { Logger } from 'pino'
import type { Services } from './compose'
import { deadline } from './http/deadline'
import { errorHandler, unknownAddress } from './http/error-handler'
import { apiExplorer } from './http/explorer'
import { healthRoutes } from './http/health-routes'
import { mountRoutes } from './http/mount'
import { requestLog } from './http/request-log'
import { sameSiteOnly } from './http/same-site'
import { securityHeaders } from './http/security-headers'
import { cookieName, sessions } from './http/sessions'
import { createAuthenticator } from './http/sign-in'
import { staticClient } from './http/static-client'

export interface AppSettings {
  readonly mode: Mode
  readonly secret: string
  /** The https address of a server; null when pages come from wherever they were asked for. */
  readonly origin: string | null
  readonly trustedProxies: readonly string[]
  readonly clientFolder: string | null
  readonly logger: Logger
  readonly checkReplies: boolean
}

/** Builds the application from ready-made services. It never listens. */
export function createApp(services: Services, settings: AppSettings): Express {
  const { mode, secret } = settings
  const app = express()
  const authenticator = createAuthenticator(services.people)
  app.disable('x-powered-by')
  app.disable('etag')
  app.set('trust proxy', settings.trustedProxies.length > 0 ? [...settings.trustedProxies] : false)
  app.set('query parser', 'simple')
  app.use(requestLog(settings.logger))
  app.use(...securityHeaders(mode === 'server'))
  app.use(healthRoutes(services.health))
  app.use(compression())
  if (mode === 'demo') app.use('/api/docs', apiExplorer())
  app.use('/api', (_req, res, next) => {
    res.set('Cache-Control', 'no-store')
    next()
  })
  app.use(
    API_ROOT,
    deadline,
    sameSiteOnly(settings.origin),
    ...sessions({ mode, secret, store: services.sessionStore, authenticator }),
  )
  const router = express.Router()
  mountRoutes({
    router,
    handlers: services.handlers,
    collections: services.collections,
    mode,
    cookie: cookieName(mode),
    authenticator,
    checkReplies: settings.checkReplies,
  })
  app.use(router)
  if (settings.clientFolder !== null) app.use(staticClient(settings.clientFolder))
  app.use(unknownAddress)
  app.use(errorHandler)
  return app
}
