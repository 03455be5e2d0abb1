/** A closed interval; low is never above high. */
export interface Range<Q extends number = number> {
  readonly low: Q
  readonly high: Q
}

/** Throws when the ends are the wrong way round. */
export function range<Q extends number>(low: Q, high: Q): Range<Q> {
  if (low > high) throw new Error(`a range cannot run from ${low} to ${high}`)
  return { low, high }
}

export const contains = (r: Range, value: number): boolean => value >= r.low && value <= r.high

export const overlaps = (a: Range, b: Range): boolean => a.low <= b.high && b.low <= a.high

/** The part that two ranges share, or null. */
export function intersect<Q extends number>(a: Range<Q>, b: Range<Q>): Range<Q> | null {
  const low = a.low > b.low ? a.low : b.low
  const high = a.high < b.high ? a.high : b.high
  return low <= high ? { low, high } : null
}
