import type { Point } from './boxes'
import type { CableInput, PieceInput, RunInput } from './drawing-input'
import { textWidth } from './text-width'

export type Part = RunInput | PieceInput

/** Where a cable ends: in a socket, by a way down to the shelf line, or in a flag at the row's edge. */
export interface StrandEnd {
  readonly x: number
  readonly exit: readonly Point[] | null
}

/** A cable from left to right, whichever way its signal runs. */
export interface StrandCable {
  readonly cable: CableInput
  readonly parts: readonly Part[]
  readonly left: StrandEnd
  readonly right: StrandEnd
}

/** One cable, or the circuits of one lead that run side by side as a ribbon. */
export interface Strand {
  readonly key: string
  readonly cables: readonly StrandCable[]
  readonly ribbon: boolean
  /** Tags hang under their numbers beside pieces, to save width. */
  readonly tight: boolean
  /** Positions of its two units on the shelf line; -1 and the number of units stand for the flags. */
  readonly a: number
  readonly b: number
}

export const LANE_TOP = 28
export const LANE_PITCH = 20
export const RIBBON_PITCH = 9
export const PIECE_W = 92
export const PIECE_H = 32
export const FLAG_W = 30
/** Height of a flag on a single cable; each further cable of a ribbon adds its pitch. */
export const FLAG_H = 28

/** Numbers are 20 wide and stand 4 apart, from each other and from their tag. */
export const NUMBER_PITCH = 24
const NUMBER_GAP = 4
const SOCKET_ROOM = 13
const TIGHT_SOCKET_ROOM = 9
const PIECE_ROOM = 7
const FLAG_ROOM = 8

export const tagWidth = (tag: string): number => Math.max(22, textWidth(tag, 12, 600) + 12)

/** Width of a number with its tag, or of the tag alone; where space is short the tag hangs under its number. */
export const markWidth = (run: RunInput, tag = run.tag, hangs = false): number => {
  if (run.numbers.length === 0) return tagWidth(tag)
  const numbers = run.numbers.length * NUMBER_PITCH - NUMBER_GAP
  return hangs ? Math.max(numbers, tagWidth(tag)) : numbers + NUMBER_GAP + tagWidth(tag)
}

/** A stretch of a lane between two fixed things, and what may stand on it. */
export interface RunSpan {
  readonly run: RunInput
  readonly x1: number
  readonly x2: number
  /** Free of bends and boxes. */
  readonly free: readonly [number, number]
}

export interface PieceSpan {
  readonly piece: PieceInput
  readonly x: number
}

export interface Spread {
  readonly runs: readonly RunSpan[]
  readonly pieces: readonly PieceSpan[]
  /** Pixels that are missing between the two ends. */
  readonly missing: number
}

const isRun = (part: Part): part is RunInput => part.kind === 'run'

/** Room that a cable asks for at an end of one of its runs. */
const roomAt = (end: StrandEnd, tight: boolean): number =>
  !end.exit ? FLAG_ROOM : tight ? TIGHT_SOCKET_ROOM : SOCKET_ROOM

/** Places the pieces of a cable along its lane, with room for the numbers between them. */
export function spreadParts(
  strandCable: StrandCable,
  pieceX: ReadonlyMap<string, number>,
  tight: boolean,
): Spread {
  const { parts, left, right } = strandCable
  const runs = parts.filter(isRun)
  const pieces = parts.filter((p): p is PieceInput => !isRun(p))
  const pads = runs.map((_, i) => ({
    before: i === 0 ? roomAt(left, tight) : PIECE_ROOM,
    after: i === runs.length - 1 ? roomAt(right, tight) : PIECE_ROOM,
  }))
  const needs = runs.map((run, i) => {
    const pad = pads[i] ?? { before: 0, after: 0 }
    return (
      pad.before +
      pad.after +
      (run.numbers.length === 0 && pieces.length > 0
        ? 6
        : markWidth(run, run.tag, tight && pieces.length > 0))
    )
  })
  const total = needs.reduce((a, b) => a + b, 0) + pieces.length * PIECE_W
  const slack = right.x - left.x - total
  const share = Math.max(0, slack) / Math.max(1, runs.length)
  let x = left.x
  const runSpans: RunSpan[] = []
  const pieceSpans: PieceSpan[] = []
  runs.forEach((run, i) => {
    const pad = pads[i] ?? { before: 0, after: 0 }
    const piece = pieces[i]
    const known = piece && pieceX.get(piece.key)
    const end =
      i === runs.length - 1 ? right.x : Math.max(x + 6, known ?? x + (needs[i] ?? 0) + share)
    runSpans.push({ run, x1: x, x2: end, free: [x + pad.before, end - pad.after] })
    if (piece) pieceSpans.push({ piece, x: end })
    x = end + PIECE_W
  })
  return { runs: runSpans, pieces: pieceSpans, missing: Math.max(0, Math.ceil(-slack)) }
}

/** From inner to outer: leads between neighbours first, and of one pair the socket nearest the gap. */
export function nestOrder(strands: readonly Strand[]): Strand[] {
  const leftX = (s: Strand): number => Math.max(...s.cables.map((c) => c.left.x))
  const rightX = (s: Strand): number => Math.min(...s.cables.map((c) => c.right.x))
  return [...strands].sort(
    (p, q) =>
      p.b - p.a - (q.b - q.a) ||
      p.a - q.a ||
      leftX(q) - leftX(p) ||
      rightX(p) - rightX(q) ||
      (p.key < q.key ? -1 : 1),
  )
}
