import type { Axes } from '@coaxwain/shelf'
import { SOUND_RANK } from '@coaxwain/signal'
import { compareHookups } from '../result/rank'
import { tierWanted, worksFully, type BestThereIs } from './finish'
import type { Finds } from './front'
import { bestScore } from './measure'
import type { Cost, Finished } from './label'

interface Bargain {
  readonly worksFully: boolean
  readonly axes: Axes
  readonly bought: number
}

interface Held extends Bargain {
  readonly found: Finished
}

type Order = (a: Bargain, b: Bargain) => number

/** The smallest purchase first. */
export const bySize: Order = (a, b) => a.bought - b.bought || compareHookups(a, b)

/** The best picture first. */
export const byPicture: Order = (a, b) => b.axes.picture - a.axes.picture || bySize(a, b)

/**
 * Of chains for which something has to be bought, the smallest purchase and the one with the best picture: all
 * that anybody is told of. What works in full leaves out what does not; where the shelf has a way already,
 * nothing else counts.
 */
export class Bargains implements Finds {
  private smallest: Held | null = null
  private finest: Held | null = null

  constructor(
    private readonly best: BestThereIs,
    private readonly hasWay: boolean,
  ) {}

  add(found: Finished): void {
    const { axes, bought } = found
    const held: Held = { found, axes, bought, worksFully: worksFully(found, this.best) }
    if (bought === 0 || (!held.worksFully && this.wholeOnly)) return
    const { smallest, finest } = this
    // The first that works in full takes the place of both.
    const first = held.worksFully && smallest?.worksFully !== true
    if (first || !smallest || bySize(held, smallest) < 0) this.smallest = held
    if (first || !finest || byPicture(held, finest) < 0) this.finest = held
  }

  matches(picture: number, sound: number, cost: Cost): boolean {
    const whole = this.mayBeWhole(picture, sound)
    if (!whole && this.wholeOnly) return true
    const { smallest, finest } = this
    if (!smallest || !finest || (whole && !smallest.worksFully)) return false
    const { bought, ...costs } = cost
    const axes = { picture, sound, ...costs, disturbance: 0 }
    const hoped = { worksFully: whole, axes, bought: Math.max(1, bought) }
    return bySize(hoped, smallest) >= 0 && byPicture(hoped, finest) >= 0
  }

  order({ boxes, pieces, bought }: Cost): readonly [number, number] {
    return [bought, boxes + pieces]
  }

  all(): readonly Finished[] {
    return [...new Set([this.smallest, this.finest])].flatMap((held) => held?.found ?? [])
  }

  private get wholeOnly(): boolean {
    return this.hasWay || this.smallest?.worksFully === true
  }

  private mayBeWhole(picture: number, sound: number): boolean {
    const heard = !this.best.sound || sound >= SOUND_RANK.mono
    return heard && picture >= bestScore(tierWanted(this.best), 0)
  }
}
