import { LIMITS } from '@coaxwain/shelf'
import type { Answer, Hookup, Question, Snapshot } from '@coaxwain/shelf'
import { CompiledShelf } from './compile/shelf'
import { Shopping, type Parts } from './reasons/purchases'
import { buildHookup } from './result/build'
import { choose, withSound } from './result/rank'
import { Solver } from './search/solve'
import type { Stepwise } from './stepwise'

export type HookupSearch = Stepwise<Answer>

export interface SearchOptions {
  /** Label expansions, for the shelf and, unless that is more than they may have, for purchases apart. */
  readonly budget?: number | undefined
  /** Ordinary parts that may be bought where the shelf does not do it. */
  readonly parts?: Parts | undefined
}

const shownOf = (hookups: readonly Hookup[]) => choose(withSound(hookups), LIMITS.hookupsShown)

/** Makes a shelf ready for any number of questions; what is worked out for one serves the next. */
export const compileShelf = (snapshot: Snapshot): CompiledShelf => new CompiledShelf(snapshot)

/**
 * A search for hookups that its caller runs in slices, so that it can be watched and stopped.
 * Deterministic: no clock, no randomness; the budget counts label expansions.
 * Throws when the question names a unit that is not in the snapshot, or a lead.
 */
export function createSearch(
  shelf: CompiledShelf,
  question: Question,
  options: SearchOptions = {},
): HookupSearch {
  const { budget = LIMITS.budget, parts } = options
  const solver = new Solver(shelf, question, budget)
  let shopping: Shopping | null = null
  let hookups: readonly Hookup[] | null = null

  const built = (): readonly Hookup[] =>
    hookups ??
    solver
      .soFar()
      .map((solved) => buildHookup({ ...solved, frame: solver.frame, offAir: question.offAir }))

  const settle = (): void => {
    if (!solver.done || hookups) return
    hookups = built()
    if (parts && !hookups.some((h) => h.worksFully)) {
      const now = shownOf(hookups).shown[0] ?? null
      shopping = new Shopping(shelf, question, now, {
        parts,
        budget: Math.min(budget, LIMITS.budgetOfPurchases),
      })
    }
  }

  const done = (): boolean => solver.done && (shopping === null || shopping.done)
  const work = (): number => solver.work + (shopping?.work ?? 0)
  const complete = (): boolean => done() && solver.complete && (shopping?.complete ?? true)

  return {
    step(steps) {
      if (shopping) shopping.step(steps)
      else solver.step(steps)
      settle()
    },
    get done() {
      return done()
    },
    get work() {
      return work()
    },
    best() {
      const { shown, more } = shownOf(built())
      return {
        format: 1,
        verdict: shown.length > 0 ? 'yes' : 'none',
        complete: complete(),
        work: work(),
        hookups: shown,
        moreCount: more,
        obstacles: solver.obstacles(),
        purchases: shopping?.done ? shopping.purchases() : [],
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
  const search = createSearch(compileShelf(snapshot), question, options)
  while (!search.done) search.step(1000)
  return search.best()
}
