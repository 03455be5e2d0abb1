import type { Hookup } from '@coaxwain/shelf'

export const MERITS = ['tested', 'picture', 'boxes'] as const
/** In which way a hookup is the best of an answer. */
export type Merit = (typeof MERITS)[number]

export interface Picked {
  /** Its place in the answer. */
  readonly index: number
  readonly merits: readonly Merit[]
}

/** What answers are compared by. */
export type Compared = Pick<Hookup, 'axes' | 'worksFully'>

/** Compares two answers; negative when the first is better. Answers come in the default order, which breaks ties. */
type Order = (a: Compared, b: Compared) => number

const fully: Order = (a, b) => Number(b.worksFully) - Number(a.worksFully)

const ORDERS: Readonly<Record<Merit, readonly Order[]>> = {
  tested: [fully, (a, b) => a.axes.doubt - b.axes.doubt],
  picture: [(a, b) => b.axes.picture - a.axes.picture, (a, b) => b.axes.sound - a.axes.sound],
  boxes: [fully, (a, b) => a.axes.boxes - b.axes.boxes, (a, b) => a.axes.pieces - b.axes.pieces],
}

function bestBy(hookups: readonly Compared[], merit: Merit): number {
  return hookups.reduce((best, hookup, i) => {
    const before = hookups[best]
    if (!before) return i
    const difference = ORDERS[merit].map((order) => order(hookup, before)).find((d) => d !== 0)
    return difference !== undefined && difference < 0 ? i : best
  }, 0)
}

/** Up to three answers for the first screen; one that is best in several ways stands once. */
export function pickAnswers(hookups: readonly Compared[]): Picked[] {
  if (hookups.length === 0) return []
  const picks: { index: number; merits: Merit[] }[] = []
  for (const merit of MERITS) {
    const index = bestBy(hookups, merit)
    const known = picks.find((p) => p.index === index)
    if (known) known.merits.push(merit)
    else picks.push({ index, merits: [merit] })
  }
  return picks
}
