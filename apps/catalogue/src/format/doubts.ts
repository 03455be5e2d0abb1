import { formState, functionState, type Hookup, type TestState } from '@coaxwain/shelf'
import type { Lookup } from './lookup'
import { usedParts } from './used-parts'
import type { Speak } from './words'

export interface Doubts {
  readonly untested: number
  readonly intermittent: number
}

/** How much of what a hookup uses was never tried, or works only now and then. Each form and function counts once. */
export function doubtsOf(hookup: Hookup, lookup: Lookup): Doubts {
  const states = usedParts(hookup, lookup).flatMap((parts): TestState[] => {
    const unit = lookup.unit(parts.unit)
    if (!unit) return []
    return [
      ...parts.forms.map((f) => formState(unit, f.jack, f.port)),
      ...parts.functions.map((f) => functionState(unit, f)),
    ]
  })
  const count = (state: TestState): number => states.filter((s) => s === state).length
  return { untested: count('untested'), intermittent: count('intermittent') }
}

/** The worst doubt in words, with the state that stands for it. */
export function doubtWords(
  { untested, intermittent }: Doubts,
  say: Speak,
): { readonly state: TestState; readonly words: string } {
  if (intermittent > 0) {
    return { state: 'intermittent', words: say('answer.intermittent', { count: intermittent }) }
  }
  return untested > 0
    ? { state: 'untested', words: say('answer.untested', { count: untested }) }
    : { state: 'works', words: say('answer.all-tested') }
}
