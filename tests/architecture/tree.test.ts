import { readdirSync, readFileSync, statSync } from 'node:fs'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { describe, expect, test } from 'vitest'

const root = fileURLToPath(new URL('../..', import.meta.url))

const SKIPPED = new Set(['node_modules', 'dist', '.data', '.cache', '.git', 'coverage'])

function filesUnder(folder: string, ending: RegExp): string[] {
  return readdirSync(join(root, folder), { withFileTypes: true }).flatMap((entry) => {
    if (SKIPPED.has(entry.name)) return []
    const path = folder === '' ? entry.name : `${folder}/${entry.name}`
    if (entry.isDirectory()) return filesUnder(path, ending)
    return ending.test(entry.name) ? [path] : []
  })
}

const read = (path: string): string => readFileSync(join(root, path), 'utf8')

const TOP = ['apps', 'database', 'packages', 'scripts', 'tests']
/** All that the house has planned; not each is built yet. */
const PACKAGES = [
  'checker',
  'contract',
  'demo',
  'house',
  'matcher',
  'models',
  'patterns',
  'procedures',
  'quantities',
  'result',
  'shelf',
  'signal',
  'wording',
]

const visibleFolders = (folder: string): string[] =>
  readdirSync(join(root, folder))
    .filter((name) => !name.startsWith('.') && !SKIPPED.has(name))
    .filter((name) => statSync(join(root, folder, name)).isDirectory())
    .sort()

describe('the tree', () => {
  test('has the five folders on top and no other', () => {
    expect(visibleFolders('')).toEqual(TOP)
  })

  test('has only packages that the house knows, each with one sentence and one entrance', () => {
    const found = visibleFolders('packages')
    expect(found.filter((name) => !PACKAGES.includes(name))).toEqual([])
    for (const name of found) {
      const { description, exports } = JSON.parse(read(`packages/${name}/package.json`)) as {
        description: string
        exports: unknown
      }
      expect(description, name).toMatch(/\.$/)
      expect(exports).toMatchObject({ '.': './src/index.ts' })
    }
  })

  test('pins every dependency exactly, and names no address of a package', () => {
    for (const file of filesUnder('', /^package\.json$/)) {
      const manifest = JSON.parse(read(file)) as Record<string, Record<string, string> | undefined>
      for (const field of ['dependencies', 'devDependencies']) {
        for (const [name, version] of Object.entries(manifest[field] ?? {})) {
          expect(version, `${file}: ${name}`).toMatch(
            name.startsWith('@coaxwain/') ? /^\*$/ : /^\d+\.\d+\.\d+$/,
          )
        }
      }
    }
    expect(read('package-lock.json')).not.toMatch(/"resolved": "(https?|git)/)
    expect(read('.npmrc')).toMatch(/^ignore-scripts=true$/m)
  })
})

describe('the source', () => {
  const sources = ['apps', 'database', 'packages'].flatMap((f) => filesUnder(f, /\.(ts|vue)$/))
  const product = sources.filter((f) => !f.endsWith('.test.ts'))

  test('uses no statement that would bind the product to a single database server', () => {
    const banned =
      /\bget_lock\s*\(|\block\s+tables\b|engine\s*=\s*(myisam|aria|memory|archive|csv)\b/i
    expect(product.filter((f) => banned.test(read(f)))).toEqual([])
  })

  test('hands the environment over in the entry points alone', () => {
    const readers = product.filter((f) => f.startsWith('apps/api/') && /process\.env/.test(read(f)))
    expect(readers.sort()).toEqual(
      ['add-owner', 'prepare', 'server'].map((entry) => `apps/api/src/${entry}.ts`),
    )
  })

  test('puts no value into the text of a statement', () => {
    const sql = filesUnder('apps/api/src', /repository\.ts$|versions\.ts$/)
    const pasted = /(whereRaw|raw|orderByRaw|joinRaw)\(\s*`[^`]*\$\{(?!column|beyond|tie|table|own)/
    expect(sql.filter((f) => pasted.test(read(f)))).toEqual([])
  })

  test('never shows markup that came from people', () => {
    expect(product.filter((f) => /v-html|innerHTML\s*=/.test(read(f)))).toEqual([])
  })

  test('catches nothing in routes', () => {
    const routes = filesUnder('apps/api/src', /^routes\.ts$/)
    expect(routes.length).toBeGreaterThan(5)
    expect(routes.filter((f) => /\b(try|catch)\b/.test(read(f)))).toEqual([])
  })
})
