import express, { type Router } from 'express'
import type { HealthService } from '../health/service'

export function healthRoutes(health: HealthService): Router {
  const router = express.Router()
  router.get('/healthz', (_req, res) => {
    res.set('Cache-Control', 'no-store').json({ status: 'alive' })
  })
  router.get('/readyz', async (_req, res) => {
    const ready = await health.isReady()
    if (!ready) res.set('Retry-After', '5')
    res
      .set('Cache-Control', 'no-store')
      .status(ready ? 200 : 503)
      .json({ status: ready ? 'ready' : 'not-ready' })
  })
  return router
}
