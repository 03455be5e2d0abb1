import type { PieceModel } from '@coaxwain/models'
import {
  cores,
  DEFLECTION_50,
  DEFLECTION_50_60,
  DEFLECTION_60,
  piece,
  through,
  wire,
} from '@coaxwain/models/build'
import {
  FORM_CIRCUITS,
  type Circuit,
  type Colour,
  type Connector,
  type Deflection,
  type OnWires,
  type PictureForm,
  type ScanId,
  type WiredInput,
} from '@coaxwain/signal'
import type { Sockets } from '../bench/devices'

/** One picture to one input, with the leads that a person would take. */
export interface WireCase {
  readonly sent: OnWires
  readonly input: WiredInput
  readonly from: Sockets
  readonly into: Sockets
  readonly pieces: readonly PieceModel[]
  /** Why the engine is not asked. */
  readonly notAsked?: string
}

type Fed = Pick<OnWires, 'scan' | 'colour'>

const input = (
  form: PictureForm,
  colours: readonly Colour[],
  deflection: Deflection,
  rest: Partial<WiredInput> = {},
): WiredInput => ({
  form,
  colours,
  deflection,
  countsLines: false,
  levelControl: false,
  ...rest,
})

const straight = (form: PictureForm): Map<Circuit, Circuit> =>
  new Map(FORM_CIRCUITS[form].map((c) => [c, c]))

const phonos = (count: number): PieceModel =>
  piece({
    name: `${count} phonos`,
    kind: 'lead',
    a: Array.from({ length: count }, (): Connector => 'phono-plug'),
    b: Array.from({ length: count }, (): Connector => 'phono-plug'),
    wires: cores(count),
  })

const COMPOSITE: Sockets = { connector: 'phono-socket', form: 'composite' }
const COMPONENT: Sockets = { connector: 'phono-socket', form: 'component' }
const S_VIDEO: Sockets = { connector: 'svideo4-socket', form: 's-video' }
const RGB: Sockets = { connector: 'bnc-socket', form: 'rgbs' }
/** Three sockets; sync comes with green. */
const RGB_PHONOS: Sockets = { connector: 'phono-socket', form: 'rgsb' }
const HD15: Sockets = { connector: 'hd15-socket', form: 'rgbhv' }

const bnc = (count: number): PieceModel =>
  piece({
    name: `${count} bayonets`,
    kind: 'lead',
    a: Array.from({ length: count }, (): Connector => 'bnc-plug'),
    b: Array.from({ length: count }, (): Connector => 'bnc-plug'),
    wires: cores(count),
  })

const hd15 = piece({
  name: 'Monitor lead',
  kind: 'lead',
  a: ['hd15-plug'],
  b: ['hd15-plug'],
  wires: through(FORM_CIRCUITS.rgbhv),
})

/** Everything arrives where it belongs. */
const matched = (fed: Fed, into: WiredInput, [sockets, lead]: readonly [Sockets, PieceModel]) => ({
  sent: { ...fed, arrives: straight(into.form), protection: 'none' as const },
  input: into,
  from: sockets,
  into: sockets,
  pieces: [lead],
})

const BY_PHONO = [COMPOSITE, phonos(1)] as const
const BY_THREE = [COMPONENT, phonos(3)] as const

/** Composite of one kind to sets that know others. */
const composite = (
  scan: ScanId,
  colour: Colour,
  ...sets: readonly (readonly [readonly Colour[], Deflection])[]
): WireCase[] =>
  sets.map(([colours, deflection]) =>
    matched({ scan, colour }, input('composite', colours, deflection), BY_PHONO),
  )

/** Something that arrives at contacts of another name. */
const crossed = (
  fed: Fed,
  arrives: readonly (readonly [Circuit, Circuit])[],
  into: WiredInput,
  by: Pick<WireCase, 'from' | 'into' | 'pieces'>,
): WireCase => ({
  sent: { ...fed, arrives: new Map(arrives), protection: 'none' },
  input: into,
  ...by,
})

const deflection = (lineKhz: readonly [number, number], fixed = false): Deflection => ({
  lineKhz: [lineKhz],
  fieldHz: [[49, 75]],
  fixed,
})

const FIFTEEN = deflection([15.6, 15.75], true)
const THIRTY_ONE = deflection([30, 40])

const NTSC: readonly Colour[] = ['ntsc-m']
const PAL: readonly Colour[] = ['pal']

const NTSC_60 = { scan: '525i60', colour: 'ntsc-m' } as const
const PLAIN_60 = { scan: '525i60', colour: 'ypbpr' } as const

const consoleVideo = (rest: Partial<WiredInput>, notAsked?: string): WireCase[] =>
  (
    [
      ['262p60', 'ntsc-m', DEFLECTION_60],
      ['312p50', 'pal', DEFLECTION_50],
    ] as const
  ).map(([scan, colour, tube]) => ({
    ...matched({ scan, colour }, input('composite', [colour], tube, rest), BY_PHONO),
    ...(notAsked === undefined ? {} : { notAsked }),
  }))

const oneWire = (
  from: Circuit | 'any',
  to: Circuit | 'any',
  ends: readonly [Connector, Connector],
) =>
  piece({
    name: `${ends[0]} to ${ends[1]}`,
    kind: 'lead',
    a: [ends[0]],
    b: [ends[1]],
    wires: [wire([0, from], [0, to])],
  })

const Y_TO_PHONO = oneWire('y', 'any', ['svideo4-plug', 'phono-plug'])
const C_TO_PHONO = oneWire('c', 'any', ['svideo4-plug', 'phono-plug'])
const PHONO_TO_Y = oneWire('any', 'y', ['phono-plug', 'svideo4-plug'])

