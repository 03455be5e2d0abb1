import { spawn } from 'node:child_process'
import { connectDatabase, migrate, pendingMigrations, rollBackAll } from '@coaxwain/database'
import type { Knex } from 'knex'
import { afterAll, beforeEach, expect, inject, test } from 'vitest'
import { createTestDatabase, settingsOf, tablesOf } from '../support/database'

const NAME = `coaxwain_migrations_${process.pid}`
const settings = { ...settingsOf(inject('database')), database: NAME }
const open: Knex[] = []

const connect = (): Knex => {
  const db = connectDatabase(settings)
  open.push(db)
  return db
}

beforeEach(async () => {
  const db = await createTestDatabase(inject('database'), NAME)
  await rollBackAll(db)
  await db.destroy()
})

afterAll(() => Promise.all(open.map((db) => db.destroy())))

test('migrations go up, down and up again', async () => {
  const db = connect()
  await migrate(settings)
  const first = await tablesOf(db)
  await rollBackAll(db)
  expect((await tablesOf(db)).filter((t) => !t.startsWith('migration'))).toEqual([])
  await migrate(settings)
  expect(await tablesOf(db)).toEqual(first)
  expect(await pendingMigrations(db)).toEqual([])
  expect(await migrate(settings)).toEqual([])
})

test('of three that start at once exactly one migrates', async () => {
  const done = await Promise.all([settings, settings, settings].map(migrate))
  expect(done.filter((d) => d.length > 0)).toHaveLength(1)
})

test('a run that was killed in the middle is taken up by the next', async () => {
  const db = connect()
  await db.raw('create table people (id bigint unsigned primary key)')
  await db.raw('drop table people')
  await migrate(settings)
  await db('migrations').whereNot({ name: '0001-people' }).delete()
  await db('migrations_lock').update({ is_locked: 1 })
  await migrate(settings)
  expect(await pendingMigrations(db)).toEqual([])
})

test('whoever holds the turn and is killed does not hold up the next', async () => {
  const db = connect()
  await migrate(settings)
  await rollBackAll(db)
  const script = `
    import { connectDatabase } from '@coaxwain/database'
    const db = connectDatabase(${JSON.stringify(settings)})
    const trx = await db.transaction()
    await trx('migration_turns').where({ id: 1 }).forUpdate()
    process.stdout.write('held')
    setInterval(() => undefined, 1000)`
  const holder = spawn(
    process.execPath,
    ['--import', 'tsx', '--input-type=module', '--eval', script],
    { cwd: new URL('..', import.meta.url), stdio: ['ignore', 'pipe', 'inherit'] },
  )
  await new Promise<void>((resolve) => holder.stdout.once('data', () => resolve()))
  const waiting = migrate(settings)
  setTimeout(() => holder.kill('SIGKILL'), 300)
  expect((await waiting).length).toBeGreaterThan(0)
})
