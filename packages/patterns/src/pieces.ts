import type { PieceModel } from '@coaxwain/models'
import { cores, piece, through, wire } from '@coaxwain/models/build'
import { FORM_CIRCUITS, type Circuit, type Connector } from '@coaxwain/signal'

/** A lead of so many equal cores. */
const equal = (name: string, connector: Connector, count: number): PieceModel =>
  piece({
    name,
    kind: 'lead',
    a: Array.from({ length: count }, () => connector),
    b: Array.from({ length: count }, () => connector),
    wires: cores(count),
  })

type Ends = readonly [Connector, Connector]

type Facts = Partial<Pick<PieceModel, 'meantFor' | 'impedanceOhm' | 'lossDb'>>

/** One plug at either end, single core. */
const single = (
  name: string,
  kind: PieceModel['kind'],
  [a, b]: Ends,
  facts: Facts = {},
): PieceModel => piece({ name, kind, a: [a], b: [b], wires: cores(1), ...facts })

/** One plug at either end, with a core for each circuit. */
const multi = (
  name: string,
  kind: PieceModel['kind'],
  [a, b]: Ends,
  circuits: readonly Circuit[],
): PieceModel => piece({ name, kind, a: [a], b: [b], wires: through(circuits) })

const RF = { meantFor: ['rf'] } as const
const AV: readonly Circuit[] = ['cvbs', 'audio-l', 'audio-r']
const SCART_ALL: readonly Circuit[] = [
  ...AV,
  'audio-mono',
  'r',
  'g',
  'b',
  'csync',
  'y',
  'c',
  'switch-volts',
]

/** A transformer between two impedances: loss by common practice, no source. */
const transforms = (...impedanceOhm: readonly [number, number]): Facts => ({
  meantFor: ['rf'],
  lossDb: 0.7,
  impedanceOhm,
})

/** A load on the loop socket of the last unit of a line. */
const terminator = (name: string, plug: Connector): PieceModel =>
  piece({ name, kind: 'terminator', a: [plug], b: [], wires: [] })

