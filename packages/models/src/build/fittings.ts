import type { Jack, JackContact, Key, Load, PlugColour, Port, PortCircuit } from '../model'
import type { Circuit, Connector, Direction, Form, SoundLevel } from '@coaxwain/signal'

/** A port before it has found its place on a panel. */
export type LoosePort = Omit<Port, 'at' | 'group'>

/** Ports that belong together, with the forms that they carry. */
export interface Fitting {
  readonly ports: readonly LoosePort[]
  readonly jacks: readonly Jack[]
}

/** Everything about a port that a fitting does not decide. */
export interface PortOptions {
  readonly connector?: Connector
  readonly mount?: Port['mount'] | undefined
  readonly load?: Load | undefined
  readonly loopsTo?: Key | undefined
  readonly ring?: PlugColour | undefined
  readonly origin?: Port['origin'] | undefined
  readonly isolated?: Port['isolated'] | undefined
  readonly impedanceOhm?: number | undefined
  readonly suppliesDcVolts?: number | undefined
  readonly standsDc?: Port['standsDc'] | undefined
  readonly note?: string | undefined
}

export const port = (
  key: Key,
  label: string,
  circuits: readonly PortCircuit[],
  options: PortOptions & { readonly connector: Connector },
): LoosePort => ({
  key,
  label,
  connector: options.connector,
  mount: options.mount ?? 'chassis',
  circuits,
  impedanceOhm: options.impedanceOhm,
  load: options.load,
  loopsTo: options.loopsTo,
  ring: options.ring,
  origin: options.origin ?? 'factory',
  isolated: options.isolated ?? 'yes',
  suppliesDcVolts: options.suppliesDcVolts,
  standsDc: options.standsDc,
  note: options.note,
})

export const one = (circuit: Circuit, dir: Direction, level?: SoundLevel): PortCircuit => ({
  circuit,
  dir,
  level,
})

export const jack = (
  key: Key,
  form: Form,
  dir: Jack['dir'],
  contacts: readonly JackContact[],
): Jack => ({ key, form, dir, contacts })

/** Contacts that all sit on one port. */
export const onPort = (key: Key, circuits: readonly Circuit[]): readonly JackContact[] =>
  circuits.map((circuit) => ({ circuit, port: key }))

/** What a socket of one form is, before it has a name. */
export interface Socket {
  readonly connector: Connector
  readonly form: Form
  readonly circuits: readonly Circuit[]
  readonly dir: Jack['dir']
}

/** One port that carries one form; port and jack share a key. Options win over the usual connector. */
export function single(
  key: Key,
  label: string,
  socket: Socket,
  options: PortOptions = {},
): Fitting {
  const circuits = socket.circuits.map((c) => one(c, socket.dir))
  return {
    ports: [port(key, label, circuits, { connector: socket.connector, ...options })],
    jacks: [jack(key, socket.form, socket.dir, onPort(key, socket.circuits))],
  }
}
