import type { DeviceModel, Port } from '@coaxwain/models'
import { doubtOf, formState, type CarriedCircuit, type Link, type PortRef } from '@coaxwain/shelf'
import { isSoundCircuit } from '@coaxwain/signal'
import { said, type Said } from './codes'
import { FITNESS } from './ways'
import type { Wired } from './wire'

/** What a link is found to be by itself, beyond plugs and wires: what it carries where, and what is known of its sockets. */
export function linkFindings(index: number, wired: Wired): Said[] {
  const link = wired.hookup.links[index]
  const laid = wired.laid[index]
  if (!link || !laid) return []
  const { way } = laid
  const carries = (way?.pairs.length ?? 0) > 0
  return [
    ...(way && !carries && way.misfits === 0 && !way.meant ? [said('nothing-across')] : []),
    ...(carries ? link.circuits.flatMap((c) => lookalike(c, wired, index)) : []),
    ...(laid.rivals.length > 0 ? [said('plug-unsaid', rivalsOf(wired, index))] : []),
    ...ontoTheAir(link, wired),
    ...[...socketDoubts(link, 'from', wired), ...socketDoubts(link, 'to', wired)],
  ]
}

function lookalike({ from, to }: CarriedCircuit, wired: Wired, index: number): Said[] {
  const pair = wired.laid[index]?.way?.pairs.find((p) => p.from === from && p.to === to)
  const details = { circuit: from, wanted: to }
  if (!pair || pair.fitness >= FITNESS.usual) return []
  if (from.startsWith('ttl-') !== to.startsWith('ttl-') && from.startsWith('ttl-'))
    return [said('logic-level', details)]
  if (pair.fitness === FITNESS.foreign) return [said('other-circuit', details)]
  return [said(isSoundCircuit(from) ? 'sound-crossed' : 'grey-only', details)]
}

function rivalsOf(wired: Wired, index: number): Said['details'] {
  const laid = wired.laid[index]
  const names = [laid?.way, ...(laid?.rivals ?? [])].flatMap((way) =>
    way ? [way.pairs.map((p) => p.from).join(' + ')] : [],
  )
  return { choices: [...new Set(names)].join(', ') }
}

/** A modulated output must never be joined to an aerial. */
function ontoTheAir({ from, to }: Link, { view }: Wired): Said[] {
  const sends = view
    .device(from.unit)
    ?.functions.some((f) =>
      f.gives.some(
        (g) => g.rf && view.jack(from.unit, g.jack)?.contacts.some((c) => c.port === from.port),
      ),
    )
  const isAerial = view.device(to.unit)?.functions.some((f) => f.kind === 'receives')
  return sends && isAerial
    ? [{ code: 'onto-the-aerial', details: { unit: from.unit, port: from.port } }]
    : []
}

const takes = (device: DeviceModel, { port }: PortRef, link: Link, side: 'from' | 'to') =>
  device.jacks.filter(
    (j) =>
      j.dir === (side === 'from' ? 'out' : 'in') &&
      j.contacts.some((c) => c.port === port && link.circuits.some((k) => k[side] === c.circuit)),
  )

/** What nobody has tried at a socket, or knows to come and go, and what must be known before it is touched. */
function socketDoubts(link: Link, side: 'from' | 'to', { view }: Wired): Said[] {
  const end = link[side]
  const unit = view.unit(end.unit)
  const device = view.device(end.unit)
  const port = view.port(end.unit, end.port)
  if (!unit || !device || !port) return []
  const details = { unit: end.unit, port: end.port }
  const jacks = takes(device, end, link, side)
  const doubts = jacks.map((j) => doubtOf(unit, formState(unit, j.key, end.port)))
  const worst = doubts.some((d) => d === null) ? null : Math.max(0, ...(doubts as number[]))
  const state =
    worst === null
      ? 'socket-dead'
      : worst === 0
        ? null
        : worst > 1
          ? 'socket-intermittent'
          : 'socket-untested'
  return [
    ...(state === null ? [] : [said(state, details)]),
    ...(isUnknownChassis(device, port) ? [said('chassis-unknown', details)] : []),
    ...(side === 'to' && isUnknownDc(link, port, view) ? [said('dc-unknown', details)] : []),
  ]
}

const isUnknownChassis = (device: DeviceModel, port: Port): boolean =>
  device.chassis !== 'isolated' && port.isolated === 'unknown'

function isUnknownDc(link: Link, to: Port, view: Wired['view']): boolean {
  const from = view.port(link.from.unit, link.from.port)
  const blocked = link.pieces.some((p) => view.piece(p.model)?.blocksDc)
  const arrives = (from?.suppliesDcVolts ?? 0) !== 0 && !blocked
  return arrives && (to.standsDc ?? 'unknown') === 'unknown' && to.needsDcVolts === undefined
}
