import { box, shiftedLabel, union, type Box, type Label, type Point } from './boxes'
import type { CableKind } from './cables'
import type { CableInput, PieceInput } from './drawing-input'
import { assignLanes, type LaidCable, type Lanes } from './lanes'
import { placeMarks, type RoundMark } from './marks'
import { placeNames, type WantedName } from './names'
import {
  FLAG_H,
  FLAG_W,
  PIECE_H,
  PIECE_W,
  RIBBON_PITCH,
  type Part,
  type Strand,
  type StrandEnd,
} from './strands'
import type { UnitBox } from './unit-box'

/** An end of a cable within a row: a socket of one of its units, or a flag at its edge. */
export type RowEnd = { readonly unit: number; readonly port: string } | 'flag'

export interface RowCable {
  readonly cable: CableInput
  /** From left to right. */
  readonly parts: readonly Part[]
  readonly left: RowEnd
  readonly right: RowEnd
}

export interface RowStrand {
  readonly key: string
  readonly ribbon: boolean
  readonly cables: readonly RowCable[]
  /** Letter of its flag, where it goes on in another row. */
  readonly letter: string | null
}

export interface DrawnRun {
  readonly look: CableKind
  readonly points: readonly Point[]
  readonly cable: string
  readonly run: number
  readonly numbers: readonly number[]
  readonly thin: boolean
}

export interface DrawnPiece {
  readonly piece: PieceInput
  readonly box: Box
  readonly axis: number
}

export interface Flag {
  readonly letter: string
  readonly side: 'left' | 'right'
  readonly box: Box
}

export interface Row {
  readonly units: readonly { readonly x: number; readonly box: UnitBox }[]
  /** From the lowest lane up: the order in which they are drawn. */
  readonly runs: readonly DrawnRun[]
  readonly pieces: readonly DrawnPiece[]
  readonly marks: readonly RoundMark[]
  readonly flags: readonly Flag[]
  readonly names: readonly Label[]
  readonly w: number
  readonly rise: number
  /** How far lanes and names reach below the shelf line. */
  readonly depth: number
}

export interface RowInput {
  readonly units: readonly UnitBox[]
  readonly strands: readonly RowStrand[]
  readonly repeat: boolean
  readonly tight: boolean
}

const UNIT_GAP = 36
const SCREEN_GAP = 28
const TIGHT_GAP = 16
const FLAG_INDENT = 40
const NAME_BELOW = 34
const ROUNDS = 40

/** A menu's screen may stand nearer to the next unit than a panel. */
function gapBefore(unit: UnitBox | undefined, tight: boolean): number {
  if (tight) return TIGHT_GAP
  return unit?.screens.some((s) => s.x + s.w >= unit.w) ? SCREEN_GAP : UNIT_GAP
}

/** Units on one shelf line with their cables below; gaps grow until everything has its place. */
export function layoutRow(input: RowInput): Row {
  const gaps = input.units.map((_, i) => gapBefore(input.units[i - 1], input.tight))
  const hasLeft = input.strands.some((s) => s.cables.some((c) => c.left === 'flag'))
  const hasRight = input.strands.some((s) => s.cables.some((c) => c.right === 'flag'))
  if (gaps.length > 0) {
    gaps[0] = hasLeft ? FLAG_INDENT : 0
    gaps.push(hasRight ? 12 : 0)
  }
  for (let round = 0; ; round++) {
    const row = tryRow(input, gaps)
    if (!row.short || round === ROUNDS) return row.row
    const gap = Math.min(Math.max(row.short.b, 0), gaps.length - 1)
    gaps[gap] = (gaps[gap] ?? 0) + row.short.by
  }
}

function tryRow(input: RowInput, gaps: readonly number[]): { row: Row; short: Lanes['short'] } {
  const xs: number[] = []
  let x = 0
  input.units.forEach((unit, i) => {
    x += gaps[i] ?? 0
    xs.push(x)
    x += unit.w
  })
  const flagX = x + (gaps[input.units.length] ?? 0)
  const strands = input.strands.map((s) => toStrand(s, input, xs, flagX))
  const lanes = assignLanes(strands)
  const { marks, short } = placeMarks(lanes.cables, input.repeat)
  const flags = input.strands.flatMap((s) => flagsOf(s, lanes.cables, flagX))
  const hasRight = flags.some((f) => f.side === 'right')
  const w = hasRight ? flagX + FLAG_W + 4 : x
  const wanted = wantedNames(lanes.cables)
  const base = lanes.bottom + (wanted.length > 0 ? NAME_BELOW : 0)
  const names = placeNames(wanted, base, Math.max(w, widestName(wanted)))
  return {
    row: {
      units: input.units.map((unit, i) => ({ x: xs[i] ?? 0, box: unit })),
      runs: drawRuns(lanes.cables),
      pieces: drawPieces(lanes.cables),
      marks,
      flags,
      names: names.labels,
      w,
      rise: Math.max(0, ...input.units.map((u) => u.rise)),
      depth: base + Math.max(0, names.lines - 1) * 16,
    },
    short: lanes.short ?? short,
  }
}

const widestName = (wanted: readonly WantedName[]): number =>
  wanted.length === 0 ? 0 : Math.max(...wanted.map((n) => n.x))

