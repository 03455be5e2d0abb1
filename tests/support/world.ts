import { ROLES, type Role } from '@coaxwain/contract'
import { createModelsRepository } from '@coaxwain/api/models'
import { createPasswords } from '@coaxwain/api/passwords'
import type { Model } from '@coaxwain/models'
import type { Knex } from 'knex'
import { Client } from './client'
import { lead, modulator, monitor, player } from './models'
import { uidOf } from './uids'

export const PASS_PHRASE = 'seven plain words that nobody has guessed'

/** A member of each role, the owner of another collection, and somebody of no collection at all. */
export type Who = Role | 'neighbour' | 'outsider'

export const COLLECTION = uidOf('collection')
export const OTHER = uidOf('neighbours')

export const MODELS = {
  player: uidOf('model-player'),
  monitor: uidOf('model-monitor'),
  modulator: uidOf('model-modulator'),
  lead: uidOf('model-lead'),
  /** Belongs to the first collection. */
  own: uidOf('model-own'),
  /** Belongs to the other collection. */
  foreign: uidOf('model-foreign'),
} as const

export const UNITS = {
  player: uidOf('unit-player'),
  monitor: uidOf('unit-monitor'),
  modulator: uidOf('unit-modulator'),
  lead: uidOf('unit-lead'),
  /** In the other collection. */
  foreign: uidOf('unit-foreign'),
} as const

export const PLACES = {
  room: uidOf('place-room'),
  shelf: uidOf('place-shelf'),
  foreign: uidOf('place-foreign'),
} as const

let passwordHash: Promise<string> | null = null

const hashOnce = (): Promise<string> =>
  (passwordHash ??= createPasswords().then((p) => p.hash(PASS_PHRASE)))

const insert = async (db: Knex, table: string, row: object): Promise<number> => {
  const [id] = (await db(table).insert(row)) as [number]
  return id
}

export const emailOf = (who: Who): string => `${who}@example.org`

async function makePeople(db: Knex): Promise<Record<Who, number>> {
  const ids = {} as Record<Who, number>
  for (const who of [...ROLES, 'neighbour', 'outsider'] as const) {
    ids[who] = await insert(db, 'people', {
      uid: uidOf(`person-${who}`),
      email: emailOf(who),
      name: `Name of ${who}`,
      password_hash: await hashOnce(),
    })
  }
  return ids
}

async function makeCollection(
  db: Knex,
  uid: string,
  members: readonly (readonly [number, Role])[],
): Promise<number> {
  const id = await insert(db, 'collections', { uid, name: `Name of ${uid}`, next_unit_number: 100 })
  for (const [person, role] of members) {
    await insert(db, 'memberships', { collection_id: id, person_id: person, role })
  }
  return id
}

interface Unit {
  readonly collection: number
  readonly uid: string
  readonly model: number
  readonly homeKey?: number
  readonly number: number
  readonly place?: number
  readonly quantity?: number
}

const makeUnit = (db: Knex, unit: Unit): Promise<number> =>
  insert(db, 'units', {
    collection_id: unit.collection,
    uid: unit.uid,
    number: unit.number,
    model_id: unit.model,
    model_home_key: unit.homeKey ?? 0,
    label: `Label of ${unit.uid}`,
    sort_name: `Label of ${unit.uid}`,
    place_id: unit.place ?? null,
    quantity: unit.quantity ?? 1,
  })

/** Two collections with people, models, places and units; the same each time. */
export async function makeWorld(db: Knex): Promise<void> {
  const people = await makePeople(db)
  const collection = await makeCollection(
    db,
    COLLECTION,
    ROLES.map((role) => [people[role], role] as const),
  )
  const other = await makeCollection(db, OTHER, [[people.neighbour, 'owner']])
  const models = createModelsRepository(db)
  const model = (uid: string, document: Model, home: number | null = null): Promise<number> =>
    models.insert({ uid, home, document, madeFrom: null, by: null })
  const ids = {
    player: await model(MODELS.player, player()),
    monitor: await model(MODELS.monitor, monitor()),
    modulator: await model(MODELS.modulator, modulator()),
    lead: await model(MODELS.lead, lead()),
    own: await model(MODELS.own, player({ name: 'Own model' }), collection),
    foreign: await model(MODELS.foreign, player({ name: 'Foreign model' }), other),
  }
  const place = (collectionId: number, uid: string, parent: number | null): Promise<number> =>
    insert(db, 'places', {
      collection_id: collectionId,
      uid,
      name: `Name of ${uid}`,
      parent_id: parent,
    })
  const room = await place(collection, PLACES.room, null)
  await place(collection, PLACES.shelf, room)
  await place(other, PLACES.foreign, null)
  const at = { collection }
  await makeUnit(db, { ...at, uid: UNITS.player, model: ids.player, number: 1, place: room })
  await makeUnit(db, { ...at, uid: UNITS.monitor, model: ids.monitor, number: 2 })
  await makeUnit(db, { ...at, uid: UNITS.modulator, model: ids.modulator, number: 3 })
  await makeUnit(db, { ...at, uid: UNITS.lead, model: ids.lead, number: 4, quantity: 5 })
  await makeUnit(db, {
    collection: other,
    uid: UNITS.foreign,
    model: ids.foreign,
    homeKey: other,
    number: 1,
  })
}

export async function signIn(address: string, who: Who): Promise<Client> {
  const client = new Client(address)
  const answer = await client.post('/session', { email: emailOf(who), password: PASS_PHRASE })
  if (answer.status !== 200) throw new Error(`${who} could not sign in: ${answer.text}`)
  return client
}
