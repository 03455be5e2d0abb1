import type { Label, Point } from './boxes'
import { solveColumns, type Columns } from './columns'
import { layoutControl, type Glyph } from './controls'
import type { FaceInput, FacePort } from './face-input'
import { textWidth } from './text-width'

export interface DrawnSocket extends Point {
  readonly port: FacePort
  /** 32 as a symbol; 10 as a bare ring in compact panels. */
  readonly size: 32 | 10
  /** From the socket down to the panel's lower edge, for a cable that leaves it. */
  readonly exit: readonly Point[]
}

export interface DrawnControl extends Point {
  readonly key: string
  readonly number: number | null
  readonly glyph: Glyph
}

export interface Bracket {
  readonly x1: number
  readonly x2: number
  readonly y: number
}

export interface Face {
  readonly w: number
  readonly h: number
  readonly caption: Label | null
  readonly moulded: boolean
  readonly sockets: readonly DrawnSocket[]
  readonly labels: readonly Label[]
  readonly brackets: readonly Bracket[]
  readonly controls: readonly DrawnControl[]
  /** Lines of a moulded back, as heights. */
  readonly vents: readonly number[]
}

const TOP = 4
const BOTTOM = 12
const ROW = 72
const THIN_ROW = 26
const JOG = 16
const CALLOUT = 24
const CAPTION = 22
const SYMBOL_Y = 54
/** Below the socket before a cable of an upper row turns aside. */
const JOG_Y = 80

interface RowBox {
  readonly y: number
  readonly thin: boolean
}

const NO_ROW: RowBox = { y: 0, thin: false }

/** Rows from the bottom edge up; a compact row without a used socket is only a strip of rings. */
function placeRows(input: FaceInput, columns: Columns, h: number): RowBox[] {
  const heights = rowHeights(input, columns)
  let y = h - BOTTOM - heights.reduce((a, b) => a + b, 0)
  return columns.rows.map((row, i) => {
    const at = { y, thin: isThin(input, row) }
    y += heights[i] ?? 0
    return at
  })
}

const isThin = (input: FaceInput, row: readonly FacePort[]): boolean =>
  input.compact && !row.some((p) => p.used)

const rowHeights = (input: FaceInput, columns: Columns): number[] =>
  columns.rows.map((row, i) =>
    isThin(input, row)
      ? THIN_ROW
      : ROW +
        (input.callouts ? CALLOUT : 0) +
        (columns.channels.some((c) => c.row === i && c.x !== columns.xOf(c.port)) ? JOG : 0),
  )

const CONTROL_GAP = 14
const TIGHT_CONTROL_GAP = 8
/** For a number right of its control, where several stand in one frame. */
const NUMBER_ROOM = 26

/** Controls side by side: their width, and how far they reach from their axis. */
interface Controls {
  readonly glyphs: readonly PlacedGlyph[]
  readonly w: number
  readonly above: number
  readonly below: number
}

interface PlacedGlyph {
  readonly key: string
  readonly number: number | null
  readonly glyph: Glyph
  readonly dx: number
}

/** Width that the controls take beside the sockets, and where each stands from the left of that. */
function placeControls(input: FaceInput): Controls {
  const side = input.ports.length > 0 ? 'above' : 'below'
  const numbers = new Set(input.controls.flatMap((c) => (c.number === null ? [] : [c.number])))
  const besides = numbers.size > 1 ? NUMBER_ROOM : 0
  const gap = input.compact ? TIGHT_CONTROL_GAP : CONTROL_GAP
  let dx = 0
  const glyphs = input.controls.map(({ key, spec, number }) => {
    const glyph = layoutControl(spec, spec.kind === 'knob' ? 'below' : side, input.compact)
    dx += glyph.left
    const placed = { key, number, glyph, dx }
    dx += glyph.right + besides + gap
    return placed
  })
  return {
    glyphs,
    w: Math.max(0, dx - gap),
    above: Math.max(0, ...glyphs.map(({ glyph }) => glyph.above)),
    below: Math.max(0, ...glyphs.map(({ glyph }) => glyph.below)),
  }
}

/** One face of a unit, drawn from its upper left corner. */
export function layoutFace(input: FaceInput): Face {
  const columns = solveColumns(input.ports, input)
  const controls = placeControls(input)
  const { w, h, controlsX, controlsY } = measure(input, columns, controls)
  const rows = placeRows(input, columns, h)
  const sockets = columns.rows.flatMap((row, i) =>
    row.map((port) => socketAt(port, columns, rows[i] ?? NO_ROW, { compact: input.compact, h })),
  )
  const named = headings(columns, rows)
  const axis = controlsY ?? controlAxis(input, rows, h)
  return {
    w,
    h,
    caption: input.caption
      ? { text: input.caption, x: 12, y: 20, anchor: 'start', size: 12, weight: 400, tone: 'ink2' }
      : null,
    moulded: input.moulded,
    sockets,
    labels: [...socketLabels(sockets, input), ...named.labels],
    brackets: named.brackets,
    controls: controls.glyphs.map(({ key, number, glyph, dx }) => ({
      key,
      number,
      glyph,
      x: controlsX + dx,
      y: controlsY === null && glyph.below > 40 ? h - glyph.below - 7 : axis,
    })),
    vents: input.vented ? vents(h, rows[0]?.y ?? h) : [],
  }
}

