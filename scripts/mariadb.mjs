import { spawn } from 'node:child_process'
import { randomBytes } from 'node:crypto'
import {
  chmodSync,
  existsSync,
  mkdirSync,
  openSync,
  closeSync,
  readFileSync,
  renameSync,
  rmSync,
  statSync,
  writeFileSync,
  chownSync,
} from 'node:fs'
import { connect } from 'node:net'
import { tmpdir, userInfo } from 'node:os'
import { dirname, join } from 'node:path'
import { readJson, writePrivateJson } from './lib/paths.mjs'
import { freePort, isFree } from './lib/ports.mjs'
import { commandLine, endProcess, run, wait } from './lib/processes.mjs'
import { Stop } from './lib/say.mjs'

const SERVER = '/usr/sbin/mariadbd'
const INSTALLER = '/usr/bin/mariadb-install-db'
const FIRST_PORT = 33070
const READY_MS = 60_000
/** A socket path over 107 bytes stops the server. */
const SOCKET_PATH_LIMIT = 100

const DURABLE = [
  '--innodb-flush-log-at-trx-commit=1',
  '--innodb-doublewrite=1',
  '--sync-binlog=1',
  '--innodb-buffer-pool-size=128M',
]

/** Quick and forgetful: for tests only. */
const DISPOSABLE = [
  '--innodb-flush-log-at-trx-commit=0',
  '--innodb-doublewrite=0',
  '--innodb-flush-method=nosync',
  '--skip-log-bin',
  '--innodb-buffer-pool-size=64M',
]

const COMMON = [
  '--bind-address=127.0.0.1',
  '--skip-name-resolve',
  '--character-set-server=utf8mb4',
  '--collation-server=utf8mb4_unicode_ci',
  '--innodb-log-file-size=32M',
  '--max-allowed-packet=64M',
  '--innodb-ft-min-token-size=2',
  '--innodb-lock-wait-timeout=5',
  '--max-recursive-iterations=100000',
  '--performance-schema=0',
]

/**
 * Starts a private server on loopback, or finds the one that already serves this folder.
 * `tests: true` lets the account make databases whose names begin with `coaxwain_`.
 */
export async function startMariadb({ folder, disposable = false, tests = false, onPortTaken }) {
  const place = layOut(folder)
  const settings = readJson(place.settings) ?? { password: randomBytes(24).toString('base64url') }
  const running = await findRunning(place, settings)
  if (running) return handle(place, settings, running)

  const account = chooseAccount(place, folder)
  await makeDataFolder(place, account)
  const port =
    settings.port && (await isFree(settings.port))
      ? settings.port
      : await freePort(settings.port ?? FIRST_PORT, onPortTaken)
  settings.port = port
  writePrivateJson(place.settings, settings)
  writeInit(place, account, settings.password, tests)

  const args = [
    '--no-defaults',
    ...(account.serverUser ? [`--user=${account.serverUser}`] : []),
    `--datadir=${place.data}`,
    `--port=${port}`,
    `--socket=${place.socket}`,
    `--pid-file=${place.pid}`,
    `--init-file=${place.init}`,
    `--tmpdir=${tmpdir()}`,
    ...COMMON,
    ...(disposable ? DISPOSABLE : DURABLE),
  ]
  const log = openSync(place.log, 'a')
  const child = spawn(SERVER, args, { detached: true, stdio: ['ignore', log, log] })
  closeSync(log)
  let ended = null
  child.once('exit', (status, signal) => (ended = { status, signal }))
  child.unref()
  await untilReady(port, () => ended, place)
  return handle(place, settings, child.pid)
}

function layOut(folder) {
  const inFolder = join(folder, 'server.sock')
  return {
    folder,
    data: join(folder, 'data'),
    settings: join(folder, 'settings.json'),
    pid: join(folder, 'data', 'server.pid'),
    init: join(folder, 'init.sql'),
    log: join(folder, 'server.log'),
    socket:
      Buffer.byteLength(inFolder) < SOCKET_PATH_LIMIT
        ? inFolder
        : join(tmpdir(), `coaxwain-${randomBytes(6).toString('hex')}.sock`),
  }
}

const handle = (place, settings, pid) => ({
  host: '127.0.0.1',
  port: settings.port,
  user: 'coaxwain',
  password: settings.password,
  database: 'coaxwain',
  pid,
  log: place.log,
  stop: () => endProcess(pid, 30_000),
})

/** The process that has this folder open, if there is one. */
function ownProcess(place) {
  if (!existsSync(place.pid)) return null
  const pid = Number(readFileSync(place.pid, 'utf8').trim())
  const command = pid > 0 ? commandLine(pid) : null
  const ours = command?.[0]?.endsWith('mariadbd') && command.includes(`--datadir=${place.data}`)
  return ours ? pid : null
}

