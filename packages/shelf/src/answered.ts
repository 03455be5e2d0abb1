import type { Answer, Hookup, Question } from './hookup'
import type { Snapshot } from './unit'

/** What was asked, what may be shown of the answer, and the shelf that it was worked out on. */
export interface Answered {
  readonly question: Question
  readonly answer: Answer
  readonly shelfVersion: number
  readonly catalogueVersion: number
}

/** Whether a hookup can be shown, judged on a shelf without knowing how it was found. */
export type Stands = (shelf: Snapshot, question: Question, hookup: Hookup) => boolean

export interface AnswerParts {
  readonly snapshot: Snapshot
  /** The shelf with everything on it that an answer may tell to buy; asked for only where it does. */
  readonly stocked: () => Snapshot
  readonly question: Question
  /** As the search left it. */
  readonly answer: Answer
}

/**
 * From what a search found to what is shown, wherever the search ran. What the check refuses is left out;
 * null when that is everything that was found, for then "none" would be untrue.
 */
export function answered(parts: AnswerParts, stands: Stands): Answered | null {
  const { snapshot, question, answer } = parts
  const hookups = answer.hookups.filter((h) => stands(snapshot, question, h))
  if (answer.hookups.length > 0 && hookups.length === 0) return null
  const stocked = answer.purchases.length > 0 ? parts.stocked() : snapshot
  const purchases = answer.purchases.filter((p) => stands(stocked, question, p.hookup))
  return {
    question,
    answer: { ...answer, hookups, purchases },
    shelfVersion: snapshot.shelfVersion,
    catalogueVersion: snapshot.catalogueVersion,
  }
}
