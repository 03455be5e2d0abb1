import { box, labelBox, shifted, type Box, type Label } from './boxes'
import type { DrawingInput, LayoutOptions } from './drawing-input'
import { bundle, rowCable, type Place } from './bundles'
import { layoutRow, moveRow, type Row, type RowStrand } from './row'
import { wrapText } from './text-width'
import { layoutUnit, unitLabels, type UnitBox } from './unit-box'

export interface CarriedText {
  readonly unit: string
  readonly rule: { readonly x1: number; readonly x2: number; readonly y: number }
  readonly labels: readonly Label[]
}

export interface PlacedRow {
  readonly row: Row
  /** Height of its shelf line. */
  readonly shelf: number
}

export interface HookupLayout {
  readonly w: number
  readonly h: number
  readonly mode: 'full' | 'compact' | 'folded'
  readonly rows: readonly PlacedRow[]
  readonly carried: readonly CarriedText[]
}

const FOLD_FROM = 6
const SHELF_PITCH = 250
const ROW_GAP = 44
const CUTS_TRIED = 3
const CARRIED_BELOW = 26
const UNDER = 8

/** Draws a hookup: full panels, else compact, else folded; never below its own size. */
export function layoutHookup(input: DrawingInput, options: LayoutOptions): HookupLayout {
  const draw = (compact: boolean): UnitBox[] =>
    input.units.map((unit) => layoutUnit(unit, { compact, stacked: options.stacked }))
  const many = input.units.length >= FOLD_FROM && !options.scrolls
  if (!options.compact && !many) {
    const full = oneRow(input, draw(false), options, 'full')
    if (full.w <= options.width || options.scrolls) return full
  }
  const compact = draw(true)
  if (!many) {
    const one = oneRow(input, compact, options, 'compact')
    if (one.w <= options.width || input.units.length < 2) return one
  }
  return folded(input, compact, options)
}

function oneRow(
  input: DrawingInput,
  units: readonly UnitBox[],
  options: LayoutOptions,
  mode: 'full' | 'compact',
): HookupLayout {
  const [row] = layoutRows(input, [units], options)
  if (!row) throw new Error('a hookup without units')
  const shelf = row.rise
  const moved = moveRow(row, 0, shelf)
  const carried = carriedTexts(moved, shelf)
  const below = Math.max(
    shelf + row.depth + UNDER,
    ...carried.flatMap((c) => c.labels.map((l) => l.y + UNDER)),
  )
  return {
    w: Math.ceil(Math.max(row.w, ...carriedWidth(carried), ...row.names.map(rightOf))),
    h: Math.ceil(below),
    mode,
    rows: [{ row: moved, shelf }],
    carried,
  }
}

const rightOf = (l: Label): number => {
  const b = labelBox(l)
  return b.x + b.w
}

const carriedWidth = (carried: readonly CarriedText[]): number[] =>
  carried.flatMap((c) => c.labels.map(rightOf))

/** What leaves each unit, under its own stretch of the line. */
function carriedTexts(row: Row, shelf: number): CarriedText[] {
  const y = shelf + row.depth + CARRIED_BELOW
  return row.units.flatMap(({ x, box: unit }, i): CarriedText[] => {
    const { carried, key } = unit.unit
    if (!carried) return []
    const next = row.units[i + 1]
    const room = Math.max(unit.w, (next ? next.x - 24 : row.w) - x)
    const lines = wrapText(carried.text, 14, 400, Math.max(room, 120))
    const label = (text: string, size: 12 | 14, at: number): Label => ({
      text,
      x,
      y: at,
      anchor: 'start',
      size,
      weight: 400,
      tone: size === 12 ? 'ink2' : 'ink',
    })
    return [
      {
        unit: key,
        rule: { x1: x, x2: x + unit.w, y },
        labels: [
          label(carried.lead, 12, y + 20),
          ...lines.map((t, k) => label(t, 14, y + 40 + k * 20)),
        ],
      },
    ]
  })
}

// ---------------------------------------------------------------- folding

