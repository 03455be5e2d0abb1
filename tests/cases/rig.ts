import { isSingle, mates, type Connector } from '@coaxwain/signal'
import type { CaseHop, CasePath, CasePiece, CasePort, HookupCase, When } from './form'
import {
  isOffAir,
  pieceId,
  portName,
  standsOf,
  unitOf,
  type Bench,
  type Stand,
} from './judging/bench'
import { isAerial } from './judging/carriers'
import { speaks } from './judging/ears'
import { isMultiway, isSound } from './judging/facts'

const meets = (a: string, b: string): boolean => mates(a as Connector, b as Connector)

/** A mono sound stands for either channel. */
function carriesSignal(port: CasePort, signal: string): boolean {
  if (port.signals.includes(signal)) return true
  return isSound(signal) && port.signals.some(isSound)
}

function carries(piece: CasePiece, signal: string): boolean {
  const limited = piece.wired ?? piece.carries
  return !limited || limited.some((s) => s === signal || (isSound(s) && isSound(signal)))
}

/** What is wrong with the two sockets of a connection by themselves. */
function socketFaults({ from: giving, to: taking, signal }: CaseHop, a: CasePort, b: CasePort) {
  const where = `${giving} to ${taking}`
  const faults: readonly (readonly [is: boolean, words: string])[] = [
    [a.works === false || b.works === false, `a socket that does not work: ${where}`],
    [Boolean(a.taken) || Boolean(b.taken), `a socket that is taken: ${where}`],
    [a.dir === 'in' || b.dir === 'out', `wrong direction: ${where}`],
    [!carriesSignal(a, signal) || !carriesSignal(b, signal), `no ${signal} on both of ${where}`],
  ]
  return faults.flatMap(([is, words]) => (is ? [words] : []))
}

/** An end at which a link goes on, and whether there is a lead in it yet. */
interface LooseEnd {
  readonly at: string
  readonly lead: boolean
}

/** Where a link goes on after a piece; one that joins wires goes one way round only. */
function farEnds(piece: CasePiece, end: LooseEnd): LooseEnd[] {
  const [a, b] = piece.ends
  const ways = piece.joins ? [[a, b] as const] : [[a, b] as const, [b, a] as const]
  return ways
    .filter(([near]) => meets(end.at, near))
    .map(([, far]) => ({ at: far, lead: end.lead || piece.kind === 'lead' }))
}

/** How many connections a piece takes; a multi-way plug is not counted by cores. */
function coresOf(piece: CasePiece | undefined): number {
  const multi = piece?.ends.some((e) => !isSingle(e as Connector))
  return !piece || multi || piece.joins ? Infinity : (piece.cores ?? 1)
}

/** Counts the different things that are noted under a name. */
class Tally {
  private readonly noted = new Map<string, Set<string>>()

  note(name: string, thing: string): void {
    this.noted.set(name, (this.noted.get(name) ?? new Set()).add(thing))
  }

  /** The names under which more is noted than they bear. */
  over(most: (name: string) => number): string[] {
    return [...this.noted]
      .filter(([name, things]) => things.size > most(name))
      .map(([name]) => name)
  }
}

/** The wiring of an answer on the bench of its case: plugs, cores, directions, and what is open. */
export class Rig {
  private readonly stands: readonly Stand[]

  constructor(
    private readonly c: HookupCase,
    private readonly bench: Bench,
  ) {
    this.stands = standsOf(bench)
  }

  /** Whether the unit that a setting follows is on this bench at all. */
  has(to: string): boolean {
    const as = /^as (.+)$/.exec(to)?.[1]
    return as === undefined || this.bench.unit(as) !== undefined
  }

  /** The same position by name, or the same channel where one of them follows another unit. */
  samePosition(wanted: string, given: string): boolean {
    return wanted === given || this.channel(wanted) === this.channel(given)
  }

  private channel(to: string): string {
    const as = /^as (.+)$/.exec(to)?.[1]
    if (as === undefined) return to
    const sent = this.bench.answer.settings.find(
      (s) => s.on === as && this.bench.meant(s)?.class === 'channel',
    )?.to
    return sent ?? this.onlyChannel(as) ?? to
  }

  private onlyChannel(unit: string): string | null {
    const channels = this.bench.unit(unit)?.ports.flatMap((p) => p.rf?.channels ?? []) ?? []
    return channels.length === 1 ? (channels[0] ?? null) : null
  }

  /** The sockets of a unit that an answer uses, off-air paths aside. */
  private sockets(paths: readonly CasePath[], unit: string): string {
    const refs = paths
      .filter((p) => !isOffAir(p))
      .flatMap((p) => p.hops.flatMap((h) => [h.from, h.to]))
      .filter((r) => r.startsWith(`${unit}:`))
    return [...new Set(refs)].sort().join()
  }

  sameSockets(unit: string): boolean {
    const mine = this.sockets(this.bench.answer.paths, unit)
    return mine !== '' && mine === this.sockets(this.c.expected.best ?? [], unit)
  }

  wiring(): string[] {
    return [
      ...this.bench.hops.flatMap((h) => this.hop(h)),
      ...this.occupancy(),
      ...this.bench.answer.paths.flatMap((p) => this.begins(p)),
      ...this.passages(),
    ]
  }

