import { textWidth, type TextSize, type Weight } from './text-width'

export interface Point {
  readonly x: number
  readonly y: number
}

export interface Box extends Point {
  readonly w: number
  readonly h: number
}

export const box = (x: number, y: number, w: number, h: number): Box => ({ x, y, w, h })

export const boxAround = (centre: Point, w: number, h: number): Box =>
  box(centre.x - w / 2, centre.y - h / 2, w, h)

/** Whether two boxes share area, or come nearer than `clear`. Touching edges do not count. */
export const overlaps = (a: Box, b: Box, clear = 0): boolean =>
  a.x < b.x + b.w + clear - 0.01 &&
  b.x < a.x + a.w + clear - 0.01 &&
  a.y < b.y + b.h + clear - 0.01 &&
  b.y < a.y + a.h + clear - 0.01

export const shifted = (b: Box, dx: number, dy: number): Box => box(b.x + dx, b.y + dy, b.w, b.h)

/** The box from the outermost edges of several. */
export function union(boxes: readonly Box[]): Box {
  const x = Math.min(...boxes.map((b) => b.x))
  const y = Math.min(...boxes.map((b) => b.y))
  const right = Math.max(...boxes.map((b) => b.x + b.w))
  const bottom = Math.max(...boxes.map((b) => b.y + b.h))
  return box(x, y, right - x, bottom - y)
}

export type Anchor = 'start' | 'middle' | 'end'

/** A line of text; `x` is where it is anchored and `y` its baseline. */
export interface Label {
  readonly text: string
  readonly x: number
  readonly y: number
  readonly anchor: Anchor
  readonly size: TextSize
  readonly weight: Weight
  readonly tone: 'ink' | 'ink2' | 'ink3'
}

/** Height of capitals and of what hangs below the line, as shares of the size (Source Sans 3). */
const CAPITALS = 0.66
const DESCENT = 0.2

export function labelBox(label: Label): Box {
  const w = textWidth(label.text, label.size, label.weight)
  const x =
    label.anchor === 'start' ? label.x : label.anchor === 'end' ? label.x - w : label.x - w / 2
  return box(x, label.y - label.size * CAPITALS, w, label.size * (CAPITALS + DESCENT))
}

export const shiftedLabel = (label: Label, dx: number, dy: number): Label => ({
  ...label,
  x: label.x + dx,
  y: label.y + dy,
})
