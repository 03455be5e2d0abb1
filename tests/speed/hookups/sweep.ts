import { DISPLAY, START, type ArcMap } from '@coaxwain/matcher'

/** Arcs as two lists of numbers, ready to be swept over: those of node n stand from first[n] up to first[n + 1]. */
export interface SweepMap {
  readonly first: Uint32Array
  readonly to: Uint32Array
}

export function sweepMapOf({ nodes, arcs }: ArcMap): SweepMap {
  const first = new Uint32Array(nodes + 1)
  for (const { from } of arcs) first[from + 1]!++
  for (let n = 0; n < nodes; n++) first[n + 1]! += first[n]!
  const next = first.slice()
  const to = new Uint32Array(arcs.length)
  for (const arc of arcs) to[next[arc.from]!++] = arc.to
  return { first, to }
}

/** Whether the display can be reached at all: the least that any search has to do. */
export function canReach({ first, to }: SweepMap): boolean {
  const seen = new Uint8Array(first.length)
  const stack = [START]
  seen[START] = 1
  for (let node = stack.pop(); node !== undefined; node = stack.pop()) {
    for (let i = first[node]!; i < first[node + 1]!; i++) {
      const next = to[i]!
      if (seen[next] === 1) continue
      seen[next] = 1
      stack.push(next)
    }
  }
  return seen[DISPLAY] === 1
}
