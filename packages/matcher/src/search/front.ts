import type { Axes } from '@coaxwain/shelf'
import type { Finished } from './label'

export type Bound = Omit<Axes, 'disturbance'> & { readonly bought: number }

/** Every axis at least as good: higher for picture and sound, lower for the rest. */
export const noWorse = (a: Bound, b: Bound): boolean =>
  a.picture >= b.picture &&
  a.sound >= b.sound &&
  a.boxes <= b.boxes &&
  a.pieces <= b.pieces &&
  a.doubt <= b.doubt &&
  a.bought <= b.bought

const boundOf = (f: Finished): Bound => ({ ...f.axes, bought: f.bought })

/** Finished chains of which none beats another; one for each set of axes. */
export class Front {
  private solutions: Finished[] = []

  add(found: Finished): void {
    const own = boundOf(found)
    if (this.solutions.some((s) => noWorse(boundOf(s), own))) return
    this.solutions = this.solutions.filter((s) => !noWorse(own, boundOf(s)))
    this.solutions.push(found)
  }

  matches(bound: Bound): boolean {
    return this.solutions.some((s) => noWorse(boundOf(s), bound))
  }

  all(): readonly Finished[] {
    return this.solutions
  }
}
