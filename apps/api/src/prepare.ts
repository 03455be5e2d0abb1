import { readFileSync, renameSync, writeFileSync } from 'node:fs'
import { connectDatabase, migrate } from '@coaxwain/database'
import { DEMO, type DemoData } from '@coaxwain/demo'
import { readConfig } from './config'
import { ensureDemo, passPhrasesFor } from './db/demo-data'
import { waitForDatabase } from './db/wait-for-database'
import { createLogger } from './http/logger'
import { createPasswords } from './people/passwords'

/** What the start script prints. */
interface SignIn {
  readonly name: string
  readonly email: string
  readonly passPhrase: string
  readonly roles: readonly string[]
}

const config = readConfig(process.env)
const logger = createLogger(config.logLevel)

function knownPhrases(file: string): Record<string, string> {
  try {
    const found = JSON.parse(readFileSync(file, 'utf8')) as SignIn[]
    return Object.fromEntries(found.map((s) => [s.email, s.passPhrase]))
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'ENOENT' || error instanceof SyntaxError)
      return {}
    throw error
  }
}

function rolesOf(data: DemoData, person: string): string[] {
  return data.collections.flatMap((c) =>
    c.members.filter((m) => m.person === person).map((m) => `${m.role} of ${c.name}`),
  )
}

function keepPhrases(file: string, phrases: Readonly<Record<string, string>>): void {
  const signIns: SignIn[] = DEMO.people.map((p) => ({
    name: p.name,
    email: p.email,
    passPhrase: phrases[p.email] ?? '',
    roles: rolesOf(DEMO, p.key),
  }))
  writeFileSync(`${file}.new`, `${JSON.stringify(signIns, null, 2)}\n`, { mode: 0o600 })
  renameSync(`${file}.new`, file)
}

/** Brings schema and demo data up to date, and ends. */
async function main(): Promise<void> {
  const db = connectDatabase(config.database)
  await waitForDatabase(db, logger)
  const done = await migrate(config.database)
  logger.info({ done }, 'schema')
  if (config.mode === 'demo' && config.demoFile !== null) {
    const phrases = passPhrasesFor(DEMO, knownPhrases(config.demoFile))
    keepPhrases(config.demoFile, phrases)
    const outcome = await ensureDemo(db, await createPasswords(), DEMO, phrases)
    logger.info({ outcome }, 'demo data')
  }
  await db.destroy()
}

main().catch((error: unknown) => {
  logger.fatal({ err: error }, 'cannot prepare')
  process.exit(1)
})
