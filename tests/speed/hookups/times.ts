/** What many runs took, in milliseconds. */
export interface Times {
  readonly count: number
  readonly medianMs: number
  readonly p99Ms: number
  readonly totalMs: number
}

const rounded = (value: number): number => Math.round(value * 1000) / 1000

export function timesOf(runs: readonly number[]): Times {
  const sorted = [...runs].sort((a, b) => a - b)
  const at = (share: number): number => sorted[Math.floor((sorted.length - 1) * share)] ?? 0
  return {
    count: runs.length,
    medianMs: rounded(at(0.5)),
    p99Ms: rounded(at(0.99)),
    totalMs: rounded(runs.reduce((a, b) => a + b, 0)),
  }
}

export function timed<T>(work: () => T): { readonly value: T; readonly ms: number } {
  const start = performance.now()
  const value = work()
  return { value, ms: performance.now() - start }
}

/** How many times longer the second took, by their totals. */
export const ratio = (ours: readonly number[], theirs: readonly number[]): number =>
  rounded(theirs.reduce((a, b) => a + b, 0) / ours.reduce((a, b) => a + b, 0))
