import { portOf, type DeviceModel, type Port } from '@coaxwain/models'
import type { Caution, Unit } from '@coaxwain/shelf'
import { familyOf, isSingle, mates, type Connector } from '@coaxwain/signal'
import type { Variant } from '../../compile/variant'
import { boxes, caution, display, named, source, type CautionInput, type Rule } from './rule'

/** More dead sockets than these are not named. */
const MOST_DEAD = 2

const deadPorts = (unit: Unit, device: DeviceModel): Port[] =>
  device.ports.filter((p) => unit.forms.some((f) => f.port === p.key && f.state === 'dead'))

const present = ({ input: { frame } }: CautionInput): readonly Variant[] => [
  frame.source,
  frame.display,
  ...frame.shelf,
]

/** Sockets recorded as dead on whatever takes part or might: named, so that nobody tries them. */
function dead(c: CautionInput): Caution[] {
  const found: Caution[] = []
  for (const { device, units } of present(c)) {
    for (const port of units.flatMap((unit) => deadPorts(unit, device))) {
      found.push(caution('socket-dead', { name: device.name, port: port.label }))
      if (found.length >= MOST_DEAD) return found
    }
  }
  return found
}

const usedPorts = (
  c: CautionInput,
): readonly { readonly device: DeviceModel; readonly port: Port }[] =>
  c.stops.flatMap((s) =>
    [s.way.into, s.way.from].flatMap((placed) =>
      (placed?.ports ?? []).map((key) => ({
        device: s.variant.device,
        port: portOf(s.variant.device, key),
      })),
    ),
  )

const carries = (port: Port, circuit: string, dir: 'in' | 'out'): boolean =>
  port.circuits.some((x) => x.circuit === circuit && (x.dir === dir || x.dir === 'either'))

/** Which contact of a 3.5 mm jack with four carries what differs from maker to maker (common practice, no source). */
const ownWiring: Rule = (c) =>
  usedPorts(c)
    .filter(
      ({ port }) =>
        familyOf(port.connector) === 'jack35' && port.circuits.some((x) => x.circuit === 'cvbs'),
    )
    .slice(0, 1)
    .map(({ device, port }) => caution('own-wiring', { name: device.name, port: port.label }))

/** Both take the same plug. */
const samePlug = (a: Connector, b: Connector): boolean =>
  isSingle(a) && familyOf(a) === familyOf(b) && !mates(a, b)

/** A television channel on a plain phono socket, and a socket for video on the set that takes the same plug. */
const channelSocket: Rule = (c) => {
  const { device } = source(c).variant
  const set = display(c).variant.device
  const used = source(c).way.from?.ports ?? []
  const channels = device.ports.filter((p) => carries(p, 'rf', 'out') && used.includes(p.key))
  const [first] = channels.flatMap((port) =>
    set.ports
      .filter((p) => carries(p, 'cvbs', 'in') && samePlug(p.connector, port.connector))
      .map((other) => ({ port, other })),
  )
  return first
    ? [
        caution('channel-socket', {
          name: device.name,
          port: first.port.label,
          other: first.other.label,
          set: set.name,
        }),
      ]
    : []
}

/** Digital sound on the same plug as ordinary sound. */
const digitalSocket: Rule = (c) => {
  const { device } = source(c).variant
  const sounds = display(c).variant.device.ports.filter((p) =>
    p.circuits.some((x) => x.circuit.startsWith('audio') && x.dir !== 'out'),
  )
  return device.ports
    .filter((p) => carries(p, 'spdif', 'out'))
    .filter((p) => sounds.some((s) => samePlug(s.connector, p.connector)))
    .slice(0, 1)
    .map((p) => caution('digital-socket', { name: device.name, port: p.label }))
}

/** A voltage on a lead, from an output or up to an aerial's own amplifier. */
const directCurrent: Rule = (c) => {
  const sent = c.stops.flatMap((s) =>
    (s.way.from?.ports ?? [])
      .map((key) => portOf(s.variant.device, key))
      .filter((p) => (p.suppliesDcVolts ?? 0) !== 0)
      .map((p) => caution('dc-on-lead', { name: named(s), port: p.label })),
  )
  const fed = c.input.wiring.aerial.some((n) =>
    (n.way.from?.ports ?? []).some(
      (key) => portOf(n.way.variant.device, key).needsDcVolts !== undefined,
    ),
  )
  return [...sent.slice(0, 1), ...(fed ? [caution('dc-to-aerial')] : [])]
}

/** The transformer that is missing is the reason why a bare lead will not do. */
const matching: Rule = (c) => {
  const { drawer } = c.input.frame
  const bought = c.hookup.links.flatMap((l) =>
    l.pieces.filter((p) =>
      drawer.pieces.some(
        (d) =>
          d.bought &&
          d.piece.impedanceOhm !== undefined &&
          d.piece.impedanceOhm[0] !== d.piece.impedanceOhm[1] &&
          d.models.some((m) => m.model === p.model),
      ),
    ),
  )
  return bought.length > 0 ? [caution('matching-needed', { name: named(display(c)) })] : []
}

/** RGB in single wires: the sync is one more. */
const syncWire: Rule = (c) =>
  [...boxes(c), display(c)].some((s) => {
    const ports = s.way.into?.ports ?? []
    const form = s.way.into?.face.form
    return ports.length > 3 && form !== undefined && (form === 'rgbs' || form === 'rgbhv')
  })
    ? [caution('sync-wire')]
    : []

/** What is special about the sockets and the wires. */
export const SOCKETS: readonly Rule[] = [
  dead,
  directCurrent,
  matching,
  ownWiring,
  channelSocket,
  digitalSocket,
  syncWire,
]
