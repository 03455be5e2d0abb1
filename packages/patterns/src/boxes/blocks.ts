import type { DeviceModel, Key } from '@coaxwain/models'
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

interface Block {
  readonly name: string
  readonly back: readonly Fitting[]
  readonly does: 'in' | 'out'
}

type Ends = readonly [picture: Key, sound: Key]

/** Wires only, between phonos and a 21-pin plug, made for one direction. */
const block = ({ name, back, does }: Block, [picture, sound]: Ends, outs: Ends): DeviceModel =>
  box({
    name,
    kind: 'other',
    pack: undefined,
    back: [back],
    functions: [
      turns(does, 'loop-through', picture, {
        sound,
        gives: [gives(outs[0], SAME), sounds(outs[1], 'same')],
        power: 'none',
      }),
    ],
  })

export const BLOCKS = {
  '21-pin-in': block(
    {
      name: '21-pin block, phono sockets in',
      back: [
        compositeIn('video-in', 'VIDEO'),
        stereoIn('sound-in'),
        scart('plug', '21-pin plug', { gives: ['composite', 'sound'] }, PLUG),
      ],
      does: 'in',
    },
    ['video-in', 'sound-in'],
    ['plug-composite-out', 'plug-sound-out'],
  ),
  '21-pin-out': block(
    {
      name: '21-pin block, phono sockets out',
      back: [
        scart('plug', '21-pin plug', { takes: ['composite', 'sound'] }, PLUG),
        compositeOut('video-out', 'VIDEO'),
        stereoOut('sound-out'),
      ],
      does: 'out',
    },
    ['plug-composite-in', 'plug-sound-in'],
    ['video-out', 'sound-out'],
  ),
  '21-pin-s-video-in': block(
    {
      name: '21-pin block, S-Video and phono sockets in',
      back: [
        sVideoIn('s-video-in', 'S-VIDEO'),
        stereoIn('sound-in'),
        scart('plug', '21-pin plug', { gives: ['s-video', 'sound'] }, PLUG),
      ],
      does: 'in',
    },
    ['s-video-in', 'sound-in'],
    ['plug-s-video-out', 'plug-sound-out'],
  ),
  '21-pin-rgb-in': block(
    {
      name: '21-pin block, four phono sockets for RGB with sync and two for sound',
      back: [
        fourWires('rgb-in', 'in', 'phono-socket'),
        stereoIn('sound-in'),
        scart('plug', '21-pin plug', { gives: ['rgb', 'sound'] }, PLUG),
      ],
      does: 'in',
    },
    ['rgb-in', 'sound-in'],
    ['plug-rgb-out', 'plug-sound-out'],
  ),
  '21-pin-rgb-out': block(
    {
      name: '21-pin socket to four BNC plugs for RGB with sync and two phono plugs',
      back: [
        scart('socket', '21-pin socket', { takes: ['rgb', 'sound'] }),
        fourWires('rgb-out', 'out', 'bnc-plug'),
        stereoPlugs('sound-out'),
      ],
      does: 'out',
    },
    ['socket-rgb-in', 'socket-sound-in'],
    ['rgb-out', 'sound-out'],
  ),
} satisfies Record<string, DeviceModel>
