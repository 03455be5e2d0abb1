import { completePassPhrases, demoIsLoaded, loadDemo, type DemoWriters } from '@coaxwain/database'
import type { DemoData } from '@coaxwain/demo'
import type { Knex } from 'knex'
import { createModelsRepository } from '../models/repository'
import type { Passwords } from '../people/passwords'
import { createPeopleRepository } from '../people/repository'
import { createUnitsRepository } from '../units/repository'
import { transact } from './transact'

type Phrases = Readonly<Record<string, string>>

const writers = (trx: Knex): DemoWriters => {
  const units = createUnitsRepository(trx)
  const models = createModelsRepository(trx)
  return {
    insertModel: (model) => models.insert(model),
    setFormStates: (key, states) => units.setFormStates(key, states),
    setFunctionStates: (key, states) => units.setFunctionStates(key, states),
    setModifications: (key, modifications) => units.setModifications(key, modifications),
    setStands: (key, stands) => units.setStands(key, stands),
  }
}

export const passPhrasesFor = (data: DemoData, known: Phrases): Phrases =>
  completePassPhrases(
    data.people.map((p) => p.email),
    known,
  )

async function hashAll(passwords: Passwords, phrases: Phrases): Promise<Record<string, string>> {
  const entries = Object.entries(phrases).map(
    async ([email, phrase]) => [email, await passwords.hash(phrase)] as const,
  )
  return Object.fromEntries(await Promise.all(entries))
}

/** Gives people of the demo the phrases that are printed, where they have others. */
async function renewPhrases(db: Knex, passwords: Passwords, phrases: Phrases): Promise<void> {
  const people = createPeopleRepository(db)
  await Promise.all(
    Object.entries(phrases).map(async ([email, phrase]) => {
      const found = await people.findByEmail(email.toLowerCase())
      if (!found || (await passwords.matches(found.passwordHash, phrase))) return
      await people.setPasswordHash(found.person.id, await passwords.hash(phrase))
    }),
  )
}

/** The demo data, loaded once; and everybody's phrase as it is printed. */
export async function ensureDemo(
  db: Knex,
  passwords: Passwords,
  data: DemoData,
  phrases: Phrases,
): Promise<'loaded' | 'there'> {
  if (await demoIsLoaded(db)) {
    await renewPhrases(db, passwords, phrases)
    return 'there'
  }
  const hashes = await hashAll(passwords, phrases)
  await transact(db, (trx) => loadDemo(trx, writers(trx), data, hashes))
  return 'loaded'
}
