import { box, type Box, type Label } from './boxes'
import { textWidth } from './text-width'

/** A control as it must stand, in words already chosen. `on` is null where it stands anywhere. */
export type GlyphSpec =
  | {
      readonly kind: 'slide' | 'push' | 'knob'
      readonly label: string
      readonly positions: readonly string[]
      readonly on: number | null
    }
  | { readonly kind: 'window'; readonly label: string; readonly value: string }
  | { readonly kind: 'trim'; readonly label: string; readonly look: 'knob' | 'screw' }

export type GlyphTone = 'line' | 'sheet' | 'glow' | 'ink'

export type GlyphShape =
  | {
      readonly tag: 'rect'
      readonly x: number
      readonly y: number
      readonly w: number
      readonly h: number
      readonly r: number
      readonly tone: GlyphTone
    }
  | {
      readonly tag: 'circle'
      readonly cx: number
      readonly cy: number
      readonly r: number
      readonly tone: GlyphTone
    }
  | { readonly tag: 'path'; readonly d: string; readonly tone: GlyphTone }

/** A control drawn about its own centre; `above` and `below` are how far it reaches, words included. */
export interface Glyph {
  readonly left: number
  readonly right: number
  readonly above: number
  readonly below: number
  readonly shapes: readonly GlyphShape[]
  readonly labels: readonly Label[]
}

const text = (words: string, x: number, y: number, strong: boolean): Label => ({
  text: words,
  x,
  y,
  anchor: 'middle',
  size: 12,
  weight: strong ? 700 : 400,
  tone: strong ? 'ink' : 'ink2',
})

/** The control's printed name: above it in a row of sockets, below it on a front. */
export type LabelSide = 'above' | 'below'

const NAME_ABOVE = -38
const NAME_BELOW = 64

const name = (label: string, side: LabelSide, below = NAME_BELOW): Label => ({
  ...text(label, 0, side === 'above' ? NAME_ABOVE : below, false),
  weight: side === 'below' ? 600 : 400,
  tone: side === 'below' ? 'ink' : 'ink2',
})

const reach = (halfWidth: number, label: string, side: LabelSide) => {
  const half = Math.max(halfWidth, textWidth(label, 12, side === 'below' ? 600 : 400) / 2)
  return { left: half, right: half }
}

type Row = Extract<GlyphSpec, { kind: 'slide' | 'push' | 'knob' }>

/** Cells side by side under their positions; the thumb fills the cell it stands in. */
function slide(spec: Row, side: LabelSide): Glyph {
  const cell = Math.max(24, ...spec.positions.map((p) => textWidth(p, 12, 700) + 8))
  const w = cell * spec.positions.length
  const x = -w / 2
  const apart = spec.kind === 'push'
  const bodies: GlyphShape[] = apart
    ? spec.positions.map((_, i) => ({
        tag: 'rect',
        x: x + cell * i + cell / 2 - 9,
        y: -9,
        w: 18,
        h: 18,
        r: 2,
        tone: i === spec.on ? 'glow' : 'sheet',
      }))
    : [{ tag: 'rect', x, y: -9, w, h: 18, r: 2, tone: 'sheet' }]
  const thumb: GlyphShape[] =
    apart || spec.on === null
      ? []
      : [
          {
            tag: 'rect',
            x: x + cell * spec.on + 1.5,
            y: -7.5,
            w: cell - 3,
            h: 15,
            r: 1,
            tone: 'glow',
          },
        ]
  return {
    ...reach(w / 2, spec.label, side),
    above: side === 'above' ? 47 : 25,
    below: side === 'above' ? 9 : 67,
    shapes: [...bodies, ...thumb],
    labels: [
      ...spec.positions.map((p, i) => text(p, x + cell * (i + 0.5), -14, i === spec.on)),
      name(spec.label, side),
    ],
  }
}

const at = (r: number, degrees: number): [number, number] => [
  r * Math.sin((degrees * Math.PI) / 180),
  -r * Math.cos((degrees * Math.PI) / 180),
]

const f = (v: number): string => String(Math.round(v * 100) / 100)

/** From lower left round to lower right, as knobs with a stop are printed. */
const SWEEP = 270
/** A knob's radius, that of the ring of words round it, and where its name stands below. */
const KNOB = { r: 28, print: 41, name: NAME_BELOW } as const
const SMALL_KNOB = { r: 23, print: 33, name: 55 } as const
const MOST_PRINTED = 16

function angles(count: number): number[] {
  if (count === 1) return [0]
  const sweep = Math.min(SWEEP, (count - 1) * 45)
  return Array.from({ length: count }, (_, i) => -sweep / 2 + (i * sweep) / (count - 1))
}

