import type { Jack, Key, PortCircuit } from '../model'
import type { Circuit, Form } from '@coaxwain/signal'
import { jack, onPort, port, type Fitting, type PortOptions } from './fittings'

export const SCART_FORMS = ['composite', 'rgb', 's-video', 'sound'] as const
export type ScartForm = (typeof SCART_FORMS)[number]

const FORM: Readonly<Record<ScartForm, Form>> = {
  composite: 'composite',
  rgb: 'rgbs',
  's-video': 's-video',
  sound: 'sound',
}

/** RGB leaves with composite video as its sync and is taken with sync on the video pin (two published pin tables). */
const GIVEN: Readonly<Record<ScartForm, readonly Circuit[]>> = {
  composite: ['cvbs'],
  rgb: ['r', 'g', 'b', 'cvbs'],
  's-video': ['y', 'c'],
  sound: ['audio-l', 'audio-r'],
}

const TAKEN: Readonly<Record<ScartForm, readonly Circuit[]>> = {
  composite: ['cvbs'],
  rgb: ['r', 'g', 'b', 'csync'],
  's-video': ['y', 'c'],
  sound: ['audio-l', 'audio-mono', 'audio-r'],
}

interface ScartUse {
  readonly gives?: readonly ScartForm[] | undefined
  readonly takes?: readonly ScartForm[] | undefined
}

/**
 * A 21-pin socket with the subset of circuits that this maker joined. Its jacks are `KEY-FORM-out` and
 * `KEY-FORM-in`. A circuit that goes both ways uses a pin each way, and is written once as `either`.
 */
export function scart(key: Key, label: string, use: ScartUse, options: PortOptions = {}): Fitting {
  const gives = use.gives ?? []
  const takes = use.takes ?? []
  return {
    ports: [
      port(key, label, circuitsOf(gives, takes), {
        connector: 'scart-socket',
        impedanceOhm: 75,
        ...options,
      }),
    ],
    jacks: [
      ...takes.map((f): Jack => jack(`${key}-${f}-in`, FORM[f], 'in', onPort(key, TAKEN[f]))),
      ...gives.map((f): Jack => jack(`${key}-${f}-out`, FORM[f], 'out', onPort(key, GIVEN[f]))),
    ],
  }
}

function circuitsOf(
  gives: readonly ScartForm[],
  takes: readonly ScartForm[],
): readonly PortCircuit[] {
  const out = new Set(gives.flatMap((f) => GIVEN[f]))
  const into = new Set(takes.flatMap((f) => TAKEN[f]))
  if (gives.length > 0) out.add('switch-volts')
  if (takes.length > 0) into.add('switch-volts')
  return [...new Set([...into, ...out])].map((circuit) => ({
    circuit,
    dir: into.has(circuit) ? (out.has(circuit) ? 'either' : 'in') : 'out',
  }))
}
