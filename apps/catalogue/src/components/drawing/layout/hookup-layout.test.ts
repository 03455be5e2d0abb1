import { stepsOf } from '@coaxwain/shelf'
import { describe, expect, it } from 'vitest'
import { HOOKUP, QUESTION, SNAPSHOT } from '../../../fixtures/disc-to-set'
import { randomDrawing } from '../../../fixtures/random-drawings'
import { createLookup } from '../../../format/lookup'
import { sayIn } from '../../../format/words'
import { toDrawing } from '../../hookup/to-drawing'
import { box, overlaps, type Box } from './boxes'
import type { DrawingInput, LayoutOptions } from './drawing-input'
import { layoutHookup, wordBoxes, type HookupLayout } from './hookup-layout'
import { corners } from './paths'

const SHEET: LayoutOptions = {
  width: 1152,
  stacked: false,
  repeat: false,
  scrolls: false,
  compact: false,
}
const PHONE: LayoutOptions = { ...SHEET, width: Infinity, repeat: true, scrolls: true }
const PRINT: LayoutOptions = { ...SHEET, width: 692, stacked: true, compact: true }

const example = (carried = true): DrawingInput =>
  toDrawing({
    hookup: HOOKUP,
    question: QUESTION,
    lookup: createLookup(SNAPSHOT),
    steps: stepsOf(HOOKUP, SNAPSHOT),
    say: sayIn('en-GB'),
    carried,
  })

/** Pairs of words or numbers that share area. */
function clashes(layout: HookupLayout): string[] {
  const boxes = wordBoxes(layout)
  return boxes.flatMap((a, i) =>
    boxes
      .slice(i + 1)
      .filter((b) => overlaps(a.box, b.box, -0.5))
      .map((b) => `${a.what} / ${b.what}`),
  )
}

interface Segment {
  readonly cable: string
  readonly area: Box
}

function segments(layout: HookupLayout): Segment[] {
  return layout.rows.flatMap(({ row }) =>
    row.runs.flatMap((run) => {
      const points = corners(run.points)
      return points.slice(1).map((p, i) => {
        const q = points[i] ?? p
        const x = Math.min(p.x, q.x)
        const y = Math.min(p.y, q.y)
        return {
          cable: run.cable,
          area: box(x - 4, y - 4, Math.abs(p.x - q.x) + 8, Math.abs(p.y - q.y) + 8),
        }
      })
    }),
  )
}

/** Words that some cable runs over; a cable's own number and tag sit on it. */
function overrun(layout: HookupLayout): string[] {
  const marks = layout.rows.flatMap(({ row }) =>
    row.marks.map((m) => ({ cable: m.cable, box: m.box })),
  )
  const ribbons = new Set(
    layout.rows.flatMap(({ row }) => row.runs.filter((r) => r.thin).map((r) => r.cable)),
  )
  const words = wordBoxes(layout).filter(
    (w) => !w.what.startsWith('join') && !w.what.startsWith('flag'),
  )
  return segments(layout).flatMap((s) => [
    ...words.filter((w) => overlaps(s.area, w.box, -1)).map((w) => `${s.cable} over ${w.what}`),
    ...marks
      .filter((m) => m.cable !== s.cable && !(ribbons.has(m.cable) && ribbons.has(s.cable)))
      .filter((m) => overlaps(s.area, m.box, -6))
      .map((m) => `${s.cable} over the number of ${m.cable}`),
  ])
}

function framesOverrun(layout: HookupLayout): string[] {
  const frames = layout.rows.flatMap(({ row, shelf }) =>
    row.units.flatMap(({ x, box: u }) =>
      u.faces.map((f) => ({
        unit: u.unit.key,
        area: box(x + f.x, shelf + f.y, f.face.w, f.face.h),
      })),
    ),
  )
  return frames.flatMap((a, i) =>
    frames
      .slice(i + 1)
      .filter((b) => overlaps(a.area, b.area))
      .map((b) => `${a.unit} / ${b.unit}`),
  )
}

