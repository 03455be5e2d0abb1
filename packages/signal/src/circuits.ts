/** A circuit is a single wire with its return. A port carries circuits, each with its own direction. */
export const CIRCUITS = [
  'cvbs',
  'y',
  'c',
  'pb',
  'pr',
  'r',
  'g',
  'b',
  'csync',
  'hsync',
  'vsync',
  'tmds',
  'rf',
  'ttl-r',
  'ttl-g',
  'ttl-b',
  'ttl-i',
  'ttl-mono',
  'audio-l',
  'audio-r',
  'audio-mono',
  'spdif',
  'ac3-rf',
  'switch-volts',
  'dc',
] as const

export type Circuit = (typeof CIRCUITS)[number]

export const DIRECTIONS = ['in', 'out', 'either'] as const
export type Direction = (typeof DIRECTIONS)[number]

export const SOUND_CIRCUITS = ['audio-l', 'audio-r', 'audio-mono'] as const
export type SoundCircuit = (typeof SOUND_CIRCUITS)[number]

const SOUND: ReadonlySet<Circuit> = new Set(SOUND_CIRCUITS)

/** Line-level, headphone or loudspeaker sound on wires (not sound that rides in RF or HDMI). */
export const isSoundCircuit = (circuit: Circuit): circuit is SoundCircuit => SOUND.has(circuit)

/** What a sound output puts out; loudspeaker outputs must never meet a line input. */
export const SOUND_LEVELS = ['line', 'headphone', 'loudspeaker'] as const
export type SoundLevel = (typeof SOUND_LEVELS)[number]

/** Voltages on the switching pins of a 21-pin socket. Source: IEC 60933-1, pins 8 and 16. */
export const SWITCH_VOLTS = ['av-select', 'rgb-select'] as const
export type SwitchVolt = (typeof SWITCH_VOLTS)[number]