/** A pointer with an ink outline, from the rim inwards. */
function pointer(r: number, degrees: number): GlyphShape {
  const [x1, y1] = at(r - 1, degrees)
  const [x2, y2] = at(2, degrees)
  const [nx, ny] = at(2.5, degrees + 90)
  const points = [
    [x1 + nx, y1 + ny],
    [x2 + nx, y2 + ny],
    [x2 - nx, y2 - ny],
    [x1 - nx, y1 - ny],
  ]
  return {
    tag: 'path',
    d: `M${points.map(([x = 0, y = 0]) => `${f(x)} ${f(y)}`).join('L')}Z`,
    tone: 'glow',
  }
}

function knob(spec: Row, small: boolean): Glyph {
  const size = small ? SMALL_KNOB : KNOB
  const turn = angles(spec.positions.length)
  const last = spec.positions.length - 1
  const printed = spec.positions.flatMap((_, i) =>
    last < MOST_PRINTED || i === 0 || i === last || i === spec.on ? [i] : [],
  )
  const labels = printed.map((i) => {
    const degrees = turn[i] ?? 0
    const [x, y] = at(size.print, degrees)
    const words = spec.positions[i] ?? ''
    const half = textWidth(words, 12, 700) / 2
    const side = Math.sin((degrees * Math.PI) / 180)
    return text(words, x + side * Math.max(0, half - 5), y + 4, i === spec.on)
  })
  const reachX = Math.max(
    size.r,
    ...labels.map((l) => Math.abs(l.x) + textWidth(l.text, 12, l.weight) / 2),
  )
  return {
    ...reach(reachX, spec.label, 'below'),
    above: size.print + 8,
    below: size.name + 3,
    shapes: [
      { tag: 'circle', cx: 0, cy: 0, r: size.r, tone: 'sheet' },
      { tag: 'circle', cx: 0, cy: 0, r: size.r * 0.6, tone: 'line' },
      ...(spec.on === null ? [] : [pointer(size.r, turn[spec.on] ?? 0)]),
    ],
    labels: [...labels, name(spec.label, 'below', size.name)],
  }
}

/** A little window that shows a value: too many positions to draw. */
function window(spec: Extract<GlyphSpec, { kind: 'window' }>, side: LabelSide): Glyph {
  const value = textWidth(spec.value, 14, 700)
  const w = Math.max(40, value + 16)
  return {
    ...reach(w / 2, spec.label, side),
    above: side === 'above' ? 47 : 13,
    below: side === 'above' ? 13 : 67,
    shapes: [
      { tag: 'rect', x: -w / 2, y: -13, w, h: 26, r: 2, tone: 'sheet' },
      { tag: 'rect', x: -value / 2, y: 7, w: value, h: 2.5, r: 0, tone: 'glow' },
    ],
    labels: [{ ...text(spec.value, 0, 4.5, true), size: 14 }, name(spec.label, side)],
  }
}

/** Turned by eye or ear: an arrow round it instead of a value. */
function trim(spec: Extract<GlyphSpec, { kind: 'trim' }>, side: LabelSide, small: boolean): Glyph {
  const r = side === 'above' ? 10 : small ? 12 : 15.5
  const below = small ? SMALL_KNOB.name : NAME_BELOW
  const [ax, ay] = at(r + 5, -45)
  const [bx, by] = at(r + 5, 45)
  const mark: GlyphShape =
    spec.look === 'screw'
      ? {
          tag: 'path',
          d: `M${f(-r * 0.77)} ${f(-r * 0.64)}L${f(r * 0.77)} ${f(r * 0.64)}`,
          tone: 'line',
        }
      : { tag: 'path', d: `M0 ${f(-r + 3)}V${f(-r / 4)}`, tone: 'line' }
  return {
    ...reach(r + 2, spec.label, side),
    above: side === 'above' ? 47 : r + 8,
    below: side === 'above' ? r + 1 : below + 3,
    shapes: [
      { tag: 'circle', cx: 0, cy: 0, r, tone: 'sheet' },
      mark,
      {
        tag: 'path',
        d: `M${f(ax)} ${f(ay)}A${f(r + 5)} ${f(r + 5)} 0 0 1 ${f(bx)} ${f(by)}m-4.5 .6l4.5 -.6l-.6 -4.5`,
        tone: 'line',
      },
    ],
    labels: [name(spec.label, side, below)],
  }
}

/** Draws a control about its own centre. */
export function layoutControl(spec: GlyphSpec, side: LabelSide, small = false): Glyph {
  switch (spec.kind) {
    case 'slide':
    case 'push':
      return slide(spec, side)
    case 'knob':
      return knob(spec, small)
    case 'window':
      return window(spec, side)
    case 'trim':
      return trim(spec, side, small)
  }
}

/** The area of a glyph without its words, where it stands. */
export const glyphBody = (glyph: Glyph, x: number, y: number): Box =>
  box(x - glyph.left, y - glyph.above, glyph.left + glyph.right, glyph.above + glyph.below)
