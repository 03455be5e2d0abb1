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
import { leastDoubt, type Way } from '../compile/way'
import type { Aerials } from './aerial'
import type { Entry, Expander } from './expand'
import {
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
        this.hear(move.way, entry).flatMap((heard) =>
          this.aerialWays(label, move.way).flatMap((aerial) =>
            this.weigh(label, { move, entry, picture: seen, score, ...heard, aerial }, isWanted),
          ),
        ),
      )
  }

  /** From the display's own loudspeakers, from others, or not at all. */
  private hear(end: Way, entry: Entry): Heard[] {
    const display = end.variant.device.display!
    if (end.soundFrom !== null)
      return [{ sound: fromLoudspeakers(entry.step.soundIn, display), speakers: null }]
    const outside = entry.left.kind === 'waits' ? this.outside(entry.left.at, entry.left.sound) : []
    return [{ sound: 'none', speakers: null }, ...outside]
  }

  private outside(at: Label, sound: Sound): Heard[] {
    return this.tools.speakers.flatMap((way) =>
      way.into && at.way.from
        ? this.tools.sounds.between(at.way.from.face, sound, way.into.face).map((route) => ({
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
    if (!label.aerial) return aerials.atTuner(label, end, end.into?.ports ?? [])
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

interface Heard {
  readonly sound: Sound
  readonly speakers: SpeakersUse | null
}

/** A chain at the display, with one way of seeing and hearing it. */
interface Ended extends Heard {
  readonly picture: SeenPicture
  readonly score: number
  readonly aerial: AerialUse | null
  readonly move: Move
  readonly entry: Entry
}

const costOf = ({ route, way }: SpeakersUse): Cost => ({
  boxes: route.boxes + 1,
  pieces: route.pieces,
  doubt: route.doubt + leastDoubt(way),
  bought: route.bought + priceOf(way.variant),
})

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

/** Reaches the tier of the set or of the source, whichever is less, in colour where both have it, with sound. */
export function worksFully(
  found: Finished,
  best: { readonly source: Quality; readonly display: Quality; readonly sound: boolean },
): boolean {
  const wanted = Math.min(TIER[best.source], TIER[best.display])
  return (
    TIER[found.picture.quality] >= wanted &&
    found.picture.degradations.length === 0 &&
    (!best.sound || found.sound === 'mono' || found.sound === 'stereo')
  )
}
