import { spawn, type ChildProcess } from 'node:child_process'
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { connectDatabase } from '@coaxwain/database'
import type { TestProject } from 'vitest/node'
import { endProcess } from '../../scripts/lib/processes.mjs'
import { build } from '../../scripts/build.mjs'
import { settingsOf, startTestServer, stopTestServer, type TestServer } from './database'

export interface SignIn {
  readonly name: string
  readonly email: string
  readonly passPhrase: string
  readonly roles: readonly string[]
}

/** The product as people get it: built, from one process, with the demo data. */
export interface Site {
  readonly address: string
  readonly signIns: readonly SignIn[]
}

declare module 'vitest' {
  interface ProvidedContext {
    site: Site
  }
}

const CHROMIUM = '/usr/bin/chromium'
const root = fileURLToPath(new URL('../..', import.meta.url))
const dist = (name: string): string => join(root, 'apps/api/dist', `${name}.js`)

const run = (script: string, env: NodeJS.ProcessEnv): Promise<void> =>
  new Promise((resolve, reject) => {
    const child = spawn(process.execPath, [script], { env, stdio: ['ignore', 'ignore', 'inherit'] })
    child.once('error', reject)
    child.once('exit', (status) =>
      status === 0 ? resolve() : reject(new Error(`${script} ended with ${String(status)}`)),
    )
  })

function serve(env: NodeJS.ProcessEnv): Promise<{ child: ChildProcess; port: number }> {
  const child = spawn(process.execPath, [dist('server')], {
    env,
    stdio: ['ignore', 'ignore', 'inherit', 'ipc'],
  })
  return new Promise((resolve, reject) => {
    child.once('message', (message) =>
      resolve({ child, port: (message as { listening: number }).listening }),
    )
    child.once('exit', (status) => reject(new Error(`the server ended with ${String(status)}`)))
  })
}

async function createSchema(server: TestServer | ReturnType<typeof settingsOf>, name: string) {
  const db = connectDatabase(settingsOf(server))
  await db.raw('drop database if exists ??', [name])
  await db.raw('create database ?? character set utf8mb4 collate utf8mb4_unicode_ci', [name])
  await db.destroy()
}

/** Builds what has changed, fills a database of its own with the demo data and serves it. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  if (!existsSync(CHROMIUM)) throw new Error(`the browser tests need ${CHROMIUM}`)
  await build()
  const given = process.env['COAXWAIN_TEST_DATABASE']
  const own = given === undefined ? await startTestServer() : null
  const server = own ?? settingsOf(JSON.parse(given ?? '') as TestServer)
  const name = `coaxwain_site_${process.pid}`
  await createSchema(server, name)
  const folder = mkdtempSync(join(tmpdir(), 'coaxwain-site-'))
  const demoFile = join(folder, 'sign-ins.json')
  const env = {
    PATH: process.env['PATH'],
    NODE_ENV: 'production',
    PORT: '0',
    COAXWAIN_MODE: 'demo',
    COAXWAIN_SECRET: 'for browser tests alone, and long enough',
    COAXWAIN_DB_HOST: server.host,
    COAXWAIN_DB_PORT: String(server.port),
    COAXWAIN_DB_USER: server.user,
    COAXWAIN_DB_PASSWORD: server.password,
    COAXWAIN_DB_NAME: name,
    COAXWAIN_CLIENT: join(root, 'apps/catalogue/dist'),
    COAXWAIN_DEMO_FILE: demoFile,
    COAXWAIN_DISPOSABLE_DATABASE: '1',
    COAXWAIN_LOG_LEVEL: 'warn',
  }
  await run(dist('prepare'), env)
  const { child, port } = await serve(env)
  project.provide('site', {
    address: `http://127.0.0.1:${port}`,
    signIns: JSON.parse(readFileSync(demoFile, 'utf8')) as SignIn[],
  })
  return async () => {
    if (child.pid !== undefined) await endProcess(child.pid)
    if (own) await stopTestServer(own)
    rmSync(folder, { recursive: true, force: true })
  }
}
