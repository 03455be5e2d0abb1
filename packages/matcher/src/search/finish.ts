import { jackOf } from '@coaxwain/models'
import type { Degradation, Demands, SeenPicture } from '@coaxwain/shelf'
import {
  followsField,
  followsLine,
  SOUND_RANK,
  TIER,
  type PictureForm,
  type Quality,
  type Sound,
} from '@coaxwain/signal'
import { priceOf } from '../compile/variant'
import { leastDoubt, sharesSocket, type Way } from '../compile/way'
import type { Aerials } from './aerial'
import type { Entry, Expander } from './expand'
import {
  leftBy,
  pathOf,
  plus,
  type AerialUse,
  type Cost,
  type Finished,
  type Label,
  type SpeakersUse,
} from './label'
import { fromLoudspeakers, pictureScore, qualityAt } from './measure'
import type { Move } from './moves'
import type { SoundRoutes } from './sound-route'

export interface FinisherTools {
  readonly demands: Demands
  readonly speakers: readonly Way[]
  readonly aerials: Aerials | null
  readonly sounds: SoundRoutes
  readonly expander: Expander
}

/** Judges what a chain shows and sounds like once it has reached the display. */
export class Finisher {
  constructor(private readonly tools: FinisherTools) {}

  /** The display follows the picture, and shows it in colour where that is demanded. */
  canEnd({ way, taken }: Move): boolean {
    const display = way.variant.device.display
    if (!display) return false
    const { scan } = taken.core
    const colour = taken.colour && display.screen !== 'tube-mono'
    return (
      followsLine(display.deflection, scan) &&
      followsField(display.deflection, scan) &&
      (colour || this.tools.demands.colour !== true)
    )
  }

  /** Every way of ending a chain by a move into the display that is still wanted. */
  finish(label: Label, move: Move, isWanted: IsWanted): Finished[] {
    const { expander, demands } = this.tools
    if (demands.aim === 'light-gun' && !fitsGun(label.sig.direct, move.way)) return []
    const seen = see(label, move)
    const score = pictureScore(seen.quality, seen.lumaMhz, seen.degradations.length)
    if (!isWanted(score, SOUND_RANK.stereo, plus(label, move))) return []
    return expander
      .entries(label, move)
      .flatMap((entry) =>
        this.hear(label, { move, entry, score }, isWanted).flatMap((heard) =>
          this.aerialWays(label, move.way).flatMap((aerial) =>
            this.weigh(label, { move, entry, picture: seen, score, ...heard, aerial }, isWanted),
          ),
        ),
      )
  }

  /** From the display's own loudspeakers, from others, or not at all. */
  private hear(label: Label, last: Last, isWanted: IsWanted): Heard[] {
    const { move, entry } = last
    const display = move.way.variant.device.display!
    if (move.way.soundFrom !== null)
      return [{ sound: fromLoudspeakers(entry.step.soundIn, display), speakers: null }]
    return [{ sound: 'none', speakers: null }, ...this.outside(label, last, isWanted)]
  }

  private outside(label: Label, { move, entry, score }: Last, isWanted: IsWanted): Heard[] {
    if (entry.left.kind !== 'waits') return []
    const { at, sound } = entry.left
    const { from } = at.way
    if (!from) return []
    const leaving = leftBy(at, label) ?? move
    const beside = { leaving, arriving: null, arrivesWith: false, leavesWith: sharesSocket(from) }
    const before = plus(label, entry)
    return this.tools.speakers
      .filter((way) => isWanted(score, SOUND_RANK[sound], plus(before, costOfSpeakers(way))))
      .flatMap((way) =>
        way.into
          ? this.tools.sounds.between(from.face, sound, way.into.face, beside).map((route) => ({
              sound: route.sound,
              speakers: { route, way },
            }))
          : [],
      )
  }

