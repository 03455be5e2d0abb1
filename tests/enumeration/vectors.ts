import { LIMITS, type Hookup, type SeenPicture } from '@coaxwain/shelf'
import { SOUND_RANK, TIER, type Sound } from '@coaxwain/signal'

/** The axes by which hookups are compared, and the step of the ladder that a silent answer is judged on. */
export interface Vector {
  readonly picture: number
  readonly sound: number
  readonly boxes: number
  readonly pieces: number
  readonly doubt: number
}

/** What every named degradation takes off within its step of the ladder. */
const PER_DEGRADATION = 30

/** The tier of the ladder times 100, plus ten times the luma bandwidth in MHz, less degradations. */
export const pictureScore = (tier: number, lumaMhz: number, degradations = 0): number =>
  tier * 100 + Math.round(lumaMhz * 10) - PER_DEGRADATION * degradations

export const scoreOf = (p: SeenPicture): number =>
  pictureScore(TIER[p.quality], p.lumaMhz, p.degradations.length)

export const rankOf = (sound: Sound): number => SOUND_RANK[sound]

/** At least as good on every axis. */
export const noWorse = (a: Vector, b: Vector): boolean =>
  a.picture >= b.picture &&
  a.sound >= b.sound &&
  a.boxes <= b.boxes &&
  a.pieces <= b.pieces &&
  a.doubt <= b.doubt

export const vectorOf = ({ axes }: Hookup): Vector => {
  const { picture, sound, boxes, pieces, doubt } = axes
  return { picture, sound, boxes, pieces, doubt }
}

export const nameOf = (v: Vector): string =>
  `picture ${v.picture}, sound ${v.sound}, boxes ${v.boxes}, pieces ${v.pieces}, doubt ${v.doubt}`

/** Hookups of which none beats another, one for each vector. */
export class Best {
  private held: { readonly vector: Vector; readonly hookup: Hookup }[] = []

  add(hookup: Hookup): void {
    const vector = vectorOf(hookup)
    if (this.matches(vector)) return
    this.held = this.held.filter((h) => !noWorse(vector, h.vector))
    this.held.push({ vector, hookup })
  }

  /** Something that has been found is at least as good on every axis. */
  matches(vector: Vector): boolean {
    return this.held.some((h) => noWorse(h.vector, vector))
  }

  all(): Hookup[] {
    return this.held.map((h) => h.hookup)
  }
}

const isHeard = (h: Hookup): boolean => h.axes.sound >= SOUND_RANK.mono

/** A silent or half answer is shown only if no answer of its picture tier has sound. */
export function withoutSilent(hookups: readonly Hookup[]): Hookup[] {
  const tiers = new Set(hookups.filter(isHeard).map((h) => TIER[h.picture.quality]))
  return hookups.filter((h) => isHeard(h) || !tiers.has(TIER[h.picture.quality]))
}

export const MOST_SHOWN = LIMITS.hookupsShown
