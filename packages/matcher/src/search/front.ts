import type { Axes } from '@coaxwain/shelf'
import type { Finished } from './label'

export type Bound = Omit<Axes, 'disturbance'>

/** Every axis at least as good: higher for picture and sound, lower for the rest. */
export const noWorse = (a: Bound, b: Bound): boolean =>
  a.picture >= b.picture &&
  a.sound >= b.sound &&
  a.boxes <= b.boxes &&
  a.pieces <= b.pieces &&
  a.doubt <= b.doubt

/** Finished chains of which none beats another; one for each set of axes. */
export class Front {
  private solutions: Finished[] = []

  add(found: Finished): void {
    if (this.solutions.some((s) => noWorse(s.axes, found.axes))) return
    this.solutions = this.solutions.filter((s) => !noWorse(found.axes, s.axes))
    this.solutions.push(found)
  }

  matches(bound: Bound): boolean {
    return this.solutions.some((s) => noWorse(s.axes, bound))
  }

  all(): readonly Finished[] {
    return this.solutions
  }
}
