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
  turns,
} from '@coaxwain/models/build'
import { box } from './box'

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
} satisfies Record<string, DeviceModel>
