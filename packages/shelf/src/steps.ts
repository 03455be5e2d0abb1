import {
  controlOf,
  POWER_KEY,
  portOf,
  type DeviceModel,
  type PieceModel,
  type PlugColour,
} from '@coaxwain/models'
import { isSoundCircuit, type Circuit } from '@coaxwain/signal'
import { fitted } from './fitted'
import type { Hookup, Link, PieceUse, Setting } from './hookup'
import type { Snapshot, Uid, Unit } from './unit'

/** A code with the details that its sentence needs. */
export interface Say {
  readonly code: string
  readonly details: Readonly<Record<string, string | number>>
}

/** One run of a cable: from a port or piece to the next piece or port. */
export interface Segment {
  readonly link: number
  /** 0 from the first port to the first piece and through it, and so on. */
  readonly index: number
}

/** One act, in the order in which it is done. Joins are drawn round, settings square. */
export interface HookupStep {
  readonly number: number
  readonly kind: 'check' | 'fetch' | 'join' | 'set'
  readonly say: Say
  readonly lines: readonly Say[]
  readonly segments: readonly Segment[]
  /** Indices into the settings of the hookup. */
  readonly settings: readonly number[]
}

type Draft = Omit<HookupStep, 'number'>

/** What a hookup asks a person to do: check, fetch, plug, set. Pure; the same for screen, sheet and phone. */
export function stepsOf(hookup: Hookup, snapshot: Snapshot): HookupStep[] {
  const look = new Lookup(snapshot)
  const drafts = [
    ...checks(hookup),
    fetch(hookup, look),
    ...joins(hookup, look),
    ...lineEnds(hookup, look),
    ...settings(hookup, look),
  ]
  return drafts.map((draft, i) => ({ ...draft, number: i + 1 }))
}

class Lookup {
  constructor(private readonly snapshot: Snapshot) {}

  unit(uid: Uid): Unit {
    const unit = this.snapshot.units.find((u) => u.uid === uid)
    if (!unit) throw new Error(`no unit ${uid}`)
    return unit
  }

  device(uid: Uid): DeviceModel {
    const unit = this.unit(uid)
    const model = this.snapshot.models[unit.model]
    if (model?.type !== 'device') throw new Error(`unit ${uid} is not a device`)
    return fitted(model, unit.modifications)
  }

  piece(model: Uid): PieceModel {
    const piece = this.snapshot.models[model]
    if (piece?.type !== 'piece') throw new Error(`no piece ${model}`)
    return piece
  }

  name(uid: Uid): string {
    return this.device(uid).name
  }

  portLabel(ref: { unit: Uid; port: string }): string {
    return portOf(this.device(ref.unit), ref.port).label
  }
}

const plain = (code: string, details: Say['details'] = {}): Say => ({ code, details })

/** Facts that nobody knows and that must be known before anything is touched. */
function checks(hookup: Hookup): Draft[] {
  return hookup.cautions
    .filter((c) => c.code.startsWith('check-'))
    .map((c) => ({
      kind: 'check',
      say: plain(`step.${c.code}`, c.details),
      lines: [],
      segments: [],
      settings: [],
    }))
}

function fetch(hookup: Hookup, look: Lookup): Draft {
  const uids = [...new Set(hookup.legs.flatMap((l) => l.stops.map((s) => s.unit)))]
  const units = uids.map((uid): Say => {
    const place = look.unit(uid).place
    const name = look.name(uid)
    return place === null
      ? plain('step.fetch.unit', { name })
      : plain('step.fetch.unit-at', { name, place })
  })
  const copies = new Map<Uid, Set<number>>()
  for (const piece of [...hookup.links.flatMap((l) => l.pieces), ...(hookup.ends ?? [])]) {
    copies.set(piece.model, (copies.get(piece.model) ?? new Set()).add(piece.copy))
  }
  const pieces = [...copies].map(([model, set]): Say => {
    const name = look.piece(model).name
    return set.size === 1
      ? plain('step.fetch.piece', { name })
      : plain('step.fetch.pieces', { name, count: set.size })
  })
  return {
    kind: 'fetch',
    say: plain('step.fetch'),
    lines: [...units, ...pieces],
    segments: [],
    settings: [],
  }
}

/** Links that are plugged in one go: the same way between the same two units, all picture or all sound. */
function groupLinks(hookup: Hookup): number[][] {
  const groups = new Map<string, number[]>()
  hookup.links.forEach((link, i) => {
    const sound = link.circuits.every((c) => isSoundCircuit(c.from))
    const way = link.pieces.map((p) => [p.model, p.copy])
    const key = JSON.stringify([link.from.unit, link.to.unit, sound, way, multiway(link)])
    groups.set(key, [...(groups.get(key) ?? []), i])
  })
  return [...groups.values()]
}

/** A link of several circuits is one plug, whatever they are. */
const multiway = (link: Link): boolean => link.circuits.length > 1

