import type { DeviceModel } from '@coaxwain/models'
import {
  compositeIn,
  compositeOut,
  gives,
  SAME,
  scart,
  sounds,
  stereoIn,
  stereoOut,
  sVideoIn,
  turns,
  type Fitting,
} from '@coaxwain/models/build'
import { box, fourWires } from './box'

/** Two phono plugs on a captive lead. */
function stereoPlugs(key: string): Fitting {
  const { ports, jacks } = stereoOut(key)
  return { ports: ports.map((p) => ({ ...p, connector: 'phono-plug', mount: 'lead' })), jacks }
}

const PLUG = { connector: 'scart-plug', mount: 'lead' } as const

/** Blocks of wires only, between phonos and a 21-pin plug, each made for one direction. */
export const BLOCKS = {
  '21-pin-in': box({
    name: '21-pin block, phono sockets in',
    kind: 'other',
    pack: undefined,
    back: [
      [
        compositeIn('video-in', 'VIDEO'),
        stereoIn('sound-in'),
        scart('plug', '21-pin plug', { gives: ['composite', 'sound'] }, PLUG),
      ],
    ],
    functions: [
      turns('in', 'loop-through', 'video-in', {
        sound: 'sound-in',
        gives: [gives('plug-composite-out', SAME), sounds('plug-sound-out', 'same')],
        power: 'none',
      }),
    ],
  }),
  '21-pin-out': box({
    name: '21-pin block, phono sockets out',
    kind: 'other',
    pack: undefined,
    back: [
      [
        scart('plug', '21-pin plug', { takes: ['composite', 'sound'] }, PLUG),
        compositeOut('video-out', 'VIDEO'),
        stereoOut('sound-out'),
      ],
    ],
    functions: [
      turns('out', 'loop-through', 'plug-composite-in', {
        sound: 'plug-sound-in',
        gives: [gives('video-out', SAME), sounds('sound-out', 'same')],
        power: 'none',
      }),
    ],
  }),
  '21-pin-s-video-in': box({
    name: '21-pin block, S-Video and phono sockets in',
    kind: 'other',
    pack: undefined,
    back: [
      [
        sVideoIn('s-video-in', 'S-VIDEO'),
        stereoIn('sound-in'),
        scart('plug', '21-pin plug', { gives: ['s-video', 'sound'] }, PLUG),
      ],
    ],
    functions: [
      turns('in', 'loop-through', 's-video-in', {
        sound: 'sound-in',
        gives: [gives('plug-s-video-out', SAME), sounds('plug-sound-out', 'same')],
        power: 'none',
      }),
    ],
  }),
  '21-pin-rgb-in': box({
    name: '21-pin block, four phono sockets for RGB with sync and two for sound',
    kind: 'other',
    pack: undefined,
    back: [
      [
        fourWires('rgb-in', 'in', 'phono-socket'),
        stereoIn('sound-in'),
        scart('plug', '21-pin plug', { gives: ['rgb', 'sound'] }, PLUG),
      ],
    ],
    functions: [
      turns('in', 'loop-through', 'rgb-in', {
        sound: 'sound-in',
        gives: [gives('plug-rgb-out', SAME), sounds('plug-sound-out', 'same')],
        power: 'none',
      }),
    ],
  }),
  '21-pin-rgb-out': box({
    name: '21-pin socket to four BNC plugs for RGB with sync and two phono plugs',
    kind: 'other',
    pack: undefined,
    back: [
      [
        scart('socket', '21-pin socket', { takes: ['rgb', 'sound'] }),
        fourWires('rgb-out', 'out', 'bnc-plug'),
        stereoPlugs('sound-out'),
      ],
    ],
    functions: [
      turns('out', 'loop-through', 'socket-rgb-in', {
        sound: 'socket-sound-in',
        gives: [gives('rgb-out', SAME), sounds('sound-out', 'same')],
        power: 'none',
      }),
    ],
  }),
} satisfies Record<string, DeviceModel>
