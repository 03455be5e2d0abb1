import type { RequestHandler } from 'express'
import { AppError } from '../app-error'
import { sendProblem } from './error-handler'

/** Whoever asks is told within six seconds, whatever hangs behind. */
const PATIENCE_MS = 5500

export const deadline: RequestHandler = (req, res, next) => {
  const timer = setTimeout(() => {
    req.log.warn('gave up waiting')
    sendProblem(req, res, new AppError('busy', { retryAfterSeconds: 5 }))
  }, PATIENCE_MS)
  res.once('close', () => clearTimeout(timer))
  res.once('finish', () => clearTimeout(timer))
  next()
}
