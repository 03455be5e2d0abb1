import { existsSync, readFileSync, writeFileSync } from 'node:fs'
import { userInfo } from 'node:os'
import { inRoot } from './paths.mjs'
import { run } from './processes.mjs'
import { say, seconds, Stop } from './say.mjs'
import { treeHash } from './tree-hash.mjs'

const OLDEST_NODE = [20, 19]

export function checkNode() {
  const [major, minor] = process.versions.node.split('.').map(Number)
  const [wantMajor, wantMinor] = OLDEST_NODE
  if (major < wantMajor || (major === wantMajor && minor < wantMinor)) {
    throw new Stop(
      `Node.js ${OLDEST_NODE.join('.')} or newer is needed; this is ${process.version}.`,
    )
  }
}

/** A file that proves that a Debian package is there, and the package. */
export const DATABASE_PACKAGES = [
  ['/usr/sbin/mariadbd', 'mariadb-server-core'],
  ['/usr/bin/mariadb', 'mariadb-client-core'],
]
export const BROWSER_PACKAGES = [['/usr/bin/chromium', 'chromium']]

/** Before anything slow, so that whoever lacks the right to install hears of it at once. */
export async function installDebianPackages(wanted) {
  const missing = wanted.filter(([proof]) => !existsSync(proof)).map(([, name]) => name)
  if (missing.length === 0) return
  if (userInfo().uid !== 0) {
    throw new Stop(
      `Needed and not installed: ${missing.join(', ')}. Run this line, then try again:\n` +
        `  sudo apt-get update && sudo apt-get install -y --no-install-recommends ${missing.join(' ')}`,
    )
  }
  const start = Date.now()
  say(`Installing ${missing.join(', ')} ...`)
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' }
  const lock = ['-o', 'DPkg::Lock::Timeout=300']
  await apt(['-qq', ...lock, 'update'], env)
  await apt(['-qq', ...lock, 'install', '-y', '--no-install-recommends', ...missing], env)
  say(`Installed in ${seconds(start)} s.`)
}

async function apt(args, env) {
  const { status, output } = await run('apt-get', args, { env, quiet: true })
  if (status !== 0) throw new Stop(`apt-get ${args.join(' ')} failed:\n${output}`)
}

const LOCK = ['package-lock.json', 'package.json', '.npmrc']

/** npm packages as the lock file says, unless they already are. */
export async function installNpmPackages() {
  const stamp = inRoot('node_modules/.stamp')
  const wanted = treeHash(LOCK)
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return
  const start = Date.now()
  say('Installing npm packages ...')
  const npm = process.env.npm_execpath
  const args = ['ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error']
  const { status } = npm
    ? await run(process.execPath, [npm, ...args], { cwd: inRoot() })
    : await run('npm', args, { cwd: inRoot() })
  if (status !== 0) throw new Stop('npm could not install the packages; its words stand above.')
  writeFileSync(stamp, wanted)
  say(`Installed in ${seconds(start)} s.`)
}
