import { spawn } from 'node:child_process'
import { mkdirSync } from 'node:fs'
import { join } from 'node:path'
import { build } from './build.mjs'
import { DATA, inRoot, readJson } from './lib/paths.mjs'
import { freePort } from './lib/ports.mjs'
import { endProcess, run } from './lib/processes.mjs'
import { complain, say, Stop } from './lib/say.mjs'
import {
  checkNode,
  DATABASE_PACKAGES,
  installDebianPackages,
  installNpmPackages,
} from './lib/setup.mjs'
import { startMariadb } from './mariadb.mjs'

const API_PORT = 8090
const CLIENT_PORT = 5173
const SIGN_INS = join(DATA, 'demo-sign-ins.json')
/** Sessions end with each start; nothing of value is behind it. */
const SECRET = 'only for work on this very machine'

const children = []
let database = null
let stopping = false
const parent = process.ppid

async function stop(status) {
  if (stopping) return
  stopping = true
  await Promise.all(children.filter((c) => c.exitCode === null).map((c) => endProcess(c.pid)))
  await database?.stop()
  process.exit(status)
}

function start(args, env) {
  const child = spawn(process.execPath, args, {
    cwd: inRoot(),
    env: { ...process.env, ...env },
    stdio: ['ignore', 'inherit', 'inherit'],
    detached: true,
  })
  children.push(child)
  child.once('exit', (code) => {
    if (!stopping) {
      complain(`${args.at(-1)} ended (${code}).`)
      void stop(1)
    }
  })
}

async function main() {
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => void stop(0))
  setInterval(() => {
    if (process.ppid !== parent) void stop(0)
  }, 500).unref()
  checkNode()
  await installDebianPackages(DATABASE_PACKAGES)
  await installNpmPackages()
  mkdirSync(DATA, { recursive: true })
  await build()
  const taken = (port) => say(`Port ${port} is in use; trying the next one.`)
  database = await startMariadb({ folder: join(DATA, 'mariadb'), onPortTaken: taken })
  const port = await freePort(API_PORT, taken)
  const env = {
    COAXWAIN_MODE: 'demo',
    COAXWAIN_SECRET: SECRET,
    COAXWAIN_DB_PORT: String(database.port),
    COAXWAIN_DB_USER: database.user,
    COAXWAIN_DB_PASSWORD: database.password,
    COAXWAIN_DB_NAME: database.database,
    COAXWAIN_DEMO_FILE: SIGN_INS,
    PORT: String(port),
  }
  const { status, output } = await run(process.execPath, [inRoot('apps/api/dist/prepare.js')], {
    env: { ...process.env, ...env },
    quiet: true,
  })
  if (status !== 0) throw new Stop(`The database could not be prepared:\n${output}`)
  for (const p of readJson(SIGN_INS) ?? []) say(`  ${p.email}   ${p.passPhrase}`)
  const clientPort = await freePort(CLIENT_PORT, taken)
  start(['--watch', '--import', 'tsx', 'apps/api/src/server.ts'], env)
  start(
    [
      inRoot('node_modules/vite/bin/vite.js'),
      ...['apps/catalogue', '--host', '127.0.0.1', '--strictPort', '--port', String(clientPort)],
    ],
    { COAXWAIN_API: `http://127.0.0.1:${port}` },
  )
  say(`\nClient at http://127.0.0.1:${clientPort}/, API at http://127.0.0.1:${port}/api/docs/`)
}

main().catch(async (error) => {
  complain(error instanceof Stop ? error.message : error.stack)
  await stop(1)
})
