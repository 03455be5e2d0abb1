import type { Caution } from '@coaxwain/shelf'
import { CARRIERS, eitherPlan } from './carriers'
import { POSITIONS } from './positions'
import { QUALITY } from './quality'
import type { CautionInput } from './rule'
import { SAFETY } from './safety'
import { SOCKETS } from './sockets'
import { SWITCHES } from './switches'

/** Danger first, then what is lost, then what decides. */
const RULES = [...SAFETY, ...SOCKETS, ...QUALITY, ...POSITIONS, ...CARRIERS, ...SWITCHES]

/** Said of every modulator. */
const ALWAYS = 'never-to-aerial'

/** Everything about a hookup that a person must know before the first step. */
export function cautionsOf(c: CautionInput): Caution[] {
  const seen = new Set<string>()
  const all = RULES.flatMap((rule) => rule(c)).filter((found) => {
    const key = JSON.stringify(found)
    return !seen.has(key) && seen.add(key)
  })
  return all.every((found) => found.code === ALWAYS) ? [...all, ...eitherPlan(c)] : all
}
