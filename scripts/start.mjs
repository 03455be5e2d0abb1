import { spawn } from 'node:child_process'
import { randomBytes } from 'node:crypto'
import {
  closeSync,
  existsSync,
  mkdirSync,
  openSync,
  readFileSync,
  rmSync,
  writeFileSync,
} from 'node:fs'
import { join } from 'node:path'
import { build } from './build.mjs'
import { DATA, inRoot, readJson, writePrivateJson } from './lib/paths.mjs'
import { freePort } from './lib/ports.mjs'
import { commandLine, endProcess, run } from './lib/processes.mjs'
import { complain, say, Stop } from './lib/say.mjs'
import {
  checkNode,
  DATABASE_PACKAGES,
  installDebianPackages,
  installNpmPackages,
} from './lib/setup.mjs'
import { startMariadb } from './mariadb.mjs'

const FIRST_PORT = 8080
const MOST_RESTARTS = 5
const RESTART_WINDOW_MS = 60_000

const OWNER = join(DATA, 'running.json')
const SECRETS = join(DATA, 'secrets.json')
const SIGN_INS = join(DATA, 'demo-sign-ins.json')
const API_LOG = join(DATA, 'api.log')

const parent = process.ppid
let database = null
let api = null
let stopping = false

async function stop(status) {
  if (stopping) return
  stopping = true
  if (api?.pid && api.exitCode === null) await endProcess(api.pid)
  if (database) await database.stop()
  const owner = readJson(OWNER)
  if (owner?.pid === process.pid) rmSync(OWNER, { force: true })
  process.exit(status)
}

/** Ctrl-C, a closed terminal, a killed npm: whatever ends us ends what we started, in order. */
function listenForTheEnd() {
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) {
    process.on(signal, () => {
      if (!stopping) say('\nStopping ...')
      void stop(0)
    })
  }
  setInterval(() => {
    if (process.ppid !== parent) void stop(0)
  }, 500).unref()
}

function refuseSecondStart() {
  const owner = readJson(OWNER)
  if (!owner || owner.pid === process.pid) return
  const command = commandLine(owner.pid)
  if (!command?.some((part) => part.endsWith('start.mjs'))) return
  throw new Stop(
    `Coaxwain is running already${owner.address ? ` at ${owner.address}` : ''} (process ${owner.pid}).`,
    0,
  )
}

function secret() {
  const known = readJson(SECRETS)?.session
  if (known) return known
  const session = randomBytes(48).toString('base64url')
  writePrivateJson(SECRETS, { session })
  return session
}

const environment = (port) => ({
  PATH: process.env.PATH,
  ...(process.env.TZ ? { TZ: process.env.TZ } : {}),
  NODE_ENV: 'production',
  COAXWAIN_MODE: 'demo',
  PORT: String(port),
  COAXWAIN_SECRET: secret(),
  COAXWAIN_DB_HOST: database.host,
  COAXWAIN_DB_PORT: String(database.port),
  COAXWAIN_DB_USER: database.user,
  COAXWAIN_DB_PASSWORD: database.password,
  COAXWAIN_DB_NAME: database.database,
  COAXWAIN_CLIENT: inRoot('apps/catalogue/dist'),
  COAXWAIN_DEMO_FILE: SIGN_INS,
})

async function prepare() {
  const { status, output } = await run(process.execPath, [inRoot('apps/api/dist/prepare.js')], {
    env: environment(0),
    quiet: true,
  })
  writeFileSync(join(DATA, 'prepare.log'), output, { mode: 0o600 })
  if (status !== 0) throw new Stop(`The database could not be prepared:\n${output}`)
}

/** Its own process group, so that Ctrl-C reaches it through us; its channel tells it when we are gone. */
function startApi(port) {
  const log = openSync(API_LOG, 'a', 0o600)
  api = spawn(process.execPath, [inRoot('apps/api/dist/server.js')], {
    env: environment(port),
    detached: true,
    stdio: ['ignore', log, log, 'ipc'],
  })
  closeSync(log)
  return new Promise((resolve, reject) => {
    api.once('message', () => resolve())
    api.once('exit', () => reject(new Stop(`The server ended; its log is ${API_LOG}.`)))
  })
}

function keepApiRunning(port) {
  const restarts = []
  const watch = () => {
    api.once('exit', async (status, signal) => {
      if (stopping) return
      complain(`The server ended (${signal ?? status}); its log is ${API_LOG}. Starting it again.`)
      const now = Date.now()
      restarts.push(now)
      if (restarts.filter((at) => now - at < RESTART_WINDOW_MS).length > MOST_RESTARTS) {
        complain('It ends again and again.')
        await stop(1)
        return
      }
      await startApi(port).then(watch, async (error) => {
        complain(error.message)
        await stop(1)
      })
    })
  }
  watch()
}

function printSignIns() {
  if (!existsSync(SIGN_INS)) return
  const people = JSON.parse(readFileSync(SIGN_INS, 'utf8'))
  say('\nPeople of the demonstration, and their pass phrases:')
  const widest = Math.max(...people.map((p) => p.email.length))
  for (const p of people) {
    say(`  ${p.email.padEnd(widest)}   ${p.passPhrase}`)
    say(`  ${' '.repeat(widest)}   ${p.name}; ${p.roles.join(', ') || 'no collection'}`)
  }
}

async function main() {
  listenForTheEnd()
  checkNode()
  refuseSecondStart()
  await installDebianPackages(DATABASE_PACKAGES)
  await installNpmPackages()
  mkdirSync(DATA, { recursive: true })
  writePrivateJson(OWNER, { pid: process.pid })
  await build()
  const taken = (port) => say(`Port ${port} is in use; trying the next one.`)
  database = await startMariadb({ folder: join(DATA, 'mariadb'), onPortTaken: taken })
  await prepare()
  const port = await freePort(Number(process.env.PORT ?? FIRST_PORT), taken)
  await startApi(port)
  keepApiRunning(port)
  const address = `http://127.0.0.1:${port}/`
  writePrivateJson(OWNER, { pid: process.pid, address })
  printSignIns()
  say(`\nCoaxwain is ready at ${address}   (Ctrl-C stops it)`)
}

main().catch(async (error) => {
  if (stopping) return
  complain(error instanceof Stop ? error.message : error.stack)
  await stop(error instanceof Stop ? error.status : 1)
})
