import { randomUUID } from 'node:crypto'
import type { IncomingMessage, ServerResponse } from 'node:http'
import type { Request, RequestHandler } from 'express'
import type { Logger } from 'pino'
import { pinoHttp } from 'pino-http'
import { personOf } from './context'
import { serializeError } from './logger'

const QUIET: readonly string[] = ['/healthz', '/readyz']

const outcome = (req: IncomingMessage, res: ServerResponse, ms: number | undefined) => ({
  method: req.method,
  path: (req.url ?? '').split('?')[0],
  status: res.statusCode,
  ms,
  person: personOf(req as Request)?.uid,
})

/** One line a request: id, what, outcome, time. Never headers, cookies, bodies or query strings. */
export const requestLog = (logger: Logger): RequestHandler =>
  pinoHttp({
    logger,
    genReqId: (_req, res) => {
      const id = randomUUID()
      res.setHeader('X-Request-Id', id)
      return id
    },
    autoLogging: { ignore: (req) => QUIET.includes(req.url ?? '') },
    quietReqLogger: true,
    customAttributeKeys: { responseTime: 'ms', reqId: 'requestId' },
    wrapSerializers: false,
    serializers: { req: () => undefined, res: () => undefined, err: serializeError },
    customSuccessObject: (req, res, { ms }: { ms?: number }) => outcome(req, res, ms),
    customErrorObject: (req, res, _error, { ms }: { ms?: number }) => outcome(req, res, ms),
    customSuccessMessage: () => 'request',
    customErrorMessage: () => 'request',
  }) as RequestHandler
