import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { connectDatabase, migrate, type DatabaseSettings } from '@coaxwain/database'
import type { Knex } from 'knex'
import { endProcess } from '../../scripts/lib/processes.mjs'
import { startMariadb } from '../../scripts/mariadb.mjs'

export interface TestServer extends DatabaseSettings {
  readonly pid: number
  readonly folder: string
}

/** A private server for one run; forgetful unless it is to be killed and started again. */
export async function startTestServer(durable = false): Promise<TestServer> {
  const folder = mkdtempSync(join(tmpdir(), 'coaxwain-test-'))
  return restartTestServer(folder, durable)
}

export async function restartTestServer(folder: string, durable = false): Promise<TestServer> {
  const { host, port, user, password, database, pid } = await startMariadb({
    folder,
    disposable: !durable,
    tests: true,
  })
  return { host, port, user, password, database, pid, folder }
}

export async function stopTestServer(server: TestServer): Promise<void> {
  await endProcess(server.pid)
  rmSync(server.folder, { recursive: true, force: true })
}

export const settingsOf = ({
  host,
  port,
  user,
  password,
  database,
}: DatabaseSettings): DatabaseSettings => ({ host, port, user, password, database })

/** A fresh schema of its own on the server, brought up to date. */
export async function createTestDatabase(server: DatabaseSettings, name: string): Promise<Knex> {
  const root = connectDatabase(settingsOf(server))
  await root.raw('drop database if exists ??', [name])
  await root.raw('create database ?? character set utf8mb4 collate utf8mb4_unicode_ci', [name])
  await root.destroy()
  const settings = { ...settingsOf(server), database: name }
  await migrate(settings)
  return connectDatabase(settings)
}

const KEPT = ['migrations', 'migrations_lock', 'migration_turns', 'catalogue']

export async function tablesOf(db: Knex): Promise<string[]> {
  const [rows] = (await db.raw(
    `select table_name as name from information_schema.tables
     where table_schema = database() and table_type = 'BASE TABLE' order by table_name`,
  )) as [{ name: string }[]]
  return rows.map((r) => r.name)
}

/** Takes every row out, in any order. */
export async function emptyTables(db: Knex): Promise<void> {
  const tables = (await tablesOf(db)).filter((t) => !KEPT.includes(t))
  await db.transaction(async (trx) => {
    await trx.raw('set foreign_key_checks = 0')
    for (const table of tables) await trx(table).delete()
    await trx.raw('set foreign_key_checks = 1')
  })
}

/** What no person keeps: who is signed in, and how often something was tried. */
const MOVING = ['sessions', 'limits']

export async function emptyMoving(db: Knex): Promise<void> {
  for (const table of MOVING) await db(table).delete()
}

/** A fingerprint of everything that people keep in the database. */
export async function checksum(db: Knex): Promise<string> {
  const tables = (await tablesOf(db)).filter((t) => ![...KEPT, ...MOVING].includes(t))
  const [rows] = (await db.raw(`checksum table ${tables.join(', ')} extended`)) as [
    { Table: string; Checksum: number | null }[],
  ]
  return rows.map((r) => `${r.Table.split('.').at(-1)}=${r.Checksum}`).join('\n')
}