/** Leads and adapters that any shop of the trade has. */
export const PIECES = {
  'phono-lead': equal('phono lead', 'phono-plug', 1),
  'phono-lead-2': equal('2-way phono lead', 'phono-plug', 2),
  'phono-lead-3': equal('3-way phono lead', 'phono-plug', 3),
  'f-lead': single('F lead', 'lead', ['f-plug', 'f-plug']),
  'f-stripped': single('F lead with a stripped end', 'lead', ['f-plug', 'stripped'], RF),
  'aerial-lead': single('9.52 mm aerial lead', 'lead', ['iec-socket', 'iec-plug'], RF),
  'phono-aerial-lead': single('phono to 9.52 mm lead', 'lead', ['phono-plug', 'iec-plug'], RF),
  's-video-lead': multi('S-Video lead', 'lead', ['svideo4-plug', 'svideo4-plug'], ['y', 'c']),
  'hd15-lead': multi(
    '15-pin computer lead',
    'lead',
    ['hd15-plug', 'hd15-plug'],
    FORM_CIRCUITS.rgbhv,
  ),
  'hdmi-lead': multi('HDMI lead', 'lead', ['hdmi-plug', 'hdmi-plug'], ['tmds']),
  '21-pin-lead': multi('21-pin lead, fully wired', 'lead', ['scart-plug', 'scart-plug'], SCART_ALL),
  'optical-lead': single('optical lead', 'lead', ['optical-plug', 'optical-plug'], {
    meantFor: ['spdif'],
  }),
  'bnc-lead': single('BNC lead', 'lead', ['bnc-plug', 'bnc-plug']),
  'mini-jack-phono-lead': piece({
    name: '3.5 mm plug to two phonos',
    kind: 'lead',
    a: ['jack35-plug'],
    b: ['phono-plug', 'phono-plug'],
    wires: [wire([0, 'audio-l'], [0, 'any']), wire([0, 'audio-r'], [1, 'any'])],
    meantFor: ['audio-l', 'audio-r', 'audio-mono'],
  }),
  'phono-f': single('phono socket to F plug', 'adapter', ['phono-socket', 'f-plug']),
  'f-phono': single('F socket to phono plug', 'adapter', ['f-socket', 'phono-plug']),
  'f-aerial': single('F socket to 9.52 mm plug', 'adapter', ['f-socket', 'iec-plug'], RF),
  'aerial-f': single('9.52 mm socket to F plug', 'adapter', ['iec-socket', 'f-plug'], RF),
  'bnc-phono': single('BNC plug to phono socket', 'adapter', ['bnc-plug', 'phono-socket']),
  'phono-bnc': single('BNC socket to phono plug', 'adapter', ['bnc-socket', 'phono-plug']),
  'phono-joiner': single('phono joiner', 'adapter', ['phono-socket', 'phono-socket']),
  'f-joiner': single('F joiner', 'adapter', ['f-socket', 'f-socket']),
  'transformer-75-300': single(
    '75/300 ohm transformer, F socket to lugs',
    'adapter',
    ['f-socket', 'spades'],
    transforms(75, 300),
  ),
  'transformer-aerial-300': single(
    '75/300 ohm transformer, 9.52 mm socket to lugs',
    'adapter',
    ['iec-socket', 'spades'],
    transforms(75, 300),
  ),
  'transformer-300-75': single(
    '300/75 ohm transformer, screws to F plug',
    'adapter',
    ['screws', 'f-plug'],
    transforms(300, 75),
  ),
  'transformer-300-aerial': single(
    '300/75 ohm transformer, screws to 9.52 mm plug',
    'adapter',
    ['screws', 'iec-plug'],
    transforms(300, 75),
  ),
  'phono-aerial': single(
    'phono socket to 9.52 mm plug',
    'adapter',
    ['phono-socket', 'iec-plug'],
    RF,
  ),
  'f-mini-jack': single('F socket to 3.5 mm plug', 'adapter', ['f-socket', 'jack35-plug'], RF),
  'hdmi-joiner': multi('HDMI joiner', 'adapter', ['hdmi-socket', 'hdmi-socket'], ['tmds']),
  'hdmi-dvi-lead': multi('HDMI to DVI lead', 'lead', ['hdmi-plug', 'dvi-plug'], ['tmds']),
  'd-lead': multi('D lead', 'lead', ['dterm-plug', 'dterm-plug'], FORM_CIRCUITS.component),
  'd-phono-lead': piece({
    name: 'D plug to three phonos',
    kind: 'lead',
    a: ['dterm-plug'],
    b: ['phono-plug', 'phono-plug', 'phono-plug'],
    wires: FORM_CIRCUITS.component.map((circuit, i) => wire([0, circuit], [i, 'any'])),
    meantFor: FORM_CIRCUITS.component,
  }),
  'mini-jack-lead': multi(
    '3.5 mm lead',
    'lead',
    ['jack35-plug', 'jack35-plug'],
    ['audio-l', 'audio-r'],
  ),
  '21-pin-japanese': multi(
    'SCART to Japanese 21-pin adapter, rewired',
    'adapter',
    ['scart-socket', 'jp21-plug'],
    ['r', 'g', 'b', 'cvbs', 'csync', 'audio-l', 'audio-r', 'switch-volts'],
  ),
  'japanese-21-pin': multi(
    'Japanese 21-pin to SCART adapter, rewired',
    'adapter',
    ['jp21-socket', 'scart-plug'],
    ['r', 'g', 'b', 'cvbs', 'csync', 'audio-l', 'audio-r', 'switch-volts'],
  ),
  'sound-y': piece({
    name: 'Y adapter, two phono sockets to one plug',
    kind: 'adapter',
    a: ['phono-socket', 'phono-socket'],
    b: ['phono-plug'],
    wires: [wire([0, 'any'], [0, 'any'], 'a-to-b'), wire([1, 'any'], [0, 'any'], 'a-to-b')],
    meantFor: ['audio-l', 'audio-r', 'audio-mono'],
    mixes: true,
  }),
  'terminator-bnc': terminator('75 ohm terminator, BNC', 'bnc-plug'),
  'terminator-phono': terminator('75 ohm terminator, phono', 'phono-plug'),
} satisfies Record<string, PieceModel>