  /** Every path must be open; of several programmes of the source one. */
  private passages(): string[] {
    const { paths } = this.bench.answer
    const programmes = paths.filter((p) => this.isProgramme(p))
    const several = new Set(programmes.map((p) => p.hops[0]?.from)).size > 1
    const shut = (p: CasePath): string[] => [...this.path(p), ...this.open(p)]
    if (!several) return paths.flatMap(shut)
    const others = paths.filter((p) => !programmes.includes(p)).flatMap(shut)
    const tried = programmes.map(shut)
    return tried.some((t) => t.length === 0) ? others : [...others, ...tried.flat()]
  }

  private isProgramme({ purpose, hops }: CasePath): boolean {
    const from = hops[0] && this.bench.port(hops[0].from)
    return purpose.startsWith('picture') && from?.rf !== undefined
  }

  private hop(h: CaseHop): string[] {
    const from = this.bench.port(h.from)
    const to = this.bench.port(h.to)
    if (!from || !to) return [`no such socket: ${from ? h.to : h.from}`]
    const toDisplay = unitOf(h.to) === 'display'
    const live = this.bench.question.display.liveChassis === true && toDisplay && h.signal !== 'rf'
    return [
      ...socketFaults(h, from, to),
      ...(live ? [`${h.to} is joined to the mains`] : []),
      ...this.plugs(h, from, to),
    ]
  }

  /** Leads and adapters in order, each one way round that fits. */
  private plugs(h: CaseHop, from: CasePort, to: CasePort): string[] {
    let ends: LooseEnd[] = [{ at: from.connector, lead: from.mount === 'lead' }]
    for (const id of h.by.map(pieceId)) {
      const piece = this.bench.pieces.get(id)
      if (!piece) return [`no such lead: ${id}`]
      if (!carries(piece, h.signal)) return [`${id} does not carry ${h.signal}`]
      ends = ends.flatMap((end) => farEnds(piece, end))
    }
    const arrives = ends.some((e) => meets(e.at, to.connector) && (e.lead || to.mount === 'lead'))
    return arrives ? [] : [`plugs do not fit: ${h.from} to ${h.to}`]
  }

  /** A connector meets one thing; each core of a lead is one connection. */
  private occupancy(): string[] {
    const meetings = new Tally()
    const cores = new Tally()
    for (const h of this.bench.hops) {
      const chain = h.by.map(pieceId)
      meetings.note(h.from, this.meeting(h.from, chain[0], h.to))
      meetings.note(h.to, this.meeting(h.to, chain.at(-1), h.from))
      for (const id of chain) cores.note(id, `${h.from} ${h.to}`)
    }
    return [
      ...meetings.over(() => 1).map((ref) => `two plugs in ${ref}`),
      ...cores
        .over((id) => coresOf(this.bench.pieces.get(id)))
        .map((id) => `too few cores in ${id}`),
    ]
  }

  /** What a connector meets: a piece, and which of its single plugs, or the port of a captive lead. */
  private meeting(ref: string, piece: string | undefined, far: string): string {
    if (piece === undefined) return far
    const port = this.bench.port(ref)
    const one = (port && isMultiway(port)) || this.bench.pieces.get(piece)?.joins !== undefined
    return one ? piece : `${piece}>${far}`
  }

  /** Where paths begin and end: at the source or an aerial; at the display, at what speaks, or where they join. */
  private begins(p: CasePath): string[] {
    const [start] = p.hops
    const end = p.hops.at(-1)
    if (!start || !end) return [`${p.purpose} has no connections`]
    const starts = isOffAir(p)
      ? isAerial(this.bench.unit(unitOf(start.from)))
      : unitOf(start.from) === 'source'
    const last = unitOf(end.to)
    const ends = isOffAir(p) || p.joins !== undefined || last === 'display'
    return [
      ...(starts ? [] : [`${p.purpose} begins at ${start.from}`]),
      ...(ends || speaks(this.bench.unit(last)) ? [] : [`${p.purpose} ends at ${end.to}`]),
    ]
  }

  /** From hop to hop the unit does it. */
  private path(p: CasePath): string[] {
    if (isOffAir(p)) return []
    const found: string[] = []
    p.hops.slice(1).forEach((h, i) => {
      const before = p.hops[i]!
      if (!before.to.startsWith(`${unitOf(h.from)}:`)) found.push(`${p.purpose} jumps to ${h.from}`)
      else if (!this.does(before.to, h.from))
        found.push(`${unitOf(h.from)} does not pass ${before.to} to ${h.from}`)
    })
    return found
  }

  private does(from: string, to: string): boolean {
    const unit = unitOf(from)
    const edges = (this.bench.unit(unit)?.does ?? []).filter(
      (d) => d.from === portName(from) && d.to === portName(to),
    )
    return this.stands.every((stand) => edges.some((d) => stand.holds(unit, d.when)))
  }

  /** A control that the answer does not set may stand anywhere. */
  private holds(unit: string, when: When | undefined): boolean {
    return this.stands.every((stand) => stand.holds(unit, when))
  }

  private open(p: CasePath): string[] {
    if (isOffAir(p)) return []
    return p.hops.flatMap((h) =>
      [h.from, h.to].flatMap((ref) =>
        this.holds(unitOf(ref), this.bench.port(ref)?.when) ? [] : [`${ref} is not open as set`],
      ),
    )
  }
}
