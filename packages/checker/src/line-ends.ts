import type { Port } from '@coaxwain/models'
import type { Link, PortRef } from '@coaxwain/shelf'
import { isSoundCircuit, mates } from '@coaxwain/signal'
import type { Bench } from './bench'
import { finding, type Finding } from './finding'

/** Every video line has one load of 75 ohm, at its far end. */
export const checkLineEnds = (bench: Bench): Finding[] => [
  ...bench.hookup.links.filter(carriesVideo).flatMap((link) => checkEnd(bench, link.to)),
  ...misplacedTerminators(bench),
]

const WITHOUT_LINE = ['rf', 'tmds']

const carriesVideo = ({ circuits }: Link): boolean =>
  circuits.some((c) => !isSoundCircuit(c.from) && !WITHOUT_LINE.includes(c.from))

const isAt = (a: PortRef, unit: string, port: string | undefined): boolean =>
  a.unit === unit && a.port === port

function checkEnd(bench: Bench, at: PortRef): Finding[] {
  const port = bench.view.port(at.unit, at.port)
  if (!port) return []
  const links = [...bench.hookup.links, ...(bench.beside?.links ?? [])]
  const goesOn = links.some((l) => isAt(l.from, at.unit, port.loopsTo))
  const ended = isEnded(bench, at, port)
  const details = { unit: at.unit, port: at.port }
  if (goesOn) return ended === 'here' ? [finding('line-ended-twice', details)] : []
  return ended === 'nowhere' ? [finding('line-not-ended', details)] : []
}

/** Where the line that comes in at a port has its load; what cannot be known is taken to be right. */
function isEnded(bench: Bench, at: PortRef, port: Port): 'here' | 'on the loop' | 'nowhere' | '?' {
  const { load } = port
  switch (load?.kind) {
    case '75':
      return 'here'
    case 'switch':
      return bench.positions.of(at.unit, load.control) === load.position75 ? 'here' : 'nowhere'
    case 'high':
      return onTheLoop(bench, at, port)
    default:
      return '?'
  }
}

function onTheLoop(bench: Bench, at: PortRef, { loopsTo }: Port): 'on the loop' | 'nowhere' | '?' {
  if (isHandedOn(bench, at) || loopsTo === undefined) return '?'
  const ends = [...(bench.hookup.ends ?? []), ...(bench.beside?.ends ?? [])]
  return ends.some((e) => isAt(e, at.unit, loopsTo)) ? 'on the loop' : 'nowhere'
}

/** A passive box hands the line on to the next unit, which ends it. */
function isHandedOn({ hookup, view }: Bench, { unit }: PortRef): boolean {
  const stop = hookup.legs.find((l) => l.purpose === 'picture')?.stops.find((s) => s.unit === unit)
  return stop !== undefined && view.fn(unit, stop.function)?.power === 'none'
}

/** A terminator sits on a free socket that it fits, and is one. */
const misplacedTerminators = ({ hookup, view }: Bench): Finding[] =>
  (hookup.ends ?? []).flatMap((end) => {
    const port = view.port(end.unit, end.port)
    const piece = view.piece(end.model)
    const fits = port && piece?.a.some((plug) => mates(plug.connector, port.connector))
    const free = !hookup.links.some(
      (l) => isAt(l.from, end.unit, end.port) || isAt(l.to, end.unit, end.port),
    )
    return piece?.kind === 'terminator' && fits && free
      ? []
      : [finding('terminator-misplaced', { unit: end.unit, port: end.port })]
  })
