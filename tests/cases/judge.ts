import {
  fits,
  familyOf,
  isSingle,
  mates,
  TIER,
  type Connector,
  type Quality,
} from '@coaxwain/signal'
import type {
  CaseAnswer,
  CaseHop,
  CasePath,
  CasePiece,
  CasePort,
  CaseUnit,
  Expected,
  HookupAnswer,
  HookupCase,
  When,
} from './form'

export interface Judgement {
  readonly id: string
  readonly failures: readonly string[]
  /** Warnings that give none of the expected ones. */
  readonly noise: number
}

/** Compares an answer with a case, by the rules of the case form. */
export function judge(c: HookupCase, answer: HookupAnswer): Judgement {
  const failures: string[] = []
  if (answer.possible !== c.expected.possible) {
    failures.push(`verdict: ${answer.possible} instead of ${c.expected.possible}`)
    return { id: c.id, failures, noise: 0 }
  }
  for (const [i, one] of (answer.answers ?? []).entries()) {
    const found = judgeAnswer(c, one, i === 0)
    failures.push(...found.map((f) => (i === 0 ? f : `answer ${i + 1}: ${f}`)))
  }
  const [first] = answer.answers ?? []
  if (c.expected.possible !== 'no' && !first) failures.push('no answer is given')
  const warned = [...(answer.warnings ?? []), ...(first?.warnings ?? [])]
  const codes = new Set(warned.map((w) => w.code))
  const wanted = (c.expected.warnings ?? []).map((w) => w.code)
  for (const code of wanted) if (!codes.has(code)) failures.push(`warning missing: ${code}`)
  if ((first?.warnings ?? []).length > 6) failures.push('more than six warnings')
  failures.push(...forbidden(c, answer))
  return {
    id: c.id,
    failures,
    noise: warned.filter((w) => !w.code || !wanted.includes(w.code)).length,
  }
}

function judgeAnswer(c: HookupCase, answer: CaseAnswer, first: boolean): string[] {
  const rig = new Rig(c, answer)
  return [
    ...rig.wiring(),
    ...(first ? quality(c.expected, answer) : []),
    ...(first ? mustSettings(c, answer, rig) : []),
  ]
}

const rank = (form: string): number => {
  const order = ['none', 'luma-only', 'rf', 'composite', 's-video']
  const at = order.indexOf(form)
  if (at >= 0) return at
  return form === 'digital' ? 6 : 5
}

const SOUND_ORDER = ['none', 'mono-one-channel-lost', 'mono', 'stereo']

function quality(expected: Expected, answer: CaseAnswer): string[] {
  const found: string[] = []
  if (answer.quality.picture !== expected.quality.picture) {
    found.push(`picture: ${answer.quality.picture} instead of ${expected.quality.picture}`)
  }
  if (rank(answer.quality.form) < rank(expected.quality.form)) {
    found.push(`form: ${answer.quality.form} instead of ${expected.quality.form}`)
  }
  if (SOUND_ORDER.indexOf(answer.quality.sound) < SOUND_ORDER.indexOf(expected.quality.sound)) {
    found.push(`sound: ${answer.quality.sound} instead of ${expected.quality.sound}`)
  }
  return found
}

/** Every must setting of a unit in the chain, where the same sockets of that unit are used as in the best answer. */
function mustSettings(c: HookupCase, answer: CaseAnswer, rig: Rig): string[] {
  return (c.expected.settings ?? [])
    .filter((s) => s.need === 'must')
    .flatMap((s): string[] => {
      // A setting that follows another unit's holds only where that unit is in the chain.
      if (!rig.sameSockets(s.on) || !rig.has(s.to)) return []
      const control = rig.unit(s.on)?.settings?.find((k) => k.name === s.set)
      const given = answer.settings.find(
        (a) => a.on === s.on && (a.set === s.set || (control && a.set === control.class)),
      )
      if (!given) return [`setting missing: ${s.on} ${s.set}`]
      const allowed = [s.to, ...(s.oneOf ?? [])]
      const any = allowed.some((a) => /any channel/.test(a))
      const same = any || allowed.some((a) => samePosition(rig, answer, a, given.to, s.on))
      return same ? [] : [`setting: ${s.on} ${s.set} to ${given.to} instead of ${s.to}`]
    })
}

function samePosition(
  rig: Rig,
  answer: CaseAnswer,
  wanted: string,
  given: string,
  on: string,
): boolean {
  if (wanted === given) return true
  const channel = (to: string): string => {
    const as = /^as (.+)$/.exec(to)?.[1]
    if (as === undefined) return to
    const sent = answer.settings.find((s) => s.on === as && s.class === 'channel')?.to
    return sent ?? rig.onlyChannel(as) ?? to
  }
  if (channel(wanted) === channel(given)) return true
  return rig.unit(on)?.ports.find((p) => p.id === given)?.when !== undefined && given === wanted
}

const isPiece = (item: CaseUnit | CasePiece): item is CasePiece => 'ends' in item