/** Every way to cut units into so many rows without changing their order. */
function cuts(units: readonly UnitBox[], rows: number): UnitBox[][][] {
  if (rows === 1) return [[[...units]]]
  return units.slice(0, units.length - rows + 1).flatMap((_, i) => {
    const first = units.slice(0, i + 1)
    return cuts(units.slice(i + 1), rows - 1).map((rest) => [first, ...rest])
  })
}

const widest = (groups: readonly (readonly UnitBox[])[]): number =>
  Math.max(...groups.map((g) => g.reduce((w, u) => w + u.w + ROW_GAP, 0)))

/** The most even cuts are tried first; rows that do not fit make room for one row more. */
function folded(
  input: DrawingInput,
  units: readonly UnitBox[],
  options: LayoutOptions,
): HookupLayout {
  for (let n = 2; n < units.length; n++) {
    const even = cuts(units, n).sort((a, b) => widest(a) - widest(b))
    for (const groups of even.slice(0, CUTS_TRIED)) {
      const rows = layoutRows(input, groups, options)
      const w = Math.max(...rows.map((r) => r.w))
      if (w <= options.width) return pile(rows, w)
    }
  }
  const rows = layoutRows(
    input,
    units.map((u) => [u]),
    options,
  )
  return pile(rows, Math.max(...rows.map((r) => r.w)))
}

function pile(rows: readonly Row[], w: number): HookupLayout {
  let shelf = 0
  let bottom = 0
  const placed = rows.map((row, i): PlacedRow => {
    shelf = i === 0 ? row.rise : Math.max(shelf + SHELF_PITCH, bottom + row.rise + 20)
    bottom = shelf + row.depth
    return { row: moveRow(row, 0, shelf), shelf }
  })
  return {
    w: Math.ceil(w),
    h: Math.ceil(bottom + UNDER),
    mode: 'folded',
    rows: placed,
    carried: [],
  }
}

/** Lays out each row with the cables that touch it; a cable between rows ends in a flag in both. */
function layoutRows(
  input: DrawingInput,
  groups: readonly (readonly UnitBox[])[],
  options: LayoutOptions,
): Row[] {
  const places = new Map<string, Place>()
  groups.forEach((group, row) => group.forEach((u, unit) => places.set(u.unit.key, { row, unit })))
  const bundles = bundle(input, places, groups)
  let letters = 0
  const lettered = bundles.map((b) => ({
    ...b,
    letter: b.from.row === b.to.row ? null : String.fromCharCode(65 + letters++),
  }))
  return groups.map((group, row) =>
    layoutRow({
      units: group,
      repeat: options.repeat,
      tight: options.stacked,
      strands: lettered.flatMap((b): RowStrand[] => {
        if (b.from.row !== row && b.to.row !== row) return []
        return [
          {
            key: b.key,
            ribbon: b.cables.length > 1,
            letter: b.letter,
            cables: b.cables.map((c) => rowCable(c, b, row)),
          },
        ]
      }),
    }),
  )
}

// ---------------------------------------------------------------- for tests and for tying lists to the drawing

export interface NamedBox {
  readonly what: string
  readonly box: Box
}

/** Every word and number with the area that it takes; none of these may overlap another. */
export function wordBoxes(layout: HookupLayout): NamedBox[] {
  return [
    ...layout.rows.flatMap(({ row, shelf }) => [
      ...row.units.flatMap(({ x, box: unit }) => [
        ...unitLabels(unit).map((l) => ({
          what: `${unit.unit.key}: ${l.text}`,
          box: shifted(labelBox(l), x, shelf),
        })),
        ...unit.squares.map((s) => ({
          what: `${unit.unit.key}: set ${s.number}`,
          box: box(x + s.x - 10, shelf + s.y - 10, 20, 20),
        })),
      ]),
      ...row.marks.map((m) => ({
        what: `join ${m.numbers.map((n) => n.number).join(' ')} ${m.tag}`,
        box: m.box,
      })),
      ...row.names.map((l) => ({ what: l.text, box: labelBox(l) })),
      ...row.flags.map((f) => ({ what: `flag ${f.letter}`, box: f.box })),
    ]),
    ...layout.carried.flatMap((c) => c.labels.map((l) => ({ what: l.text, box: labelBox(l) }))),
  ]
}
