import { LIMITS } from '@coaxwain/shelf'
import type { Answer, Question, Snapshot } from '@coaxwain/shelf'
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

/**
 * A search for hookups that its caller runs in slices, so that it can be watched and stopped.
 * Deterministic: no clock, no randomness; the budget counts label expansions.
 * Throws when the question names a unit that is not in the snapshot, or a lead.
 */
export function createSearch(
  snapshot: Snapshot,
  question: Question,
  budget: number = LIMITS.budget,
): HookupSearch {
  const solver = new Solver(snapshot, question, budget)
  return {
    step: (expansions) => solver.step(expansions),
    get done() {
      return solver.done
    },
    get work() {
      return solver.work
    },
    best: () => answerOf(solver, question),
  }
}

function answerOf(solver: Solver, question: Question): Answer {
  const hookups = solver
    .soFar()
    .map((solved) => buildHookup({ solved, frame: solver.frame, offAir: question.offAir }))
  const { shown, more } = choose(withSound(hookups), LIMITS.hookupsShown)
  return {
    format: 1,
    verdict: shown.length > 0 ? 'yes' : 'none',
    complete: solver.done && solver.complete,
    work: solver.work,
    hookups: shown,
    moreCount: more,
    obstacles: solver.done ? solver.obstacles() : [],
    purchases: [],
  }
}

/** Runs a search to its end in one go. */
export function findHookups(snapshot: Snapshot, question: Question, budget?: number): Answer {
  const search = createSearch(snapshot, question, budget)
  while (!search.done) search.step(1000)
  return search.best()
}