function toStrand(
  s: RowStrand,
  { units, tight }: RowInput,
  xs: readonly number[],
  flagX: number,
): Strand {
  const end = (e: RowEnd, edge: number): StrandEnd => {
    if (e === 'flag') return { x: edge, exit: null }
    const exit = units[e.unit]?.exits.get(e.port)
    const left = xs[e.unit] ?? 0
    if (!exit) throw new Error(`no socket ${e.port} on ${units[e.unit]?.unit.key ?? 'no unit'}`)
    const moved = exit.map((p) => ({ x: p.x + left, y: p.y }))
    return { x: moved.at(-1)?.x ?? left, exit: moved }
  }
  const cables = s.cables.map((c) => ({
    cable: c.cable,
    parts: c.parts,
    left: end(c.left, FLAG_W),
    right: end(c.right, flagX),
  }))
  const first = s.cables[0]
  return {
    key: s.key,
    ribbon: s.ribbon,
    tight,
    cables,
    a: first && first.left !== 'flag' ? first.left.unit : -1,
    b: first && first.right !== 'flag' ? first.right.unit : units.length,
  }
}

function drawRuns(cables: readonly LaidCable[]): DrawnRun[] {
  return [...cables]
    .sort((p, q) => q.y - p.y)
    .flatMap((c) =>
      c.spread.runs.map((span, i): DrawnRun => {
        const first = i === 0 && c.of.left.exit
        const last = i === c.spread.runs.length - 1 && c.of.right.exit
        return {
          look: span.run.look,
          points: [
            ...(first ? (c.of.left.exit ?? []) : []),
            { x: span.x1, y: c.y },
            { x: span.x2, y: c.y },
            ...(last ? [...(c.of.right.exit ?? [])].reverse() : []),
          ],
          cable: c.of.cable.key,
          run: i,
          numbers: span.run.numbers,
          thin: c.strand.ribbon,
        }
      }),
    )
}

/** A piece through which several cables go is one box over their lanes. */
function drawPieces(cables: readonly LaidCable[]): DrawnPiece[] {
  const found = new Map<string, { piece: PieceInput; boxes: Box[] }>()
  for (const c of cables) {
    for (const { piece, x } of c.spread.pieces) {
      const entry = found.get(piece.key) ?? { piece, boxes: [] }
      entry.boxes.push(box(x, c.y - PIECE_H / 2, PIECE_W, PIECE_H))
      found.set(piece.key, entry)
    }
  }
  return [...found.values()].map(({ piece, boxes }) => {
    const outline = union(boxes)
    return { piece, box: outline, axis: outline.y + outline.h / 2 }
  })
}

function flagsOf(s: RowStrand, cables: readonly LaidCable[], flagX: number): Flag[] {
  const { letter } = s
  if (letter === null) return []
  const mine = cables.filter((c) => c.strand.key === s.key)
  const top = Math.min(...mine.map((c) => c.y))
  const h = FLAG_H + RIBBON_PITCH * (s.ribbon ? mine.length - 1 : 0)
  const y = top - FLAG_H / 2
  return [
    ...(s.cables[0]?.left === 'flag'
      ? [{ letter, side: 'left' as const, box: box(0, y, FLAG_W, h) }]
      : []),
    ...(s.cables[0]?.right === 'flag'
      ? [{ letter, side: 'right' as const, box: box(flagX, y, FLAG_W + 4, h) }]
      : []),
  ]
}

/** The name of every lead once, in the middle of its lanes, and of every piece under it. */
function wantedNames(cables: readonly LaidCable[]): WantedName[] {
  const leads = new Map<string, { text: string; x1: number; x2: number }>()
  const pieces = new Map<string, WantedName>()
  for (const c of cables) {
    for (const { run, x1, x2 } of c.spread.runs) {
      if (!run.lead) continue
      const before = leads.get(run.lead.key)
      leads.set(run.lead.key, {
        text: run.lead.name,
        x1: Math.min(x1, before?.x1 ?? x1),
        x2: Math.max(x2, before?.x2 ?? x2),
      })
    }
    for (const { piece, x } of c.spread.pieces) {
      pieces.set(piece.key, { text: piece.name, x: x + PIECE_W / 2 })
    }
  }
  return [
    ...[...leads.values()].map(({ text, x1, x2 }) => ({ text, x: (x1 + x2) / 2 })),
    ...pieces.values(),
  ]
}

/** A row moved to its place in the whole drawing. */
export function moveRow(row: Row, dx: number, dy: number): Row {
  const point = (p: Point): Point => ({ x: p.x + dx, y: p.y + dy })
  const move = (b: Box): Box => box(b.x + dx, b.y + dy, b.w, b.h)
  return {
    ...row,
    units: row.units.map((u) => ({ ...u, x: u.x + dx })),
    runs: row.runs.map((r) => ({ ...r, points: r.points.map(point) })),
    pieces: row.pieces.map((p) => ({ ...p, box: move(p.box), axis: p.axis + dy })),
    marks: row.marks.map((m) => ({
      ...m,
      numbers: m.numbers.map((n) => ({ ...n, at: point(n.at) })),
      tagBox: move(m.tagBox),
      box: move(m.box),
    })),
    flags: row.flags.map((f) => ({ ...f, box: move(f.box) })),
    names: row.names.map((l) => shiftedLabel(l, dx, dy)),
  }
}
