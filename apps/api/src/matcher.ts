import { setImmediate as nextTurn } from 'node:timers/promises'
import { createSearch } from '@coaxwain/matcher'
import { ORDINARY_PARTS } from '@coaxwain/patterns'
import type { Matcher } from './answers/service'

/** Other requests get their turn in between. */
const SLICE_MS = 40
const EXPANSIONS_AT_ONCE = 100
/** After that the best so far is the answer, and says that it is not complete. */
const PATIENCE_MS = 2000

export const findHookups: Matcher = async (snapshot, question) => {
  const start = performance.now()
  const search = createSearch(snapshot, question, { parts: ORDINARY_PARTS })
  while (!search.done && performance.now() - start < PATIENCE_MS) {
    const slice = performance.now()
    while (!search.done && performance.now() - slice < SLICE_MS) search.step(EXPANSIONS_AT_ONCE)
    await nextTurn()
  }
  return search.best()
}
