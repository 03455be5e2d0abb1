import { box, overlaps, type Box, type Point } from './boxes'
import type { LaidCable } from './lanes'
import {
  markWidth,
  NUMBER_PITCH,
  PIECE_H,
  PIECE_W,
  tagWidth,
  type RunSpan,
  type Strand,
} from './strands'

/** The numbers that say plug this, with the lead's letters beside them. */
export interface RoundMark {
  readonly numbers: readonly { readonly number: number; readonly at: Point }[]
  readonly tag: string
  readonly tagBox: Box
  readonly box: Box
  /** Cable and run that it names. */
  readonly cable: string
  readonly run: number
}

export interface Marks {
  readonly marks: readonly RoundMark[]
  readonly short: { readonly a: number; readonly b: number; readonly by: number } | null
}

const STEP = 42
const FIRST = 46
const CLEAR = 1.5
const REPEAT_OVER = 280
const REPEAT_APART = 160

/** Ways down of all cables that cross a height, and boxes hanging in the lanes. */
function obstacles(cables: readonly LaidCable[], self: LaidCable): Box[] {
  const ways = cables.flatMap((c) =>
    c === self || (c.strand === self.strand && self.strand.ribbon)
      ? []
      : [c.of.left, c.of.right].flatMap((end) =>
          end.exit && c.y > self.y - 1 ? [box(end.x - 7, 0, 14, c.y + 5)] : [],
        ),
  )
  const hanging = cables.flatMap((c) =>
    c.spread.pieces.map((p) => box(p.x - 3, c.y - PIECE_H / 2 - 2, PIECE_W + 6, PIECE_H + 4)),
  )
  return [...ways, ...hanging]
}

/** A mark that is looked for a place on a lane. */
interface Wanted {
  readonly span: RunSpan
  readonly tag: string
  readonly y: number
  /** The tag stands under its number. */
  readonly hangs: boolean
}

const markBox = ({ span, tag, y, hangs }: Wanted, x: number): Box =>
  box(x, y - 10, markWidth(span.run, tag, hangs), hangs && span.run.numbers.length > 0 ? 42 : 20)

function place(mark: Wanted, wanted: number, blocked: readonly Box[]): number | null {
  const [low, end] = mark.span.free
  const high = end - markWidth(mark.span.run, mark.tag, mark.hangs)
  const free = (x: number): boolean =>
    x >= low - 0.01 &&
    x <= high + 0.01 &&
    !blocked.some((b) => overlaps(markBox(mark, x), b, CLEAR))
  const start = Math.min(Math.max(wanted, low), Math.max(low, high))
  for (let off = 0; off <= Math.max(high - low, 0) + 2; off += 2) {
    if (free(start + off)) return start + off
    if (free(start - off)) return start - off
  }
  return null
}

function toMark(cable: LaidCable, mark: Wanted, x: number): RoundMark {
  const { span, tag, hangs } = mark
  const w = tagWidth(tag)
  const outline = markBox(mark, x)
  const count = span.run.numbers.length
  const under = hangs && count > 0
  const numbersX = under ? x + (outline.w - (count * NUMBER_PITCH - 4)) / 2 : x
  const tagX = under ? x + (outline.w - w) / 2 : x + count * NUMBER_PITCH
  return {
    numbers: span.run.numbers.map((number, i) => ({
      number,
      at: { x: numbersX + 10 + i * NUMBER_PITCH, y: cable.y },
    })),
    tag,
    tagBox: box(tagX, under ? cable.y + 13 : cable.y - 9, w, 18),
    box: outline,
    cable: cable.of.cable.key,
    run: cable.spread.runs.indexOf(span),
  }
}

/** One mark stands for a ribbon: on its middle cable, with all letters from top to bottom. */
function marked(cables: readonly LaidCable[]): { cable: LaidCable; tag: string | null }[] {
  return cables.flatMap((cable): { cable: LaidCable; tag: string | null }[] => {
    if (!cable.strand.ribbon) return [{ cable, tag: null }]
    const lanes = cable.strand.cables
    const middle = lanes[Math.floor((lanes.length - 1) / 2)]
    if (cable.of !== middle) return []
    const tag = lanes.map((c) => (c.parts[0]?.kind === 'run' ? c.parts[0].tag : '')).join(' ')
    return [{ cable, tag }]
  })
}

/** Steps along neighbouring lanes of one pair of units, so that numbers read as a stair. */
function wantedX(
  cable: LaidCable,
  stairs: Map<string, number>,
  base: ReadonlyMap<string, number>,
): number {
  const key = pairKey(cable.strand)
  const step = stairs.get(key) ?? 0
  stairs.set(key, step + 1)
  return (base.get(key) ?? cable.of.left.x) + FIRST - 10 + STEP * step
}

const pairKey = (s: Strand): string => `${s.a} ${s.b}`

export function placeMarks(cables: readonly LaidCable[], repeat: boolean): Marks {
  const placed: RoundMark[] = []
  const wanted = wantedMarks(cables)
  const lost = wanted.find((w) => {
    const x = place(w.mark, w.x, [...w.blocked, ...placed.map((m) => m.box)])
    if (x !== null) placed.push(toMark(w.cable, w.mark, x))
    return x === null && w.mark.span.run.numbers.length > 0
  })
  if (lost) {
    const { a, b } = lost.cable.strand
    return { marks: placed, short: { a, b, by: 24 } }
  }
  return { marks: repeat ? [...placed, ...repeated(wanted, placed)] : placed, short: null }
}

interface WantedMark {
  readonly cable: LaidCable
  readonly mark: Wanted
  /** Where it would best begin. */
  readonly x: number
  readonly blocked: readonly Box[]
}

/** Every run's mark, from the top lane down. */
function wantedMarks(cables: readonly LaidCable[]): WantedMark[] {
  const stairs = new Map<string, number>()
  const base = new Map<string, number>()
  for (const c of cables) {
    const key = pairKey(c.strand)
    base.set(key, Math.max(base.get(key) ?? -Infinity, c.of.left.x))
  }
  return marked([...cables].sort((p, q) => p.y - q.y)).flatMap(({ cable, tag }) => {
    const blocked = obstacles(cables, cable)
    const single = cable.spread.runs.length === 1
    const stair = single ? wantedX(cable, stairs, base) : 0
    return cable.spread.runs.map((span): WantedMark => ({
      cable,
      blocked,
      x: single ? stair : span.free[0],
      mark: {
        span,
        tag: tag ?? span.run.tag,
        y: cable.y,
        hangs: cable.strand.tight && !single,
      },
    }))
  })
}

/** The same marks once more near the far ends of long lanes, where there is room. */
function repeated(wanted: readonly WantedMark[], placed: readonly RoundMark[]): RoundMark[] {
  const again: RoundMark[] = []
  for (const { cable, mark, blocked } of wanted) {
    const { span } = mark
    const first = placed.find(
      (m) => m.cable === cable.of.cable.key && m.run === cable.spread.runs.indexOf(span),
    )
    if (!first || span.x2 - span.x1 <= REPEAT_OVER) continue
    const x = place(mark, span.free[1], [...blocked, ...[...placed, ...again].map((m) => m.box)])
    if (x !== null && x - first.box.x > REPEAT_APART) again.push(toMark(cable, mark, x))
  }
  return again
}
