import { box, overlaps, type Box } from './boxes'
import {
  FLAG_H,
  FLAG_W,
  LANE_PITCH,
  LANE_TOP,
  nestOrder,
  PIECE_H,
  PIECE_W,
  RIBBON_PITCH,
  spreadParts,
  type Spread,
  type Strand,
  type StrandCable,
} from './strands'

export interface LaidCable {
  readonly of: StrandCable
  readonly strand: Strand
  readonly y: number
  readonly spread: Spread
}

export interface Lanes {
  readonly cables: readonly LaidCable[]
  readonly bottom: number
  /** The two units between which something has no room, and how much more is wanted. */
  readonly short: { readonly a: number; readonly b: number; readonly by: number } | null
}

interface Taken {
  readonly area: Box
  /** Cables through the same piece may share its area. */
  readonly piece: string | null
}

const HALF_LANE = 10
const HALF_FLAG = FLAG_H / 2 + 1
const HANGING_TAG = 22
const HALF_PIECE = PIECE_H / 2 + 2
const MOST_LANES = 40

/** Gives every strand the highest lane that is free along its whole width. */
export function assignLanes(strands: readonly Strand[]): Lanes {
  const taken: Taken[] = []
  const pieceX = new Map<string, number>()
  const cables: LaidCable[] = []
  let short: Lanes['short'] = null
  let before: { strand: Strand; lane: number } | null = null

  for (const strand of nestOrder(strands)) {
    const spreads = strand.cables.map((c) => spreadParts(c, pieceX, strand.tight))
    const missing = Math.max(...spreads.map((s) => s.missing))
    if (missing > 0 && !short) short = { a: strand.a, b: strand.b, by: missing }
    for (const s of spreads) for (const p of s.pieces) pieceX.set(p.piece.key, p.x)
    const nested = before && before.strand.a === strand.a && before.strand.b === strand.b
    const first: number = nested && before ? before.lane + 1 : 0
    const hangs = spreads.some((s) => s.pieces.length > 0)
    const lane = freeLane(strand, spreads, taken, Math.max(first, hangs ? 1 : 0))
    taken.push(...areas(strand, spreads, lane))
    strand.cables.forEach((of, i) => {
      const spread = spreads[i]
      if (spread) cables.push({ of, strand, y: laneY(strand, lane, i), spread })
    })
    const lanesUsed = strand.ribbon
      ? Math.ceil(((strand.cables.length - 1) * RIBBON_PITCH) / LANE_PITCH)
      : 0
    before = { strand, lane: lane + lanesUsed }
  }
  const bottom = Math.max(0, ...cables.map((c) => c.y + (c.spread.pieces.length > 0 ? 12 : 0)))
  return { cables, bottom, short }
}

const laneY = (strand: Strand, lane: number, i: number): number =>
  LANE_TOP + LANE_PITCH * lane + (strand.ribbon ? RIBBON_PITCH * i : 0)

function areas(strand: Strand, spreads: readonly Spread[], lane: number): Taken[] {
  return strand.cables.flatMap((cable, i): Taken[] => {
    const y = laneY(strand, lane, i)
    const pieces = spreads[i]?.pieces ?? []
    const key = pieces[0]?.piece.key ?? null
    const flagged = cable.left.exit === null || cable.right.exit === null
    const half = flagged ? HALF_FLAG : HALF_LANE
    const tags = strand.tight && pieces.length > 0 ? HANGING_TAG : 0
    const x1 = cable.left.x - (cable.left.exit ? 8 : FLAG_W)
    const x2 = cable.right.x + (cable.right.exit ? 8 : FLAG_W)
    return [
      { area: box(x1, y - half, x2 - x1, 2 * half + tags), piece: key },
      ...pieces.map((p) => ({
        area: box(p.x - 3, y - HALF_PIECE, PIECE_W + 6, 2 * HALF_PIECE),
        piece: p.piece.key,
      })),
    ]
  })
}

function freeLane(
  strand: Strand,
  spreads: readonly Spread[],
  taken: readonly Taken[],
  from: number,
): number {
  for (let lane = from; lane < MOST_LANES; lane++) {
    const wanted = areas(strand, spreads, lane)
    const clash = wanted.some((w) =>
      taken.some((t) => overlaps(w.area, t.area) && (w.piece === null || w.piece !== t.piece)),
    )
    if (!clash) return lane
  }
  throw new Error(`no lane for ${strand.key}`)
}
