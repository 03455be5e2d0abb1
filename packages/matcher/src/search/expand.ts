import { pass, type Core, type CoreTable } from '../compile/signal'
import { leastDoubt, soundEnd, type Way } from '../compile/way'
import { levelOf, type Aerials } from './aerial'
import { leastApart } from './assign'
import {
  pathOf,
  type AerialUse,
  type Cost,
  type Label,
  type SoundRoute,
  type SoundState,
  type Step,
  type Waiting,
} from './label'
import type { Move } from './moves'
import { met, toMono, type SoundRoutes } from './sound-route'

/** One way of making a move: what is plugged, what is taken, what sound came along. */
export interface Entry extends Cost {
  readonly step: Step
  /** Sound left where it waits. */
  readonly left: SoundState
}

export interface ExpanderTools {
  readonly sounds: SoundRoutes
  readonly cores: CoreTable
  readonly scarceUnits: ReadonlySet<string>
  /** Null when nobody asks for the aerial to be kept. */
  readonly aerials: Aerials | null
}

const NONE: SoundState = { kind: 'none' }

/** Sound shares its socket with the picture, so that one plug takes both or none. */
function shareSocket(way: Way, side: 'into' | 'from'): boolean {
  const face = way[side]?.face
  return face !== undefined && face.sound.some((s) => face.picture.some((p) => p.port === s.port))
}

/** Makes moves from labels, with everything that may become of the sound. */
export class Expander {
  constructor(private readonly tools: ExpanderTools) {}

  /** Every way of making a move. */
  entries(label: Label, move: Move): Entry[] {
    const { way, taken } = move
    const { sound } = label
    if (soundEnd(way.soundFrom) === null) {
      const rides = way.soundFrom === 'picture'
      if (rides && label.sig.sound === 'none') return []
      const heard = rides && !taken.heard ? 'none' : label.sig.sound
      return [entryOf(move, { soundRoute: null, soundIn: heard }, mayStay(label) ? sound : NONE)]
    }
    if (sound.kind === 'none') return []
    if (move.withSound) {
      if (sound.at !== label) return []
      const soundIn = met(sound.sound, move.join.sound ?? 'mono')
      return [entryOf(move, { soundRoute: null, soundIn }, NONE)]
    }
    return this.routes(label, way, sound).map((route) =>
      entryOf(move, { soundRoute: route, soundIn: route.sound }, NONE),
    )
  }

  /** Ways for the sound where it does not come by the picture's own leads. */
  private routes(label: Label, way: Way, waits: Waiting): readonly SoundRoute[] {
    const here = waits.at === label
    if (shareSocket(way, 'into') || (here && shareSocket(label.way, 'from'))) return []
    const routes = this.tools.sounds.between(waits.at.way.from!.face, waits.sound, way.into!.face)
    // Between the same two units a straight route is a link of both, found already.
    return here ? routes.filter((r) => r.via !== null) : routes
  }

  /** What leaves a unit after a move into it. */
  leave(label: Label, move: Move, entry: Entry): Label[] {
    const { way, leaving } = move
    if (!leaving) return []
    const inside = way.soundMono ? toMono(entry.step.soundIn) : entry.step.soundIn
    const sig = pass(label.sig, leaving, way.soundTo === 'picture' ? inside : 'none')
    const silent = soundEnd(way.soundTo) ? inside === 'none' : sig.sound === 'none'
    if (way.soundTo !== null && silent) return []
    const apart = this.doubtApart(label, way)
    if (apart === null || this.losesAerial(label, way)) return []
    const made: Label & { sound: SoundState } = {
      way,
      sig,
      stand: move.stand,
      sound: entry.left,
      aerial: label.aerial,
      depth: label.depth + 1,
      prev: label,
      step: entry.step,
      boxes: label.boxes + entry.boxes,
      pieces: label.pieces + entry.pieces,
      doubt: label.doubt + entry.doubt + apart,
      bought: label.bought + entry.bought,
    }
    if (soundEnd(way.soundTo)) made.sound = { kind: 'waits', sound: inside, at: made }
    return this.withAerial(label, made)
  }

