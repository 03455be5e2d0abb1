import { PROBLEMS } from '@coaxwain/contract'
import type { ErrorRequestHandler, Request, Response } from 'express'
import { AppError } from '../app-error'
import { localeOf, requestIdOf } from './context'
import { PROBLEM_CONTENT_TYPE, toAppError, toProblem } from './problem'

/** A failure that needs no database any more; the session is let go so that nothing waits for it. */
export function sendProblem(req: Request, res: Response, error: AppError): void {
  if (res.headersSent) return
  const problem = toProblem(error, requestIdOf(req), localeOf(req))
  if (problem.status === 503) letSessionGo(req)
  if (error.retryAfterSeconds !== null) res.set('Retry-After', String(error.retryAfterSeconds))
  if (error.allow !== null) res.set('Allow', error.allow)
  res.status(problem.status).type(PROBLEM_CONTENT_TYPE).send(JSON.stringify(problem))
}

function letSessionGo(req: Request): void {
  Object.assign(req, { session: null })
}

export const errorHandler: ErrorRequestHandler = (error, req, res, _next) => {
  const known = toAppError(error)
  if (PROBLEMS[known.code].status >= 500) {
    req.log.error({ err: known.cause ?? known, code: known.code }, 'request failed')
  } else {
    req.log.debug({ code: known.code, errors: known.errors }, 'request refused')
  }
  sendProblem(req, res, known)
}

export const unknownAddress = (_req: Request): never => {
  throw new AppError('not-found')
}
