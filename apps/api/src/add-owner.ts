import { createInterface } from 'node:readline/promises'
import { connectDatabase, migrate } from '@coaxwain/database'
import { readConfig } from './config'
import { together } from './db/transact'
import { waitForDatabase } from './db/wait-for-database'
import { createLogger } from './http/logger'
import { addOwner, type OwnerFault } from './people/add-owner'
import { createPasswords } from './people/passwords'
import { createPeopleRepository } from './people/repository'

const USAGE = 'add-owner.js E-MAIL NAME COLLECTION, with the pass phrase as the first line of input'

const REASONS: Readonly<Record<OwnerFault, string>> = {
  'too-short': 'the pass phrase needs at least 15 characters',
  'too-long': 'the pass phrase may have 128 characters at most',
  repeats: 'the pass phrase repeats a few letters',
  common: 'the pass phrase is made of parts that everybody uses',
  personal: 'the pass phrase holds the name of the product, the collection or the address',
  'email-taken': 'somebody has this e-mail address already',
  'email-malformed': 'that is not an e-mail address',
}

/** Makes the first owner of a server; run by whoever runs the server. */
async function main(): Promise<void> {
  const [email, name, collection] = process.argv.slice(2)
  if (email === undefined || name === undefined || collection === undefined) throw new Error(USAGE)
  const config = readConfig(process.env)
  const input = createInterface({ input: process.stdin })
  const passPhrase = await input.question('')
  input.close()
  const db = connectDatabase(config.database)
  await waitForDatabase(db, createLogger(config.logLevel))
  await migrate(config.database)
  const wish = { email, name, collection, passPhrase }
  const fault = await addOwner(together(db, createPeopleRepository), await createPasswords(), wish)
  await db.destroy()
  if (fault) throw new Error(`Nobody was added: ${REASONS[fault]}.`)
}

main().catch((error: unknown) => {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`)
  process.exitCode = 1
})
