import type { Model } from '@coaxwain/models'
import type { Answer, Question, Snapshot, Unit } from '@coaxwain/shelf'
import { asked } from '@coaxwain/shelf/rig'
import { compileShelf, createSearch, type SearchOptions } from './create-search'

/** A shelf on which every model is known by the name of its unit. */
export const shelfOf = (
  models: Readonly<Record<string, Model>>,
  units: readonly Unit[],
): Snapshot => ({ shelfVersion: 1, catalogueVersion: 1, models, units })

/** More steps than any small shelf may take. */
const MOST_STEPS = 20_000

/** The answer, and in how many small steps it came; throws when it does not come to an end. */
export function searched(
  snapshot: Snapshot,
  question: Question = asked(),
  options?: SearchOptions,
): { readonly answer: Answer; readonly steps: number } {
  const search = createSearch(compileShelf(snapshot), question, options)
  let steps = 0
  for (; !search.done && steps < MOST_STEPS; steps++) search.step(1)
  if (!search.done) throw new Error(`no end after ${MOST_STEPS} steps`)
  return { answer: search.best(), steps }
}

/** Units on the picture's way from the source to the display, best hookup first. */
export const ways = ({ hookups }: Answer): string[] =>
  hookups.map(({ legs }) => legs[0]!.stops.map((s) => s.unit).join(' > '))
