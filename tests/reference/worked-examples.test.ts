import { spawnSync } from 'node:child_process'
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { afterAll, describe, expect, it } from 'vitest'
import { differences, type Check } from './check'
import { failuresOf, KINDS, readChecks, runChecks } from './run'

const FILE = fileURLToPath(new URL('./data/worked-examples.json', import.meta.url))
const checks = readChecks(readFileSync(FILE, 'utf8'))

describe('worked examples', () => {
  it.each(checks.map((c) => [c.kind, c.id, c] as const))('%s %s', (_kind, _id, check) => {
    expect(failuresOf(check)).toEqual([])
  })

  it('have an example of every kind that is worked out', () => {
    expect(Object.keys(KINDS).sort()).toEqual([...new Set(checks.map((c) => c.kind))].sort())
  })
})

/** Every number, string and boolean that a check expects, each spoilt in turn. */
function spoilt(expected: unknown): unknown[] {
  if (typeof expected === 'number') return [expected + 1]
  if (typeof expected === 'string') return [`${expected}?`]
  if (typeof expected === 'boolean') return [!expected]
  if (Array.isArray(expected)) return [[...(expected as unknown[]), 0]]
  if (expected === null || typeof expected !== 'object') return []
  return Object.entries(expected).flatMap(([name, value]) =>
    spoilt(value).map((wrong) => ({ ...expected, [name]: wrong })),
  )
}

describe('a check', () => {
  it('fails when any one of its figures is wrong', () => {
    const slipped = checks.flatMap((check) =>
      spoilt(check.expected)
        .map((expected): Check => ({ ...check, expected }))
        .filter((wrong) => failuresOf(wrong).length === 0)
        .map((wrong) => `${wrong.id} ${JSON.stringify(wrong.expected)}`),
    )
    expect(slipped).toEqual([])
  })

  it('fails where its inputs lack something or are of another sort', () => {
    const [check] = checks.filter((c) => c.kind === 'reflection')
    expect(failuresOf({ ...check!, inputs: {} })).toEqual(['inputs have no number z0_ohm'])
    expect(failuresOf({ ...check!, inputs: { z0_ohm: '75', load_ohm: 300 } })).toHaveLength(1)
  })

  it('fails with the code of the problem where there is no such figure', () => {
    const check = { id: 'x', kind: 'attenuator', inputs: { z_ohm: 75, loss_db: 0 }, expected: {} }
    expect(failuresOf(check)).toEqual(['not-positive {"what":"loss","value":0}'])
  })

  it.each(['no_such_kind', 'toString'])('of the unknown kind %s fails and says so', (kind) => {
    expect(failuresOf({ id: 'x', kind, inputs: {}, expected: 1 })).toEqual([`unknown kind ${kind}`])
  })

  it('compares no null, and numbers within the tolerance only', () => {
    expect(differences({ a: null, b: 1 }, { b: 1.01 }, 0.02)).toEqual([])
    expect(differences({ b: 1 }, { b: 1.03 }, 0.02)).toHaveLength(1)
    expect(differences([1, 2], [1], 0)).toHaveLength(1)
    expect(differences('low', 'ok', 5)).toHaveLength(1)
  })
})

describe('a report', () => {
  it('counts by kind', () => {
    const [good] = checks
    const report = runChecks([good!, { ...good!, expected: 1e9 }, { ...good!, kind: 'other' }])
    expect(report).toMatchObject({
      passed: 1,
      failed: 2,
      kinds: [
        { kind: good!.kind, passed: 1, failed: 1 },
        { kind: 'other', passed: 0, failed: 1 },
      ],
    })
  })
})

describe('npm run reference', () => {
  const folder = mkdtempSync(join(tmpdir(), 'reference-'))
  afterAll(() => rmSync(folder, { recursive: true }))

  const run = (...files: string[]) =>
    spawnSync('node', ['--import', 'tsx', 'tests/reference/main.ts', ...files], {
      cwd: fileURLToPath(new URL('../..', import.meta.url)),
      encoding: 'utf8',
    })

  const written = (name: string, content: string): string => {
    const file = join(folder, name)
    writeFileSync(file, content)
    return file
  }

  it('prints the count of each kind and of all, over several files', () => {
    const { status, stdout } = run(FILE, FILE)
    expect(stdout).toContain('video_divider: 16 of 16\n')
    expect(stdout).toContain(`${2 * checks.length} passed, 0 failed\n`)
    expect(status).toBe(0)
  })

  it('names an unknown kind and leaves with an error', () => {
    const check = { id: 'x-1', kind: 'no_such_kind', inputs: {}, expected: 1 }
    const { status, stdout } = run(written('unknown.json', JSON.stringify([check])))
    expect(stdout).toContain('FAIL no_such_kind x-1: unknown kind no_such_kind\n')
    expect(stdout).toContain('0 passed, 1 failed\n')
    expect(status).toBe(1)
  })

  it('leaves with an error where a file is missing or holds no checks', () => {
    expect(run().status).toBe(2)
    expect(run(join(folder, 'missing.json')).status).toBe(2)
    expect(run(written('other.json', '{"rows":[]}')).status).toBe(2)
    expect(run(written('none.json', '[]')).status).toBe(1)
  })
})
