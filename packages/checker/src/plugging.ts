import { mayLend, type Hookup, type Link, type PieceUse, type PortRef } from '@coaxwain/shelf'
import type { Bench } from './bench'
import { finding, type Finding } from './finding'

/** A socket holds one plug and a plug sits in one socket; wires meet only where they may; stock lasts. */
export const checkPlugging = (bench: Bench): Finding[] => [
  ...takenTwice(bench.hookup),
  ...wiresJoined(bench),
  ...shortOf(bench),
]

const socket = ({ unit, port }: PortRef): string => `port ${unit} ${port}`

const plug = ({ model, copy, wayRound }: PieceUse, side: 'a' | 'b', index: number): string =>
  `plug ${model} ${copy} ${index} ${wayRound === 'forward' ? side : side === 'a' ? 'b' : 'a'}`

/** The ends that meet along a link, pair by pair. */
function meetings(link: Link): [string, string][] {
  const plugs = link.pieces.flatMap((p) => [plug(p, 'a', p.inPlug), plug(p, 'b', p.outPlug)])
  const ends = [socket(link.from), ...plugs, socket(link.to)]
  return Array.from({ length: ends.length / 2 }, (_, i) => [ends[2 * i]!, ends[2 * i + 1]!])
}

function takenTwice(hookup: Hookup): Finding[] {
  const mates = new Map<string, Set<string>>()
  const note = (end: string, other: string): void => {
    mates.set(end, (mates.get(end) ?? new Set()).add(other))
  }
  for (const [a, b] of hookup.links.flatMap(meetings)) {
    note(a, b)
    note(b, a)
  }
  return [...mates]
    .filter(([, others]) => others.size > 1)
    .map(([end]) =>
      finding(end.startsWith('port') ? 'port-taken-twice' : 'plug-taken-twice', { end }),
    )
}

/** Two outputs must not meet on one wire unless a piece mixes them. */
function wiresJoined({ hookup, view }: Bench): Finding[] {
  const arrivals = new Map<string, Set<Link>>()
  for (const link of hookup.links) {
    for (const c of link.circuits) {
      const wire = `${socket(link.to)} ${c.to}`
      arrivals.set(wire, (arrivals.get(wire) ?? new Set()).add(link))
    }
  }
  const isMixed = (link: Link): boolean =>
    link.pieces.some((p) => view.piece(p.model)?.mixes === true)
  return [...arrivals.values()]
    .map((links) => [...links])
    .filter((links) => links.length > 1 && !links.every(isMixed))
    .map((links) => finding('wires-joined', { unit: links[0]!.to.unit, port: links[0]!.to.port }))
}

/** More copies of a piece than the drawer holds; leads that are assumed to be there never run out. */
function shortOf({ question, hookup, view }: Bench): Finding[] {
  const copies = new Map<string, Set<number>>()
  for (const { model, copy } of [
    ...hookup.links.flatMap((l) => l.pieces),
    ...(hookup.ends ?? []),
  ]) {
    if (question.assumedLeads.includes(model)) continue
    copies.set(model, (copies.get(model) ?? new Set()).add(copy))
  }
  return [...copies].flatMap(([model, used]) => {
    const stock = view.snapshot.units
      .filter((u) => u.model === model && !question.avoid.includes(u.uid))
      .filter((u) => mayLend(u) && u.working !== 'faulty')
      .reduce((sum, u) => sum + u.quantity, 0)
    return used.size > stock ? [finding('piece-short', { piece: model })] : []
  })
}
