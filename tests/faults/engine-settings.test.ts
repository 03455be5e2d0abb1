import { connectDatabase, migrate } from '@coaxwain/database'
import { engineFaults } from '@coaxwain/api/engine-settings'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { settingsOf, startTestServer, stopTestServer, type TestServer } from '../support/database'

let server: TestServer
beforeAll(async () => {
  server = await startTestServer(true)
})
afterAll(() => stopTestServer(server))

test('the private server keeps every promise of the engine, and each broken one is named', async () => {
  await migrate(settingsOf(server))
  const db = connectDatabase(settingsOf(server))
  expect(await engineFaults(db)).toEqual([])
  await db.raw('create table loose (word varchar(10)) engine=MyISAM')
  expect(await engineFaults(db)).toMatchObject([{ setting: 'table loose', found: 'MyISAM' }])
  await db.destroy()
})

test('two who read and then write the same row cannot both win', async () => {
  const db = connectDatabase(settingsOf(server))
  await db.raw(
    'create table if not exists counter (id int primary key, n int not null) engine=InnoDB',
  )
  await db.raw('replace into counter values (1, 0)')
  const [one, two] = [await db.transaction(), await db.transaction()]
  await one('counter').where({ id: 1 }).first()
  await two('counter').where({ id: 1 }).first()
  await one('counter').where({ id: 1 }).update({ n: 1 })
  await one.commit()
  await expect(two('counter').where({ id: 1 }).update({ n: 1 })).rejects.toMatchObject({
    errno: 1020,
  })
  await two.rollback()
  await db.destroy()
})
