import { isSoundCircuit, type Circuit, type SoundLevel } from '../circuits'
import type { SoundHeard } from './shown'
import type { Why } from './why'

/** Sockets that look alike: for line level, for a turntable, for digital sound. */
export const SOUND_INPUTS = ['line', 'turntable', 'digital'] as const
export type SoundInput = (typeof SOUND_INPUTS)[number]

export interface SoundShown {
  readonly sound: SoundHeard
  /** Loudspeaker outputs harm a line input. */
  readonly harms: boolean
  readonly why: readonly Why[]
}

const heard = (sound: SoundHeard, why: readonly Why[] = [], harms = false): SoundShown => ({
  sound,
  harms,
  why,
})

/** What an amplifier lets hear of a circuit in one of its sockets. */
export function heardOnWires(circuit: Circuit, level: SoundLevel, input: SoundInput): SoundShown {
  if (input === 'digital') {
    return circuit === 'spdif' ? heard('heard', ['same-system']) : heard('none', ['other-signal'])
  }
  if (circuit === 'spdif') return heard('loud-noise', ['digital-sound'])
  if (!isSoundCircuit(circuit)) return heard('none', ['other-signal'])
  if (level === 'loudspeaker') return heard('distorted', ['other-signal'], true)
  return input === 'turntable' ? heard('distorted', ['turntable-gain']) : heard('heard')
}
