import type { RequestHandler } from 'express'
import { AppError } from '../app-error'

const SAFE_METHODS: readonly string[] = ['GET', 'HEAD', 'OPTIONS']

const hostOf = (origin: string): string | null => {
  try {
    return new URL(origin).host
  } catch {
    return null
  }
}

/**
 * A request that changes something must say that it comes from our own pages. Browsers do so by
 * themselves and cannot be made to lie; a program sends an `Origin` header of this server.
 */
export const sameSiteOnly =
  (ownOrigin: string | null): RequestHandler =>
  (req, _res, next) => {
    if (SAFE_METHODS.includes(req.method)) {
      next()
      return
    }
    const site = req.get('sec-fetch-site')
    const origin = req.get('origin')
    const ownHost = ownOrigin === null ? req.get('host') : new URL(ownOrigin).host
    const foreignOrigin = origin !== undefined && hostOf(origin) !== ownHost
    const fromHere = site === undefined ? origin !== undefined : site === 'same-origin'
    if (!fromHere || foreignOrigin) throw new AppError('other-site')
    next()
  }
