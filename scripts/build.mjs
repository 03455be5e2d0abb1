import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { pathToFileURL } from 'node:url'
import { inRoot } from './lib/paths.mjs'
import { run } from './lib/processes.mjs'
import { say, seconds, Stop } from './lib/say.mjs'
import { treeHash } from './lib/tree-hash.mjs'

const API_DIST = inRoot('apps/api/dist')
const CLIENT_DIST = inRoot('apps/catalogue/dist')

const API_SOURCES = [
  'apps/api/src',
  'packages',
  'database',
  'package-lock.json',
  'scripts/build.mjs',
]
const CLIENT_SOURCES = ['apps/catalogue', 'packages', 'package-lock.json', 'scripts/build.mjs']

const isFresh = (folder, hash) => {
  const stamp = join(folder, '.stamp')
  return existsSync(stamp) && readFileSync(stamp, 'utf8') === hash
}

/** Own packages in, everything of node_modules outside: their code is read where it lies. */
async function buildApi() {
  const { build, stop } = await import('esbuild')
  rmSync(API_DIST, { recursive: true, force: true })
  await build({
    entryPoints: ['server', 'prepare', 'add-owner'].map((name) =>
      inRoot(`apps/api/src/${name}.ts`),
    ),
    outdir: API_DIST,
    bundle: true,
    splitting: true,
    format: 'esm',
    platform: 'node',
    target: 'node20',
    plugins: [{ name: 'packages', setup: leavePackagesOut }],
    logLevel: 'warning',
  })
  await stop()
}

function leavePackagesOut(builder) {
  builder.onResolve({ filter: /^[^./]/ }, ({ path, kind }) =>
    kind === 'entry-point' || path.startsWith('@coaxwain/') ? null : { path, external: true },
  )
}

async function buildClient() {
  const vite = inRoot('node_modules/vite/bin/vite.js')
  const args = [vite, 'build', 'apps/catalogue', '--logLevel', 'warn']
  const { status, output } = await run(process.execPath, args, { cwd: inRoot(), quiet: true })
  if (status !== 0) throw new Stop(`The client could not be built:\n${output}`)
}

async function buildIfStale(name, folder, sources, work) {
  const hash = treeHash(sources)
  if (isFresh(folder, hash)) return false
  const start = Date.now()
  say(`Building the ${name} ...`)
  await work()
  mkdirSync(folder, { recursive: true })
  writeFileSync(join(folder, '.stamp'), hash)
  say(`Built in ${seconds(start)} s.`)
  return true
}

/** Builds what has changed since it was built last; the stamp is written last, inside the output. */
export async function build() {
  await buildIfStale('server', API_DIST, API_SOURCES, buildApi)
  await buildIfStale('client', CLIENT_DIST, CLIENT_SOURCES, buildClient)
}

if (import.meta.url === pathToFileURL(process.argv[1]).href) {
  build().catch((error) => {
    process.stderr.write(`${error instanceof Stop ? error.message : error.stack}\n`)
    process.exitCode = 1
  })
}
