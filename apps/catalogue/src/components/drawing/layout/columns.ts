import type { FacePort } from './face-input'
import { headingRuns, type HeadingRun, type WayDown } from './headings'
import { textWidth } from './text-width'

/** Where a cable of an upper row comes down between the sockets of the rows beneath. */
export interface Channel {
  readonly port: string
  readonly row: number
  readonly x: number
}

export interface PlacedHeading {
  readonly row: number
  readonly text: string
  readonly x: number
  /** Ends of its bracket. */
  readonly x1: number
  readonly x2: number
}

export interface Columns {
  readonly rows: readonly (readonly FacePort[])[]
  readonly headings: readonly PlacedHeading[]
  readonly channels: readonly Channel[]
  readonly xOf: (port: string) => number
  readonly w: number
  /** Right end of the words. */
  readonly reach: number
}

export interface ColumnStyle {
  readonly compact: boolean
  readonly plain: boolean
  readonly vented: boolean
}

const FULL_HALF = 24
const USED_HALF = 21
const RING_HALF = 7.5
const EDGE = 12
/** A moulded back has room to spare: 40 to the first socket, then 68. */
const SPACED_HALF = 34
const SPACED_EDGE = 6
const COMPACT_EDGE = 9
const LABEL_GAP = 4
const HEADING_GAP = 8
const BRACKET = 14
/** A cable with its margins. */
const CHANNEL = 15
const ROUNDS = 80

const distinct = (values: readonly number[]): number[] => [...new Set(values)].sort((a, b) => a - b)

/** Each column may lie no nearer to an earlier one than its words and cables ask; all after it move along. */
class Places {
  readonly x: number[]
  moved = false
  constructor(halves: readonly number[], edge: number) {
    let right = edge
    this.x = halves.map((half) => {
      const centre = right + half
      right = centre + half
      return centre
    })
  }
  at(i: number): number {
    return this.x[i] ?? 0
  }
  push(i: number, by: number): void {
    if (by <= 0.01) return
    this.moved = true
    for (let k = i; k < this.x.length; k++) this.x[k] = this.at(k) + by
  }
}

interface Solver {
  readonly rows: readonly (readonly FacePort[])[]
  readonly indexOf: (port: string) => number
  readonly halves: readonly number[]
  readonly places: Places
  readonly headings: readonly HeadingRun[]
  readonly ways: readonly WayDown[]
  /** Half of a socket's printed label; nothing where none is printed. */
  readonly words: (p: FacePort) => number
  /** How far a socket with its label reaches from its centre. */
  readonly extent: (p: FacePort) => number
}

/** Places the sockets of a face on shared columns, in the order and alignment of the real panel. */
export function solveColumns(ports: readonly FacePort[], style: ColumnStyle): Columns {
  const s = createSolver(ports, style)
  for (let round = 0; round < ROUNDS; round++) {
    s.places.moved = false
    pushLabels(s)
    pushHeadings(s)
    pushWays(s)
    if (!s.places.moved) break
  }
  const xOf = (port: string): number => s.places.at(s.indexOf(port))
  const last = s.halves.length - 1
  const edge = edgeOf(style, s.halves.length)
  const channels = s.ways.map((w) => ({ port: w.port, row: w.row, x: wayX(s, w) }))
  const reach = Math.max(
    0,
    ...ports.map((p) => xOf(p.key) + s.extent(p)),
    ...s.headings.map((h) => centreOf(s, h) + h.half),
  )
  return {
    rows: s.rows,
    headings: s.headings.map((h) => ({
      row: h.row,
      text: h.text,
      x: centreOf(s, h),
      x1: s.places.at(h.first) - BRACKET,
      x2: s.places.at(h.last) + BRACKET,
    })),
    channels,
    xOf,
    w: Math.ceil(
      Math.max(
        s.places.at(last) + (s.halves[last] ?? 0) + edge,
        reach + 6,
        ...channels.map((c) => c.x + 14),
      ),
    ),
    reach,
  }
}

const edgeOf = (style: ColumnStyle, columns: number): number =>
  style.compact ? COMPACT_EDGE : style.vented && columns < 3 ? SPACED_EDGE : EDGE

