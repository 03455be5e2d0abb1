import type { DeviceModel } from '@coaxwain/models'
import {
  at,
  carrier,
  choice,
  device,
  gives,
  passes,
  rfEither,
  rfIn,
  rfOut,
  SAME,
  sounds,
  tuner,
  turns,
} from '@coaxwain/models/build'
import { fitting, type Sockets } from '../bench/devices'
import { CHANNEL_3 } from '../bench/usual'

const plain = (kind: DeviceModel['kind'], name: string) => ({
  maker: 'Bench',
  name,
  kind,
  market: 'any' as const,
})

/** The first end of every box has this connector, the second another one, so that no box can be used the other way round unseen. */
const F = 'f-socket'
const B = 'bnc-socket'
const COMPOSITE: Sockets = { connector: 'phono-socket', form: 'composite' }
const SOUND: Sockets = { connector: 'phono-socket', form: 'sound' }

/** A slide switch that joins one of two inputs to its output, and nothing backwards. */
const switchbox = device({
  ...plain('rf-switch', 'Switch box'),
  back: [[rfIn('a', 'A', F), rfIn('b', 'B', F), rfOut('out', 'TV', B)]],
  controls: [choice('way', 'A/B', 'input', { positions: ['a', 'b'], access: 'front' })],
  functions: (['a', 'b'] as const).map((side) =>
    passes(`from-${side}`, 'selects', side, { to: ['out'], while: at('way', side) }),
  ),
})

/** A contact that moves is as good backwards as forwards. */
const switchAb = device({
  ...plain('rf-switch', 'A/B switch'),
  back: [[rfEither('a', 'A', F), rfEither('b', 'B', F), rfEither('line', 'COMMON', B)]],
  controls: [choice('way', 'A/B', 'input', { positions: ['a', 'b'], access: 'front' })],
  functions: (['a', 'b'] as const).flatMap((side) => [
    passes(`from-${side}`, 'selects', `${side}-in`, { to: ['line-out'], while: at('way', side) }),
    passes(`to-${side}`, 'selects', 'line-in', { to: [`${side}-out`], while: at('way', side) }),
  ]),
})

/** Three sockets of which one is shared with either of two, both ways; the two may be 300 ohm. */
const branching = (name: string, kind: DeviceModel['kind'], branch: typeof B | 'screws' = B) =>
  device({
    ...plain(kind, name),
    back: [
      [
        rfEither('line', 'IN', F),
        rfEither('one', 'OUT 1', branch),
        rfEither('two', 'OUT 2', branch),
      ],
    ],
    functions: [
      passes('out', 'splits', 'line-in', { to: ['one-out', 'two-out'] }),
      passes('from-one', 'combines', 'one-in', { to: ['line-out'] }),
      passes('from-two', 'combines', 'two-in', { to: ['line-out'] }),
    ],
  })

/** It couples from its input only. */
const tap = device({
  ...plain('splitter', 'Tap'),
  back: [[rfIn('in', 'IN', F), rfOut('out', 'OUT', B), rfOut('tap', 'TAP', B)]],
  functions: [passes('taps', 'splits', 'in', { to: ['out', 'tap'] })],
})

const loopThrough = device({
  ...plain('recorder', 'Recorder'),
  back: [[rfIn('in', 'RF IN', F), rfOut('out', 'RF OUT', B)]],
  functions: [passes('loop', 'loop-through', 'in', { to: ['out'], power: 'standby' })],
})

const modulator = device({
  ...plain('modulator', 'Modulator'),
  back: [
    [fitting('picture', COMPOSITE, 'in'), fitting('sound', SOUND, 'in'), rfOut('out', 'TO TV', F)],
  ],
  functions: [
    turns('modulate', 'modulates', 'picture', {
      sound: 'sound',
      gives: [gives('out', SAME, { rf: [carrier('M', { fixed: CHANNEL_3, levelDbmv: 8 })] })],
    }),
  ],
})

const demodulator = device({
  ...plain('tuner', 'Demodulator'),
  back: [
    [rfIn('in', 'ANT', F), fitting('picture', COMPOSITE, 'out'), fitting('sound', SOUND, 'out')],
  ],
  controls: [tuner('tuned', 'CH', 'numbers', { reaches: [CHANNEL_3] })],
  functions: [
    turns('tune', 'tunes', 'in', {
      accepts: [{ scans: 'any', colours: 'any', systems: ['M'] }],
      tunedBy: 'tuned',
      gives: [gives('picture', SAME), sounds('sound', 'mono')],
    }),
  ],
})

/** A capacitor from chroma into luma: nothing comes back out of it apart. */
const capacitor = device({
  ...plain('converter-box', 'Y/C adder'),
  back: [
    [
      fitting('in', { connector: 'svideo4-socket', form: 's-video' }, 'in'),
      fitting('out', COMPOSITE, 'out'),
    ],
  ],
  functions: [
    turns('add', 'combines', 'in', {
      power: 'none',
      separator: 'capacitor',
      gives: [gives('out', SAME)],
    }),
  ],
})

const syncAdder = device({
  ...plain('converter-box', 'Sync adder'),
  back: [
    [fitting('in', { connector: 'bnc-socket', form: 'rgbhv' }, 'in')],
    [fitting('out', { connector: 'phono-socket', form: 'rgbs' }, 'out')],
  ],
  functions: [turns('add', 'combines', 'in', { power: 'none', gives: [gives('out', SAME)] })],
})

/** Rows of the table that are boxes to the engine: what they do is a function, not a wire. */
export const BOXES = {
  'band-separator': branching('Band separator', 'diplexer', 'screws'),
  'switchbox-manual': switchbox,
  'switch-ab': switchAb,
  'recorder-passthrough': loopThrough,
  'svideo-composite': capacitor,
  'hv-combine': syncAdder,
  splitter: branching('Splitter', 'splitter'),
  tap,
  /** Its common socket is the one that the line of the table ends at. */
  diplexer: branching('Diplexer', 'diplexer'),
  modulator,
  demodulator,
} as const satisfies Readonly<Record<string, DeviceModel>>
