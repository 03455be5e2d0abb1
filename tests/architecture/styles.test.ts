import { readdirSync, readFileSync } from 'node:fs'
import { dirname, join, relative, resolve } from 'node:path'
import { fileURLToPath } from 'node:url'
import { describe, expect, it } from 'vitest'

const ROOT = fileURLToPath(new URL('../../apps/catalogue/src', import.meta.url))
/** Sheets that only change what others have styled. */
const OVERRIDES = ['phone.css', 'print.css', 'tokens.css']

interface Part {
  readonly uses: ReadonlySet<string>
  readonly styles: ReadonlySet<string>
  readonly imports: readonly string[]
}

const found = (text: string, pattern: RegExp): string[] =>
  [...text.matchAll(pattern)].map(([, hit = '']) => hit)

const classesIn = (css: string): Set<string> => new Set(found(css, /\.([a-z][a-z0-9-]*)/g))

function readPart(path: string): Part {
  const source = readFileSync(path, 'utf8')
  const [script = ''] = found(source, /<script[^>]*>([\s\S]*?)<\/script>/g)
  const [template = ''] = found(source, /<template>([\s\S]*)<\/template>/g)
  const plain = found(template, /\sclass="([^"]*)"/g).flatMap((names) => names.split(/\s+/))
  const bound = found(template, /:class="([^"]*)"/g).flatMap((value) => found(value, /'([^']+)'/g))
  return {
    uses: new Set([...plain, ...bound]),
    styles: classesIn(found(source, /<style>([\s\S]*?)<\/style>/g).join('\n')),
    imports: found(script, /from '(\.[^']+\.vue)'/g).map((to) => resolve(dirname(path), to)),
  }
}

const files = readdirSync(ROOT, { recursive: true, encoding: 'utf8' })
const parts = new Map(
  files
    .filter((file) => file.endsWith('.vue'))
    .map((file) => [join(ROOT, file), readPart(join(ROOT, file))] as const),
)
const everywhere = classesIn(
  files
    .filter((file) => file.endsWith('.css') && !OVERRIDES.some((o) => file.endsWith(o)))
    .map((file) => readFileSync(join(ROOT, file), 'utf8'))
    .join('\n'),
)

/** A component and all that come with it, wherever it is shown. */
function comesWith(path: string, met = new Set<string>()): Set<string> {
  if (!met.has(path)) {
    met.add(path)
    parts.get(path)?.imports.forEach((to) => comesWith(to, met))
  }
  return met
}

const frame = comesWith(join(ROOT, 'App.vue'))

/** Classes that look as they should only if some other page was opened before. */
function borrowed(path: string, { uses }: Part): string[] {
  const near = new Set([...comesWith(path), ...frame])
  return [...uses].filter((name) => {
    if (name.startsWith('is-') || everywhere.has(name)) return false
    const owners = [...parts].filter(([, part]) => part.styles.has(name)).map(([owner]) => owner)
    return owners.length > 0 && !owners.some((owner) => near.has(owner))
  })
}

describe('styles', () => {
  it('come with whatever uses them, on whichever page it is opened first', () => {
    const wrong = [...parts].flatMap(([path, part]) =>
      borrowed(path, part).map((name) => `${relative(ROOT, path)}: ${name}`),
    )
    expect(wrong).toEqual([])
  })

  it('are read from all components', () => {
    expect(parts.size).toBeGreaterThan(80)
    expect(everywhere.has('sheet')).toBe(true)
  })
})
