import type { TestProject } from 'vitest/node'
import type { DatabaseSettings } from '@coaxwain/database'
import { settingsOf, startTestServer, stopTestServer } from './database'

declare module 'vitest' {
  interface ProvidedContext {
    database: DatabaseSettings
  }
}

/** The server that `npm test` has started, or one of our own. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const given = process.env['COAXWAIN_TEST_DATABASE']
  if (given !== undefined) {
    project.provide('database', JSON.parse(given) as DatabaseSettings)
    return () => Promise.resolve()
  }
  const server = await startTestServer()
  project.provide('database', settingsOf(server))
  return () => stopTestServer(server)
}
