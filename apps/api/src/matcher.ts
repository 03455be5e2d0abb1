import { setImmediate as nextTurn } from 'node:timers/promises'
import {
  compileShelf,
  compileTried,
  createArrangementSearch,
  createProveSearch,
  createSearch,
  withParts,
  type CompiledShelf,
} from '@coaxwain/matcher'
import { ORDINARY_PARTS } from '@coaxwain/patterns'
import type { Snapshot } from '@coaxwain/shelf'
import type { Matcher, Stocker } from './answers/service'
import type { Arranger } from './arrangements/service'
import type { Prover } from './proofs/service'

/** Other requests get their turn in between. */
const SLICE_MS = 20
const STEPS_AT_ONCE = 10
/** After that the best so far is the answer, and says that it is not complete. */
const PATIENCE_MS = 5000

/** Several chains use theirs up far more often, so it leaves more of what a request may take to the rest. */
const PATIENCE_OF_SEVERAL_MS = 4000

/** As long as a snapshot is kept, so is what has been worked out for it. */
function keptPerSnapshot(compile: (snapshot: Snapshot) => CompiledShelf) {
  const compiled = new WeakMap<Snapshot, CompiledShelf>()
  return (snapshot: Snapshot): CompiledShelf => {
    const shelf = compiled.get(snapshot) ?? compile(snapshot)
    compiled.set(snapshot, shelf)
    return shelf
  }
}

const shelfOf = keptPerSnapshot(compileShelf)
const triedOf = keptPerSnapshot(compileTried)

export const withOrdinaryParts: Stocker = (snapshot) => withParts(snapshot, ORDINARY_PARTS)

interface Steps {
  step(steps: number): void
  readonly done: boolean
}

async function goOn(search: Steps, stepsAtOnce: number, patienceMs: number): Promise<void> {
  const start = performance.now()
  while (!search.done && performance.now() - start < patienceMs) {
    const slice = performance.now()
    while (!search.done && performance.now() - slice < SLICE_MS) search.step(stepsAtOnce)
    await nextTurn()
  }
}

export const findHookups: Matcher = async (snapshot, question) => {
  const search = createSearch(shelfOf(snapshot), question, { parts: ORDINARY_PARTS })
  await goOn(search, STEPS_AT_ONCE, PATIENCE_MS)
  return search.best()
}

/** A step of this one may set a chain beside many others, so the clock is read after each. */
export const findArrangements: Arranger = async (snapshot, question) => {
  const search = createArrangementSearch(shelfOf(snapshot), question)
  await goOn(search, 1, PATIENCE_OF_SEVERAL_MS)
  return search.best()
}

export const findProofs: Prover = async (snapshot, question) => {
  const search = createProveSearch(triedOf(snapshot), question)
  await goOn(search, 1, PATIENCE_OF_SEVERAL_MS)
  return search.best()
}
