import { cores, piece, wire } from '@coaxwain/models/build'
import type { Connector } from '@coaxwain/signal'

/** One contact in, the same contact out; losses at radio frequencies (common practice, no source). */
const joint = (
  name: string,
  a: Connector,
  b: Connector,
  extra: Partial<Parameters<typeof piece>[0]> = {},
) => piece({ name, kind: 'adapter', a: [a], b: [b], wires: cores(1), ...extra })

const SOUND = ['audio-l', 'audio-r', 'audio-mono'] as const

export const ADAPTERS = {
  /** The F plug is screwed by hand: no lead hangs on it. */
  'phono-to-f': joint('Phono socket to F plug', 'phono-socket', 'f-plug', { lossDb: 0.2 }),
  'f-to-phono': joint('F socket to phono plug', 'f-socket', 'phono-plug', { lossDb: 0.2 }),
  'f-joiner': joint('F joiner', 'f-socket', 'f-socket', { lossDb: 0.2, aliases: ['barrel'] }),
  'phono-joiner': joint('Phono joiner', 'phono-socket', 'phono-socket'),
  'phono-to-bnc': joint('Phono socket to BNC plug', 'phono-socket', 'bnc-plug'),
  'bnc-to-phono': joint('BNC socket to phono plug', 'bnc-socket', 'phono-plug'),
  'f-to-aerial': joint('F socket to 9.52 mm plug', 'f-socket', 'iec-plug', {
    lossDb: 0.3,
    meantFor: ['rf'],
  }),
  'aerial-to-f': joint('9.52 mm socket to F plug', 'iec-socket', 'f-plug', {
    lossDb: 0.3,
    meantFor: ['rf'],
  }),

  /** Works both ways; it is no isolator from the mains. */
  'balun-to-screws': joint('75/300 transformer, F socket to lugs', 'f-socket', 'spades', {
    aliases: ['balun', 'matching transformer'],
    impedanceOhm: [75, 300],
    lossDb: 0.8,
    meantFor: ['rf'],
    blocksDc: true,
  }),
  'balun-to-f': joint('300/75 transformer, screws to F plug', 'screws', 'f-plug', {
    aliases: ['balun', 'matching transformer'],
    impedanceOhm: [300, 75],
    lossDb: 0.8,
    meantFor: ['rf'],
    blocksDc: true,
  }),

  'f-to-jack': piece({
    name: 'F socket to 3.5 mm plug, aerial',
    kind: 'adapter',
    aliases: ['plug-on aerial adapter', 'plug-on antenna adapter'],
    a: ['f-socket'],
    b: ['jack35-plug'],
    wires: [wire([0, 'any'], [0, 'rf'])],
    meantFor: ['rf'],
    lossDb: 0.5,
  }),
  'pad-10': joint('10 dB pad', 'f-socket', 'f-plug', { lossDb: 10, meantFor: ['rf'] }),
  'pad-6': joint('6 dB pad', 'f-socket', 'f-plug', { lossDb: 6, meantFor: ['rf'] }),

  'y-mixer': piece({
    name: 'Y adapter with resistors, 2 phono sockets to 1 plug',
    kind: 'adapter',
    aliases: ['left and right to mono'],
    a: [
      ['phono-socket', 'white'],
      ['phono-socket', 'red'],
    ],
    b: [['phono-plug', 'white']],
    wires: [wire([0, 'any'], [0, 'any']), wire([1, 'any'], [0, 'any'])],
    meantFor: SOUND,
    lossDb: 0.6,
    mixes: true,
  }),

  /** Wired towards the set: it does nothing at the output of a player's 21-pin socket. */
  'pin21-in': piece({
    name: '21-pin block, phono in',
    kind: 'adapter',
    aliases: ['IN block'],
    a: [
      ['phono-socket', 'yellow'],
      ['phono-socket', 'white'],
      ['phono-socket', 'red'],
    ],
    b: ['scart-plug'],
    wires: [
      wire([0, 'any'], [0, 'cvbs'], 'a-to-b'),
      wire([1, 'any'], [0, 'audio-l'], 'a-to-b'),
      wire([2, 'any'], [0, 'audio-r'], 'a-to-b'),
    ],
  }),
  'pin21-out': piece({
    name: '21-pin block, phono out',
    kind: 'adapter',
    aliases: ['OUT block'],
    a: ['scart-plug'],
    b: [
      ['phono-socket', 'yellow'],
      ['phono-socket', 'white'],
      ['phono-socket', 'red'],
    ],
    wires: [
      wire([0, 'cvbs'], [0, 'any'], 'a-to-b'),
      wire([0, 'audio-l'], [1, 'any'], 'a-to-b'),
      wire([0, 'audio-r'], [2, 'any'], 'a-to-b'),
    ],
  }),

  'end-f': piece({
    name: '75 ohm terminator, F',
    kind: 'terminator',
    a: ['f-plug'],
    b: [],
    wires: [],
    meantFor: ['rf'],
  }),
  'end-bnc': piece({
    name: '75 ohm terminator, BNC',
    kind: 'terminator',
    a: ['bnc-plug'],
    b: [],
    wires: [],
  }),
}
