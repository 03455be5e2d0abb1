import { LIMITS } from '@coaxwain/shelf'
import type { Answer, Hookup, Question, Snapshot } from '@coaxwain/shelf'
import { Shopping, type Parts } from './reasons/purchases'
import { buildHookup } from './result/build'
import { choose, withSound } from './result/rank'
import { Solver } from './search/solve'

export interface HookupSearch {
  /** Expands at most so many labels. */
  step(expansions: number): void
  readonly done: boolean
  /** Labels expanded so far. */
  readonly work: number
  /** The answer as far as it is known. */
  best(): Answer
}

export interface SearchOptions {
  /** Label expansions, for the shelf and for purchases apart. */
  readonly budget?: number | undefined
  /** Ordinary parts that may be bought where the shelf does not do it. */
  readonly parts?: Parts | undefined
}

/**
 * A search for hookups that its caller runs in slices, so that it can be watched and stopped.
 * Deterministic: no clock, no randomness; the budget counts label expansions.
 * Throws when the question names a unit that is not in the snapshot, or a lead.
 */
export function createSearch(
  snapshot: Snapshot,
  question: Question,
  options: SearchOptions = {},
): HookupSearch {
  const { budget = LIMITS.budget, parts } = options
  const solver = new Solver(snapshot, question, budget)
  let shopping: Shopping | null = null
  let hookups: readonly Hookup[] | null = null

  const built = (): readonly Hookup[] =>
    hookups ??
    solver
      .soFar()
      .map((solved) => buildHookup({ solved, frame: solver.frame, offAir: question.offAir }))

  const settle = (): void => {
    if (!solver.done || hookups) return
    hookups = built()
    if (parts && !hookups.some((h) => h.worksFully)) {
      shopping = new Shopping(snapshot, question, parts, budget)
    }
  }

  return {
    step(expansions) {
      if (shopping) shopping.step(expansions)
      else solver.step(expansions)
      settle()
    },
    get done() {
      return solver.done && (shopping === null || shopping.done)
    },
    get work() {
      return solver.work + (shopping?.work ?? 0)
    },
    best() {
      const { shown, more } = choose(withSound(built()), LIMITS.hookupsShown)
      const complete = solver.complete && (shopping?.complete ?? true)
      return {
        format: 1,
        verdict: shown.length > 0 ? 'yes' : 'none',
        complete: solver.done && (shopping?.done ?? true) && complete,
        work: solver.work + (shopping?.work ?? 0),
        hookups: shown,
        moreCount: more,
        obstacles: solver.done ? solver.obstacles() : [],
        purchases: shopping?.done ? shopping.purchases(shown[0] ?? null) : [],
      }
    },
  }
}

/** Runs a search to its end in one go. */
export function findHookups(
  snapshot: Snapshot,
  question: Question,
  options?: SearchOptions,
): Answer {
  const search = createSearch(snapshot, question, options)
  while (!search.done) search.step(1000)
  return search.best()
}
