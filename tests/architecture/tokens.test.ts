import { readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { describe, expect, it } from 'vitest'

const ROOT = fileURLToPath(new URL('../../apps/catalogue/src', import.meta.url))
const CSS = readFileSync(join(ROOT, 'styles/tokens.css'), 'utf8')

const SCREEN = CSS.slice(0, CSS.indexOf('@media print'))

type Theme = 'day' | 'night'
const TOKENS = new Map(
  [...SCREEN.matchAll(/--([a-z0-9-]+): light-dark\((#[0-9a-f]{6}), (#[0-9a-f]{6})\)/g)].map(
    ([, name = '', day = '', night = '']) => [name, { day, night }],
  ),
)

function colour(token: string, theme: Theme): string {
  const found = TOKENS.get(token)
  if (!found) throw new Error(`no token ${token}`)
  return found[theme]
}

/** Relative luminance and contrast as WCAG 2.2 defines them. */
function luminance(hex: string): number {
  const [r = 0, g = 0, b = 0] = [1, 3, 5].map((i) => {
    const c = parseInt(hex.slice(i, i + 2), 16) / 255
    return c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4
  })
  return 0.2126 * r + 0.7152 * g + 0.0722 * b
}

function contrast(a: string, b: string): number {
  const [low = 0, high = 0] = [luminance(a), luminance(b)].sort((x, y) => x - y)
  return (high + 0.05) / (low + 0.05)
}

const GROUNDS = ['paper', 'sheet', 'panel']
const TEXT = ['ink', 'ink2', 'ink3', 'amber', 'ok', 'part', 'dead']
const BANDS = [...TOKENS.keys()].filter((t) => t.startsWith('cable-'))
const THEMES: readonly Theme[] = ['day', 'night']

const below = (pairs: readonly (readonly [string, string])[], least: number): string[] =>
  THEMES.flatMap((theme) =>
    pairs
      .map(([front, back]) => ({
        name: `${front} on ${back}, ${theme}`,
        ratio: contrast(colour(front, theme), colour(back, theme)),
      }))
      .filter(({ ratio }) => ratio < least)
      .map(({ name, ratio }) => `${name}: ${ratio.toFixed(2)}`),
  )

describe('contrast of the tokens', () => {
  it('reads every token of the table, by day and at night', () => {
    expect(TOKENS.size).toBeGreaterThanOrEqual(30)
    expect(BANDS).toHaveLength(13)
  })

  it('is 4.5 or more for text on every ground', () => {
    expect(
      below(
        TEXT.flatMap((t) => GROUNDS.map((g) => [t, g] as const)),
        4.5,
      ),
    ).toEqual([])
    expect(below([['on-amber', 'amber']], 4.5)).toEqual([])
  })

  it('is 3 or more for borders, focus and everything drawn', () => {
    expect(
      below(
        ['edge', 'ink'].flatMap((t) => GROUNDS.map((g) => [t, g] as const)),
        3,
      ),
    ).toEqual([])
  })

  it('is 3 or more for the line of a cable on its band, and 4.5 for the letter on its plug', () => {
    expect(
      below(
        BANDS.map((b) => ['on-band', b] as const),
        4.2,
      ),
    ).toEqual([])
  })

  it('is 4.5 or more for ink on the glow of a control', () => {
    expect(below([['on-band', 'glow']], 4.5)).toEqual([])
  })

  it('keeps the figures of the design by day', () => {
    expect(contrast(colour('amber', 'day'), colour('paper', 'day'))).toBeCloseTo(5.3, 1)
    expect(contrast(colour('ink', 'day'), colour('panel', 'day'))).toBeCloseTo(12.3, 1)
  })
})

const SOURCES = readdirSync(ROOT, { recursive: true })
  .map(String)
  .filter((name) => /\.(vue|css)$/.test(name))
  .map((name) => ({ name, text: readFileSync(join(ROOT, name), 'utf8') }))

const guilty = (pattern: RegExp, among: (name: string) => boolean): string[] =>
  SOURCES.filter((f) => among(f.name) && pattern.test(f.text)).map((f) => f.name)

describe('colours', () => {
  it('stand in the token file alone', () => {
    const literal = /#[0-9a-f]{3,8}\b|\b(rgb|hsl)a?\(/i
    expect(guilty(literal, (name) => !name.endsWith('tokens.css'))).toEqual([])
  })

  it('are never bound as style text, which the content policy forbids', () => {
    expect(guilty(/\s:?style=/, (name) => name.endsWith('.vue'))).toEqual([])
  })
})
