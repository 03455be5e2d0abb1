import type { Request, RequestHandler, Response } from 'express'
import { AppError } from '../app-error'
import { sendProblem } from './error-handler'

/** Whoever asks is told within six seconds, whatever hangs behind. */
const PATIENCE_MS = 5500

const timers = new WeakMap<Response, NodeJS.Timeout>()

export const stopDeadline = (res: Response): void => clearTimeout(timers.get(res))

/** Begins anew when the body is there: the time that a slow sender takes is not ours. */
export function startDeadline(req: Request, res: Response): void {
  stopDeadline(res)
  if (res.closed) return
  const giveUp = (): void => {
    if (res.headersSent) return
    req.log.warn('gave up waiting')
    sendProblem(req, res, new AppError('busy', { retryAfterSeconds: 5 }))
  }
  timers.set(res, setTimeout(giveUp, PATIENCE_MS))
}

export const deadline: RequestHandler = (req, res, next) => {
  startDeadline(req, res)
  res.once('close', () => stopDeadline(res))
  next()
}
