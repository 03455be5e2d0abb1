import type { DeviceModel, Key } from '@coaxwain/models'
import type { Leg, Stop, Uid } from '@coaxwain/shelf'
import { takesAt, type Bench } from './bench'
import { finding, type Finding } from './finding'

/** 0.346 sqrt(75) microvolts at the aerial terminal: 47 CFR 15.115(c)(1)(ii). */
const LIMIT_DBMV = -50.47

/** The aerial is kept as asked, and nothing that is modulated here gets up to it. */
export function checkAerial(bench: Bench): Finding[] {
  const leg = bench.hookup.legs.find((l) => l.purpose === 'aerial')
  if (leg) return [...checkWay(bench, leg), ...checkRadiation(bench, leg)]
  return bench.question.demands.keepAerial === true ? [finding('aerial-not-kept')] : []
}

const hasRf = (device: DeviceModel, key: Key | null): boolean =>
  device.jacks.some((j) => j.key === key && j.form === 'rf')

/** From stop to stop there is a link, and every unit on the way passes the signal on in some position. */
function checkWay(bench: Bench, leg: Leg): Finding[] {
  const found: Finding[] = []
  const [first] = leg.stops
  const start = first ? bench.view.fn(first.unit, first.function) : null
  if (start?.kind !== 'receives') found.push(finding('aerial-not-kept'))
  leg.stops.slice(1).forEach((stop, i) => {
    const before = leg.stops[i] as Stop
    const joined = leg.links.some((l) => {
      const link = bench.hookup.links[l]
      return link?.from.unit === before.unit && link.to.unit === stop.unit
    })
    if (!joined) found.push(finding('aerial-not-kept', { unit: stop.unit }))
    const last = i === leg.stops.length - 2
    if (!last && !passesOn(bench, stop)) found.push(finding('aerial-not-kept', { unit: stop.unit }))
    if (last && !receives(bench, stop)) found.push(finding('aerial-not-kept', { unit: stop.unit }))
  })
  return found
}

function passesOn(bench: Bench, stop: Stop): boolean {
  const device = bench.view.device(stop.unit)
  if (!device || !hasRf(device, stop.in)) return false
  return device.functions.some(
    (fn) =>
      takesAt(fn, stop.in) &&
      (fn.tunedBy !== undefined || fn.gives.some((g) => g.jack === stop.out && !g.rf)),
  )
}

/** The last tuner receives the kind of station that there is. */
function receives(bench: Bench, stop: Stop): boolean {
  const device = bench.view.device(stop.unit)
  const kinds = new Set(bench.question.offAir.map((s) => s.kind))
  return (device?.functions ?? []).some((fn) => {
    if (!takesAt(fn, stop.in) || fn.tunedBy === undefined) return false
    const analogue = fn.accepts.some((r) => (r.systems ?? []).length > 0)
    const digital = fn.accepts.some((r) => (r.digital ?? []).length > 0)
    if (kinds.size === 0) return analogue || digital
    return (kinds.has('analogue') && analogue) || (kinds.has('digital') && digital)
  })
}

interface Edge {
  readonly to: string
  /** Gain in dB, negative for loss; null where nobody knows the isolation. */
  readonly db: number | null
  /** Along a lead, or inside a unit: a signal that has crossed a unit leaves it by a lead. */
  readonly by: 'lead' | 'unit'
}

const node = (unit: Uid, port: Key): string => `${unit} ${port}`

/** Something that is modulated here, where it leaves, and its level there. */
interface Sender {
  readonly from: string
  readonly levelDbmv: number
}

/** Level at an aerial terminal of everything that is modulated in the picture's path, by every way that joins. */
function checkRadiation(bench: Bench, leg: Leg): Finding[] {
  const warned = bench.hookup.cautions.some((c) => c.code === 'check-isolation')
  return levelsAt(bench, leg).flatMap(({ known, worst }): Finding[] => {
    const level = known > LIMIT_DBMV || warned ? known : worst
    return level > LIMIT_DBMV ? [finding('radiates', { level: Math.round(level * 10) / 10 })] : []
  })
}

/** Whether too much might get up to an aerial, and nobody knows. */
export function isolationUnknown(bench: Bench): boolean {
  const leg = bench.hookup.legs.find((l) => l.purpose === 'aerial')
  const levels = leg ? levelsAt(bench, leg) : []
  return levels.some(({ known, worst }) => known <= LIMIT_DBMV && worst > LIMIT_DBMV)
}