function joins(hookup: Hookup, look: Lookup): Draft[] {
  const groups = groupLinks(hookup)
  return groups.flatMap((group, nth) => {
    const first = hookup.links[group[0]!]!
    const segments = Math.max(1, first.pieces.length)
    const earlier = groups.slice(0, nth).flatMap((g) => g.map((i) => hookup.links[i]!))
    return Array.from({ length: segments }, (_, index): Draft => {
      const plugged = pluggedBefore(first, index, earlier)
      const again = plugged && againSentence(first, index, plugged, look)
      const isSame = plugged && !again
      return {
        kind: 'join',
        say: again ?? joinSentence(hookup, group, index, look),
        lines: [
          ...joinLines(first, index, segments, look),
          ...(isSame ? [plain('step.same-lead', { name: pieceName(first, index, look) })] : []),
          ...(isShared(first, index, hookup)
            ? group.flatMap((i) => tails(hookup.links[i]!, index, look))
            : []),
        ],
        segments: group.map((link) => ({ link, index })),
        settings: [],
      }
    })
  })
}

const pieceName = (link: Link, index: number, look: Lookup): string =>
  look.piece(link.pieces[index]!.model).name

const isOnWayOf = (a: Link, b: Link): boolean =>
  a.from.unit === b.from.unit && a.to.unit === b.to.unit

/** Uses of the piece of a segment by links between other units. */
const usedBy = (link: Link, index: number, others: readonly Link[]): PieceUse[] => {
  const own = link.pieces[index]
  return others
    .filter((other) => !isOnWayOf(other, link))
    .flatMap((other) => other.pieces)
    .filter((use) => own && use.model === own.model && use.copy === own.copy)
}

const isShared = (link: Link, index: number, { links }: Hookup): boolean =>
  usedBy(link, index, links).length > 0

/** Which plugs of a piece sit somewhere before a step; null when the piece is not in use before. */
interface Plugged {
  readonly near: boolean
  readonly far: boolean
}

function pluggedBefore(link: Link, index: number, earlier: readonly Link[]): Plugged | null {
  const own = link.pieces[index]
  const uses = usedBy(link, index, earlier)
  if (!own || uses.length === 0) return null
  const isSame = (side: 'inPlug' | 'outPlug'): boolean =>
    uses.some((use) => use.wayRound === own.wayRound && use[side] === own[side])
  return { near: isSame('inPlug'), far: isSame('outPlug') }
}

/** What is still to be plugged of a lead of which one end sits already; null where neither does. */
function againSentence(link: Link, index: number, plugged: Plugged, look: Lookup): Say | null {
  const name = pieceName(link, index, look)
  const next = link.pieces[index + 1]
  const last = link.pieces[index - 1]
  if (plugged.near)
    return next
      ? plain('step.join.same-to-piece', { name, next: look.piece(next.model).name })
      : plain('step.join.same-to', {
          name,
          to: look.name(link.to.unit),
          toPort: look.portLabel(link.to),
        })
  if (!plugged.far) return null
  return last
    ? plain('step.join.same-from-piece', { name, last: look.piece(last.model).name })
    : plain('step.join.same-from', {
        name,
        from: look.name(link.from.unit),
        fromPort: look.portLabel(link.from),
      })
}

/** Which tail of a lead goes where, by its colour. */
function tails(link: Link, index: number, look: Lookup): Say[] {
  const use = link.pieces[index]!
  const piece = look.piece(use.model)
  const [entry, exit] = use.wayRound === 'forward' ? [piece.a, piece.b] : [piece.b, piece.a]
  // With several plugs at both ends the sentence itself goes by their colours.
  if (entry.length > 1 && exit.length > 1) return []
  const ends = [
    ...(entry.length > 1 && index === 0 ? [{ plug: entry[use.inPlug], at: link.from }] : []),
    ...(exit.length > 1 && index === link.pieces.length - 1
      ? [{ plug: exit[use.outPlug], at: link.to }]
      : []),
  ]
  return ends.flatMap(({ plug, at }) =>
    plug?.colour
      ? [
          plain(`step.tail.${plug.colour}`, {
            unit: look.name(at.unit),
            port: look.portLabel(at),
          }),
        ]
      : [],
  )
}

/** Terminators, one by one. */
const lineEnds = (hookup: Hookup, look: Lookup): Draft[] =>
  (hookup.ends ?? []).map((end) => ({
    kind: 'join',
    say: plain('step.end-line', {
      name: look.piece(end.model).name,
      to: look.name(end.unit),
      toPort: look.portLabel(end),
    }),
    lines: [],
    segments: [],
    settings: [],
  }))

/** Colours by which the trade tells the plugs of a lead apart (common practice, no source). */
export const USUAL_COLOUR: Partial<Record<Circuit, PlugColour>> = {
  cvbs: 'yellow',
  'audio-l': 'white',
  'audio-mono': 'white',
  'audio-r': 'red',
  y: 'green',
  pb: 'blue',
  pr: 'red',
  r: 'red',
  g: 'green',
  b: 'blue',
}

