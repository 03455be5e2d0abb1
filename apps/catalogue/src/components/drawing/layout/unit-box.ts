import { box, labelBox, shiftedLabel, union, type Box, type Label, type Point } from './boxes'
import type { UnitInput } from './drawing-input'
import { layoutFace, type Face } from './face'
import { layoutScreen, screenSquares, type Screen } from './screens'
import { FACE_GAP, type SquareMark, type UnitStyle } from './unit-types'
import { cutText, textWidth } from './text-width'

export interface PlacedFace {
  readonly face: Face
  readonly x: number
  readonly y: number
}

/** A unit drawn with its left edge at 0 and the shelf line at 0; everything lies above the line. */
export interface UnitBox {
  readonly unit: UnitInput
  readonly w: number
  /** How far it rises above the line, title included. */
  readonly rise: number
  readonly faces: readonly PlacedFace[]
  readonly screens: readonly Screen[]
  readonly squares: readonly SquareMark[]
  readonly title: Label
  readonly subtitle: Label
  readonly pack: { readonly box: Box; readonly label: Label } | null
  /** From each used socket to the shelf line. */
  readonly exits: ReadonlyMap<string, readonly Point[]>
}

/** A twin lead ends this far below the screws that its two lugs go to. */
const LUGS = 25
const TITLE_ABOVE = 28
const SUBTITLE_ABOVE = 10
const TITLE_CAPS = 12
const LEAST_SUBTITLE = 230

const FACES = ['back', 'side', 'front'] as const

/** The faces that have something to show: the back always, others for what is used or set there. */
function wantedFaces(unit: UnitInput) {
  return FACES.filter(
    (face) =>
      unit.ports.some((p) => p.face === face && (p.used || face === 'back')) ||
      unit.controls.some((c) => c.face === face),
  )
}

export function layoutUnit(unit: UnitInput, style: UnitStyle): UnitBox {
  const wanted = wantedFaces(unit)
  const draw = (minHeight: number): Face[] =>
    wanted.map((name) =>
      layoutFace({
        ports: unit.ports.filter((p) => p.face === name),
        controls: unit.controls.filter((c) => c.face === name),
        caption: wanted.length > 1 ? unit.captions[name] : null,
        moulded: unit.moulded,
        vented: unit.moulded && name === 'back',
        compact: style.compact,
        minHeight,
        minWidth: 0,
        controlsAbove: style.stacked && unit.controls.filter((c) => c.face === name).length > 1,
        callouts: false,
        plain: false,
      }),
    )
  const first = draw(0)
  const faces = style.stacked ? first : draw(Math.max(64, ...first.map((f) => f.h)))
  const placed = style.stacked ? stack(faces) : inLine(faces)
  return assemble(unit, style, placed)
}

function inLine(faces: readonly Face[]): PlacedFace[] {
  let x = 0
  return faces.map((face) => {
    const at = { face, x, y: -face.h }
    x += face.w + FACE_GAP
    return at
  })
}

/** The back stands on the line, other faces above it. */
function stack(faces: readonly Face[]): PlacedFace[] {
  const w = Math.max(...faces.map((f) => f.w))
  let y = 0
  return faces.map((face) => {
    y -= face.h
    const at = { face: { ...face, w }, x: 0, y }
    y -= FACE_GAP - 2
    return at
  })
}