const TTL: Sockets = { connector: 'de9-socket', form: 'rgbi' }
const TTL_TO_HD15 = piece({
  name: '9-pin to 15-pin lead',
  kind: 'lead',
  a: ['de9-plug'],
  b: ['hd15-plug'],
  wires: [
    wire([0, 'ttl-r'], [0, 'r']),
    wire([0, 'ttl-g'], [0, 'g']),
    wire([0, 'ttl-b'], [0, 'b']),
    wire([0, 'hsync'], [0, 'hsync']),
    wire([0, 'vsync'], [0, 'vsync']),
  ],
})

/** Rows of the compatibility table about video sockets. */
export const ON_WIRES: Readonly<Record<string, readonly WireCase[]>> = {
  c25: composite('525i60', 'ntsc-m', [PAL, DEFLECTION_50], [PAL, DEFLECTION_50_60]),
  c26: composite(
    '525i60',
    'pal-60',
    [['pal', 'pal-60'], DEFLECTION_50_60],
    [PAL, DEFLECTION_50_60],
  ),
  c27: composite('525i60', 'pal-60', [NTSC, DEFLECTION_60]),
  c28: composite('525i60', 'ntsc-443', [['pal', 'ntsc-443'], DEFLECTION_50_60]),
  c29: composite('525i60', 'ntsc-443', [NTSC, DEFLECTION_60]),
  c30: composite('625i50', 'pal', [NTSC, DEFLECTION_60]),
  c31: composite('625i50', 'pal', [['secam'], DEFLECTION_50]),
  c32: composite('625i50', 'secam', [PAL, DEFLECTION_50]),
  c33: composite('625i50', 'secam', [NTSC, DEFLECTION_60]),
  c34: [
    ...composite('525i60', 'pal-m', [NTSC, DEFLECTION_60]),
    ...composite('625i50', 'pal-n', [PAL, DEFLECTION_50]),
  ],
  c35: consoleVideo({}),
  c36: consoleVideo(
    { countsLines: true },
    'what a converter counts is told by the rows of its model',
  ),
  c38: [matched(PLAIN_60, input('component', ['ypbpr'], DEFLECTION_60), BY_THREE)],
  c39: [
    matched(
      { scan: '625i50', colour: 'ypbpr' },
      input('component', ['ypbpr'], DEFLECTION_60),
      BY_THREE,
    ),
  ],
  c40: [
    matched({ scan: '525p60', colour: 'ypbpr' }, input('component', ['ypbpr'], FIFTEEN), BY_THREE),
  ],
  c41: [
    crossed(
      { scan: '525i60', colour: 'rgb' },
      [
        ['y', 'g'],
        ['pb', 'b'],
        ['pr', 'r'],
      ],
      input('component', ['ypbpr'], DEFLECTION_60),
      { from: RGB_PHONOS, into: COMPONENT, pieces: [phonos(3)] },
    ),
  ],
  c42: [
    crossed(
      PLAIN_60,
      [
        ['g', 'y'],
        ['b', 'pb'],
        ['r', 'pr'],
      ],
      input('rgsb', ['rgb'], DEFLECTION_60),
      { from: COMPONENT, into: RGB_PHONOS, pieces: [phonos(3)] },
    ),
  ],
  c43: [
    matched({ scan: '525i60', colour: 'rgb' }, input('rgbs', ['rgb'], THIRTY_ONE), [RGB, bnc(4)]),
  ],
  c44: [
    matched({ scan: 'vga-31k-60', colour: 'rgb' }, input('rgbhv', ['rgb'], FIFTEEN), [HD15, hd15]),
  ],
  c45: [
    crossed(
      { scan: 'cga-15k7', colour: 'rgbi' },
      [
        ['r', 'ttl-r'],
        ['g', 'ttl-g'],
        ['b', 'ttl-b'],
        ['hsync', 'hsync'],
        ['vsync', 'vsync'],
      ],
      input('rgbhv', ['rgb'], FIFTEEN),
      { from: TTL, into: HD15, pieces: [TTL_TO_HD15] },
    ),
  ],
  c46: [
    crossed(NTSC_60, [['cvbs', 'y']], input('composite', NTSC, DEFLECTION_60), {
      from: S_VIDEO,
      into: COMPOSITE,
      pieces: [Y_TO_PHONO],
    }),
  ],
  c47: [
    crossed(NTSC_60, [['cvbs', 'c']], input('composite', NTSC, DEFLECTION_60), {
      from: S_VIDEO,
      into: COMPOSITE,
      pieces: [C_TO_PHONO],
    }),
  ],
  c48: [
    crossed(NTSC_60, [['y', 'cvbs']], input('s-video', NTSC, DEFLECTION_60), {
      from: COMPOSITE,
      into: S_VIDEO,
      pieces: [PHONO_TO_Y],
    }),
  ],
  c49: [
    crossed(PLAIN_60, [['cvbs', 'y']], input('composite', NTSC, DEFLECTION_60), {
      from: COMPONENT,
      into: COMPOSITE,
      pieces: [phonos(1)],
    }),
  ],
  c50: [
    crossed(NTSC_60, [['y', 'cvbs']], input('component', ['ypbpr'], DEFLECTION_60), {
      from: COMPOSITE,
      into: COMPONENT,
      pieces: [phonos(1)],
    }),
  ],
}

/** A protected disc through a recorder, by its level control or past one. */
export const PROTECTED = {
  id: 'c37',
  sent: { ...NTSC_60, arrives: straight('composite'), protection: 'agc-pulses' } satisfies OnWires,
  input: input('composite', NTSC, DEFLECTION_60, { levelControl: true }),
  screen: input('composite', NTSC, DEFLECTION_60),
}