  /** A label as it is, and once for each way in which an aerial can join at its last unit. */
  withAerial(before: Label | null, made: Label): Label[] {
    const { aerials } = this.tools
    if (!aerials || made.aerial) return [made]
    const taken = [...(made.way.into?.ports ?? []), ...(made.way.from?.ports ?? [])]
    const uses = [...aerials.atBox(before, made.way), ...aerials.atTuner(before, made.way, taken)]
    return [made, ...uses.flatMap((use) => this.joined(made, use))]
  }

  private joined(made: Label, use: AerialUse): Label[] {
    const core = use.together ? this.besideStations(made) : made.sig.core
    if (!core) return []
    const apart = (way: Way): number => (made.prev ? (this.doubtApart(made.prev, way) ?? 0) : 0)
    const copy: Label & { sound: SoundState } = {
      ...made,
      way: use.at,
      sig: { ...made.sig, core },
      aerial: use,
      boxes: made.boxes + use.boxes,
      pieces: made.pieces + use.pieces,
      doubt: made.doubt + use.doubt + apart(use.at) - apart(made.way),
      bought: made.bought + use.bought,
    }
    if (copy.sound.kind === 'waits' && copy.sound.at === made)
      copy.sound = { ...copy.sound, at: copy }
    return [copy]
  }

  private besideStations(made: Label): Core | null {
    const { core } = made.sig
    const carrier =
      core.carrier && this.tools.aerials?.besideStations(core.carrier, levelOf(made) ?? 0)
    return carrier ? this.tools.cores.intern({ ...core, carrier }) : null
  }

  /** An aerial goes on beside the picture up to the tuner that receives it. */
  private losesAerial({ aerial }: Label, way: Way): boolean {
    return aerial !== null && aerial.fn.tunedBy === undefined && !this.passesOn(way)
  }

  /** An aerial that has joined before goes on to the next unit, or is received there. */
  private passesOn(way: Way): boolean {
    if (way.fn.tunedBy !== undefined) return this.tools.aerials?.canWatch(way.fn) ?? false
    const { device } = way.variant
    return device.functions.some(
      (fn) =>
        fn.tunedBy === undefined &&
        way.in !== null &&
        [...fn.needs, ...(fn.oneOf ?? [])].includes(way.in) &&
        fn.gives.some((g) => g.jack === way.out?.jack && g.rf === undefined),
    )
  }

  /**
   * What one more unit adds to the doubt beyond its least, where a chain may want more of a sort than there are;
   * null when there is none left.
   */
  private doubtApart(label: Label, way: Way): number | null {
    if (!this.tools.scarceUnits.has(way.variant.id)) return 0
    const before = pathOf(label)
      .slice(1)
      .map((l) => l.way)
      .filter((w) => w.variant.id === way.variant.id)
    const after = leastApart([...before, way])
    return after && after.doubt - (leastApart(before)?.doubt ?? 0) - leastDoubt(way)
  }
}

/** Sound may be left behind only where the picture's plug does not take its socket. */
const mayStay = (label: Label): boolean =>
  label.sound.kind === 'waits' && (label.sound.at !== label || !shareSocket(label.way, 'from'))

const entryOf = (
  move: Move,
  sound: Pick<Step, 'soundRoute' | 'soundIn'>,
  left: SoundState,
): Entry => {
  const { join, taken, terminators } = move
  const route = sound.soundRoute
  return {
    step: { join, taken, terminators, ...sound },
    left,
    boxes: move.boxes + (route?.boxes ?? 0),
    pieces: move.pieces + (route?.pieces ?? 0),
    doubt: move.doubt + (route?.doubt ?? 0),
    bought: move.bought + (route?.bought ?? 0),
  }
}
