import { noWorseCost, type Cost, type Finished } from './label'

interface Held extends Cost {
  readonly found: Finished
}

/** Finished chains of which none beats another; one for each set of axes. */
export class Front {
  private held: Held[] = []

  add(found: Finished): void {
    const { picture, sound, boxes, pieces, doubt } = found.axes
    const own: Held = { found, boxes, pieces, doubt, bought: found.bought }
    if (this.matches(picture, sound, own)) return
    this.held = this.held.filter((h) => !noWorse(own, h))
    this.held.push(own)
  }

  /** Some chain is at least as good on every axis. */
  matches(picture: number, sound: number, cost: Cost): boolean {
    return this.held.some(
      (h) => h.found.axes.picture >= picture && h.found.axes.sound >= sound && noWorseCost(h, cost),
    )
  }

  all(): readonly Finished[] {
    return this.held.map((h) => h.found)
  }
}

const noWorse = (a: Held, b: Held): boolean =>
  a.found.axes.picture >= b.found.axes.picture &&
  a.found.axes.sound >= b.found.axes.sound &&
  noWorseCost(a, b)
