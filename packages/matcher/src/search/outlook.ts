import { FORM_MHZ, RF_SYSTEMS, SOUND_RANK, type PictureForm } from '@coaxwain/signal'
import type { Face } from '../compile/face'
import type { Core } from '../compile/signal'
import type { Way } from '../compile/way'
import { fromLoudspeakers } from './measure'
import type { Label } from './label'
import type { Move } from './moves'
import { tierInto, type MovesFrom, type State, type StateGraph, type Stride } from './states'

/** What a chain still has to pay at least, and the best it can still become. */
export interface Outlook {
  /** Further units before the display. */
  readonly units: number
  readonly boxes: number
  readonly pieces: number
  readonly doubt: number
  readonly bought: number
  readonly tier: number
  readonly lumaMhz: number
  readonly sound: number
}

/** Composite of the 625-line systems keeps 5 MHz (ITU-R BT.470). */
const WIDEST_COMPOSITE_MHZ = 5

/** The luma bandwidth that a display can show at most by one input. */
function mhzInto(way: Way): number {
  const form: PictureForm | null = way.into?.face.form ?? null
  if (form === null) return 0
  if (form === 'composite') return WIDEST_COMPOSITE_MHZ
  if (form !== 'rf') return FORM_MHZ[form]
  const systems = way.fn.accepts.flatMap((row) => row.systems ?? [])
  const widths = systems.map((system) => RF_SYSTEMS[system].videoMhz)
  return widths.length === 0 ? Infinity : Math.max(...widths)
}

const keyOf = (face: Face, core: Core): number => face.id * 65_536 + core.kind

interface Seen {
  readonly state: State
  /** The best into the display from here; null where no lead goes there. */
  readonly end: Outlook | null
  outlook: Outlook | null
  /** States that lead here, each by its stride. */
  readonly before: { readonly seen: Seen; readonly stride: Stride }[]
}

/**
 * Explores every picture that can come about at all, costs aside, and spreads backwards from the display what
 * each still has to pay at least; every axis by itself, so that it never promises too little.
 */
export class Outlooks {
  private readonly seen = new Map<State, Seen>()
  private readonly byKind = new Map<number, Outlook>()

  constructor(
    private readonly starts: readonly Label[],
    private readonly space: {
      readonly states: StateGraph
      /** Moves into the display. */
      readonly allEnds: MovesFrom
      /** Works the moves out of one state out in slices, where there are many. */
      readonly prepareEnds?: (face: Face, core: Core) => Generator<void>
      readonly outsideSpeakers: boolean
    },
  ) {}

  /** Null where the display cannot be reached. */
  at(face: Face, core: Core): Outlook | null {
    return this.byKind.get(keyOf(face, core)) ?? null
  }

  /** Explores in slices; ends with the outlooks known. */
  *explore(): Generator<void> {
    const { states, prepareEnds } = this.space
    for (const { way, sig } of prepareEnds ? this.starts : [])
      yield* prepareEnds!(way.from!.face, sig.core)
    const waiting = this.starts.map(({ way, sig }) => this.see(states.at(way.from!.face, sig.core)))
    const met = new Set(waiting)
    for (const from of waiting) {
      yield* states.prepare(from.state)
      for (const stride of states.stridesFrom(from.state)) {
        if (prepareEnds) yield* prepareEnds(stride.to.face, stride.to.core)
        const to = this.see(stride.to)
        to.before.push({ seen: from, stride })
        if (met.has(to)) continue
        met.add(to)
        waiting.push(to)
      }
      yield
    }
    this.spread()
  }

  private see(state: State): Seen {
    const known = this.seen.get(state)
    if (known) return known
    const end = this.space
      .allEnds(state.face, state.core)
      .map((move) => this.atEnd(move))
      .reduce<Outlook | null>((all, one) => (all ? best(all, one) : one), null)
    const made: Seen = { state, end, outlook: end, before: [] }
    this.seen.set(state, made)
    return made
  }

  private spread(): void {
    const all = [...this.seen.values()]
    const waiting = all.filter((s) => s.end !== null)
    const queued = new Set(waiting)
    for (const at of waiting) {
      queued.delete(at)
      for (const { seen, stride } of at.before) {
        const beyond = before(stride, at.outlook!)
        const outlook = seen.outlook ? best(seen.outlook, beyond) : beyond
        if (seen.outlook && same(seen.outlook, outlook)) continue
        seen.outlook = outlook
        if (queued.has(seen)) continue
        queued.add(seen)
        waiting.push(seen)
      }
    }
    for (const { state, outlook } of all) {
      const key = keyOf(state.face, state.core)
      const known = this.byKind.get(key)
      if (outlook) this.byKind.set(key, known ? best(known, outlook) : outlook)
    }
  }

  private atEnd(move: Move): Outlook {
    const { way, pieces, doubt, bought } = move
    const display = way.variant.device.display
    const own =
      way.soundFrom !== null && display ? SOUND_RANK[fromLoudspeakers('stereo', display)] : 0
    const outside = way.soundFrom === null && this.space.outsideSpeakers ? SOUND_RANK.stereo : 0
    return {
      units: 0,
      boxes: 0,
      pieces,
      doubt,
      bought,
      tier: tierInto(move),
      lumaMhz: mhzInto(way),
      sound: Math.max(own, outside),
    }
  }
}

const before = (stride: Stride, after: Outlook): Outlook => ({
  units: after.units + 1,
  boxes: after.boxes + stride.boxes,
  pieces: after.pieces + stride.pieces,
  doubt: after.doubt + stride.doubt,
  bought: after.bought + stride.bought,
  tier: Math.min(after.tier, stride.tier),
  lumaMhz: Math.min(after.lumaMhz, stride.lumaMhz),
  sound: after.sound,
})

const best = (a: Outlook, b: Outlook): Outlook => ({
  units: Math.min(a.units, b.units),
  boxes: Math.min(a.boxes, b.boxes),
  pieces: Math.min(a.pieces, b.pieces),
  doubt: Math.min(a.doubt, b.doubt),
  bought: Math.min(a.bought, b.bought),
  tier: Math.max(a.tier, b.tier),
  lumaMhz: Math.max(a.lumaMhz, b.lumaMhz),
  sound: Math.max(a.sound, b.sound),
})

const same = (a: Outlook, b: Outlook): boolean =>
  a.units === b.units &&
  a.boxes === b.boxes &&
  a.pieces === b.pieces &&
  a.doubt === b.doubt &&
  a.bought === b.bought &&
  a.tier === b.tier &&
  a.lumaMhz === b.lumaMhz &&
  a.sound === b.sound
