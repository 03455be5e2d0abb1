import { existsSync } from 'node:fs'
import { join } from 'node:path'
import express, { type Router } from 'express'

const NO_ROBOTS = 'User-agent: *\nDisallow: /\n'

/** A page of the client; what has a file ending or a hidden folder, or stands under these, is a file or nothing. */
const isPage = (path: string): boolean =>
  !/^\/(api|assets)(\/|$)/.test(path) && !/\.[a-z0-9]+$/i.test(path) && !path.includes('/.')

/** The built client, and its one document for every address that is a page. */
export function staticClient(folder: string): Router {
  const router = express.Router()
  const document = join(folder, 'index.html')
  router.use(
    '/assets',
    express.static(join(folder, 'assets'), { immutable: true, maxAge: '1y', index: false }),
  )
  router.use(express.static(folder, { index: false, maxAge: 0, dotfiles: 'ignore' }))
  if (!existsSync(join(folder, 'robots.txt'))) {
    router.get('/robots.txt', (_req, res) => {
      res.type('text/plain').send(NO_ROBOTS)
    })
  }
  router.get('/{*path}', (req, res, next) => {
    if (!isPage(req.path)) {
      next()
      return
    }
    res.set('Cache-Control', 'no-cache').sendFile(document)
  })
  return router
}