describe('layout of a hookup', () => {
  it('draws the example in full panels on one line of the sheet', () => {
    const layout = layoutHookup(example(), SHEET)
    expect([layout.mode, layout.rows.length]).toEqual(['full', 1])
    expect(layout.w).toBeLessThanOrEqual(1152)
  })

  it('gives the first lane 28 below the shelf line and the next ones 20 more', () => {
    const { rows } = layoutHookup(example(), SHEET)
    const lanes = new Set(
      rows[0]?.row.marks.flatMap((m) => m.numbers.map((n) => n.at.y - (rows[0]?.shelf ?? 0))),
    )
    expect([...lanes].sort((a, b) => a - b)).toEqual([28, 48, 68])
  })

  it('nests leads of one pair: the socket nearest the gap takes the top lane', () => {
    const { rows } = layoutHookup(example(), SHEET)
    const marks = rows[0]?.row.marks.filter((m) => ['V', 'R', 'L'].includes(m.tag)) ?? []
    expect([...marks].sort((a, b) => a.tagBox.y - b.tagBox.y).map((m) => m.tag)).toEqual([
      'V',
      'R',
      'L',
    ])
  })

  it('draws the lowest lane first, so that a crossing breaks the cable beneath', () => {
    const runs = layoutHookup(example(), SHEET).rows[0]?.row.runs ?? []
    const lanes = runs.map((r) => Math.max(...r.points.map((p) => p.y)))
    expect(lanes).toEqual([...lanes].sort((a, b) => b - a))
  })

  it('names every run of every cable', () => {
    const layout = layoutHookup(example(), SHEET)
    expect(
      layout.rows.flatMap(({ row }) => row.marks.flatMap((m) => m.numbers.map((n) => n.number))),
    ).toEqual(expect.arrayContaining([2, 3, 3, 4, 5]))
  })

  it('folds six units to two rows joined by flags', () => {
    const layout = layoutHookup(randomDrawing(3, 6), SHEET)
    expect(layout.mode).toBe('folded')
    const flags = layout.rows.map(({ row }) => row.flags.map((f) => f.letter).sort())
    expect(flags[0]?.length).toBeGreaterThan(0)
    expect(new Set(flags.flat()).size * 2).toBe(flags.flat().length)
  })

  it('prints the example on one line of the printed sheet', () => {
    const layout = layoutHookup(example(false), PRINT)
    expect(layout.rows.length).toBe(1)
    expect(layout.w).toBeLessThanOrEqual(692)
  })

  it('never folds where the drawing may scroll', () => {
    const layout = layoutHookup(randomDrawing(3, 6), PHONE)
    expect([layout.mode, layout.rows.length]).toEqual(['full', 1])
  })

  it('runs the circuits of one lead as a ribbon from five units on', () => {
    const many = layoutHookup(randomDrawing(5, 5), SHEET)
    const few = layoutHookup(example(), SHEET)
    expect(many.rows.some(({ row }) => row.runs.some((r) => r.thin))).toBe(true)
    expect(few.rows.some(({ row }) => row.runs.some((r) => r.thin))).toBe(false)
  })

  it('uses right angles only', () => {
    const layout = layoutHookup(randomDrawing(11, 5), SHEET)
    const slanted = layout.rows.flatMap(({ row }) =>
      row.runs.flatMap((r) =>
        corners(r.points).filter((p, i, all) => {
          const q = all[i - 1]
          return q !== undefined && p.x !== q.x && p.y !== q.y
        }),
      ),
    )
    expect(slanted).toEqual([])
  })
})

describe.each([
  ['on the sheet', SHEET],
  ['on a phone', PHONE],
  ['in print', PRINT],
])('words of many hookups %s', (_, options) => {
  it('stand clear of one another', () => {
    const found: string[] = []
    for (let seed = 1; seed <= 240; seed++) {
      const units = 2 + (seed % 6)
      const layout = layoutHookup(randomDrawing(seed, units), options)
      found.push(...clashes(layout).map((c) => `${seed}: ${c}`))
    }
    expect(found).toEqual([])
  })

  it('are never crossed by a cable, and no panel stands on another', () => {
    const found: string[] = []
    for (let seed = 1; seed <= 240; seed++) {
      const units = 2 + (seed % 6)
      const layout = layoutHookup(randomDrawing(seed, units), options)
      found.push(...[...overrun(layout), ...framesOverrun(layout)].map((c) => `${seed}: ${c}`))
    }
    expect(found).toEqual([])
  })
})