function createSolver(ports: readonly FacePort[], style: ColumnStyle): Solver {
  const numbers = distinct(ports.map((p) => p.column))
  const rows = distinct(ports.map((p) => p.row)).map((row) =>
    ports.filter((p) => p.row === row).sort((a, b) => a.column - b.column),
  )
  const index = new Map(ports.map((p) => [p.key, numbers.indexOf(p.column)]))
  const indexOf = (port: string): number => index.get(port) ?? 0
  const spaced = style.vented && numbers.length < 3
  const halves = numbers.map((column) => {
    if (!style.compact) return spaced ? SPACED_HALF : FULL_HALF
    return ports.some((p) => p.column === column && p.used) ? USED_HALF : RING_HALF
  })
  const shown = (p: FacePort): boolean => !style.compact || p.used
  const words = (p: FacePort): number =>
    shown(p) ? textWidth(p.label, 12, p.used && !style.plain ? 600 : 400) / 2 : 0
  const ways = style.plain ? [] : waysDown(rows, indexOf)
  return {
    rows,
    indexOf,
    halves,
    places: new Places(halves, edgeOf(style, numbers.length)),
    headings: headingRuns(rows, indexOf, shown, ways),
    ways,
    words,
    extent: (p) => (shown(p) ? Math.max(16, words(p)) : 5),
  }
}

/** Every used socket above the last row needs a way down. */
function waysDown(
  rows: readonly (readonly FacePort[])[],
  indexOf: (port: string) => number,
): WayDown[] {
  const slots = new Map<number, number>()
  return rows.slice(0, -1).flatMap((row, i) =>
    row
      .filter((p) => p.used)
      .map((p) => {
        const column = indexOf(p.key)
        const straight = !rows
          .slice(i + 1)
          .flat()
          .some((q) => indexOf(q.key) === column)
        const taken = slots.get(column) ?? 0
        const slot = straight && taken === 0 ? 0 : taken
        slots.set(column, taken + 1)
        return { port: p.key, row: i, column, straight: straight && taken === 0, slot }
      }),
  )
}

const centreOf = (s: Solver, h: HeadingRun): number =>
  (s.places.at(h.textFirst) + s.places.at(h.textLast)) / 2

/** Neighbouring labels, and neighbouring symbols, stand clear of each other. */
function pushLabels(s: Solver): void {
  for (const row of s.rows) {
    row.forEach((port, i) => {
      const at = s.indexOf(port.key)
      if (i === 0) s.places.push(at, s.words(port) + 6 - s.places.at(at))
      const next = row[i + 1]
      if (!next) return
      const to = s.indexOf(next.key)
      const words = s.words(port) + s.words(next)
      const need = Math.max(
        words > 0 ? words + LABEL_GAP : 0,
        (s.halves[at] ?? 0) + (s.halves[to] ?? 0),
      )
      s.places.push(to, need - (s.places.at(to) - s.places.at(at)))
    })
  }
}

function pushHeadings(s: Solver): void {
  s.headings.forEach((heading, i) => {
    const before = s.headings[i - 1]
    const centre = centreOf(s, heading)
    if (!before || before.row !== heading.row) {
      s.places.push(heading.textFirst, heading.half + 8 - centre)
      return
    }
    const need = heading.half + before.half + HEADING_GAP
    const by = need - (centre - centreOf(s, before))
    s.places.push(heading.textFirst > before.textLast ? heading.textFirst : heading.first, by)
  })
}

/** How far words and sockets of lower rows reach right of a column's centre. */
function rightOf(s: Solver, way: WayDown): number {
  const sockets = s.rows
    .slice(way.row + 1)
    .flat()
    .filter((p) => s.indexOf(p.key) === way.column)
    .map(s.extent)
  const names = s.headings
    .filter((h) => h.row > way.row && h.textLast === way.column)
    .map((h) => centreOf(s, h) + h.half - s.places.at(way.column))
  return Math.max(0, ...sockets, ...names)
}

const wayX = (s: Solver, way: WayDown): number =>
  way.straight
    ? s.places.at(way.column)
    : s.places.at(way.column) + rightOf(s, way) + CHANNEL * (way.slot + 0.5)

/** Nothing of the rows beneath stands where a cable comes down. */
function pushWays(s: Solver): void {
  for (const way of s.ways) {
    for (const port of s.rows.slice(way.row + 1).flat()) {
      const at = s.indexOf(port.key)
      const x = wayX(s, way)
      if (at > way.column) s.places.push(at, x + CHANNEL / 2 + s.extent(port) - s.places.at(at))
      else if (at < way.column) {
        s.places.push(way.column, s.places.at(at) + s.extent(port) + CHANNEL / 2 - x)
      }
    }
    for (const h of s.headings) {
      if (h.row <= way.row) continue
      const x = wayX(s, way)
      const centre = centreOf(s, h)
      const right = way.straight ? h.textFirst >= way.column : h.textFirst > way.column
      if (right) s.places.push(h.textFirst, x + CHANNEL / 2 + h.half - centre)
      else if (h.textLast < way.column) {
        s.places.push(way.column, centre + h.half + CHANNEL / 2 - x)
      }
    }
  }
}
