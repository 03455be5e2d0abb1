import {
  at,
  channelSwitch,
  choice,
  compositeIn,
  compositeOut,
  cores,
  DEFLECTION_60,
  device,
  gives,
  heardOn,
  mains120,
  NTSC_SET,
  passes,
  picture,
  piece,
  plays,
  receives,
  rfIn,
  rfOut,
  SAME,
  shows,
  sounds,
  stereoIn,
  stereoOut,
  THREE_FOUR,
  carrier,
  tube,
  tuner,
  turns,
  wire,
} from '@coaxwain/models/build'

/** Small models for the tests: each has just what its rigs need. */

export const PLAYER = device({
  maker: 'Rig',
  name: 'player',
  kind: 'disc-player',
  market: '525-m',
  mains: mains120(20),
  back: [[compositeOut('video-out', 'VIDEO'), stereoOut('sound-out')]],
  functions: [
    plays('play', 'Plays', [
      gives('video-out', [picture('525i60', 'ntsc-m')]),
      sounds('sound-out', 'stereo'),
    ]),
  ],
})

export const SET = device({
  maker: 'Rig',
  name: 'set',
  kind: 'television',
  market: '525-m',
  mains: mains120(90),
  display: tube(DEFLECTION_60, 'stereo'),
  back: [
    [
      compositeIn('video-in', 'VIDEO'),
      stereoIn('sound-in'),
      rfIn('aerial-in', 'ANT', 'f-socket', { standsDc: 'yes' }),
    ],
  ],
  controls: [tuner('tuned-to', 'CHANNEL', 'numbers', { reaches: [THREE_FOUR] })],
  functions: [
    shows('line', 'VIDEO', 'video-in', { sound: 'sound-in', accepts: NTSC_SET }),
    shows('tuner', 'TV', 'aerial-in', {
      accepts: heardOn(NTSC_SET, ['M']),
      tunedBy: 'tuned-to',
    }),
  ],
})

export const MODULATOR = device({
  maker: 'Rig',
  name: 'modulator',
  kind: 'modulator',
  market: '525-m',
  mains: mains120(4),
  back: [
    [compositeIn('video-in', 'VIDEO'), stereoIn('sound-in'), rfOut('rf-out', 'TO TV', 'f-socket')],
  ],
  controls: [channelSwitch(THREE_FOUR)],
  functions: [
    turns('modulate', 'modulates', 'video-in', {
      sound: 'sound-in',
      gives: [gives('rf-out', SAME, { rf: [carrier('M', { levelDbmv: 8 })] })],
    }),
  ],
})

/** Passes a picture on by its loop, and has an input that lifts its own load then. */
export const LOOP = device({
  maker: 'Rig',
  name: 'loop box',
  kind: 'selector',
  market: 'any',
  back: [
    [
      compositeIn('video-in', 'VIDEO', { load: { kind: 'ends-itself' }, loopsTo: 'video-loop' }),
      compositeOut('video-loop', 'LOOP'),
    ],
  ],
  functions: [passes('loop', 'loop-through', 'video-in', { to: ['video-loop'] })],
})

export const AERIAL = device({
  maker: 'Rig',
  name: 'aerial',
  kind: 'aerial',
  market: 'any',
  back: [[rfOut('out', 'OUT', 'f-socket')]],
  functions: [receives('receive', 'out')],
})

export const SWITCH = device({
  maker: 'Rig',
  name: 'aerial switch',
  kind: 'rf-switch',
  market: 'any',
  back: [
    [
      rfIn('a', 'A', 'f-socket', { standsDc: 'yes' }),
      rfIn('b', 'B', 'f-socket', { standsDc: 'yes' }),
      rfOut('out', 'OUT', 'f-socket'),
    ],
  ],
  controls: [choice('switch', 'A/B', 'input', { positions: { a: 'A', b: 'B' }, access: 'front' })],
  functions: (['a', 'b'] as const).map((side) =>
    passes(`select-${side}`, 'selects', side, { to: ['out'], while: at('switch', side) }),
  ),
  leaks: [{ from: 'b', to: 'a', db: 60 }],
})

/** Three phonos, one F plug, and small parts that other tests join in. */
export const PIECES = {
  phonos: piece({
    name: 'phonos',
    kind: 'lead',
    a: ['phono-plug', 'phono-plug', 'phono-plug'],
    b: ['phono-plug', 'phono-plug', 'phono-plug'],
    wires: cores(3),
  }),
  coax: piece({ name: 'coax', kind: 'lead', a: ['f-plug'], b: ['f-plug'], wires: cores(1) }),
  extension: piece({
    name: 'extension',
    kind: 'lead',
    a: ['phono-socket'],
    b: ['phono-plug'],
    wires: cores(1),
  }),
  collar: piece({
    name: 'collar',
    kind: 'adapter',
    a: ['phono-socket'],
    b: ['phono-plug'],
    wires: cores(1),
  }),
  y: piece({
    name: 'Y adapter',
    kind: 'adapter',
    a: ['phono-socket', 'phono-socket'],
    b: ['phono-plug'],
    wires: [wire([0, 'any'], [0, 'any']), wire([1, 'any'], [0, 'any'])],
    mixes: true,
  }),
}
