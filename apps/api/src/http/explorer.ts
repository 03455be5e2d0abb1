import { API_ROOT } from '@coaxwain/contract'
import express, { type RequestHandler, type Router } from 'express'
import { createRequire } from 'node:module'
import { dirname } from 'node:path'
import { openApiDocument } from './open-api'

const PAGE = `<!doctype html>
<html lang="en-GB">
  <head>
    <meta charset="utf-8" />
    <title>Coaxwain API</title>
    <link rel="icon" href="data:," />
    <link rel="stylesheet" href="swagger-ui.css" />
  </head>
  <body>
    <div id="explorer"></div>
    <script src="swagger-ui-bundle.js"></script>
    <script src="start.js"></script>
  </body>
</html>
`

const START = `window.SwaggerUIBundle({ url: 'openapi.json', dom_id: '#explorer' })
`

const FILES = ['swagger-ui.css', 'swagger-ui-bundle.js']

/** The viewer writes style attributes; scripts stay as strict as everywhere. */
const looserStyles: RequestHandler = (_req, res, next) => {
  const policy = String(res.getHeader('Content-Security-Policy'))
  res.set(
    'Content-Security-Policy',
    policy.replace("style-src 'self'", "style-src 'self' 'unsafe-inline'"),
  )
  next()
}

/** The description of the API and a page to try it; for the demonstration only. */
export function apiExplorer(): Router {
  const router = express.Router()
  const folder = dirname(createRequire(import.meta.url).resolve('swagger-ui-dist/package.json'))
  const description = JSON.stringify(openApiDocument(API_ROOT))
  router.use(looserStyles)
  router.get('/openapi.json', (_req, res) => {
    res.type('application/json').send(description)
  })
  router.get('/start.js', (_req, res) => {
    res.type('text/javascript').send(START)
  })
  router.get('/', (req, res) => {
    if (req.originalUrl.endsWith('/')) res.type('text/html').send(PAGE)
    else res.redirect(`${req.baseUrl}/`)
  })
  for (const file of FILES) {
    router.get(`/${file}`, (_req, res) => {
      res.sendFile(file, { root: folder })
    })
  }
  return router
}
