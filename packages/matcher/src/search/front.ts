import { noWorseCost, type Cost, type Finished } from './label'

interface Held extends Cost {
  readonly found: Finished
}

/** What a search has found so far, and what is still worth finding. */
export interface Finds {
  add(found: Finished): void
  /** Nothing that is at best so good at so much cost would be worth knowing. */
  matches(picture: number, sound: number, cost: Cost): boolean
  /** What comes at such a cost is looked at in the order of these two. */
  order(cost: Cost): readonly [first: number, second: number]
  all(): readonly Finished[]
}

/** Finished chains of which none beats another; one for each set of axes. */
export class Front implements Finds {
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

  order({ boxes, pieces }: Cost): readonly [number, number] {
    return [boxes, pieces]
  }

  all(): readonly Finished[] {
    return this.held.map((h) => h.found)
  }
}

const noWorse = (a: Held, b: Held): boolean =>
  a.found.axes.picture >= b.found.axes.picture &&
  a.found.axes.sound >= b.found.axes.sound &&
  noWorseCost(a, b)
