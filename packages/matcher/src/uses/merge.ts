import { portOf, together, type Condition, type Key } from '@coaxwain/models'
import type { Uid, Unit } from '@coaxwain/shelf'
import { bothLeans, offersOf } from '../compile/leans'
import type { Drawer } from '../join/drawer'
import { stepsOf } from '../search/assign'
import type { Cost } from '../search/label'
import { doubtOfJoins, nodesOf, type Edge, type Node, type Wiring } from '../search/wiring'

/** One unit of an arrangement, and every way in which its chains use it. */
interface Place {
  readonly nodes: readonly Node[]
  readonly units: readonly Unit[]
}

/** Two chains wired at once: who is who, and what it costs together. */
export interface Merged {
  readonly wirings: readonly Wiring[]
  readonly unitOf: ReadonlyMap<Node, Unit>
  /** Positions of units that serve several displays at once; where absent, each use has its own. */
  readonly standOf: ReadonlyMap<Node, Condition>
  readonly cost: Cost
}

/** Sockets used by chains at the same time must allow the same positions; else each use has its own. */
export type Timing = 'at-once' | 'in-turn'

/** Every way of wiring a chain beside others that differs in which units are shared, the most shared first. */
export function merges(before: Merged, added: Wiring, drawer: Drawer, timing: Timing): Merged[] {
  const nodes = nodesOf(added)
  const results: Merged[] = []
  const put = (i: number, mapped: readonly Place[]): void => {
    const node = nodes[i]
    if (!node) {
      const merged = settle([...before.wirings, added], mapped, drawer, timing)
      if (merged) results.push(merged)
      return
    }
    mapped.forEach((place, at) => {
      const units = place.units.filter((u) => poolOf(node).includes(u))
      if (units.length === 0 || place.nodes.some((n) => nodes.includes(n))) return
      put(i + 1, mapped.with(at, { nodes: [...place.nodes, node], units }))
    })
    put(i + 1, [...mapped, { nodes: [node], units: poolOf(node) }])
  }
  put(0, placesOf(before))
  return results
}

/** One chain alone. */
export const alone = (wiring: Wiring, drawer: Drawer, timing: Timing): Merged | null =>
  settle(
    [wiring],
    nodesOf(wiring).map((node) => ({ nodes: [node], units: poolOf(node) })),
    drawer,
    timing,
  )

const poolOf = ({ way }: Node): Unit[] => way.offers.map((o) => o.unit)

/** The places of what is merged already; its units may still change. */
function placesOf({ wirings, unitOf }: Merged): Place[] {
  const groups = new Map<Unit, Node[]>()
  for (const node of wirings.flatMap(nodesOf)) {
    const unit = unitOf.get(node)!
    groups.set(unit, [...(groups.get(unit) ?? []), node])
  }
  return [...groups.values()].map((nodes) => ({
    nodes,
    units: nodes.map(poolOf).reduce((all, pool) => all.filter((u) => pool.includes(u))),
  }))
}

function settle(
  wirings: readonly Wiring[],
  places: readonly Place[],
  drawer: Drawer,
  timing: Timing,
): Merged | null {
  const edges = distinctEdges(wirings, places)
  if (!edges) return null
  const stands = timing === 'at-once' ? standsOf(places, edges) : new Map<Node, Condition>()
  const picked = stands && pickUnits(places)
  if (!picked) return null
  const terminators = terminatorsOf(wirings, places, edges)
  if (isShort([...piecesOf(edges), ...terminators], drawer)) return null
  const boxes = places.filter((p) => !isFixed(p))
  const powered = boxes.filter(isBox).length
  return {
    wirings,
    unitOf: new Map(places.flatMap((p, i) => p.nodes.map((n) => [n, picked.units[i]!] as const))),
    standOf: stands,
    cost: {
      boxes: powered,
      pieces: piecesOf(edges).length + terminators.length + boxes.length - powered,
      doubt: picked.doubt + wirings.reduce((sum, w) => sum + doubtOfJoins(w), 0),
      bought: 0,
    },
  }
}

const isFixed = ({ nodes }: Place): boolean =>
  nodes.some((n) => n.way.variant.id.startsWith('unit:'))

/** Under power, or loudspeakers, which count as a box either way. */
const isBox = ({ nodes }: Place): boolean =>
  nodes.some((n) => n.way.variant.powered || n.way.fn.kind === 'makes-sound')

