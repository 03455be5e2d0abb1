import { formState, functionState, type Hookup, type TestState } from '@coaxwain/shelf'
import type { Lookup } from './lookup'
import { usedParts } from './used-parts'

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
