import type { DemoCollection, DemoData, DemoPerson, DemoUnit } from '@coaxwain/demo'
import type { Model } from '@coaxwain/models'
import type { FormState, FunctionState, Modification } from '@coaxwain/shelf'
import type { Knex } from 'knex'

type Stored<State> = Omit<State, 'by' | 'on' | 'how'> & {
  readonly on: string | null
  readonly how: string | null
  readonly byId: number | null
  readonly byName: string | null
}

interface UnitKey {
  readonly collectionId: number
  readonly unitId: number
}

/** How models and units are written; the same code that serves requests. */
export interface DemoWriters {
  insertModel(model: {
    readonly uid: string
    readonly home: null
    readonly document: Model
    readonly madeFrom: null
    readonly by: null
  }): Promise<number>
  setFormStates(key: UnitKey, states: readonly Stored<FormState>[]): Promise<void>
  setFunctionStates(key: UnitKey, states: readonly Stored<FunctionState>[]): Promise<void>
  setModifications(key: UnitKey, modifications: readonly Modification[]): Promise<void>
  setStands(key: UnitKey, stands: Readonly<Record<string, string>>): Promise<void>
}

interface Loading {
  readonly trx: Knex
  readonly writers: DemoWriters
  readonly people: ReadonlyMap<string, { readonly id: number; readonly name: string }>
  readonly models: ReadonlyMap<string, { readonly id: number; readonly model: Model }>
}

const found = <T>(map: ReadonlyMap<string, T>, key: string, what: string): T => {
  const value = map.get(key)
  if (value === undefined) throw new Error(`the demo data has no ${what} ${key}`)
  return value
}

const insertOne = async (db: Knex, table: string, row: object): Promise<number> => {
  const [id] = (await db(table).insert(row)) as [number | undefined]
  if (id === undefined) throw new Error(`no id after insert into ${table}`)
  return id
}

async function loadPeople(
  trx: Knex,
  people: readonly DemoPerson[],
  hashes: Readonly<Record<string, string>>,
): Promise<Loading['people']> {
  const ids = new Map<string, { id: number; name: string }>()
  for (const p of people) {
    const id = await insertOne(trx, 'people', {
      uid: p.uid,
      email: p.email.toLowerCase(),
      name: p.name,
      locale: p.locale,
      password_hash: hashes[p.email],
      is_demo: true,
    })
    ids.set(p.key, { id, name: p.name })
  }
  return ids
}

async function loadPlaces(
  trx: Knex,
  collectionId: number,
  places: DemoCollection['places'],
): Promise<ReadonlyMap<string, number>> {
  const ids = new Map<string, number>()
  for (const p of places) {
    const parent = p.parent === null ? null : found(ids, p.parent, 'place')
    const row = { collection_id: collectionId, uid: p.uid, name: p.name, parent_id: parent }
    ids.set(p.key, await insertOne(trx, 'places', row))
  }
  return ids
}

async function loadUnit(
  loading: Loading,
  collectionId: number,
  unit: DemoUnit,
  placeId: number | null,
): Promise<void> {
  const { trx, writers } = loading
  const { id: modelId, model } = found(loading.models, unit.model, 'model')
  const added = `${unit.addedOn} 12:00:00`
  const unitId = await insertOne(trx, 'units', {
    collection_id: collectionId,
    uid: unit.uid,
    number: unit.number,
    model_id: modelId,
    model_home_key: 0,
    label: unit.label,
    sort_name: unit.label === '' ? `${model.maker} ${model.name}` : unit.label,
    serial: unit.serial,
    note: unit.note,
    quantity: unit.quantity,
    working: unit.working,
    holding: unit.holding,
    place_id: placeId,
    remote_present: unit.remotePresent,
    created_at: added,
    changed_at: added,
  })
  const key = { collectionId, unitId }
  const stored = <S extends FormState | FunctionState>({ by, on, how, ...rest }: S) => {
    const person = by === undefined ? null : found(loading.people, by, 'person')
    return {
      ...rest,
      on: on ?? null,
      how: how ?? null,
      byId: person?.id ?? null,
      byName: person?.name ?? null,
    }
  }
  await writers.setFormStates(key, unit.forms.map(stored))
  await writers.setFunctionStates(key, unit.functions.map(stored))
  await writers.setModifications(key, unit.modifications)
  await writers.setStands(key, unit.stands)
}

async function loadCollection(loading: Loading, collection: DemoCollection): Promise<void> {
  const { trx, people } = loading
  const collectionId = await insertOne(trx, 'collections', {
    uid: collection.uid,
    name: collection.name,
    market: collection.market,
    currency: collection.currency,
    next_unit_number: Math.max(0, ...collection.units.map((u) => u.number)) + 1,
  })
  for (const [position, station] of collection.offAir.entries()) {
    await insertOne(trx, 'off_air_channels', {
      collection_id: collectionId,
      position,
      plan: station.plan,
      channel: station.channel,
      kind: station.kind,
      level_dbmv: station.levelDbmv ?? null,
    })
  }
  for (const m of collection.members) {
    await insertOne(trx, 'memberships', {
      collection_id: collectionId,
      person_id: found(people, m.person, 'person').id,
      role: m.role,
    })
  }
  const places = await loadPlaces(trx, collectionId, collection.places)
  for (const unit of collection.units) {
    const placeId = unit.place === null ? null : found(places, unit.place, 'place')
    await loadUnit(loading, collectionId, unit, placeId)
  }
}

const SEED = 'demo'

/** Whether the demo data was loaded before, even if people have changed or deleted all of it since. */
export const demoIsLoaded = async (db: Knex): Promise<boolean> =>
  (await db('seeds').where({ name: SEED }).first('name')) !== undefined

/** Loads the demo data inside one transaction: all of it, or nothing. */
export async function loadDemo(
  trx: Knex,
  writers: DemoWriters,
  data: DemoData,
  hashes: Readonly<Record<string, string>>,
): Promise<void> {
  await trx('seeds').insert({ name: SEED })
  const people = await loadPeople(trx, data.people, hashes)
  const models = new Map<string, { id: number; model: Model }>()
  for (const [uid, model] of Object.entries(data.models)) {
    const whole = { uid, home: null, document: model, madeFrom: null, by: null }
    models.set(uid, { id: await writers.insertModel(whole), model })
  }
  for (const collection of data.collections) {
    await loadCollection({ trx, writers, people, models }, collection)
  }
  await trx('catalogue').where({ id: 1 }).increment('version', 1)
}
