import { familyOf, type Connector } from '@coaxwain/signal'

/** `line` is an outline, `ground` an outline over the panel, `plug` over the plug's colour, `ink` solid. */
export type Tone = 'line' | 'ground' | 'plug' | 'ink'

export type Shape =
  | { readonly tag: 'circle'; readonly cx: number; readonly cy: number; readonly r: number }
  | { readonly tag: 'path'; readonly d: string }

export type TonedShape = Shape & {
  readonly tone: Tone
  readonly dash?: string
  /** Line in grid units where it differs from the symbol's own. */
  readonly line?: number
}

/** Marks stand on a grid of 24 units with the centre at 12, 12. */
export const GRID = 24

export const SYMBOL_KEYS = [
  'phono',
  'f',
  'iec-socket',
  'iec-plug',
  'screws',
  'svideo',
  'pin21',
  'bnc',
  'hd15',
  'hdmi',
  'jack35',
  'din5',
  'screw',
  'spade',
  'whip',
  'captive',
  'power',
  'optical',
  'minidin7',
  'dterm',
  'dvi',
  'de9',
  'db23',
  'din6',
  'din8',
  'multi',
  'bare',
] as const

export type SymbolKey = (typeof SYMBOL_KEYS)[number]

const ring = (r: number, tone: Tone = 'line', cx = 12, cy = 12): TonedShape => ({
  tag: 'circle',
  cx,
  cy,
  r,
  tone,
})
const dot = (r: number, cx = 12, cy = 12): TonedShape => ring(r, 'ink', cx, cy)
const path = (d: string, tone: Tone = 'line'): TonedShape => ({ tag: 'path', d, tone })

/** Two decimals are a hundredth of a grid unit: finer than any pixel. */
const n = (value: number): string => String(Math.round(value * 100) / 100)

const polar = (r: number, degrees: number): [number, number] => [
  12 + r * Math.cos((degrees * Math.PI) / 180),
  12 + r * Math.sin((degrees * Math.PI) / 180),
]

const hexagon = (r: number): string =>
  `M${[0, 60, 120, 180, 240, 300].map((a) => polar(r, a).map(n).join(' ')).join('L')}Z`

/** A rectangle about the centre with rounded corners. */
const rounded = (w: number, h: number, r: number): string => {
  const [a, b] = [n(w - 2 * r), n(h - 2 * r)]
  const corner = (dx: number, dy: number): string => `a${r} ${r} 0 0 1 ${dx * r} ${dy * r}`
  const start = `M${n(12 - w / 2 + r)} ${n(12 - h / 2)}`
  return `${start}h${a}${corner(1, 1)}v${b}${corner(-1, 1)}h-${a}${corner(-1, -1)}v-${b}${corner(1, -1)}Z`
}

/** A slot through a screw's head, at an angle. */
const slot = (cx: number, r: number, degrees: number): TonedShape => {
  const a = (degrees * Math.PI) / 180
  const dx = r * Math.cos(a)
  const dy = r * Math.sin(a)
  return path(`M${n(cx - dx)} ${n(12 - dy)}L${n(cx + dx)} ${n(12 + dy)}`)
}

const dots = (r: number, rows: readonly (readonly [y: number, xs: readonly number[]])[]) =>
  rows.flatMap(([y, xs]) => xs.map((x) => dot(r, x, y)))

const spread = (count: number, pitch: number): number[] =>
  Array.from({ length: count }, (_, i) => 12 + (i - (count - 1) / 2) * pitch)

const arc = (count: number, degrees: number): TonedShape[] =>
  Array.from({ length: count }, (_, i) => {
    const [x, y] = polar(5.6, -90 - degrees / 2 + (i * degrees) / (count - 1))
    return dot(1.5, x, y)
  })

/** A round shell of r 9.5 with a half-round notch below. */
const DIN_SHELL = path('M13.9 21.3A9.5 9.5 0 1 0 10.1 21.3A1.9 1.9 0 0 1 13.9 21.3Z', 'ground')

const FOUR_PIN_SHELL = path('M9.6 2.8A9.5 9.5 0 1 0 14.4 2.8V4.6H9.6Z', 'ground')

const tapered = (w: number, h: number, taper: number): TonedShape => {
  const x = 12 - w / 2
  const y = 12 - h / 2
  return path(
    `M${n(x + 1.5)} ${n(y)}h${n(w - 3)}q1.6 0 1.4 1.6l-${n(taper)} ${n(h - 3)}q-.2 1.4 -1.6 1.4h${n(2 * taper - w + 3.2)}q-1.4 0 -1.6 -1.4l-${n(taper)} -${n(h - 3)}q-.2 -1.6 1.4 -1.6Z`,
    'ground',
  )
}

const upright = (xs: readonly number[], y: number): TonedShape[] =>
  xs.map((x) => path(`M${n(x)} ${n(y)}v2.6`))

