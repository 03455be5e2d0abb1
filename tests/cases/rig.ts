import { isSingle, mates, type Connector } from '@coaxwain/signal'
import type {
  CaseAnswer,
  CaseHop,
  CasePath,
  CasePiece,
  CasePort,
  CaseUnit,
  HookupCase,
  When,
} from './form'

const isPiece = (item: CaseUnit | CasePiece): item is CasePiece => 'ends' in item

const isSound = (s: string): boolean => s.startsWith('audio-')

/** The unit that a setting follows: "as UNIT". */
const followed = (to: string): string | undefined => /^as (.+)$/.exec(to)?.[1]

export const pieceId = (use: CaseHop['by'][number]): string =>
  typeof use === 'string' ? use : use.id

const meets = (a: string, b: string): boolean => mates(a as Connector, b as Connector)

/** Composite is also taken where RGB takes its sync; a mono sound stands for either channel. */
function carriesSignal(port: CasePort, signal: string): boolean {
  if (port.signals.includes(signal)) return true
  return isSound(signal) && port.signals.some(isSound)
}

function carries(piece: CasePiece, signal: string): boolean {
  const limited = piece.wired ?? piece.carries
  return !limited || limited.some((s) => s === signal || (isSound(s) && isSound(signal)))
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

/** An answer laid out on the bench of its case. */
export class Rig {
  private readonly units = new Map<string, CaseUnit>()
  private readonly pieces = new Map<string, CasePiece>()
  private readonly hops: readonly CaseHop[]

  constructor(
    private readonly c: HookupCase,
    private readonly answer: CaseAnswer,
  ) {
    this.units.set('source', c.source).set('display', c.display)
    const bought = (answer.missing ?? []).map((m) => m.item)
    for (const item of [...c.shelf, ...bought]) {
      if (isPiece(item)) this.pieces.set(item.id, item)
      else this.units.set(item.id ?? '', item)
    }
    this.hops = answer.paths.flatMap((p) => p.hops)
  }

  unit(id: string): CaseUnit | undefined {
    return this.units.get(id)
  }

  port(ref: string): CasePort | undefined {
    const [unit = '', port] = ref.split(':')
    return this.units.get(unit)?.ports.find((p) => p.id === port)
  }

  /** Whether the unit that a setting follows is on this bench at all. */
  has(to: string): boolean {
    const as = followed(to)
    return as === undefined || this.units.has(as)
  }

  /** The same position by name, or the same channel where one of them follows another unit. */
  samePosition(wanted: string, given: string): boolean {
    return wanted === given || this.channel(wanted) === this.channel(given)
  }

  private channel(to: string): string {
    const as = followed(to)
    if (as === undefined) return to
    const sent = this.answer.settings.find((s) => s.on === as && s.class === 'channel')?.to
    return sent ?? this.onlyChannel(as) ?? to
  }

  private onlyChannel(unit: string): string | null {
    const channels = this.units.get(unit)?.ports.flatMap((p) => p.rf?.channels ?? []) ?? []
    return channels.length === 1 ? (channels[0] ?? null) : null
  }

  /** The sockets of a unit that an answer uses, off-air paths aside. */
  private sockets(paths: readonly CasePath[], unit: string): string {
    const refs = paths
      .filter((p) => !p.purpose.startsWith('off-air'))
      .flatMap((p) => p.hops.flatMap((h) => [h.from, h.to]))
      .filter((r) => r.startsWith(`${unit}:`))
    return [...new Set(refs)].sort().join()
  }

  sameSockets(unit: string): boolean {
    const mine = this.sockets(this.answer.paths, unit)
    return mine !== '' && mine === this.sockets(this.c.expected.best ?? [], unit)
  }

  wiring(): string[] {
    return [
      ...this.hops.flatMap((h) => this.hop(h)),
      ...this.occupancy(),
      ...this.answer.paths.flatMap((p) => this.path(p)),
      ...this.answer.paths.flatMap((p) => this.open(p)),
    ]
  }

  private hop(h: CaseHop): string[] {
    const from = this.port(h.from)
    const to = this.port(h.to)
    if (!from || !to) return [`no such socket: ${from ? h.to : h.from}`]
    const found: string[] = []
    if (from.works === false || to.works === false)
      found.push(`a socket that does not work: ${h.from} to ${h.to}`)
    if (from.taken || to.taken) found.push(`a socket that is taken: ${h.from} to ${h.to}`)
    if (from.dir === 'in' || to.dir === 'out') found.push(`wrong direction: ${h.from} to ${h.to}`)
    if (!carriesSignal(from, h.signal) || !carriesSignal(to, h.signal)) {
      found.push(`no ${h.signal} on both ${h.from} and ${h.to}`)
    }
    return [...found, ...this.plugs(h, from, to)]
  }

  /** Leads and adapters in order, each one way round that fits. */
  private plugs(h: CaseHop, from: CasePort, to: CasePort): string[] {
    let ends: LooseEnd[] = [{ at: from.connector, lead: from.mount === 'lead' }]
    for (const id of h.by.map(pieceId)) {
      const piece = this.pieces.get(id)
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
    for (const h of this.hops) {
      const chain = h.by.map(pieceId)
      meetings.note(h.from, `${chain[0] ?? h.to}>${h.to.split(':')[0]}`)
      meetings.note(h.to, chain.at(-1) ?? h.from)
      for (const id of chain) cores.note(id, `${h.from} ${h.to}`)
    }
    const crowded = meetings.over((ref) => {
      const port = this.port(ref)
      return port && isSingle(port.connector as Connector) ? 1 : Infinity
    })
    const short = cores.over((id) => coresOf(this.pieces.get(id)))
    return [
      ...crowded.map((ref) => `two plugs in ${ref}`),
      ...short.map((id) => `too few cores in ${id}`),
    ]
  }

  /** From hop to hop the unit does it. */
  private path(p: CasePath): string[] {
    if (p.purpose.startsWith('off-air')) return []
    const found: string[] = []
    const [start] = p.hops
    if (start && !start.from.startsWith('source:'))
      found.push(`${p.purpose} does not begin at the source`)
    p.hops.slice(1).forEach((h, i) => {
      const before = p.hops[i]!
      const [unit = ''] = h.from.split(':')
      if (!before.to.startsWith(`${unit}:`)) found.push(`${p.purpose} jumps to ${h.from}`)
      else if (!this.does(unit, before.to, h.from))
        found.push(`${unit} does not pass ${before.to} to ${h.from}`)
    })
    return found
  }

  private does(unit: string, from: string, to: string): boolean {
    const [, a] = from.split(':')
    const [, b] = to.split(':')
    return (this.units.get(unit)?.does ?? []).some(
      (d) => d.from === a && d.to === b && this.holds(unit, d.when),
    )
  }

  /** A control that the answer does not set may stand anywhere. */
  private holds(unit: string, when: When | undefined): boolean {
    return Object.entries(when ?? {}).every(([name, positions]) => {
      const control = this.units.get(unit)?.settings?.find((s) => s.name === name)
      if (control?.class === 'auto') return true
      const given = this.answer.settings.find(
        (s) => s.on === unit && (s.set === name || s.set === control?.class),
      )
      return given
        ? positions.includes(given.to)
        : (control?.choices ?? []).every((c) => positions.includes(c))
    })
  }

  private open(p: CasePath): string[] {
    if (p.purpose.startsWith('off-air')) return []
    return p.hops.flatMap((h) =>
      [h.from, h.to].flatMap((ref) => {
        const [unit = ''] = ref.split(':')
        return this.holds(unit, this.port(ref)?.when) ? [] : [`${ref} is not open as set`]
      }),
    )
  }
}