/** What arrives at the aerial of each carrier: by ways of which the isolation is known, and at worst. */
function levelsAt(bench: Bench, leg: Leg): { known: number; worst: number }[] {
  const aerial = leg.stops[0]
  const link = aerial && bench.hookup.links.find((l) => l.from.unit === aerial.unit)
  if (!link) return []
  const graph = rfGraph(bench)
  const target = node(aerial.unit, link.from.port)
  return senders(bench).map((sender) => ({
    known: highest(graph, sender, target, null),
    worst: highest(graph, sender, target, 0),
  }))
}

function senders(bench: Bench): Sender[] {
  const stops = bench.hookup.legs.find((l) => l.purpose === 'picture')?.stops ?? []
  return stops.flatMap((stop) => {
    const fn = bench.view.fn(stop.unit, stop.function)
    const rf = fn?.gives.find((g) => g.jack === stop.out)?.rf?.[0]
    const port = bench.view.jack(stop.unit, stop.out ?? '')?.contacts[0]?.port
    return rf && port !== undefined
      ? [{ from: node(stop.unit, port), levelDbmv: rf.levelDbmv }]
      : []
  })
}

function rfGraph(bench: Bench): Map<string, Edge[]> {
  const graph = new Map<string, Edge[]>()
  const add = (from: string, edge: Edge): void => {
    graph.set(from, [...(graph.get(from) ?? []), edge])
  }
  for (const l of bench.hookup.links) {
    if (!l.circuits.some((c) => c.from === 'rf')) continue
    add(node(l.from.unit, l.from.port), { to: node(l.to.unit, l.to.port), db: 0, by: 'lead' })
    add(node(l.to.unit, l.to.port), { to: node(l.from.unit, l.from.port), db: 0, by: 'lead' })
  }
  for (const uid of new Set(bench.hookup.links.flatMap((l) => [l.from.unit, l.to.unit]))) {
    const device = bench.view.device(uid)
    if (device) for (const [a, edge] of insideOf(device, uid)) add(a, edge)
  }
  return graph
}

/** Ways through a unit: forwards with its gain or loss, otherwise by what leaks. */
function insideOf(device: DeviceModel, uid: Uid): [string, Edge][] {
  const rf = device.ports
    .filter((p) => p.circuits.some((c) => c.circuit === 'rf'))
    .map((p) => p.key)
  const forwards = forwardsIn(device)
  return rf.flatMap((a) =>
    rf
      .filter((b) => b !== a)
      .map((b): [string, Edge] => {
        const ahead = forwards.get(`${a} ${b}`)
        const leak = device.leaks.find((l) => l.from === a && l.to === b)?.db
        const db = ahead ?? (leak === undefined ? null : -leak)
        return [node(uid, a), { to: node(uid, b), db, by: 'unit' }]
      }),
  )
}

/** Gain in dB from port to port, of what a device passes on without turning it into something else. */
function forwardsIn(device: DeviceModel): Map<string, number> {
  const portsOf = (jack: Key): Key[] =>
    device.jacks
      .filter((j) => j.key === jack && j.form === 'rf')
      .flatMap((j) => j.contacts.map((c) => c.port))
  const ways = device.functions
    .filter((fn) => fn.tunedBy === undefined)
    .flatMap((fn) => {
      const into = [...fn.needs, ...(fn.oneOf ?? [])].flatMap(portsOf)
      const outOf = fn.gives.filter((g) => g.rf === undefined).flatMap((g) => portsOf(g.jack))
      return into.flatMap((a) => outOf.map((b): [string, number] => [`${a} ${b}`, fn.gainDb ?? 0]))
    })
  return new Map(ways)
}

/** The highest level that arrives at a node; ways of unknown isolation count as given, or not at all. */
function highest(
  graph: ReadonlyMap<string, readonly Edge[]>,
  sender: Sender,
  target: string,
  unknownDb: number | null,
): number {
  let highestAtTarget = -Infinity
  const visit = (path: readonly string[], level: number, last: Edge['by'] | null): void => {
    const at = path.at(-1) as string
    if (at === target) highestAtTarget = Math.max(highestAtTarget, level)
    for (const edge of graph.get(at) ?? []) {
      const db = edge.db ?? unknownDb
      if (db === null || edge.by === last || path.includes(edge.to)) continue
      visit([...path, edge.to], level + db, edge.by)
    }
  }
  visit([sender.from], sender.levelDbmv, null)
  return highestAtTarget
}
