import { box, labelBox, shifted, type Box } from './boxes'
import type { UnitControlInput, UnitPortInput } from './drawing-input'
import { layoutFace, type DrawnSocket, type Face } from './face'

export interface PanelInput {
  readonly ports: readonly UnitPortInput[]
  readonly controls: readonly UnitControlInput[]
  readonly captions: Readonly<Record<'back' | 'front' | 'side', string>>
  readonly moulded: boolean
}

export interface PanelLayout {
  readonly w: number
  readonly h: number
  readonly faces: readonly { readonly face: Face; readonly x: number; readonly y: number }[]
  readonly sockets: readonly {
    readonly socket: DrawnSocket
    readonly x: number
    readonly y: number
  }[]
}

const GAP = 16
const FACES = ['back', 'side', 'front'] as const

/** All faces of one unit with room for a number under every socket; faces that do not fit go one lower. */
export function layoutPanel(input: PanelInput, width: number, callouts: boolean): PanelLayout {
  const names = FACES.filter(
    (f) => input.ports.some((p) => p.face === f) || input.controls.some((c) => c.face === f),
  )
  const faces: { face: Face; x: number; y: number }[] = []
  let x = 0
  let y = 0
  let rowH = 0
  for (const name of names) {
    const face = layoutFace({
      ports: input.ports.filter((p) => p.face === name),
      controls: input.controls.filter((c) => c.face === name),
      caption: names.length > 1 ? input.captions[name] : null,
      moulded: input.moulded,
      vented: false,
      compact: false,
      minHeight: 0,
      minWidth: 0,
      controlsAbove: false,
      callouts,
      plain: true,
    })
    if (x > 0 && x + face.w > width) {
      x = 0
      y += rowH + GAP
      rowH = 0
    }
    faces.push({ face, x, y })
    x += face.w + GAP
    rowH = Math.max(rowH, face.h)
  }
  return {
    w: Math.ceil(Math.max(0, ...faces.map((f) => f.x + f.face.w))) + 2,
    h: Math.ceil(Math.max(0, ...faces.map((f) => f.y + f.face.h))) + 2,
    faces,
    sockets: faces.flatMap((f) =>
      f.face.sockets.map((socket) => ({ socket, x: f.x + socket.x, y: f.y + socket.y })),
    ),
  }
}

/** Words of a panel where they stand: none may overlap another. */
export const panelWords = (layout: PanelLayout): { what: string; box: Box }[] => [
  ...layout.faces.flatMap(({ face, x, y }) =>
    [
      ...(face.caption ? [face.caption] : []),
      ...face.labels,
      ...face.controls.flatMap((c) =>
        c.glyph.labels.map((l) => ({ ...l, x: l.x + c.x, y: l.y + c.y })),
      ),
    ].map((l) => ({ what: l.text, box: shifted(labelBox(l), x, y) })),
  ),
  ...layout.sockets.map((s) => ({
    what: `number of ${s.socket.port.key}`,
    box: box(s.x - 10, s.y + CALLOUT_BELOW - 10, 20, 20),
  })),
]

/** From a socket's centre down to the middle of its number. */
export const CALLOUT_BELOW = 29