function assemble(unit: UnitInput, style: UnitStyle, placed: readonly PlacedFace[]): UnitBox {
  const facesRight = Math.max(...placed.map((p) => p.x + p.face.w))
  const facesTop = Math.min(...placed.map((p) => p.y))
  const screens = unit.screen ? [layoutScreen(unit.screen, style, facesRight, facesTop)] : []
  const frames = [
    ...placed.map((p) => box(p.x, p.y, p.face.w, p.face.h)),
    ...screens.map((s) => box(s.x, s.y, s.w, s.h)),
  ]
  const outline = union(frames)
  const right = outline.x + outline.w
  const squares = [
    ...placed.flatMap(faceSquares),
    ...screens.flatMap((s) => screenSquares(s, unit)),
  ]
  const lift = liftFor(unit, squares, outline.y, right)
  const label = (text: string, above: number, size: 12 | 16, weight: 400 | 600): Label => ({
    text,
    x: 0,
    y: outline.y - above - lift,
    anchor: 'start',
    size,
    weight,
    tone: size === 16 ? 'ink' : 'ink2',
  })
  const subtitle = cutText(unit.subtitle, 12, 400, Math.max(right, LEAST_SUBTITLE))
  const title = label(unit.title, TITLE_ABOVE, 16, 600)
  return {
    unit,
    w: Math.ceil(Math.max(right, textWidth(unit.title, 16, 600), textWidth(subtitle, 12, 400))),
    rise: TITLE_ABOVE + TITLE_CAPS + lift - outline.y,
    faces: placed,
    screens,
    squares,
    title,
    subtitle: label(subtitle, SUBTITLE_ABOVE, 12, 400),
    pack: layoutPack(unit, placed),
    exits: exitsOf(placed),
  }
}

/** Titles rise where a number on a corner would stand in their words. */
function liftFor(
  unit: UnitInput,
  squares: readonly SquareMark[],
  top: number,
  right: number,
): number {
  const words = textWidth(cutText(unit.subtitle, 12, 400, Math.max(right, LEAST_SUBTITLE)), 12, 400)
  const stands = squares.some((s) => s.y - 10 < top - 4 && s.x - 14 < words)
  return stands ? 10 : 0
}

function exitsOf(placed: readonly PlacedFace[]): Map<string, readonly Point[]> {
  return new Map(
    placed.flatMap(({ face, x, y }) =>
      face.sockets
        .filter((s) => s.port.used)
        .map(
          (s) =>
            [
              s.port.key,
              s.exit.map((p, i) => ({
                x: p.x + x,
                y: p.y + y + (i === 0 ? LUGS * Number(s.port.connector === 'screws') : 0),
              })),
            ] as const,
        ),
    ),
  )
}

/** One number on the corner of its frame, or beside each control where several stand in one frame. */
function faceSquares({ face, x, y }: PlacedFace): SquareMark[] {
  const numbered = face.controls.filter((c) => c.number !== null)
  const numbers = [...new Set(numbered.map((c) => c.number))]
  if (numbers.length === 1) return [{ x: x + face.w, y, number: numbers[0] ?? 0 }]
  return numbered.map((c) => ({
    x: x + c.x + c.glyph.right + 15,
    y: y + c.y,
    number: c.number ?? 0,
  }))
}

function layoutPack(unit: UnitInput, placed: readonly PlacedFace[]): UnitBox['pack'] {
  const { pack } = unit
  if (!pack) return null
  for (const { face, x } of placed) {
    const socket = face.sockets.find((s) => s.port.key === pack.port)
    if (!socket) continue
    const w = textWidth(pack.text, 12, 600) + 14
    const centre = Math.max(x + socket.x, x + w / 2 + 2)
    const label: Label = {
      text: pack.text,
      x: centre,
      y: 4,
      anchor: 'middle',
      size: 12,
      weight: 600,
      tone: 'ink',
    }
    return { box: box(centre - w / 2, -9, w, 18), label }
  }
  return null
}

/** Every word of a unit at its place, for tests and for drawing. */
export function unitLabels(u: UnitBox): Label[] {
  return [
    u.title,
    u.subtitle,
    ...u.faces.flatMap(({ face, x, y }) => [
      ...(face.caption ? [shiftedLabel(face.caption, x, y)] : []),
      ...face.labels.map((l) => shiftedLabel(l, x, y)),
      ...face.controls.flatMap((c) => c.glyph.labels.map((l) => shiftedLabel(l, x + c.x, y + c.y))),
    ]),
    ...u.screens.flatMap((s) => s.labels),
    ...(u.pack ? [u.pack.label] : []),
  ]
}

export const unitLabelBoxes = (u: UnitBox): Box[] => unitLabels(u).map(labelBox)