/** Each connection once; null where a socket would have to hold two plugs. */
function distinctEdges(wirings: readonly Wiring[], places: readonly Place[]): Edge[] | null {
  const at = new Map(places.flatMap(({ nodes }, i) => nodes.map((node) => [node, i] as const)))
  const sockets = new Map<string, string>()
  const distinct = new Map<string, Edge>()
  for (const edge of wirings.flatMap((w) => w.edges)) {
    const plugs = plugsOf(edge)
    const [from, to] = [at.get(edge.from.node), at.get(edge.to.node)]
    const what = `${from} ${to} ${plugs.name}`
    for (const socket of [
      ...plugs.out.map((p) => `${from} ${p}`),
      ...plugs.in.map((p) => `${to} ${p}`),
    ]) {
      if ((sockets.get(socket) ?? what) !== what) return null
      sockets.set(socket, what)
    }
    distinct.set(what, edge)
  }
  return [...distinct.values()]
}

interface Plugs {
  readonly out: readonly Key[]
  readonly in: readonly Key[]
  /** The sockets, the pieces between them and how they lie. */
  readonly name: string
}

/** Read again and again while a chain is set beside others. */
const known = new WeakMap<Edge, Plugs>()

function plugsOf(edge: Edge): Plugs {
  const found = known.get(edge)
  if (found) return found
  const { instances, hops } = edge.join.routing
  const [out, into] = [portsOut(edge), portsIn(edge)]
  const pieces = instances.map((t) => [t.piece, t.wayRound])
  const plugs = { out, in: into, name: JSON.stringify([out, into, pieces, hops]) }
  known.set(edge, plugs)
  return plugs
}

const portsOut = ({ from, join }: Edge): Key[] =>
  join.wires.map((w) => from.placed.ports[w.fromPort]!)

const portsIn = ({ to, join }: Edge): Key[] => join.wires.map((w) => to.placed.ports[w.toPort]!)

const piecesOf = (edges: readonly Edge[]): number[] =>
  edges.flatMap((e) => e.join.routing.instances.map((t) => t.piece))

function isShort(pieces: readonly number[], drawer: Drawer): boolean {
  const used = new Map<number, number>()
  for (const piece of pieces) used.set(piece, (used.get(piece) ?? 0) + 1)
  return [...used].some(([piece, n]) => n > (drawer.pieces[piece]?.stock ?? 0))
}

/** Loop sockets into which nothing is plugged want their terminators. */
function terminatorsOf(
  wirings: readonly Wiring[],
  places: readonly Place[],
  edges: readonly Edge[],
): number[] {
  const found = new Map<string, number>()
  for (const { found: finished, chain } of wirings) {
    stepsOf(finished).forEach(({ terminators }, i) => {
      const node = chain[i + 1]!
      const place = places.findIndex((p) => p.nodes.includes(node))
      const outs = portsFrom(places[place]!, edges)
      terminators.forEach((piece, nth) => {
        const key = node.way.terminate[nth]!
        if (!outs.includes(key)) found.set(`${place} ${key}`, piece)
      })
    })
  }
  return [...found.values()]
}

const portsFrom = ({ nodes }: Place, edges: readonly Edge[]): Key[] =>
  edges.filter((e) => nodes.includes(e.from.node)).flatMap(portsOut)

/** One stand for each unit that serves several at once; null where they want different ones. */
function standsOf(places: readonly Place[], edges: readonly Edge[]): Map<Node, Condition> | null {
  const stands = new Map<Node, Condition>()
  for (const place of places) {
    const { nodes } = place
    if (nodes.length < 2) continue
    const outs = portsFrom(place, edges)
    const joint = nodes.reduce<Condition | null>(
      (all, node) => all && together(all, standBeside(node, outs)),
      [],
    )
    if (!joint) return null
    for (const node of nodes) stands.set(node, joint)
  }
  return stands
}

/** Where the line goes on by a loop, the input no longer ends it. */
function standBeside({ way, stand }: Node, outs: readonly Key[]): Condition {
  const loops = (way.into?.ports ?? []).flatMap((p) => portOf(way.variant.device, p).loopsTo ?? [])
  const passesOn = way.out !== null
  if (passesOn || !loops.some((l) => outs.includes(l))) return stand
  const ends = new Set(way.lineStand.map((c) => c.control))
  return stand.filter((c) => !ends.has(c.control))
}

/** A unit for each place, none twice, with the least doubt in all. */
function pickUnits(places: readonly Place[]): { units: Unit[]; doubt: number } | null {
  const options = places.map(({ nodes, units }) => {
    const leans = nodes.map((n) => n.way.leans).reduce(bothLeans)
    const { variant } = nodes[0]!.way
    return offersOf({ ...variant, units }, leans)
  })
  let best: { units: Unit[]; doubt: number } | null = null
  const pick = (i: number, units: readonly Unit[], doubt: number): void => {
    if (best && doubt >= best.doubt) return
    if (i === options.length) {
      best = { units: [...units], doubt }
      return
    }
    const taken = new Set<Uid>(units.map((u) => u.uid))
    for (const offer of options[i]!.filter((o) => !taken.has(o.unit.uid)))
      pick(i + 1, [...units, offer.unit], doubt + offer.doubt)
  }
  pick(0, [], 0)
  return best
}