  /** The aerial as it has joined, or by another input of the display; none where it is not asked for. */
  private aerialWays(label: Label, end: Way): (AerialUse | null)[] {
    const { aerials } = this.tools
    if (!aerials) return [null]
    if (!label.aerial) return [...aerials.joining(label, end)]
    const received =
      pathOf(label).some((l) => l.step !== null && l.way.fn.tunedBy !== undefined) ||
      label.aerial.fn.tunedBy !== undefined
    return received || aerials.canWatch(end.fn) ? [label.aerial] : []
  }

  private weigh(label: Label, ended: Ended, isWanted: IsWanted): Finished[] {
    const { move, entry, picture, sound, speakers, aerial } = ended
    if (this.tools.demands.stereo === true && sound !== 'stereo') return []
    let cost = plus(label, entry)
    if (aerial && aerial !== label.aerial) cost = plus(cost, aerial)
    if (speakers) cost = plus(cost, costOf(speakers))
    if (!isWanted(ended.score, SOUND_RANK[sound], cost)) return []
    const { bought, ...costs } = cost
    const axes = { picture: ended.score, sound: SOUND_RANK[sound], ...costs, disturbance: 0 }
    const { step } = entry
    const how = { last: label, end: move.way, step, stand: move.stand, speakers, aerial }
    return [{ ...how, picture, sound, axes, bought }]
  }
}

/** Whether no chain that has been found is at least as good on every axis. */
export type IsWanted = (picture: number, sound: number, cost: Cost) => boolean

/** The move into the display, one way of making it, and how good the picture is. */
interface Last {
  readonly move: Move
  readonly entry: Entry
  readonly score: number
}

interface Heard {
  readonly sound: Sound
  readonly speakers: SpeakersUse | null
}

/** A chain at the display, with one way of seeing and hearing it. */
interface Ended extends Last, Heard {
  readonly picture: SeenPicture
  readonly aerial: AerialUse | null
}

/** Without what leads there. */
const costOfSpeakers = (way: Way): Cost => ({
  boxes: 1,
  pieces: 0,
  doubt: leastDoubt(way),
  bought: priceOf(way.variant),
})

const costOf = ({ route, way }: SpeakersUse): Cost => plus(route, costOfSpeakers(way))

function see(label: Label, { way, join, taken }: Move): SeenPicture {
  const { sig } = label
  const display = way.variant.device.display!
  const form = jackOf(way.variant.device, way.in ?? '').form as PictureForm
  const tube = display.screen !== 'tube-mono'
  const [source] = pathOf(label)
  const grey = tube && !taken.colour && source?.sig.core.colour !== 'mono'
  const degradations: Degradation[] = [
    ...(grey ? (['monochrome'] as const) : []),
    ...(taken.reducedHeight ? (['reduced-height'] as const) : []),
    ...(sig.shape === 'squeezed' && display.shape === '4:3' ? (['squeezed'] as const) : []),
  ]
  return {
    quality: qualityAt(join.picture === 'luma-only' ? 'luma-only' : sig.poorest, form),
    lumaMhz: sig.lumaMhz,
    degradations,
    colour: tube && taken.colour,
  }
}

/** A light gun looks for a spot on a tube drawn at the source's own line rate. */
const fitsGun = (direct: boolean, { variant }: Way): boolean => {
  const { display } = variant.device
  return (
    direct &&
    display !== undefined &&
    display.directView &&
    display.screen !== 'flat' &&
    !display.storesFields &&
    !display.convertsScan
  )
}

/** The best that a source and a display have, each by itself. */
export interface BestThereIs {
  readonly source: Quality
  readonly display: Quality
  readonly sound: boolean
}

/** The tier that a chain must have to work in full. */
export const tierWanted = ({ source, display }: BestThereIs): number =>
  Math.min(TIER[source], TIER[display])

/** Reaches the tier of the set or of the source, whichever is less, in colour where both have it, with sound. */
export function worksFully(found: Finished, best: BestThereIs): boolean {
  return (
    TIER[found.picture.quality] >= tierWanted(best) &&
    found.picture.degradations.length === 0 &&
    (!best.sound || found.sound === 'mono' || found.sound === 'stereo')
  )
}
