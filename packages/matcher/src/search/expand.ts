import type { Sound } from '@coaxwain/signal'
import { pass, type Core, type CoreTable } from '../compile/signal'
import { leastDoubt, sharesSocket, soundEnd, type SoundEnd, type Way } from '../compile/way'
import { levelOf, type Aerials } from './aerial'
import { leastApart } from './assign'
import {
  leftBy,
  waysUsed,
  type AerialRoute,
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

/** Makes moves from labels, with everything that may become of the sound. */
export class Expander {
  /** Pictures as they are beside the stations of the air, by what they are and their level. */
  private readonly beside = new Map<string, Core | null>()

  constructor(private readonly tools: ExpanderTools) {}

  /** Every way of making a move. */
  entries(label: Label, move: Move): Entry[] {
    const { way, taken } = move
    const { sound } = label
    if (soundEnd(way.soundFrom) === null) {
      const rides = way.soundFrom === 'picture'
      if (rides && label.sig.sound === 'none') return []
      const heard = rides && !taken.heard ? 'none' : label.sig.sound
      return [entryOf(move, { soundRoute: null, soundIn: heard }, this.staying(label))]
    }
    if (sound.kind === 'none') return []
    if (move.withSound) {
      if (sound.at !== label) return []
      const soundIn = met(sound.sound, move.join.sound ?? 'mono')
      return [entryOf(move, { soundRoute: null, soundIn }, NONE)]
    }
    return this.routes(label, move, sound).map((route) =>
      entryOf(move, { soundRoute: route, soundIn: route.sound }, NONE),
    )
  }

  /** Ways for the sound where it does not come by the picture's own leads. */
  private routes(label: Label, move: Move, { at, sound }: Waiting): readonly SoundRoute[] {
    const { from } = at.way
    const { into } = move.way
    return this.tools.sounds.between(from!.face, sound, into!.face, {
      leaving: leftBy(at, label) ?? move,
      arriving: move,
      leavesWith: sharesSocket(from),
      arrivesWith: sharesSocket(into),
    })
  }

  /** Sound may be left behind only where the picture's plug leaves its socket free, or has a tail for it. */
  private staying({ sound, way, ...label }: Label): SoundState {
    if (sound.kind === 'none' || sound.at.depth < label.depth || !sharesSocket(way.from))
      return sound
    return this.tools.sounds.part(way.from!.face) ? sound : NONE
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
    const end = soundEnd(way.soundTo)
    if (end) made.sound = { kind: 'waits', sound: waitingAt(end, inside), at: made }
    return this.withAerial(label, made)
  }

  /** A label as it is, and once for each way in which an aerial can join at its last unit. */
  withAerial(before: Label | null, made: Label): Label[] {
    const { aerials } = this.tools
    if (!aerials || made.aerial) return [made]
    return [made, ...aerials.joining(before, made.way).flatMap((use) => this.joined(made, use))]
  }

  private joined(made: Label, use: AerialUse): Label[] {
    if (!this.hasEnough(made, use.route)) return []
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

  /** No unit of a scarce sort is taken by the chain and on the way of the aerial as well. */
  private hasEnough(made: Label, route: AerialRoute): boolean {
    const ways = [...waysUsed(made), ...route.ways]
    return route.ways.every(
      ({ variant }) =>
        !this.tools.scarceUnits.has(variant.id) ||
        leastApart(ways.filter((w) => w.variant === variant)) !== null,
    )
  }

  private besideStations(made: Label): Core | null {
    const { core } = made.sig
    const level = levelOf(made) ?? 0
    const key = `${core.id} ${level}`
    const known = this.beside.get(key)
    if (known !== undefined) return known
    const carrier = core.carrier && this.tools.aerials?.besideStations(core.carrier, level)
    const beside = carrier ? this.tools.cores.intern({ ...core, carrier }) : null
    this.beside.set(key, beside)
    return beside
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
    const before = waysUsed(label).filter((w) => w.variant.id === way.variant.id)
    const after = leastApart([...before, way])
    return after && after.doubt - (leastApart(before)?.doubt ?? 0) - leastDoubt(way)
  }
}

/** Of both channels one alone leaves where there is a wire for no more; it is worth less than a mono sound. */
const waitingAt = ({ circuits }: SoundEnd, sound: Sound): Sound =>
  sound === 'stereo' && circuits.length === 1 && circuits[0] !== 'audio-mono' ? 'half' : sound

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
