import type { Circuit } from '../circuits'
import type { ConnectorFamily, LooseConnector } from '../connectors'
import type { FactConfidence } from './confidence'

export const ADAPTER_IDS = [
  'rca-bnc',
  'rca-f',
  'f-iec',
  'f-bnc',
  'f-barrel',
  'balun-75-300',
  'band-separator',
  'direct-300-75',
  'pad-300-75',
  'pad-75',
  'terminator-75',
  'dc-block',
  'switchbox-manual',
  'switch-ab',
  'recorder-passthrough',
  'svideo-composite',
  'composite-svideo',
  'y-only',
  'scart-in-av',
  'scart-out-av',
  'scart-switched',
  'scart-svideo',
  'scart-rgb-bnc',
  'scart-ypbpr',
  'scart-jp21',
  'scart-male-male',
  'component-rca-bnc',
  'd-rca',
  'de15-bnc',
  'de15-component',
  'hv-combine',
  'jack-rca-stereo',
  'jack-rca-av',
  'rca-y-split',
  'mono-mix',
  'din5-rca',
  'din6-rca',
  'splitter',
  'tap',
  'diplexer',
  'modulator',
  'demodulator',
] as const

/** What stands between two sockets that do not meet. */
export type AdapterId = (typeof ADAPTER_IDS)[number]

export interface AdapterEnd {
  /** Any of these does. */
  readonly families: readonly (ConnectorFamily | LooseConnector)[]
  readonly count: number
  /** A further plug of another family beside them. */
  readonly also?: ConnectorFamily
  readonly ohm: 75 | 300 | null
}

/** `as-made`: by its wiring or by a switch on it, which somebody has to look at. `none`: it ends a line. */
export type AdapterWay = 'both' | 'a-to-b' | 'b-to-a' | 'as-made' | 'none'

/** What must be so besides. */
export const ADAPTER_CONDITIONS = [
  /** Component signals must already stand on the pins: wire never turns RGB into component. */
  'source-gives-component',
  /** The socket takes Y/C and is told so in its menu. */
  'socket-set-to-yc',
  /** Layouts differ under one connector. */
  'pins-agree',
  /** A voltage on the switching pin sets the direction. */
  'switching-volts',
  /** Joined straight it loses and ghosts: a transformer is wanted instead. */
  'mismatched',
  /** It separates nothing: no better than what went in. */
  'pointless',
] as const

export type AdapterCondition = (typeof ADAPTER_CONDITIONS)[number]

/** Loss from least to most, in dB; a gain is below zero. */
export interface AdapterLoss {
  readonly band: 'any' | 'baseband' | 'vhf' | 'uhf' | 'satellite' | 'video'
  readonly db: readonly [least: number, most: number]
}

export interface AdapterFact {
  readonly a: AdapterEnd
  readonly b: AdapterEnd
  /** Needs no power; the others are units, not leads. */
  readonly passive: boolean
  readonly way: AdapterWay
  readonly carries: readonly Circuit[]
  readonly loss: readonly AdapterLoss[]
  readonly condition?: AdapterCondition
  readonly source: string
  readonly confidence: FactConfidence
}
