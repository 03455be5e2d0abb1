import type { Circuit } from '../circuits'
import type { Connector } from '../connectors'
import type { FactConfidence } from './confidence'

export const SOCKET_IDS = [
  'rca-composite',
  'rca-line-left',
  'rca-line-right',
  'rca-component',
  'rca-digital-audio',
  'rca-rf',
  'bnc',
  'f',
  'iec-coax',
  'twin-screw',
  'twin-spade',
  'screw-75',
  'svideo-4',
  'minidin-7',
  'minidin-8-10',
  'multi-out',
  'din-5',
  'din-6-av',
  'din-8',
  'scart',
  'jp21',
  'd-terminal',
  'de15',
  'de9-ttl',
  'jack-35-trs',
  'jack-35-ts',
  'jack-35-trrs-av',
  'optical-f05',
  'hdmi-a',
  'captive-lead',
] as const

/** Sockets as the trade tells them apart: by what they look like and what they are for. */
export type SocketId = (typeof SOCKET_IDS)[number]

export interface SocketFact {
  /** At the equipment where it takes a signal, and where it gives one; null where there is no such side. */
  readonly takes: Connector | null
  readonly gives: Connector | null
  /** Ends of the leads for it. */
  readonly leads: readonly Connector[]
  readonly impedanceOhm: readonly number[]
  /** Single contacts with their returns counted, over every socket of the group. */
  readonly contacts: readonly number[]
  readonly carries: readonly Circuit[]
  readonly standard: string | null
  /** A plug that goes in is wired alike; where it is not, only the lead made for that model is right. */
  readonly wiredAlike: boolean
  readonly source: string
  readonly confidence: FactConfidence
}

const PRACTICE = 'common practice'
const SOUND_PAIR: readonly Circuit[] = ['audio-l', 'audio-r']
const RGB: readonly Circuit[] = ['r', 'g', 'b']

type Rest = Omit<SocketFact, 'takes' | 'gives' | 'leads' | 'wiredAlike'>

const ends = (
  takes: Connector | null,
  gives: Connector | null,
  ...leads: readonly Connector[]
) => ({
  takes,
  gives,
  leads,
  wiredAlike: true,
})

type Family = 'phono' | 'f' | 'bnc' | 'svideo4' | 'minidin7' | 'scart' | 'jp21' | 'dterm' | 'hd15'
type Round = 'de9' | 'din5' | 'din6' | 'din8' | 'jack35' | 'optical' | 'hdmi' | 'multi'

/** Sockets at the equipment, plugs at both ends of the lead. */
const usual = (family: Family | Round) =>
  ends(`${family}-socket`, `${family}-socket`, `${family}-plug`)

const phono = (
  carries: readonly Circuit[],
  rest: Omit<Rest, 'carries' | 'contacts'> & { readonly contacts?: readonly number[] },
): SocketFact => ({ ...usual('phono'), contacts: [2], carries, ...rest })

const practice = { source: 'common practice, no source', confidence: PRACTICE } as const
const memory = { source: 'from memory', confidence: 'from memory' } as const

