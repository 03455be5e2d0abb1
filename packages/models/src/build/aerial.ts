import type { Jack, Key } from '../model'
import type { Connector } from '@coaxwain/signal'
import { jack, onPort, one, port, single, type Fitting, type PortOptions } from './fittings'

/** 75 ohm coax or 300 ohm twin lead, by the connector (IEC 61169-2, -24; common practice, no source). */
const ohmOf = (connector: Connector): number =>
  ['screws', 'spades', 'bare'].includes(connector) ? 300 : 75

const rf = (connector: Connector, dir: Jack['dir']) =>
  ({ connector, form: 'rf', circuits: ['rf'], dir }) as const

export const rfIn = (
  key: Key,
  label: string,
  connector: Connector,
  options?: PortOptions,
): Fitting =>
  single(key, label, rf(connector, 'in'), {
    impedanceOhm: ohmOf(connector),
    standsDc: 'unknown',
    ...options,
  })

export const rfOut = (
  key: Key,
  label: string,
  connector: Connector,
  options?: PortOptions,
): Fitting =>
  single(key, label, rf(connector, 'out'), { impedanceOhm: ohmOf(connector), ...options })

/** A passive socket that may be fed or may feed: its two jacks are `KEY-in` and `KEY-out`. */
export function rfEither(key: Key, label: string, connector: Connector): Fitting {
  const contacts = onPort(key, ['rf'])
  return {
    ports: [
      port(key, label, [one('rf', 'either')], {
        connector,
        impedanceOhm: ohmOf(connector),
        standsDc: 'unknown',
      }),
    ],
    jacks: [jack(`${key}-in`, 'rf', 'in', contacts), jack(`${key}-out`, 'rf', 'out', contacts)],
  }
}

/** A telescopic aerial fixed to the set: nothing can be plugged to it. */
export const whip = (key: Key, label = 'AERIAL'): Fitting => rfIn(key, label, 'whip')

/** Where a power pack is plugged in. */
export const packSocket = (label: string): Fitting => ({
  ports: [port('power-in', label, [one('dc', 'in')], { connector: 'dc-socket' })],
  jacks: [],
})
