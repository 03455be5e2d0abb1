import type { PieceModel, Wire } from '@coaxwain/models'
import { piece, wire, type PieceDraft } from '@coaxwain/models/build'
import {
  isSingle,
  type AdapterEnd,
  type AdapterFact,
  type Circuit,
  type Connector,
  type ConnectorFamily,
  type LooseConnector,
} from '@coaxwain/signal'

export type Role = 'gives' | 'takes'

/** The socket that a device has for a family. An aerial output of 9.52 mm is a plug, an input a socket. */
export function socketOf({ families }: AdapterEnd, role: Role): Connector {
  const [family] = families
  if (family === undefined) throw new Error('an end without a connector')
  if (family === 'spades') return 'screws'
  if (family === 'iec') return role === 'gives' ? 'iec-plug' : 'iec-socket'
  return `${family as ConnectorFamily}-socket`
}

const LOOSE: readonly string[] = ['spades', 'bare', 'screws', 'whip'] satisfies LooseConnector[]

/** What goes into that socket. */
function plugOf(end: AdapterEnd, role: Role): Connector {
  const [family = 'f'] = end.families
  if (LOOSE.includes(family)) return family as LooseConnector
  const socket = socketOf(end, role)
  return socket.endsWith('-plug')
    ? `${family as ConnectorFamily}-socket`
    : `${family as ConnectorFamily}-plug`
}

const plugs = (end: AdapterEnd, role: Role): Connector[] =>
  Array.from({ length: end.count }, () => plugOf(end, role))

/** The plug on which a circuit runs: its own of several single ones, or the only one. */
const at = (end: AdapterEnd, connector: Connector, [circuit, index]: readonly [Circuit, number]) =>
  isSingle(connector) ? ([end.count === 1 ? 0 : index, 'any'] as const) : ([0, circuit] as const)

/** Wires as they run from the first end to the second: one to a core, or one to a circuit. */
function wiresOf(
  fact: AdapterFact,
  [a, b]: readonly [Connector, Connector],
  way: Wire['way'],
): Wire[] {
  if (isSingle(a) && isSingle(b)) {
    const cores = Math.max(fact.a.count, fact.b.count)
    return Array.from({ length: cores }, (_, i) =>
      wire([Math.min(i, fact.a.count - 1), 'any'], [Math.min(i, fact.b.count - 1), 'any'], way),
    )
  }
  const most = Math.max(isSingle(a) ? fact.a.count : 0, isSingle(b) ? fact.b.count : 0)
  const carried = most > 0 ? fact.carries.slice(0, most) : fact.carries
  return carried.map((circuit, i) =>
    wire(at(fact.a, a, [circuit, i]), at(fact.b, b, [circuit, i]), way),
  )
}

/**
 * A lead made by a fact, wired one way or both. `turned`: the giver sits at its second end, so that ends that
 * differ for inputs and outputs are made for that.
 */
export function leadBy(
  fact: AdapterFact,
  way: Wire['way'],
  { turned = false, ...rest }: Partial<PieceDraft> & { readonly turned?: boolean } = {},
): PieceModel {
  const roles: readonly [Role, Role] = turned ? ['takes', 'gives'] : ['gives', 'takes']
  const [a, b] = [plugs(fact.a, roles[0]), plugs(fact.b, roles[1])]
  return piece({
    name: 'By the table',
    kind: 'lead',
    a,
    b,
    wires: wiresOf(fact, [a[0] ?? 'f-plug', b[0] ?? 'f-plug'], way),
    meantFor: fact.carries,
    ...rest,
  })
}
