import { stated, type CaseHop, type CasePort, type CaseRf, type CaseUnit } from '../form'
import { pieceId, portName, unitOf, type Bench, type Stand } from './bench'
import { isMultiway, isSound } from './facts'
import type { Waves } from './waves'

export type Heard = 'none' | 'mono-one-channel-lost' | 'mono' | 'stereo'

export const HEARD: readonly Heard[] = ['none', 'mono-one-channel-lost', 'mono', 'stereo']

/** What is on the two sides of a sound: channels of the source by name, or its tracks. */
interface Sides {
  readonly left: ReadonlySet<string>
  readonly right: ReadonlySet<string>
}

const NOTHING: Sides = { left: new Set(), right: new Set() }
const both = (...names: string[]): Sides => ({ left: new Set(names), right: new Set(names) })

const join = (all: readonly Sides[]): Sides => ({
  left: new Set(all.flatMap((s) => [...s.left])),
  right: new Set(all.flatMap((s) => [...s.right])),
})

const folded = ({ left, right }: Sides): Sides => both(...left, ...right)

const isOnly = (set: ReadonlySet<string>, name: string): boolean => set.size === 1 && set.has(name)

/** Signals inside which sound travels. */
const EMBEDS: readonly string[] = ['hdmi', 'rf', 'digital-audio']

const onSide = (signal: string, names: ReadonlySet<string>): Sides => {
  if (signal === 'audio-l') return { left: names, right: new Set() }
  return signal === 'audio-r' ? { left: new Set(), right: names } : both(...names)
}

const has = (port: CasePort, signal: string): boolean => port.signals.includes(signal)

/** The one side that a port serves; null where it serves both or none. */
function sideOf(port: CasePort): 'audio-l' | 'audio-r' | null {
  if (has(port, 'audio-l') === has(port, 'audio-r')) return null
  return has(port, 'audio-l') ? 'audio-l' : 'audio-r'
}

/** A port whose sides travel apart inside one plug. */
const isWide = (port: CasePort): boolean => isMultiway(port) || has(port, 'rf') || has(port, 'hdmi')

/** Follows sound from where it begins to where it is heard, for one way of standing. */
export class Ears {
  constructor(
    private readonly bench: Bench,
    private readonly stand: Stand,
    private readonly waves: Waves,
  ) {}

  /** The best that is heard anywhere, and everything that is heard there. */
  best(): { heard: Heard; names: ReadonlySet<string> } {
    const all = [this.display(), ...this.boxes()].map((s) => ({
      heard: this.judge(s.sides, s.speakers),
      names: new Set([...s.sides.left, ...s.sides.right]),
    }))
    return all.sort((a, b) => HEARD.indexOf(b.heard) - HEARD.indexOf(a.heard))[0] as {
      heard: Heard
      names: ReadonlySet<string>
    }
  }

  private judge({ left, right }: Sides, speakers: string): Heard {
    const names = new Set([...left, ...right])
    if (names.size === 0 || speakers === 'none') return 'none'
    if (speakers === 'stereo' && isOnly(left, 'L') && isOnly(right, 'R')) return 'stereo'
    if (names.has('L') !== names.has('R')) return 'mono-one-channel-lost'
    return 'mono'
  }

  private display(): { sides: Sides; speakers: string } {
    const into = this.bench.watched.filter((h) => unitOf(h.to) === 'display')
    const open = into.filter((h) => this.stand.holds('display', this.bench.port(h.to)?.when))
    return {
      sides: join(open.map((h) => this.arriving(h))),
      speakers: this.bench.question.display.sound ?? 'none',
    }
  }

  /** Boxes that take sound and pass nothing on, such as amplifiers with their loudspeakers. */
  private boxes(): { sides: Sides; speakers: string }[] {
    const others = this.bench.chain.filter((id) => id !== 'display' && id !== 'source')
    return others
      .filter((id) => speaks(this.bench.unit(id)))
      .map((id) => {
        const into = this.bench.watched.filter(
          (h) => unitOf(h.to) === id && this.stand.holds(id, this.bench.port(h.to)?.when),
        )
        return { sides: join(into.map((h) => this.arriving(h))), speakers: 'stereo' }
      })
  }

  /** What a connection brings, sorted by the sides of the port that it reaches. */
  private arriving(hop: CaseHop): Sides {
    const to = this.bench.port(hop.to)
    if (!to) return NOTHING
    const given = this.given(hop)
    const from = this.bench.port(hop.from)
    if (!isSound(hop.signal) || (isMultiway(to) && from && isMultiway(from))) return given
    const all = new Set([...given.left, ...given.right])
    if (isMultiway(to)) return onSide(hop.signal, all)
    const side = sideOf(to)
    const servesBoth = side === 'audio-l' && has(to, 'audio-mono') && !this.rightIsFed(hop)
    return side === null || servesBoth ? both(...all) : onSide(side, all)
  }

  /** A left socket that is also for mono serves both sides while nothing is in the right one. */
  private rightIsFed({ to }: CaseHop): boolean {
    return this.bench.watched.some(
      (h) =>
        unitOf(h.to) === unitOf(to) &&
        h.to !== to &&
        isSound(h.signal) &&
        this.bench.port(h.to)?.signals.includes('audio-r'),
    )
  }

