import type { Jack, Key } from '../model'
import type { Circuit, SoundLevel } from '@coaxwain/signal'
import { jack, onPort, one, port, single, type Fitting, type PortOptions } from './fittings'

const PHONO = { connector: 'phono-socket' } as const

type Labels = readonly [left: string, right: string]

/** Two phonos at line level. Ports are `KEY-l` and `KEY-r`. */
export function stereoOut(key: Key, labels: Labels = ['L', 'R']): Fitting {
  const [left, right] = [`${key}-l`, `${key}-r`]
  return {
    ports: [
      port(left, labels[0], [one('audio-l', 'out')], PHONO),
      port(right, labels[1], [one('audio-r', 'out')], PHONO),
    ],
    jacks: [
      jack(key, 'sound', 'out', [
        { circuit: 'audio-l', port: left },
        { circuit: 'audio-r', port: right },
      ]),
    ],
  }
}

/** Two phonos at line level; the left one takes a mono source by itself. */
export function stereoIn(key: Key, labels: Labels = ['L', 'R']): Fitting {
  const [left, right] = [`${key}-l`, `${key}-r`]
  return {
    ports: [
      port(left, labels[0], [one('audio-l', 'in'), one('audio-mono', 'in')], PHONO),
      port(right, labels[1], [one('audio-r', 'in')], PHONO),
    ],
    jacks: [
      jack(key, 'sound', 'in', [
        { circuit: 'audio-l', port: left },
        { circuit: 'audio-mono', port: left },
        { circuit: 'audio-r', port: right },
      ]),
    ],
  }
}

const phono = (form: Jack['form'], circuit: Circuit, dir: Jack['dir']) => ({
  ...PHONO,
  form,
  circuits: [circuit],
  dir,
})

export const monoOut = (key: Key, label: string): Fitting =>
  single(key, label, phono('sound', 'audio-mono', 'out'))

export const monoIn = (key: Key, label: string, options?: PortOptions): Fitting =>
  single(key, label, phono('sound', 'audio-mono', 'in'), options)

/** A 3.5 mm socket: tip left or mono, ring right (IEC 60603-11; common practice, no source). */
export function miniJackOut(
  key: Key,
  label: string,
  channels: 'mono' | 'stereo',
  level: SoundLevel,
): Fitting {
  const circuits: readonly Circuit[] = channels === 'mono' ? ['audio-mono'] : ['audio-l', 'audio-r']
  return {
    ports: [
      port(
        key,
        label,
        circuits.map((c) => one(c, 'out', level)),
        { connector: 'jack35-socket' },
      ),
    ],
    jacks: [jack(key, 'sound', 'out', onPort(key, circuits))],
  }
}

const optical = (dir: Jack['dir']) =>
  ({ connector: 'optical-socket', form: 'digital-sound', circuits: ['spdif'], dir }) as const

export const opticalOut = (key: Key, label = 'OPTICAL'): Fitting =>
  single(key, label, optical('out'))

export const opticalIn = (key: Key, label = 'OPTICAL'): Fitting => single(key, label, optical('in'))

export const coaxialSoundOut = (key: Key, label = 'COAXIAL'): Fitting =>
  single(key, label, phono('digital-sound', 'spdif', 'out'), { ring: 'orange' })