export const SYMBOLS: Readonly<Record<SymbolKey, readonly TonedShape[]>> = {
  phono: [ring(9, 'plug'), ring(5.25, 'ground'), dot(1.9)],
  f: [path(hexagon(10), 'ground'), ring(6), dot(1.6)],
  'iec-socket': [ring(9, 'ground'), ring(6.4), ring(2.4)],
  'iec-plug': [{ ...ring(9, 'ground'), dash: '10.6 3.54' }, ring(5.4), dot(2.4)],
  screws: [
    path(rounded(22.5, 13, 2), 'ground'),
    ring(4.1, 'ground', 6.75),
    ring(4.1, 'ground', 17.25),
    slot(6.75, 4.1, 40),
    slot(17.25, 4.1, -25),
  ],
  svideo: [
    FOUR_PIN_SHELL,
    path('M10 8.4h4v2.4h-4Z', 'ink'),
    ...dots(1.5, [
      [12.2, [7, 17]],
      [16.8, [9.4, 14.6]],
    ]),
  ],
  pin21: [
    path('M1.5 5.5h21v13h-17l-4 -4Z', 'ground'),
    ...upright(spread(6, 2.8), 8),
    ...upright(spread(5, 2.8), 13.2),
  ],
  bnc: [
    path('M4.9 10.1h-3.9v3.8h3.9M19.1 10.1h3.9v3.8h-3.9', 'ground'),
    ring(7.4, 'ground'),
    ring(4.2),
    dot(1.6),
  ],
  hd15: [
    tapered(20, 13, 1.7),
    ...dots(0.85, [
      [8.6, spread(5, 3)],
      [12, spread(5, 3)],
      [15.4, spread(5, 3)],
    ]),
  ],
  hdmi: [path('M2 7.5h20v5l-3.6 4h-12.8l-3.6 -4Z', 'ground'), path('M6 9.8h12v2.2h-12Z', 'ink')],
  jack35: [ring(7.5, 'ground'), dot(3.4)],
  din5: [DIN_SHELL, ...arc(5, 180)],
  screw: [ring(7.5, 'ground'), slot(12, 7.5, 40)],
  spade: [
    path('M7 2v7.5q0 4 3 4.6v7.9h4v-7.9q3 -.6 3 -4.6v-7.5h-3v6.8q0 2 -2 2t-2 -2v-6.8Z', 'ground'),
  ],
  whip: [
    { ...path('M7.2 16.8L13 11'), line: 2.6 },
    { ...path('M13 11L17.4 6.6'), line: 1.8 },
    { ...path('M17.4 6.6L21 3'), line: 1 },
    ring(3.2, 'ground', 5, 19),
    dot(1.4, 21.4, 2.6),
  ],
  captive: [
    ring(3.7, 'ground', 5.2, 6),
    dot(1.5, 5.2, 6),
    path('M5.2 9.7V13q0 5 5 5h3'),
    path('M13.2 14.9h5.4v6.2h-5.4Z', 'ground'),
    path('M18.6 18H23'),
  ],
  power: [path(rounded(17, 17, 2.5), 'ground'), ring(5.6), dot(2)],
  optical: [
    path('M7.5 3.5h9l4 4v13h-17v-13Z', 'ground'),
    path('M8.6 8.9h6.8v6.8h-6.8Z'),
    path('M10.8 11.1h2.4v2.4h-2.4Z', 'ink'),
  ],
  minidin7: [
    FOUR_PIN_SHELL,
    path('M10 8h4v2h-4Z', 'ink'),
    ...dots(1.2, [
      [11.6, [6.4, 17.6]],
      [14, [9.4, 14.6]],
      [17.4, [8.2, 12, 15.8]],
    ]),
  ],
  dterm: [
    path('M3 6.5h18l-2.2 11h-13.6Z', 'ground'),
    ...dots(0.85, [
      [10, spread(7, 2)],
      [14, spread(6, 2)],
    ]),
  ],
  dvi: [
    path(rounded(22, 11, 1.5), 'ground'),
    ...dots(0.8, [
      [9.4, [4, 6.4, 8.8, 11.2, 13.6]],
      [12, [4, 6.4, 8.8, 11.2, 13.6]],
      [14.6, [4, 6.4, 8.8, 11.2, 13.6]],
    ]),
    path('M16.4 12h4.6'),
  ],
  de9: [
    tapered(18, 11, 1.5),
    ...dots(1, [
      [10, spread(5, 2.9)],
      [14, spread(4, 2.9)],
    ]),
  ],
  db23: [
    tapered(23, 10, 1.3),
    ...dots(0.7, [
      [10.4, spread(12, 1.6)],
      [13.6, spread(11, 1.6)],
    ]),
  ],
  din6: [DIN_SHELL, ...arc(5, 240), dot(1.5)],
  din8: [DIN_SHELL, ...arc(7, 270), dot(1.5)],
  multi: [
    path(rounded(20, 10, 3), 'ground'),
    ...upright(spread(6, 2.6), 8.6),
    ...upright(spread(6, 2.6), 12.8),
  ],
  bare: [path('M8 22V13M16 22V13'), { ...path('M8 13V4M16 13V4'), line: 1.6, dash: '1.6 1.2' }],
}

const BY_FAMILY: Readonly<Record<string, SymbolKey>> = {
  phono: 'phono',
  f: 'f',
  bnc: 'bnc',
  svideo4: 'svideo',
  minidin7: 'minidin7',
  scart: 'pin21',
  jp21: 'pin21',
  dterm: 'dterm',
  hd15: 'hd15',
  hdmi: 'hdmi',
  dvi: 'dvi',
  de9: 'de9',
  db23: 'db23',
  din5: 'din5',
  din6: 'din6',
  din8: 'din8',
  jack35: 'jack35',
  multi: 'multi',
  optical: 'optical',
  dc: 'power',
  screws: 'screws',
  spades: 'spade',
  bare: 'bare',
  clamp: 'screw',
  stripped: 'bare',
  whip: 'whip',
}

/** The mark of a connector; aerial plugs and sockets of 9.52 mm are the one family told apart. */
export function symbolOf(connector: Connector): SymbolKey {
  if (connector === 'iec-plug') return 'iec-plug'
  if (connector === 'iec-socket') return 'iec-socket'
  const key = BY_FAMILY[familyOf(connector)]
  if (!key) throw new Error(`no mark for ${connector}`)
  return key
}

/** Line of a mark in pixels at a size: 1.4 up to 24, 1.5 at 32, 2.25 at 72. */
export const symbolLine = (size: number): number => (size >= 72 ? 2.25 : size >= 32 ? 1.5 : 1.4)
