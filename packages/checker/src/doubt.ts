import type { Key, Port } from '@coaxwain/models'
import type { Leg, Stop, Uid } from '@coaxwain/shelf'
import { doubtOf, formState, functionState } from '@coaxwain/shelf'
import { isSoundCircuit } from '@coaxwain/signal'
import { isolationUnknown } from './aerial'
import type { Bench } from './bench'
import { finding, type Finding } from './finding'

/** What nobody has tried, or knows to come and go, on every socket and function that is used; nothing dead. */
export function checkDoubt(bench: Bench): Finding[] {
  const leant = [...socketsLeantOn(bench), ...functionsLeantOn(bench)]
  const dead = leant.filter((l) => l.doubt === null)
  if (dead.length > 0) return dead.map((l) => l.ifDead)
  const doubt =
    leant.reduce((sum, l) => sum + (l.doubt ?? 0), 0) +
    chassisUnknown(bench) +
    handshakesUnknown(bench) +
    dcUnknown(bench) +
    (isolationUnknown(bench) ? 1 : 0)
  return doubt === bench.hookup.axes.doubt ? [] : [finding('claims-doubt', { doubt })]
}

/** Something that a hookup leans on: how doubtful it is, null when it must not be used. */
interface Leant {
  readonly doubt: number | null
  readonly ifDead: Finding
}

/** One form on one port that a hookup leans on. */
interface Socket {
  readonly unit: Uid
  readonly jack: Key
  readonly port: Key
}

/** Each thing once, told apart by what it is made of. */
const distinct = <T extends object>(things: readonly T[]): T[] => [
  ...new Map(things.map((t) => [Object.values(t).join(' '), t])).values(),
]

const stopsOf = ({ hookup }: Bench): { leg: Leg; stop: Stop }[] =>
  hookup.legs.flatMap((leg) => leg.stops.map((stop) => ({ leg, stop })))

/** Every form on a port that a hookup leans on, once. */
export const socketsIn = (bench: Bench): Socket[] =>
  distinct(
    stopsOf(bench).flatMap(({ leg, stop }) => [
      ...socketsAt(bench, leg, stop, 'to'),
      ...socketsAt(bench, leg, stop, 'from'),
    ]),
  )

/** Of a sound jack only the sockets that a sound wire reaches, of other jacks all. */
function socketsAt(bench: Bench, leg: Leg, stop: Stop, side: 'from' | 'to'): Socket[] {
  const { unit } = stop
  const jack = bench.view.jack(unit, (side === 'to' ? stop.in : stop.out) ?? '')
  const wired = (port: Key): boolean =>
    bench.hookup.links.some(
      (l) =>
        l[side].unit === unit &&
        l[side].port === port &&
        l.circuits.some((c) => isSoundCircuit(c.from)),
    )
  return (jack?.contacts ?? [])
    .filter(({ port }) => leg.purpose !== 'sound' || wired(port))
    .map(({ port }) => ({ unit, jack: jack!.key, port }))
}

const socketsLeantOn = (bench: Bench): Leant[] =>
  socketsIn(bench).flatMap(({ unit: uid, jack, port }) => {
    const unit = bench.view.unit(uid)
    if (!unit) return []
    const doubt = doubtOf(unit, formState(unit, jack, port))
    return [{ doubt, ifDead: finding('socket-dead', { unit: uid, jack, port }) }]
  })

/** Every function that a hookup leans on, once. */
export const functionsIn = (bench: Bench): { readonly unit: Uid; readonly fn: Key }[] =>
  distinct(stopsOf(bench).map(({ stop }) => ({ unit: stop.unit, fn: stop.function })))

const functionsLeantOn = (bench: Bench): Leant[] =>
  functionsIn(bench).flatMap(({ unit: uid, fn }) => {
    const unit = bench.view.unit(uid)
    if (!unit) return []
    const doubt = doubtOf(unit, functionState(unit, fn))
    return [{ doubt, ifDead: finding('function-dead', { unit: uid, function: fn }) }]
  })

/** Units with a socket in use of which nobody knows whether it is joined to the chassis. */
const chassisUnknown = (bench: Bench): number =>
  new Set(
    socketsIn(bench)
      .filter(({ unit }) => bench.view.device(unit)?.chassis !== 'isolated')
      .filter(({ unit, port }) => bench.view.port(unit, port)?.isolated === 'unknown')
      .map(({ unit }) => unit),
  ).size

/** Units on the way of protected pictures of which nobody knows whether they complete the handshake. */
function handshakesUnknown(bench: Bench): number {
  const { question, view } = bench
  if (question.material.protection !== 'hdcp') return 0
  const unknown = stopsOf(bench).filter(({ leg, stop }) => {
    const form = view.jack(stop.unit, stop.in ?? '')?.form
    const digital = form === 'hdmi' || form === 'dvi'
    return (
      leg.purpose === 'picture' && digital && view.fn(stop.unit, stop.function)?.hdcp === undefined
    )
  })
  return new Set(unknown.map(({ stop }) => stop.unit)).size
}

/** Nobody knows whether one end stands what the other supplies. */
const mayHarm = (supply: Port | null, load: Port | null): boolean =>
  (supply?.suppliesDcVolts ?? 0) !== 0 &&
  (load?.standsDc ?? 'unknown') === 'unknown' &&
  load?.needsDcVolts === undefined

/** Joins by which a voltage comes up a cable to a socket of which nobody knows whether it stands it. */
function dcUnknown({ hookup, view }: Bench): number {
  const doubtful = hookup.links.filter((l) => {
    const from = view.port(l.from.unit, l.from.port)
    const to = view.port(l.to.unit, l.to.port)
    const blocked = l.pieces.some((p) => view.piece(p.model)?.blocksDc)
    return !blocked && (mayHarm(from, to) || mayHarm(to, from))
  })
  return new Set(doubtful.map((l) => `${l.from.unit} ${l.to.unit}`)).size
}
