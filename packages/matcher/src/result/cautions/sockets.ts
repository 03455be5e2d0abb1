import { portOf, type DeviceModel, type Port } from '@coaxwain/models'
import type { Caution, Unit } from '@coaxwain/shelf'
import { familyOf, isSingle, mates, type Connector } from '@coaxwain/signal'
import type { Variant } from '../../compile/variant'
import { boxes, caution, display, named, source, type CautionInput, type Rule } from './rule'

/** More dead sockets than these are not named. */
const MOST_DEAD = 2

interface DeadPort {
  readonly port: Port
  readonly units: readonly Unit[]
}

const deadPortsOf = new WeakMap<Variant, readonly DeadPort[]>()

/** Ports of a model with the units on which they are recorded as dead; found once for each shelf. */
function deadPorts(variant: Variant): readonly DeadPort[] {
  const known = deadPortsOf.get(variant)
  if (known) return known
  const isDead = (unit: Unit, port: Port) =>
    unit.forms.some((f) => f.port === port.key && f.state === 'dead')
  const found = variant.device.ports
    .map((port) => ({ port, units: variant.units.filter((unit) => isDead(unit, port)) }))
    .filter(({ units }) => units.length > 0)
  deadPortsOf.set(variant, found)
  return found
}

/** Takes something in and gives something on, so that a way could have led through it. */
const isBetween = (device: DeviceModel): boolean =>
  device.functions.some((f) => f.needs.length > 0 && f.gives.length > 0)

/**
 * Sockets recorded as dead, so that nobody tries them: first those of the units that take part, then those of
 * their doubles on the shelf, which are easily taken for them, then those of boxes that a way could lead through.
 */
function dead(c: CautionInput): Caution[] {
  const { source: from, display: to, shelf } = c.input.frame
  const taken = new Set(c.stops.map((s) => s.unit))
  const part = new Set(c.stops.map((s) => s.variant.device))
  const onShelf = [...new Set([from, to, ...shelf])]
  const say = (code: string, variants: readonly Variant[], counts: (u: Unit) => boolean) =>
    variants.flatMap((v) =>
      deadPorts(v)
        .filter(({ units }) => units.some(counts))
        .map(({ port }) => caution(code, { name: v.device.name, port: port.label })),
    )
  const others = onShelf.filter(({ device }) => !part.has(device) && isBetween(device))
  const found = [
    ...say('socket-dead', onShelf, (u) => taken.has(u)),
    ...say(
      'double-dead',
      onShelf.filter(({ device }) => part.has(device)),
      (u) => !taken.has(u),
    ),
    ...say('socket-dead', others, () => true),
  ]
  return found.slice(0, MOST_DEAD)
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

/** A socket that only repeats the aerial: what is played never leaves by it, though a set's aerial input is near. */
const repeatsAerial: Rule = (c) => {
  const { device } = source(c).variant
  const tuned = display(c).variant.device.functions.some((f) => f.tunedBy !== undefined)
  const { fn } = source(c).way
  const played = new Set(fn.gives.map((g) => g.jack))
  const loops = device.functions.filter((f) => f.kind === 'loop-through').flatMap((f) => f.gives)
  return device.jacks
    .filter((j) => j.form === 'rf' && !played.has(j.key) && loops.some((g) => g.jack === j.key))
    .slice(0, tuned ? 1 : 0)
    .map((j) =>
      caution('repeats-aerial', {
        name: device.name,
        port: portOf(device, j.contacts[0]!.port).label,
      }),
    )
}

/** A socket without picture or sound, such as one for tape data or power, that takes a plug of the set's input. */
const otherSocket: Rule = (c) => {
  const set = display(c).variant.device
  const inputs = set.ports.filter((p) => p.circuits.some((x) => x.dir !== 'out'))
  return source(c)
    .variant.device.ports.filter((p) => p.circuits.length === 0)
    .flatMap((port) =>
      inputs
        .filter((p) => familyOf(p.connector) === familyOf(port.connector))
        .map((other) =>
          caution('other-socket', {
            name: named(source(c)),
            port: port.label,
            other: other.label,
            set: set.name,
          }),
        ),
    )
    .slice(0, 1)
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
  repeatsAerial,
  otherSocket,
  syncWire,
]
