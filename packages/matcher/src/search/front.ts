import type { Finished } from './label'

/** Finished chains of which none beats another; one for each set of axes. */
export class Front {
  private solutions: Finished[] = []

  add(found: Finished): void {
    const { picture, sound, boxes, pieces, doubt } = found.axes
    if (this.matches(picture, sound, boxes, pieces, doubt, found.bought)) return
    this.solutions = this.solutions.filter((s) => !noWorse(found, s))
    this.solutions.push(found)
  }

  /** Some chain is at least as good on every axis: higher for picture and sound, lower for the rest. */
  matches(
    picture: number,
    sound: number,
    boxes: number,
    pieces: number,
    doubt: number,
    bought: number,
  ): boolean {
    for (const { axes, bought: paid } of this.solutions) {
      if (
        axes.picture >= picture &&
        axes.sound >= sound &&
        axes.boxes <= boxes &&
        axes.pieces <= pieces &&
        axes.doubt <= doubt &&
        paid <= bought
      )
        return true
    }
    return false
  }

  all(): readonly Finished[] {
    return this.solutions
  }
}

const noWorse = (a: Finished, b: Finished): boolean =>
  a.axes.picture >= b.axes.picture &&
  a.axes.sound >= b.axes.sound &&
  a.axes.boxes <= b.axes.boxes &&
  a.axes.pieces <= b.axes.pieces &&
  a.axes.doubt <= b.axes.doubt &&
  a.bought <= b.bought