  /** What a connection carries as it leaves its giving port. */
  private given(hop: CaseHop): Sides {
    const from = this.bench.port(hop.from)
    if (!from || !this.stand.holds(unitOf(hop.from), from.when)) return NOTHING
    const sides = this.leaving(hop.from)
    if (isSound(hop.signal)) {
      if (isMultiway(from) && isMultiway(this.bench.port(hop.to) as CasePort)) return sides
      const { left, right } = sides
      if (hop.signal === 'audio-l' && isMultiway(from)) return both(...left)
      if (hop.signal === 'audio-r' && isMultiway(from)) return both(...right)
      return folded(sides)
    }
    if (EMBEDS.includes(hop.signal)) return sides
    return this.goesAlong(hop) ? sides : NOTHING
  }

  /** A multi-way plug brings the sound along with the picture, where the lead has the wires. */
  private goesAlong(hop: CaseHop): boolean {
    const ports = [this.bench.port(hop.from), this.bench.port(hop.to)]
    const leads = hop.by.map((b) => this.bench.pieces.get(pieceId(b)))
    return (
      ports.every((p) => p !== undefined && isMultiway(p) && p.signals.some(isSound)) &&
      leads.every((l) => (l?.wired ?? l?.carries ?? ['audio-']).some(isSound))
    )
  }

  /** What a port gives: the source's own sound, or what reaches the unit by its other ports. */
  private leaving(ref: string): Sides {
    const id = unitOf(ref)
    const port = this.bench.port(ref) as CasePort
    const unit = this.bench.unit(id) as CaseUnit
    const edges = (unit.does ?? []).filter(
      (d) => d.to === portName(ref) && this.stand.holds(id, d.when),
    )
    const fed = edges.flatMap((d) =>
      this.bench.watched
        .filter((h) => h.to === `${id}:${d.from}`)
        .filter((h) => this.stand.holds(id, this.bench.port(h.to)?.when))
        .map((h) => this.passed(h, port, d.how === 'loop')),
    )
    if (id === 'source' && fed.length === 0) return this.played(unit, port)
    const sides = join(fed)
    return port.rf && !edges.some((e) => e.how === 'loop' && fed.length > 0)
      ? this.onCarrier(sides, this.waves.rfNow(id, port.rf).sound)
      : sides
  }

  private onCarrier(sides: Sides, sound: string | undefined): Sides {
    if (sound === 'none') return NOTHING
    return sound === 'stereo' ? sides : folded(sides)
  }

  /** What one input passes to one output. */
  private passed(hop: CaseHop, out: CasePort, loops: boolean): Sides {
    const into = this.bench.port(hop.to) as CasePort
    if (EMBEDS.includes(hop.signal)) {
      if (hop.signal === 'rf' && into.tuner && !loops && !this.isHeard(hop)) return NOTHING
      return this.side(this.given(hop), out)
    }
    const sides = this.given(hop)
    if (isMultiway(into)) return this.side(sides, out)
    if (!isSound(hop.signal)) return NOTHING
    const all = [...sides.left, ...sides.right]
    const side = sideOf(into)
    return side === null || has(out, 'audio-mono') || !isWide(out)
      ? both(...all)
      : onSide(side, new Set(all))
  }

  /** Of sound with two sides what goes to an output: one side, or both. */
  private side(sides: Sides, out: CasePort): Sides {
    if (isWide(out)) return sides
    const side = sideOf(out)
    if (side === null) return folded(sides)
    return both(...(side === 'audio-l' ? sides.left : sides.right))
  }

  private isHeard(hop: CaseHop): boolean {
    return this.waves.through(hop, unitOf(hop.to)).some((w) => w.heard)
  }

  private played(unit: CaseUnit, port: CasePort): Sides {
    const tracks = stated(port.tracks).filter((t) => this.stand.holds('source', t.when))
    if (tracks.length > 0) return both(...tracks.map((t) => `track ${String(t.value)}`))
    if (port.rf) return this.ofRf(port.rf)
    if (has(port, 'hdmi') || has(port, 'digital-audio'))
      return { left: new Set(['L']), right: new Set(['R']) }
    if (has(port, 'audio-l') && has(port, 'audio-r'))
      return { left: new Set(['L']), right: new Set(['R']) }
    if (has(port, 'audio-mono')) return both('M')
    if (has(port, 'audio-l')) return this.isAlone(unit, port) ? both('M') : both('L')
    return has(port, 'audio-r') ? both('R') : NOTHING
  }

  /** A source with a left socket and no right one has one channel. */
  private isAlone(unit: CaseUnit, port: CasePort): boolean {
    return !unit.ports.some((p) => p !== port && p.dir !== 'in' && has(p, 'audio-r'))
  }

  private ofRf(rf: CaseRf): Sides {
    const { sound = 'mono' } = this.waves.rfNow('source', rf)
    if (sound === 'none') return NOTHING
    return sound === 'stereo' ? { left: new Set(['L']), right: new Set(['R']) } : both('M')
  }
}

export const speaks = (unit: CaseUnit | undefined): boolean =>
  unit !== undefined &&
  unit.ports.some((p) => p.signals.some(isSound)) &&
  unit.ports.every((p) => p.dir === 'in' && p.signals.every(isSound))
