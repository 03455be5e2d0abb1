import type { DisplayFacts } from '@coaxwain/models'
import { poorer, TIER, type PictureForm, type Quality, type Sound } from '@coaxwain/signal'

/**
 * The picture axis: the tier of the poorest form on the way times 100, plus ten times the luma bandwidth.
 * Named degradations take off 30 each, which keeps them inside their tier (an ordering, common practice, no source).
 */
export const pictureScore = (quality: Quality, lumaMhz: number, degradations: number): number =>
  bestScore(TIER[quality], lumaMhz) - 30 * degradations

/** The score of a picture without degradations, by its tier. */
export const bestScore = (tier: number, lumaMhz: number): number =>
  tier * 100 + Math.round(lumaMhz * 10)

export const qualityAt = (poorest: Quality, form: PictureForm): Quality => poorer(poorest, form)

/** What a display's own loudspeakers make of a sound. */
export function fromLoudspeakers(sound: Sound, display: DisplayFacts): Sound {
  if (display.loudspeakers === 'none') return 'none'
  return display.loudspeakers === 'mono' && sound === 'stereo' ? 'mono' : sound
}
