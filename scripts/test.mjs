import { existsSync, mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { inRoot } from './lib/paths.mjs'
import { run } from './lib/processes.mjs'
import { complain, say, seconds, Stop } from './lib/say.mjs'
import {
  BROWSER_PACKAGES,
  checkNode,
  DATABASE_PACKAGES,
  installDebianPackages,
  installNpmPackages,
} from './lib/setup.mjs'

const AT_ONCE = 2
const isLong = process.argv.includes('--long')
/** `npm test -- api unit` runs these suites alone. */
const chosen = process.argv.slice(2).filter((a) => !a.startsWith('--'))

/** What a test wants to be printed even where it passes. */
const TOLD = 'told: '

const bin = (name) => inRoot('node_modules/.bin', name)

/** A check that passes or fails as a whole. */
const check = (name, command, args) => ({ name, work: (env) => whole(name, command, args, env) })

/** A project of vitest, counted test by test; `where` is where its tests would be. */
const project = (name, ...where) => ({ name, where, work: (env, out) => counted(name, env, out) })

const SUITES = [
  check('lint', bin('eslint'), ['--config', 'scripts/eslint.config.js', '.']),
  check('types', bin('vue-tsc'), ['-b', 'scripts/tsconfig.json']),
  check('boundaries', bin('depcruise'), [
    ...['--config', '.dependency-cruiser.cjs', '--output-type', 'err'],
    ...['apps', 'packages', 'database', 'tests'],
  ]),
  check('format', bin('prettier'), ['--check', '--log-level', 'warn', '.']),
  project('api', 'tests/api'),
  project('unit', 'packages', 'apps/api/src', 'database'),
  project('architecture', 'tests/architecture'),
  project('reference', 'tests/reference'),
  project('enumeration', 'tests/enumeration'),
  project('laws', 'tests/laws'),
  project('cases', 'tests/cases'),
  project('web', 'apps/catalogue/src'),
]

/** It mostly waits for a database that is gone, so it runs beside the others. */
const WAITING = [project('faults', 'tests/faults')]

/** They measure what a person would see, so nothing but the two of them runs. */
const ON_SITE = [project('browser', 'tests/browser'), project('looks', 'tests/browser')]

function hasTests(folder) {
  const full = inRoot(folder)
  if (!existsSync(full)) return false
  return readdirSync(full, { recursive: true, withFileTypes: true }).some(
    (e) => e.isFile() && e.name.endsWith('.test.ts') && !e.parentPath.includes('node_modules'),
  )
}

const isWanted = (suite) =>
  (chosen.length === 0 || chosen.includes(suite.name)) &&
  (suite.where === undefined || suite.where.some(hasTests))

async function whole(name, command, args, env) {
  const { status, output } = await run(command, args, { cwd: inRoot(), env, quiet: true })
  return status === 0
    ? { passed: 1, failed: 0, output: '' }
    : { passed: 0, failed: 1, output: `${name}:\n${output}` }
}

/** Skipped, unfinished and unreadable tests count as failed. */
function countReport(report) {
  const cases = report.testResults.flatMap((file) => file.assertionResults)
  const passed = cases.filter((c) => c.status === 'passed').length
  const broken = report.testResults.filter(
    (file) => file.status === 'failed' && !file.assertionResults.some((c) => c.status === 'failed'),
  )
  const left = cases.filter((c) => c.status !== 'passed' && c.status !== 'failed')
  return {
    passed,
    failed: cases.length - passed + broken.length,
    notes: left.map((c) => `  left out, so it counts as failed: ${c.fullName}`),
  }
}

async function counted(name, env, folder) {
  const file = join(folder, `${name}.json`)
  const { status, output } = await run(
    bin('vitest'),
    [
      ...['run', '--config', 'tests/vitest.config.ts', '--project', name],
      ...['--reporter=dot', '--reporter=json', `--outputFile.json=${file}`, '--no-color'],
    ],
    { cwd: inRoot(), env, quiet: true },
  )
  if (!existsSync(file))
    return { passed: 0, failed: 1, output: `${name} gave no report:\n${output}` }
  const { passed, failed, notes } = countReport(JSON.parse(readFileSync(file, 'utf8')))
  for (const line of output.split('\n'))
    if (line.startsWith(TOLD)) say(`  ${line.slice(TOLD.length)}`)
  const silent = status !== 0 && failed === 0
  const none = passed + failed === 0
  const bad = failed > 0 || silent || none
  return {
    passed,
    failed: failed + (silent || none ? 1 : 0),
    output: bad ? `${name}:\n${output}\n${notes.join('\n')}` : '',
  }
}

async function runSuite(suite, env, folder) {
  const start = Date.now()
  const result = await suite.work(env, folder).catch((error) => ({
    passed: 0,
    failed: 1,
    output: `${suite.name} could not be run: ${error.stack}`,
  }))
  const counts = `${result.passed} passed, ${result.failed} failed`
  say(`  ${suite.name.padEnd(14)} ${seconds(start).padStart(6)} s   ${counts}`)
  return result
}

async function runAll(env, folder) {
  const results = []
  const runThese = async (suites) => {
    const waiting = [...suites]
    const worker = async () => {
      for (let suite = waiting.shift(); suite; suite = waiting.shift()) {
        results.push(await runSuite(suite, env, folder))
      }
    }
    await Promise.all(Array.from({ length: AT_ONCE }, worker))
  }
  await Promise.all([runThese(SUITES.filter(isWanted)), runThese(WAITING.filter(isWanted))])
  const onSite = ON_SITE.filter(isWanted)
  // Built once here, so that the two do not build at the same time.
  if (onSite.length > 0) await buildOnce()
  await runThese(onSite)
  return results
}

async function buildOnce() {
  const { build } = await import('./build.mjs')
  await build()
}

async function withDatabase(work) {
  const { startMariadb } = await import('./mariadb.mjs')
  const folder = mkdtempSync(join(tmpdir(), 'coaxwain-tests-'))
  let database = null
  const clean = async () => {
    await database?.stop()
    rmSync(folder, { recursive: true, force: true })
  }
  const interrupted = () => void clean().finally(() => process.exit(130))
  process.once('SIGINT', interrupted).once('SIGTERM', interrupted)
  try {
    database = await startMariadb({
      folder: join(folder, 'mariadb'),
      disposable: true,
      tests: true,
      onPortTaken: (port) => say(`Port ${port} is in use; trying the next one.`),
    })
    return await work(database, folder)
  } finally {
    await clean()
  }
}

async function main() {
  const start = Date.now()
  checkNode()
  await installDebianPackages([...DATABASE_PACKAGES, ...BROWSER_PACKAGES])
  await installNpmPackages()
  const results = await withDatabase((database, folder) => {
    const { host, port, user, password, database: name } = database
    const settings = JSON.stringify({ host, port, user, password, database: name })
    const env = {
      ...process.env,
      COAXWAIN_TEST_DATABASE: settings,
      ...(isLong ? { COAXWAIN_LONG: '1' } : {}),
    }
    say('Suites, with the seconds that each took:')
    return runAll(env, folder)
  })
  for (const { output } of results) if (output !== '') complain(`\n${output}`)
  const sum = (field) => results.reduce((total, r) => total + r[field], 0)
  const failed = results.length === 0 ? 1 : sum('failed')
  say(`\nAll of it took ${seconds(start)} s.`)
  say(`${sum('passed')} passed, ${failed} failed`)
  process.exitCode = failed === 0 ? 0 : 1
}

main().catch((error) => {
  complain(error instanceof Stop ? error.message : error.stack)
  say('0 passed, 1 failed')
  process.exitCode = 1
})