/** An answer laid out on the bench of its case. */
class Rig {
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
    const as = /^as (.+)$/.exec(to)?.[1]
    return as === undefined || this.units.has(as)
  }

  onlyChannel(unit: string): string | null {
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
    let ends: { at: string; lead: boolean }[] = [
      { at: from.connector, lead: from.mount === 'lead' },
    ]
    for (const use of h.by) {
      const id = typeof use === 'string' ? use : use.id
      const piece = this.pieces.get(id)
      if (!piece) return [`no such lead: ${id}`]
      const limited = piece.wired ?? piece.carries
      if (limited && !limited.some((s) => s === h.signal || (isSound(s) && isSound(h.signal)))) {
        return [`${id} does not carry ${h.signal}`]
      }
      const next: typeof ends = []
      for (const end of ends) {
        const [a, b] = piece.ends
        const ways: [string, string][] = piece.joins
          ? [[a, b]]
          : [
              [a, b],
              [b, a],
            ]
        for (const [near, far] of ways) {
          if (mates(end.at as Connector, near as Connector))
            next.push({ at: far, lead: end.lead || piece.kind === 'lead' })
        }
      }
      ends = next
    }
    const arrives = ends.some(
      (e) => mates(e.at as Connector, to.connector as Connector) && (e.lead || to.mount === 'lead'),
    )
    return arrives ? [] : [`plugs do not fit: ${h.from} to ${h.to}`]
  }

  /** A connector meets one thing; each core of a lead is one connection. */
  private occupancy(): string[] {
    const meets = new Map<string, Set<string>>()
    const cores = new Map<string, Set<string>>()
    for (const h of this.hops) {
      const chain = h.by.map((u) => (typeof u === 'string' ? u : u.id))
      const first = chain[0] ?? h.to
      const last = chain.at(-1) ?? h.from
      meets.set(h.from, (meets.get(h.from) ?? new Set()).add(`${first}>${h.to.split(':')[0]}`))
      meets.set(h.to, (meets.get(h.to) ?? new Set()).add(last))
      for (const id of chain) cores.set(id, (cores.get(id) ?? new Set()).add(`${h.from} ${h.to}`))
    }
    const found: string[] = []
    for (const [ref, set] of meets) {
      const port = this.port(ref)
      if (port && isSingle(port.connector as Connector) && set.size > 1)
        found.push(`two plugs in ${ref}`)
    }
    for (const [id, set] of cores) {
      const piece = this.pieces.get(id)
      const multi = piece?.ends.some((e) => !isSingle(e as Connector))
      if (piece && !multi && !piece.joins && set.size > (piece.cores ?? 1))
        found.push(`too few cores in ${id}`)
    }
    return found
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

const isSound = (s: string): boolean => s.startsWith('audio-')

/** Composite is also taken where RGB takes its sync; a mono sound stands for either channel. */
function carriesSignal(port: CasePort, signal: string): boolean {
  if (port.signals.includes(signal)) return true
  return isSound(signal) && port.signals.some(isSound)
}

function forbidden(c: HookupCase, answer: HookupAnswer): string[] {
  const [first, ...rest] = answer.answers ?? []
  return (c.expected.mustNot ?? []).flatMap((n): string[] => {
    const uses = (one: CaseAnswer | undefined, what: string): boolean =>
      (one?.paths ?? []).some((p) =>
        p.hops.some(
          (h) =>
            h.from === what ||
            h.to === what ||
            h.from.startsWith(`${what}:`) ||
            h.to.startsWith(`${what}:`) ||
            h.by.some((u) => (typeof u === 'string' ? u : u.id) === what),
        ),
      )
    switch (n.code) {
      case 'N-USE-ITEM':
      case 'N-REVERSE-ADAPTER':
        return uses(first, n.item ?? '') || rest.some((r) => !r.below && uses(r, n.item ?? ''))
          ? [`uses ${n.item}`]
          : []
      case 'N-USE-PORT':
        return uses(first, n.port ?? '') ? [`uses ${n.port}`] : []
      case 'N-OMIT-ITEM':
        return first && !uses(first, n.item ?? '') ? [`leaves out ${n.item}`] : []
      case 'N-BUY-NEEDLESS':
        return (first?.missing ?? []).length > 0 ? ['buys what is not needed'] : []
      case 'N-CLAIM-COLOUR':
        return answer.possible === 'yes' && first?.quality.picture === 'colour'
          ? ['promises colour']
          : []
      case 'N-CLAIM-STEREO':
        return first?.quality.sound === 'stereo' ? ['promises stereo'] : []
      case 'N-CHANNEL':
        return first?.settings.some((s) => s.on === n.on && s.class === 'channel' && s.to === n.to)
          ? [`sets ${n.on} to ${n.to}`]
          : []
      case 'N-SETTING':
        return first?.settings.some((s) => s.on === n.on && s.set === n.setting && s.to === n.to)
          ? [`sets ${n.setting} to ${n.to}`]
          : []
      case 'N-OMIT-SETTING':
        return first && !first.settings.some((s) => s.set === n.setting)
          ? [`leaves out ${n.setting}`]
          : []
      case 'N-OMIT-WARNING': {
        const all = [...(answer.warnings ?? []), ...(first?.warnings ?? [])]
        return all.some((w) => w.code === n.warning) ? [] : [`leaves out ${n.warning}`]
      }
      case 'N-SAY-POSSIBLE':
        return answer.possible === 'no' ? [] : ['says that it can be done']
      case 'N-SAY-IMPOSSIBLE':
        return answer.possible === 'no' ? ['says that it cannot be done'] : []
      default:
        return []
    }
  })
}

export { familyOf, fits, TIER, type Quality }
