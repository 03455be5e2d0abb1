import { jackOf } from '@coaxwain/models'
import type { Protection } from '@coaxwain/signal'
import type { Way } from '../compile/way'

const isDigital = (way: Way): boolean =>
  way.in !== null && ['hdmi', 'dvi'].includes(jackOf(way.variant.device, way.in).form)

/** Protection that a function does not stand: a recorder's level control, a box without the handshake. */
export function stopsAt(way: Way, protection: Protection): boolean {
  if (protection === 'agc-pulses') return way.fn.inputAgc === true
  return protection === 'hdcp' && isDigital(way) && way.fn.hdcp === false
}

/** Nobody has said whether the handshake is completed: the answer may stand, with doubt. */
export const handshakeUnknown = (way: Way, protection: Protection): boolean =>
  protection === 'hdcp' && isDigital(way) && way.fn.hdcp === undefined
