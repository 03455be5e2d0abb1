import type { Circuit, Connector } from '@coaxwain/signal'
import type { PlugColour, Port } from '@coaxwain/models'

const BY_COLOUR: Readonly<Record<PlugColour, string>> = {
  yellow: 'v',
  white: 'l',
  red: 'r',
  green: 'y',
  blue: 'pb',
  black: '75',
  orange: 'd',
  grey: 's',
}

const BY_CIRCUIT: Partial<Record<Circuit, string>> = {
  cvbs: 'v',
  'audio-l': 'l',
  'audio-mono': 'l',
  'audio-r': 'r',
  y: 'y',
  pb: 'pb',
  pr: 'pr',
  r: 'pr',
  g: 'y',
  b: 'pb',
  spdif: 'd',
  'ac3-rf': 'd',
}

/** The token of a phono's ring: the printed colour, else the usual one for what it carries, else none. */
export function ringBand(port: Pick<Port, 'connector' | 'ring' | 'circuits'>): string | null {
  if (!port.connector.startsWith('phono')) return null
  if (port.ring) return BY_COLOUR[port.ring]
  const only = port.circuits[0]?.circuit
  return (only && BY_CIRCUIT[only]) ?? null
}

/** How a plug looks that sits in a socket: a lettered disc, a solid disc, or two forks. */
export type PlugLook =
  | { readonly kind: 'letter'; readonly r: number }
  | { readonly kind: 'solid'; readonly r: number }
  | { readonly kind: 'lugs' }

export function plugLook(socket: Connector, carriesRf = false): PlugLook {
  if (socket === 'screws') return { kind: 'lugs' }
  if (socket.startsWith('f-') || socket.startsWith('iec-')) return { kind: 'solid', r: 7.5 }
  if (socket.startsWith('dc-')) return { kind: 'solid', r: 6.5 }
  if (carriesRf) return { kind: 'solid', r: 7 }
  return { kind: 'letter', r: 9.5 }
}