interface Measures {
  readonly w: number
  readonly h: number
  readonly controlsX: number
  /** Set where controls stand in a row of their own above the sockets. */
  readonly controlsY: number | null
}

/** Size of the frame, and where its controls stand: beside the sockets, above them, or alone. */
function measure(input: FaceInput, columns: Columns, controls: Controls): Measures {
  const rowsH = rowHeights(input, columns).reduce((a, b) => a + b, 0)
  const captionW = input.caption ? textWidth(input.caption, 12, 400) + 24 : 0
  const size = { rowsH, least: Math.max(input.minWidth, captionW, 64) }
  if (controls.glyphs.length === 0) return withoutControls(input, columns, size)
  if (input.ports.length === 0) return controlsAlone(input, controls, size)
  return input.controlsAbove
    ? controlsOver(input, columns, controls, size)
    : controlsBeside(input, columns, controls, size)
}

interface Size {
  readonly rowsH: number
  readonly least: number
}

const rowsHeight = (input: FaceInput, { rowsH }: Size): number =>
  Math.max(input.minHeight, 64, TOP + rowsH + BOTTOM + (input.caption ? 16 : 0))

const withoutControls = (input: FaceInput, columns: Columns, size: Size): Measures => ({
  w: Math.max(size.least, input.ports.length > 0 ? columns.w : 0),
  h: rowsHeight(input, size),
  controlsX: 0,
  controlsY: null,
})

function controlsAlone(input: FaceInput, controls: Controls, { least }: Size): Measures {
  const side = input.compact ? 8 : 11
  const w = Math.max(least, controls.w + 2 * side)
  const h = Math.max(input.minHeight, 64, controls.above + controls.below + 44)
  return { w, h, controlsX: (w - controls.w) / 2, controlsY: null }
}

function controlsOver(
  input: FaceInput,
  columns: Columns,
  controls: Controls,
  size: Size,
): Measures {
  const controlsY = TOP + (input.caption ? CAPTION : 0) + controls.above
  return {
    w: Math.max(size.least, columns.w, controls.w + 24),
    h: Math.max(input.minHeight, controlsY + controls.below + 6 + size.rowsH + BOTTOM),
    controlsX: 12,
    controlsY,
  }
}

function controlsBeside(
  input: FaceInput,
  columns: Columns,
  controls: Controls,
  size: Size,
): Measures {
  const x = Math.max(columns.w - 10, columns.reach + 8)
  return {
    w: Math.max(size.least, x + controls.w + (input.compact ? 8 : 10)),
    h: Math.max(rowsHeight(input, size), controls.above + controls.below + 20),
    controlsX: x,
    controlsY: null,
  }
}

/** The height on which controls stand: that of the lowest row of sockets. */
function controlAxis(input: FaceInput, rows: readonly RowBox[], h: number): number {
  const last = rows.at(-1)
  return input.ports.length > 0 && last && !last.thin ? last.y + SYMBOL_Y : h - 30
}

const vents = (h: number, rowsTop: number): number[] => {
  const room = rowsTop - 34
  const count = Math.min(4, Math.floor(room / 8))
  return count < 2 || h < 120 ? [] : Array.from({ length: count }, (_, i) => 34 + i * 8)
}

function socketAt(
  port: FacePort,
  columns: Columns,
  row: RowBox,
  { compact, h }: { readonly compact: boolean; readonly h: number },
): DrawnSocket {
  const x = columns.xOf(port.key)
  const y = row.y + (row.thin ? THIN_ROW / 2 : SYMBOL_Y)
  const channel = columns.channels.find((c) => c.port === port.key)
  const aside = channel && channel.x !== x
  const turn = row.y + JOG_Y
  return {
    port,
    x,
    y,
    size: compact && !port.used ? 10 : 32,
    exit: aside
      ? [
          { x, y },
          { x, y: turn },
          { x: channel.x, y: turn },
          { x: channel.x, y: h },
        ]
      : [
          { x, y },
          { x, y: h },
        ],
  }
}

function socketLabels(sockets: readonly DrawnSocket[], input: FaceInput): Label[] {
  return sockets.flatMap((s): Label[] =>
    s.size === 10
      ? []
      : [
          {
            text: s.port.label,
            x: s.x,
            y: s.y - SYMBOL_Y + 32,
            anchor: 'middle',
            size: 12,
            weight: s.port.used && !input.plain ? 600 : 400,
            tone: input.plain || s.port.used ? 'ink' : 'ink3',
          },
        ],
  )
}

/** Bracketed names over runs of sockets. */
function headings(
  columns: Columns,
  rows: readonly RowBox[],
): { labels: Label[]; brackets: Bracket[] } {
  const shown = columns.headings.flatMap((h) => {
    const row = rows[h.row]
    return row && !row.thin ? [{ h, y: row.y }] : []
  })
  return {
    brackets: shown.map(({ h, y }) => ({ x1: h.x1, x2: h.x2, y: y + 16 })),
    labels: shown.map(({ h, y }) => ({
      text: h.text,
      x: h.x,
      y: y + 12,
      anchor: 'middle',
      size: 12,
      weight: 400,
      tone: 'ink2',
    })),
  }
}
