import type { Circuit, SwitchVolt } from '../circuits'

/** Which way a pin drives at the equipment. A lead joins each output pin with the input pin of its pair. */
export type PinWay = 'out' | 'in' | 'source-to-set' | 'both' | 'ground' | 'shell'

export interface ScartPin {
  readonly way: PinWay
  /** Circuits that use it, one at a time. */
  readonly circuits: readonly Circuit[]
  readonly switching?: SwitchVolt
  /** Peak to peak for video, r.m.s. for sound. */
  readonly volts?: number
  /** What it is fed from or ended by; a bound where it has no one figure. */
  readonly ohm?: number | { readonly below: number } | { readonly above: number }
  /** Pin of the return that it shares. */
  readonly ground?: number
}

const soundOut = (circuits: readonly Circuit[]): ScartPin => ({
  way: 'out',
  circuits,
  volts: 0.5,
  ohm: { below: 1000 },
  ground: 4,
})

const soundIn = (circuits: readonly Circuit[]): ScartPin => ({
  way: 'in',
  circuits,
  volts: 0.5,
  ohm: { above: 10_000 },
  ground: 4,
})

const colour = (circuits: readonly Circuit[], ground: number): ScartPin => ({
  way: 'source-to-set',
  circuits,
  volts: 0.7,
  ohm: 75,
  ground,
})

const video = (way: 'in' | 'out', ground: number): ScartPin => ({
  way,
  circuits: ['cvbs', 'csync', 'y'],
  volts: 1,
  ohm: 75,
  ground,
})

const ground: ScartPin = { way: 'ground', circuits: [] }
const data: ScartPin = { way: 'both', circuits: [] }

/**
 * Pins of a 21-pin socket. Mono machines use the left pair. Red and chroma share pin 15, never both at once;
 * some Y/C set-ups return chroma on pin 7. RGB takes its sync on pin 20. Source: two published pin tables.
 */
export const SCART_PINS: Readonly<Record<number, ScartPin>> = {
  1: soundOut(['audio-r']),
  2: soundIn(['audio-r']),
  3: soundOut(['audio-l', 'audio-mono']),
  4: ground,
  5: ground,
  6: soundIn(['audio-l', 'audio-mono']),
  7: colour(['b'], 5),
  8: {
    way: 'source-to-set',
    circuits: ['switch-volts'],
    switching: 'av-select',
    ohm: { above: 10_000 },
  },
  9: ground,
  10: data,
  11: colour(['g'], 9),
  12: data,
  13: ground,
  14: ground,
  15: colour(['r', 'c'], 13),
  16: {
    way: 'source-to-set',
    circuits: ['switch-volts'],
    switching: 'rgb-select',
    ohm: 75,
    ground: 14,
  },
  17: ground,
  18: ground,
  19: video('out', 17),
  20: video('in', 18),
  21: { way: 'shell', circuits: [] },
}

/** Output pin and the input pin that a full lead joins it with. Source: two published pin tables. */
export const SCART_CROSSED: readonly (readonly [out: number, into: number])[] = [
  [1, 2],
  [3, 6],
  [19, 20],
]

export type FunctionSwitch = 'internal' | 'external-wide' | 'external'

/**
 * What a set does with a voltage on pin 8: up to 2 V its own programme, 4.5 to 8 V the socket on a wide screen,
 * from 9.5 to 12 V the socket at 4:3; null where it is not told. A 5 V console supply on this pin makes a
 * later set go wide. Source: two published pin tables, which differ on the lower end of the middle band.
 */
export function functionSwitch(volts: number): FunctionSwitch | null {
  if (volts >= 0 && volts <= 2) return 'internal'
  if (volts >= 4.5 && volts <= 8) return 'external-wide'
  return volts >= 9.5 && volts <= 12 ? 'external' : null
}

/**
 * What a set takes at a voltage on pin 16, across its 75 ohm: up to 0.4 V composite, 1 to 3 V RGB; null
 * between and above. Source: two published pin tables.
 */
export function fastBlanking(volts: number): 'composite' | 'rgb' | null {
  if (volts >= 0 && volts <= 0.4) return 'composite'
  return volts >= 1 && volts <= 3 ? 'rgb' : null
}