async function findRunning(place, settings) {
  const pid = ownProcess(place)
  if (pid === null) return null
  // It may still be on its way up, or on its way down.
  for (let tries = 0; tries < 200 && commandLine(pid); tries += 1) {
    if (settings.port && (await greets(settings.port))) return pid
    await wait(50)
  }
  if (commandLine(pid)) {
    throw new Stop(`The database process ${pid} does not answer; its log is ${place.log}.`)
  }
  return null
}

/** As root the server wants an ordinary account; it must be able to reach the folder. */
function chooseAccount(place, folder) {
  const me = userInfo()
  mkdirSync(folder, { recursive: true })
  if (existsSync(place.data)) {
    const owner = statSync(place.data).uid
    if (owner === me.uid) return { serverUser: me.uid === 0 ? 'root' : null, uid: null }
    if (me.uid === 0) return { serverUser: String(owner), uid: owner }
    throw new Stop(`${place.data} belongs to another account (${owner}); start as that one.`)
  }
  return me.uid === 0 ? accountForRoot(folder) : { serverUser: null, uid: null }
}

function accountForRoot(folder) {
  const accounts = readFileSync('/etc/passwd', 'utf8')
    .split('\n')
    .map((row) => row.split(':'))
  for (const name of ['mysql', 'nobody']) {
    const entry = accounts.find(([account]) => account === name)
    if (!entry) continue
    const uid = Number(entry[2])
    if (reachable(folder)) return { serverUser: name, uid, gid: Number(entry[3]) }
  }
  return { serverUser: 'root', uid: null }
}

/** Every folder above must let others through. */
function reachable(folder) {
  for (let at = dirname(folder); ; at = dirname(at)) {
    if ((statSync(at).mode & 0o001) === 0) return false
    if (at === dirname(at)) return true
  }
}

/** Made beside its place and moved there when whole, so that an interrupted start leaves nothing half-made. */
async function makeDataFolder(place, account) {
  if (existsSync(place.data)) return
  const fresh = `${place.data}.new`
  rmSync(fresh, { recursive: true, force: true })
  mkdirSync(fresh, { recursive: true, mode: 0o700 })
  if (account.uid !== null) {
    chownSync(place.folder, account.uid, account.gid ?? -1)
    chownSync(fresh, account.uid, account.gid ?? -1)
  }
  const { status, output } = await run(
    INSTALLER,
    [
      '--no-defaults',
      ...(account.serverUser ? [`--user=${account.serverUser}`] : []),
      `--datadir=${fresh}`,
      '--auth-root-authentication-method=socket',
      '--skip-test-db',
      '--innodb-log-file-size=32M',
    ],
    { quiet: true },
  )
  if (status !== 0) throw new Stop(`The data folder could not be made:\n${output}`)
  renameSync(fresh, place.data)
}

/** Runs at each start before anybody can connect, so no client program is needed. */
function writeInit(place, account, password, tests) {
  const user = 'coaxwain@127.0.0.1'
  const statements = [
    'CREATE DATABASE IF NOT EXISTS coaxwain CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci;',
    `CREATE USER IF NOT EXISTS ${user} IDENTIFIED BY '${password}';`,
    `ALTER USER ${user} IDENTIFIED BY '${password}';`,
    `GRANT ALL PRIVILEGES ON coaxwain.* TO ${user};`,
    ...(tests ? [`GRANT ALL PRIVILEGES ON \`coaxwain\\_%\`.* TO ${user};`] : []),
  ]
  rmSync(place.init, { force: true })
  writeFileSync(place.init, `${statements.join('\n')}\n`, { mode: 0o600 })
  writeFileSync(place.log, '', { flag: 'a', mode: 0o600 })
  chmodSync(place.init, 0o600)
  if (account.uid !== null) chownSync(place.init, account.uid, account.gid ?? -1)
}

async function untilReady(port, ended, place) {
  const until = Date.now() + READY_MS
  while (Date.now() < until) {
    if (ended()) break
    if (await greets(port)) return
    await wait(30)
  }
  const tail = readFileSync(place.log, 'utf8').split('\n').slice(-15).join('\n')
  throw new Stop(`The database did not start. The end of its log:\n${tail}`)
}

/** The first packet of a MySQL-family server holds its protocol version, 10, as the fifth byte. */
const greets = (port) =>
  new Promise((resolve) => {
    const socket = connect({ port, host: '127.0.0.1' })
    const done = (yes) => {
      socket.destroy()
      resolve(yes)
    }
    socket.setTimeout(500, () => done(false))
    socket.once('error', () => done(false))
    socket.once('close', () => done(false))
    socket.once('data', (bytes) => done(bytes[4] === 10))
  })