/** The colour of the plug that carries a link, where its piece has coloured plugs or its circuit a usual one. */
export function plugColour(link: Link, piece: PieceModel | null): PlugColour | null {
  const [use] = link.pieces
  const own =
    use && piece ? (use.wayRound === 'forward' ? piece.a : piece.b)[use.inPlug]?.colour : undefined
  const [circuit] = link.circuits
  return (
    own ?? (circuit && link.circuits.length === 1 ? (USUAL_COLOUR[circuit.from] ?? null) : null)
  )
}

function joinSentence(hookup: Hookup, group: readonly number[], index: number, look: Lookup): Say {
  const links = group.map((i) => hookup.links[i]!)
  const first = links[0]!
  const ends = {
    from: look.name(first.from.unit),
    to: look.name(first.to.unit),
    fromPort: joined(links.map((l) => look.portLabel(l.from))),
    toPort: joined(links.map((l) => look.portLabel(l.to))),
  }
  if (first.pieces.length === 0) return plain('step.join.captive', ends)
  const piece = look.piece(first.pieces[index]!.model)
  const name = piece.name
  if (first.pieces.length > 1) {
    const next = first.pieces[index + 1]
    if (index === 0) {
      return plain('step.join.to-piece', { ...ends, name, next: look.piece(next!.model).name })
    }
    return next
      ? plain('step.join.between', { name, next: look.piece(next.model).name })
      : plain('step.join.from-piece', { ...ends, name })
  }
  const colours = links.map((l) => plugColour(l, piece))
  const coloured = piece.a.length > 1 && colours.every((c) => c !== null)
  if (!coloured) return plain('step.join.lead', { ...ends, name })
  return links.length === 1
    ? plain(`step.join.${colours[0]}`, ends)
    : plain('step.join.colours', { ...ends, colours: colours.join(' ') })
}

const joined = (labels: readonly string[]): string => [...new Set(labels)].join(', ')

/** What is easily got wrong at this plug. */
function joinLines(link: Link, index: number, segments: number, look: Lookup): Say[] {
  const lines: Say[] = []
  const device = look.device(link.from.unit)
  const [circuit] = link.circuits
  if (index === 0 && circuit?.from === 'cvbs') {
    const green = device.ports.find((p) =>
      p.circuits.some((c) => c.circuit === 'y' && c.dir === 'out'),
    )
    if (green && green.key !== link.from.port)
      lines.push(plain('step.not-the-green', { port: green.label }))
  }
  if (index === 0 && portOf(device, link.from.port).connector === 'f-socket')
    lines.push(plain('step.screw-home'))
  const target = portOf(look.device(link.to.unit), link.to.port)
  if (index === segments - 1 && target.connector === 'screws')
    lines.push(plain('step.aerial-lugs-off'))
  return lines
}

/** One step a unit: the boxes on the way first, then the display, menus last because they need a picture. */
function settings(hookup: Hookup, look: Lookup): Draft[] {
  const order = hookup.legs[0]?.stops.map((s) => s.unit) ?? []
  const inMenu = (s: Setting): boolean => s.access === 'menu' || s.access === 'remote'
  const groups = new Map<string, number[]>()
  hookup.settings.forEach((setting, i) => {
    const key = `${inMenu(setting) ? 1 : 0} ${String(order.indexOf(setting.unit)).padStart(3, '0')} ${setting.unit}`
    groups.set(key, [...(groups.get(key) ?? []), i])
  })
  return [...groups.entries()]
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .map(([, indices]) => {
      const unit = hookup.settings[indices[0]!]!.unit
      return {
        kind: 'set',
        say: plain('step.set', { name: look.name(unit) }),
        lines: indices.map((i) => settingSentence(hookup.settings[i]!, look)),
        segments: [],
        settings: indices,
      }
    })
}

/** A setting in words: control and position as the device itself calls them. */
export function settingSentence(setting: Setting, look: { device(uid: Uid): DeviceModel }): Say {
  if (setting.control === POWER_KEY) return plain(`setting.power.${setting.position}`)
  const control = controlOf(look.device(setting.unit), setting.control)
  const label =
    control.kind === 'positions' || control.kind === 'auto'
      ? (control.positions.find((p) => p.key === setting.position)?.label ?? setting.position)
      : setting.position
  const details = { control: control.label, position: label }
  switch (control.kind) {
    case 'channel':
      return plain('setting.channel', details)
    case 'tuned-to':
      return plain(`setting.tune.${control.way}`, details)
    case 'trim':
      return plain(`setting.trim.${setting.position}`, details)
    case 'auto':
      return plain('setting.auto', details)
    case 'positions':
      return plain('setting.position', details)
  }
}
