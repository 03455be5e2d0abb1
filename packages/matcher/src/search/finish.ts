import { jackOf } from '@coaxwain/models'
import type { Axes, Degradation, Demands } from '@coaxwain/shelf'
import {
  followsField,
  followsLine,
  TIER,
  type PictureForm,
  type Quality,
  type Sound,
} from '@coaxwain/signal'
import { priceOf } from '../compile/variant'
import type { Way } from '../compile/way'
import type { Aerials, AerialUse } from './aerial'
import { settle, type Entry, type Expander } from './expand'
import { pathOf, type Finished, type Label, type SpeakersUse } from './label'
import { fromLoudspeakers, pictureScore, qualityAt, soundScore } from './measure'
import type { SoundRoutes } from './sound-route'

/** Judges what a chain shows and sounds like once it has reached the display. */
export class Finisher {
  private sounds: SoundRoutes | null = null
  private expander: Expander | null = null

  constructor(
    private readonly demands: Demands,
    private readonly speakers: readonly Way[],
    private readonly aerials: Aerials | null,
  ) {}

  use(sounds: SoundRoutes, expander: Expander): void {
    this.sounds = sounds
    this.expander = expander
  }

  finish(label: Label, end: Way): Finished[] {
    return (this.expander?.entries(label, end) ?? []).flatMap((entry) => {
      const seen = this.see(label, end, entry)
      if (!seen) return []
      return this.hear(end, entry).flatMap(({ sound, use }) =>
        this.aerialWays(label, end).flatMap((aerial) =>
          this.weigh(label, end, entry, { picture: seen, sound, speakers: use, aerial }),
        ),
      )
    })
  }

  private see(label: Label, end: Way, entry: Entry) {
    const display = end.variant.device.display
    if (!display) return null
    const { sig, colour, reducedHeight } = entry.step.taken
    if (!followsLine(display.deflection, sig.scan) || !followsField(display.deflection, sig.scan))
      return null
    if (this.demands.aim === 'light-gun' && !fitsGun(sig.direct, display)) return null
    const lumaOnly = entry.step.join.picture === 'luma-only'
    const form = jackOf(end.variant.device, end.in ?? '').form as PictureForm
    const quality = qualityAt(lumaOnly ? 'luma-only' : sig.poorest, form)
    const grey = !colour && isColourful(label) && display.screen !== 'tube-mono'
    if (this.demands.colour === true && (grey || display.screen === 'tube-mono')) return null
    const degradations: Degradation[] = [
      ...(grey ? (['monochrome'] as const) : []),
      ...(reducedHeight ? (['reduced-height'] as const) : []),
      ...(sig.shape === 'squeezed' && display.shape === '4:3' ? (['squeezed'] as const) : []),
    ]
    return {
      quality,
      lumaMhz: sig.lumaMhz,
      degradations,
      colour: colour && display.screen !== 'tube-mono',
    }
  }

  /** From the display's own loudspeakers, from others, or not at all. */
  private hear(end: Way, entry: Entry): { sound: Sound; use: SpeakersUse | null }[] {
    const display = end.variant.device.display!
    const heard: { sound: Sound; use: SpeakersUse | null }[] = []
    if (end.soundFrom !== null) {
      heard.push({ sound: fromLoudspeakers(entry.step.soundIn, display), use: null })
    } else {
      heard.push({ sound: 'none', use: null })
      if (entry.left.kind === 'waits') heard.push(...this.outside(entry.left.at, entry.left.sound))
    }
    return heard
  }

  private outside(at: Label, sound: Sound): { sound: Sound; use: SpeakersUse }[] {
    return this.speakers.flatMap((way) =>
      way.into && at.way.from
        ? (this.sounds?.between(at.way.from.face, sound, way.into.face) ?? []).map((route) => ({
            sound: route.sound,
            use: { route, way },
          }))
        : [],
    )
  }

  /** The aerial as it has joined, or by another input of the display; none where it is not asked for. */
  private aerialWays(label: Label, end: Way): (AerialUse | null)[] {
    if (!this.aerials) return [null]
    if (!label.aerial) return this.aerials.atTuner(end, end.into?.ports ?? [])
    const received =
      pathOf(label).some((l) => l.step !== null && l.way.fn.tunedBy !== undefined) ||
      label.aerial.fn.tunedBy !== undefined
    return received || this.aerials.canWatch(end.fn) ? [label.aerial] : []
  }

  private weigh(
    label: Label,
    end: Way,
    entry: Entry,
    ways: Pick<Finished, 'picture' | 'sound' | 'speakers' | 'aerial'>,
  ): Finished[] {
    const { picture, sound, speakers, aerial } = ways
    const late = aerial && aerial !== label.aerial ? aerial : NOTHING
    if (this.demands.stereo === true && sound !== 'stereo') return []
    const stand = settle(end, entry.step.taken.stand)
    if (!stand) return []
    const extra = speakers
      ? {
          boxes: speakers.route.boxes + 1,
          pieces: speakers.route.pieces,
          doubt: speakers.route.doubt + (speakers.way.offers[0]?.doubt ?? 0),
          bought: speakers.route.bought + priceOf(speakers.way.variant),
        }
      : NOTHING
    const bought = label.bought + entry.bought + extra.bought + late.bought
    const axes: Axes = {
      picture: pictureScore(picture.quality, picture.lumaMhz, picture.degradations.length),
      sound: soundScore(sound),
      boxes: label.boxes + entry.boxes + extra.boxes + late.boxes,
      pieces: label.pieces + entry.pieces + extra.pieces + late.pieces,
      doubt: label.doubt + entry.doubt + extra.doubt + late.doubt + (end.offers[0]?.doubt ?? 0),
      disturbance: 0,
    }
    return [
      { last: label, end, step: entry.step, stand, speakers, aerial, picture, sound, axes, bought },
    ]
  }
}

const NOTHING = { boxes: 0, pieces: 0, doubt: 0, bought: 0 }

/** A light gun looks for a spot on a tube drawn at the source's own line rate. */
const fitsGun = (
  direct: boolean,
  display: NonNullable<Way['variant']['device']['display']>,
): boolean =>
  direct &&
  display.directView &&
  display.screen !== 'flat' &&
  !display.storesFields &&
  !display.convertsScan

/** The source gives colour at all. */
const isColourful = (label: Label): boolean => pathOf(label)[0]?.sig.colour !== 'mono'

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