export const SOCKETS: Readonly<Record<SocketId, SocketFact>> = {
  'rca-composite': phono(['cvbs'], {
    impedanceOhm: [75],
    standard: 'IEC 60603-14',
    source: 'IEC 60603-14; common practice',
    confidence: PRACTICE,
  }),
  /** On mono machines the one sound socket is often white, sometimes black or red. */
  'rca-line-left': phono(['audio-l', 'audio-mono'], {
    impedanceOhm: [],
    standard: 'IEC 60603-14',
    ...practice,
  }),
  /** Red is Pr and R as well. */
  'rca-line-right': phono(['audio-r'], {
    impedanceOhm: [],
    standard: 'IEC 60603-14',
    ...practice,
  }),
  'rca-component': phono(['y', 'pb', 'pr'], {
    impedanceOhm: [75],
    contacts: [6],
    standard: 'EIA-770.2 levels; IEC 60603-14',
    source: 'EIA-770.2, from memory; common practice',
    confidence: PRACTICE,
  }),
  'rca-digital-audio': phono(['spdif'], {
    impedanceOhm: [75],
    standard: 'IEC 60958-3',
    source: 'IEC 60958-3, from memory',
    confidence: 'from memory',
  }),
  /** Looks just like composite: consoles and computers of the 1970s and 1980s. */
  'rca-rf': phono(['rf'], {
    impedanceOhm: [75],
    standard: null,
    source: '47 CFR 15.115; common practice',
    confidence: PRACTICE,
  }),
  /** 50 and 75 ohm types mate. */
  bnc: {
    ...usual('bnc'),
    impedanceOhm: [75, 50],
    contacts: [2],
    carries: ['cvbs', 'y', 'c', 'pb', 'pr', ...RGB, 'csync', 'hsync', 'vsync', 'rf'],
    standard: 'IEC 61169-8',
    source: 'IEC 61169-8; common practice',
    confidence: PRACTICE,
  },
  f: {
    ...usual('f'),
    impedanceOhm: [75],
    contacts: [2],
    carries: ['rf'],
    standard: 'IEC 61169-24',
    source: 'IEC 61169-24; common practice',
    confidence: PRACTICE,
  },
  /** An aerial input is a socket, a modulated output a plug; the lead has one of each. */
  'iec-coax': {
    ...ends('iec-socket', 'iec-plug', 'iec-socket', 'iec-plug'),
    impedanceOhm: [75],
    contacts: [2],
    carries: ['rf'],
    standard: 'IEC 61169-2',
    source: 'IEC 61169-2; common practice',
    confidence: PRACTICE,
  },
  'twin-screw': {
    ...ends('screws', 'screws', 'spades', 'bare'),
    impedanceOhm: [300],
    contacts: [2],
    carries: ['rf'],
    standard: null,
    ...practice,
  },
  /** The end of a transformer or of a switch box. */
  'twin-spade': {
    ...ends('screws', null, 'spades'),
    impedanceOhm: [300],
    contacts: [2],
    carries: ['rf'],
    standard: null,
    ...practice,
  },
  'screw-75': {
    ...ends('clamp', 'clamp', 'stripped'),
    impedanceOhm: [75],
    contacts: [2],
    carries: ['rf'],
    standard: null,
    ...practice,
  },
  'svideo-4': {
    ...usual('svideo4'),
    impedanceOhm: [75],
    contacts: [4],
    carries: ['y', 'c'],
    standard: 'IEC 60933-5',
    source: 'pin list agrees in three public sources; standard number from memory',
    confidence: 'two independent sources agree',
  },
  /** The further pins are the maker's own. */
  'minidin-7': {
    ...usual('minidin7'),
    leads: ['minidin7-plug', 'svideo4-plug'],
    impedanceOhm: [75],
    contacts: [7],
    carries: ['y', 'c'],
    standard: null,
    source: 'public adapter pages',
    confidence: 'one source',
  },
  'minidin-8-10': {
    ...usual('multi'),
    wiredAlike: false,
    impedanceOhm: [],
    contacts: [8, 10],
    carries: [],
    standard: null,
    ...practice,
  },
  /** One pin differs by region: 12 V in one, composite sync in another. */
  'multi-out': {
    ...usual('multi'),
    wiredAlike: false,
    impedanceOhm: [],
    contacts: [10, 16],
    carries: ['cvbs', 'y', 'c', ...RGB, 'pb', 'pr', ...SOUND_PAIR],
    standard: null,
    source: 'public connector library; common practice',
    confidence: 'one source',
  },
  'din-5': {
    ...usual('din5'),
    impedanceOhm: [],
    contacts: [5],
    carries: SOUND_PAIR,
    standard: 'IEC 60130-9',
    ...memory,
  },
  /** 12 V on the switching pin sets the direction. */
  'din-6-av': {
    ...usual('din6'),
    impedanceOhm: [75],
    contacts: [6],
    carries: ['cvbs', ...SOUND_PAIR, 'switch-volts'],
    standard: 'DIN 45482',
    ...memory,
  },
  /** Two angles exist and do not mate; pins differ by machine. */
  'din-8': {
    ...usual('din8'),
    wiredAlike: false,
    impedanceOhm: [],
    contacts: [8],
    carries: ['cvbs', 'y', 'c', ...RGB, ...SOUND_PAIR],
    standard: 'IEC 60130-9',
    ...memory,
  },
  scart: {
    ...usual('scart'),
    impedanceOhm: [75],
    contacts: [21],
    carries: ['cvbs', 'y', 'c', ...RGB, 'csync', ...SOUND_PAIR, 'switch-volts'],
    standard: 'IEC 60933-1 / EN 50049-1',
    source: 'two published pin tables',
    confidence: 'two independent sources agree',
  },
  /** The body of SCART with other pins: sound or 5 V may land on video. */
  jp21: {
    ...usual('jp21'),
    impedanceOhm: [75],
    contacts: [21],
    carries: [...RGB, 'cvbs', 'csync', ...SOUND_PAIR],
    standard: 'EIAJ TTC-0003',
    ...memory,
  },
  'd-terminal': {
    ...usual('dterm'),
    impedanceOhm: [75],
    contacts: [14],
    carries: ['y', 'pb', 'pr'],
    standard: 'EIAJ CP-4120',
    ...memory,
  },
  de15: {
    ...usual('hd15'),
    impedanceOhm: [75],
    contacts: [15],
    carries: [...RGB, 'hsync', 'vsync'],
    standard: null,
    ...practice,
  },
  'de9-ttl': {
    ...usual('de9'),
    impedanceOhm: [],
    contacts: [9],
    carries: ['ttl-r', 'ttl-g', 'ttl-b', 'ttl-i', 'hsync', 'vsync'],
    standard: null,
    ...practice,
  },
  'jack-35-trs': {
    ...usual('jack35'),
    impedanceOhm: [],
    contacts: [3],
    carries: SOUND_PAIR,
    standard: 'IEC 60603-11',
    ...practice,
  },
  /** A stereo plug in a mono socket may short one channel. */
  'jack-35-ts': {
    ...usual('jack35'),
    impedanceOhm: [],
    contacts: [2],
    carries: ['audio-mono', 'cvbs'],
    standard: 'IEC 60603-11',
    ...practice,
  },
  /** At least three layouts are sold. */
  'jack-35-trrs-av': {
    ...usual('jack35'),
    wiredAlike: false,
    impedanceOhm: [75],
    contacts: [4],
    carries: ['cvbs', ...SOUND_PAIR],
    standard: null,
    ...practice,
  },
  'optical-f05': {
    ...usual('optical'),
    impedanceOhm: [],
    contacts: [1],
    carries: ['spdif'],
    standard: 'IEC 61754 family / JIS C 5974',
    ...memory,
  },
  /** Never turned into any analogue form by wire alone. */
  'hdmi-a': {
    ...usual('hdmi'),
    impedanceOhm: [100],
    contacts: [19],
    carries: ['tmds'],
    standard: 'HDMI',
    ...practice,
  },
  /** Its plug is the connector. */
  'captive-lead': {
    ...ends(null, null),
    impedanceOhm: [],
    contacts: [],
    carries: [],
    standard: null,
    ...practice,
  },
}
