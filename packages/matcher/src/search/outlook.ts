import { LIMITS } from '@coaxwain/shelf'
import { FORM_MHZ, RF_SYSTEMS, SOUND_RANK, TIER, type PictureForm } from '@coaxwain/signal'
import type { Face } from '../compile/face'
import type { Core } from '../compile/signal'
import type { Way } from '../compile/way'
import { fromLoudspeakers } from './measure'
import type { Label } from './label'
import type { Move } from './moves'

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

/** A picture at an output: all that decides where it can go. */
interface State {
  readonly face: Face
  readonly core: Core
  readonly ends: readonly Move[]
  next: { readonly move: Move; readonly to: State }[]
  /** The least that must have been bought to get here. */
  bought: number
  outlook: Outlook | null
}

export type MovesFrom = (face: Face, core: Core) => readonly Move[]

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

const tierInto = (move: Move): number =>
  TIER[move.join.picture === 'luma-only' ? 'luma-only' : (move.way.into?.face.form ?? 'none')]

const keyOf = (face: Face, core: Core): number => face.id * 65_536 + core.kind

/**
 * Explores every picture that can come about at all, costs aside, and spreads backwards from the display what
 * each still has to pay at least; every axis by itself, so that it never promises too little.
 */
export class Outlooks {
  private readonly states = new Map<string, State>()
  private readonly byKind = new Map<number, Outlook>()
  private edge: State[] = []
  private depth = 0

  constructor(
    starts: readonly Label[],
    private readonly space: {
      /** Moves into boxes. */
      readonly moves: MovesFrom
      /** Moves into the display. */
      readonly ends: MovesFrom
      readonly outsideSpeakers: boolean
      /** Chains that need more than so many purchases are not followed. */
      readonly mostBought: number
    },
  ) {
    for (const { way, sig } of starts) this.visit(way.from!.face, sig.core, 0)
  }

  /** Null where the display cannot be reached. */
  at(face: Face, core: Core): Outlook | null {
    return this.byKind.get(keyOf(face, core)) ?? null
  }

  /** Explores in slices; ends with the outlooks known. */
  *explore(): Generator<void> {
    while (this.edge.length > 0 && this.depth <= LIMITS.boxesInLeg) {
      const layer = this.edge
      this.edge = []
      for (const state of layer) {
        this.grow(state)
        yield
      }
      this.depth++
    }
    this.spread()
  }

  private visit(face: Face, core: Core, bought: number): State {
    const key = `${face.id} ${core.id}`
    const known = this.states.get(key)
    if (known && known.bought <= bought) return known
    const made = known ?? {
      face,
      core,
      next: [],
      ends: this.space.ends(face, core),
      bought,
      outlook: null,
    }
    made.bought = bought
    this.states.set(key, made)
    this.edge.push(made)
    return made
  }

  private grow(state: State): void {
    if (this.depth >= LIMITS.boxesInLeg) return
    state.next = []
    for (const move of this.space.moves(state.face, state.core)) {
      const { leaving, way } = move
      const bought = state.bought + move.bought
      if (leaving && way.from && bought <= this.space.mostBought)
        state.next.push({ move, to: this.visit(way.from.face, leaving.core, bought) })
    }
  }

  private spread(): void {
    const states = [...this.states.values()].reverse()
    for (let changed = true; changed;) {
      changed = false
      for (const state of states) {
        const seen = this.look(state)
        if (!seen || (state.outlook && same(seen, state.outlook))) continue
        state.outlook = seen
        changed = true
      }
    }
    for (const { face, core, outlook } of states) {
      const key = keyOf(face, core)
      const known = this.byKind.get(key)
      if (outlook) this.byKind.set(key, known ? best(known, outlook) : outlook)
    }
  }

  private look(state: State): Outlook | null {
    let seen: Outlook | null = null
    for (const move of state.ends) {
      const end = this.atEnd(move)
      seen = seen ? best(seen, end) : end
    }
    for (const { move, to } of state.next) {
      if (!to.outlook) continue
      const beyond = before(move, to.outlook)
      seen = seen ? best(seen, beyond) : beyond
    }
    return seen
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

const before = (move: Move, after: Outlook): Outlook => ({
  units: after.units + 1,
  boxes: after.boxes + move.boxes,
  pieces: after.pieces + move.pieces,
  doubt: after.doubt + move.doubt,
  bought: after.bought + move.bought,
  tier: Math.min(after.tier, TIER[move.leaving?.poorest ?? 'none'], tierInto(move)),
  lumaMhz: Math.min(after.lumaMhz, move.leaving?.lumaMhz ?? 0),
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
