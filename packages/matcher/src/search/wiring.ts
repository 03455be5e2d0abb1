import type { Condition } from '@coaxwain/models'
import type { Placed } from '../compile/face'
import { leastDoubt, type Way } from '../compile/way'
import type { Join } from '../join/join'
import { pathOf, type Finished, type SoundRoute } from './label'

/** One unit in a chain. Two units of one sort are two nodes with one way. */
export interface Node {
  readonly way: Way
  /** Its positions, once it is known what comes in and what goes out. */
  readonly stand: Condition
}

export interface EdgeEnd {
  readonly node: Node
  readonly placed: Placed
}

/** Everything that is plugged between two units of a chain in one go. */
export interface Edge {
  readonly from: EdgeEnd
  readonly to: EdgeEnd
  readonly join: Join
  readonly of: 'chain' | 'sound' | 'aerial'
}

/** A finished chain as a drawing of who is plugged into whom. */
export interface Wiring {
  readonly found: Finished
  /** From the source to the display, both included. */
  readonly chain: readonly Node[]
  /** Boxes that handle sound alone, then loudspeakers. */
  readonly alone: readonly Node[]
  /** The aerial and the boxes of its own that it comes by. */
  readonly aerial: readonly Node[]
  readonly edges: readonly Edge[]
}

export const nodesOf = ({ chain, alone, aerial }: Wiring): Node[] => [...chain, ...alone, ...aerial]

/** Nodes for which a unit is picked from the shelf. */
export const boxesOf = (wiring: Wiring): Node[] => [
  ...wiring.chain.slice(1, -1),
  ...wiring.alone,
  ...wiring.aerial,
]

const leaving = (node: Node): EdgeEnd => ({ node, placed: node.way.from! })
const entering = (node: Node): EdgeEnd => ({ node, placed: node.way.into! })

const plainNode = (way: Way): Node => ({ way, stand: way.stand })

/** Lays a finished chain out as nodes and edges. */
export function wiringOf(found: Finished): Wiring {
  const path = pathOf(found.last)
  const chain: Node[] = [
    ...path.map(({ way, stand }) => ({ way, stand })),
    { way: found.end, stand: found.stand },
  ]
  const alone: Node[] = []
  const edges: Edge[] = []
  const addRoute = (route: SoundRoute, from: Node, to: Node): void => {
    const [first, second] = route.joins
    if (!route.via || !second) {
      edges.push({ from: leaving(from), to: entering(to), join: first!, of: 'sound' })
      return
    }
    const via = plainNode(route.via)
    alone.push(via)
    edges.push(
      { from: leaving(from), to: entering(via), join: first!, of: 'sound' },
      { from: leaving(via), to: entering(to), join: second, of: 'sound' },
    )
  }
  const waitingAt = (index: number): Node => {
    const { sound } = path[index]!
    return chain[sound.kind === 'waits' ? path.indexOf(sound.at) : index]!
  }
  const steps = [...path.slice(1).map((l) => l.step!), found.step]
  steps.forEach(({ join, soundRoute }, i) => {
    const [from, to] = [chain[i]!, chain[i + 1]!]
    edges.push({ from: leaving(from), to: entering(to), join, of: 'chain' })
    if (soundRoute) addRoute(soundRoute, waitingAt(i), to)
  })
  if (found.speakers) {
    const speakers = plainNode(found.speakers.way)
    addRoute(found.speakers.route, waitingAt(path.length - 1), speakers)
    alone.push(speakers)
  }
  const aerial = (found.aerial?.route.ways ?? []).map(plainNode)
  const all = [...withSharedLeads(edges), ...aerialEdges(found, chain, aerial)]
  return { found, chain, alone, aerial, edges: all }
}

/** Where a sound goes over the pieces of a picture, the picture is laid with them too. */
function withSharedLeads(edges: readonly Edge[]): Edge[] {
  const laid = new Map(edges.map((edge) => [edge, edge]))
  for (const edge of edges) {
    const { along } = edge.join
    const picture = along && edges.find((e) => e.of === 'chain' && meet(e, edge, along.shared))
    if (!picture) continue
    // Made anew for every wiring, so that it can be told apart where the same is plugged twice.
    const join = { ...along.join }
    laid.set(edge, { ...edge, join: { ...edge.join, along: { ...along, join } } })
    laid.set(picture, { ...picture, join })
  }
  return edges.map((edge) => laid.get(edge)!)
}

const meet = (a: Edge, b: Edge, shared: 'from' | 'to'): boolean => a[shared].node === b[shared].node

/** The node where an aerial joins the chain. */
export const jointOf = ({ aerial }: Finished, chain: readonly Node[]): Node | null =>
  chain.find((n) => n.way === aerial?.at) ??
  chain.find((n, i) => i === chain.length - 1 && n.way.id === aerial?.at.id) ??
  null

function aerialEdges(found: Finished, chain: readonly Node[], aerial: readonly Node[]): Edge[] {
  const joint = jointOf(found, chain)
  if (!found.aerial || !joint) return []
  const { route, into } = found.aerial
  return route.joins.map((join, i) => {
    const next = aerial[i + 1]
    const to = next ? entering(next) : { node: joint, placed: into }
    return { from: leaving(aerial[i]!), to, join, of: 'aerial' }
  })
}

/** Doubt of a chain that belongs to its joins and not to its units. */
export const doubtOfJoins = (wiring: Wiring): number =>
  wiring.found.axes.doubt - nodesOf(wiring).reduce((sum, n) => sum + leastDoubt(n.way), 0)
