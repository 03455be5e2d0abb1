import { checkHookup } from '@coaxwain/checker'
import { connectDatabase, migrate } from '@coaxwain/database'
import type { Knex } from 'knex'
import { createApp } from './app'
import { compose } from './compose'
import { readConfig } from './config'
import { engineFaults } from './db/engine-settings'
import { createHttpServer } from './http/http-server'
import { createLogger } from './http/logger'
import { findHookups } from './matcher'
import { waitForDatabase } from './db/wait-for-database'

const STOP_PATIENCE_MS = 10_000
const CLOSE_IDLE_EVERY_MS = 50

const config = readConfig(process.env)
const logger = createLogger(config.logLevel)

process.on('unhandledRejection', (error) => {
  logger.fatal({ err: error }, 'a promise failed that nobody waits for')
  process.exit(1)
})
process.on('uncaughtException', (error) => {
  logger.fatal({ err: error }, 'something was thrown that nobody catches')
  process.exit(1)
})

async function mustBeSafe(db: Knex): Promise<void> {
  const faults = await engineFaults(db)
  for (const fault of faults) logger.warn(fault, 'engine setting')
  if (faults.length > 0 && !config.disposableDatabase) {
    throw new Error(
      `The database engine is not set as it must be: ${faults
        .map((f) => `${f.setting} is ${f.found}, wanted ${f.wanted}`)
        .join('; ')}.`,
    )
  }
}

async function main(): Promise<void> {
  const db = connectDatabase(config.database)
  await waitForDatabase(db, logger)
  const done = await migrate(config.database)
  if (done.length > 0) logger.info({ done }, 'migrated')
  await mustBeSafe(db)
  const services = await compose({
    db,
    mode: config.mode,
    matcher: findHookups,
    checker: checkHookup,
    logger,
  })
  if (config.mode === 'server') await services.people.refuseDemoPeople()
  const app = createApp(services, { ...config, logger, checkReplies: false })
  const server = createHttpServer(app)

  let stopping = false
  const stop = (): void => {
    if (stopping) return
    stopping = true
    services.health.stop()
    const late = setTimeout(() => server.closeAllConnections(), STOP_PATIENCE_MS)
    server.close(() => {
      clearTimeout(late)
      void db.destroy().finally(() => process.exit(0))
    })
    // A connection that has had its answer would be kept open for more.
    setInterval(() => server.closeIdleConnections(), CLOSE_IDLE_EVERY_MS).unref()
    server.closeIdleConnections()
  }
  process.once('SIGTERM', stop).once('SIGINT', stop).once('disconnect', stop)

  server.once('error', (error) => {
    logger.fatal({ err: error }, 'cannot listen')
    process.exit(1)
  })
  server.listen(config.port, config.host, () => {
    const address = server.address()
    const port = typeof address === 'object' && address ? address.port : config.port
    logger.info({ port, mode: config.mode }, 'listening')
    process.send?.({ listening: port })
  })
}

main().catch((error: unknown) => {
  logger.fatal({ err: error }, 'cannot start')
  process.exit(1)
})
