import { setImmediate as nextTurn } from 'node:timers/promises'
import { compileShelf, createSearch, withParts, type CompiledShelf } from '@coaxwain/matcher'
import { ORDINARY_PARTS } from '@coaxwain/patterns'
import type { Snapshot } from '@coaxwain/shelf'
import type { Matcher, Stocker } from './answers/service'

/** Other requests get their turn in between. */
const SLICE_MS = 20
const STEPS_AT_ONCE = 10
/** After that the best so far is the answer, and says that it is not complete. */
const PATIENCE_MS = 5000

/** As long as a snapshot is kept, so is what has been worked out for it. */
const compiled = new WeakMap<Snapshot, CompiledShelf>()

function shelfOf(snapshot: Snapshot): CompiledShelf {
  const shelf = compiled.get(snapshot) ?? compileShelf(snapshot)
  compiled.set(snapshot, shelf)
  return shelf
}

export const withOrdinaryParts: Stocker = (snapshot) => withParts(snapshot, ORDINARY_PARTS)

export const findHookups: Matcher = async (snapshot, question) => {
  const start = performance.now()
  const search = createSearch(shelfOf(snapshot), question, { parts: ORDINARY_PARTS })
  while (!search.done && performance.now() - start < PATIENCE_MS) {
    const slice = performance.now()
    while (!search.done && performance.now() - slice < SLICE_MS) search.step(STEPS_AT_ONCE)
    await nextTurn()
  }
  return search.best()
}
