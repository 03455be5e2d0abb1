import { findHookups } from '@coaxwain/matcher'
import type { Answer, Hookup } from '@coaxwain/shelf'
import { SOUND_RANK, TIER } from '@coaxwain/signal'
import fc from 'fast-check'
import { drawQuickly } from '../enumeration/shelves/recipes'
import type { Asked } from '../enumeration/shrink'
import { nameOf, noWorse, vectorOf } from '../enumeration/vectors'
import { Chance } from '../support/chance'
import { isLong } from '../support/long'

/** How often each law is tried. */
export const RUNS = isLong ? 1000 : 60

const SEED = 20_250

/** A shelf with its question, and chance left over to change something by. */
export interface Drawn extends Asked {
  readonly chance: Chance
}

/** Numbers of shelves. A smaller number is no simpler shelf, so nothing is gained by shrinking. */
const drawn = fc.noShrink(fc.integer({ min: 0, max: 2 ** 31 - 1 })).map((number): Drawn => {
  const chance = new Chance(number)
  const { snapshot, question } = drawQuickly(chance)
  return { snapshot, question, chance }
})

/** Tries a law on as many shelves as there is time for, the same in every run. */
export function holds(law: (drawn: Drawn) => void): void {
  fc.assert(fc.property(drawn, law), { numRuns: RUNS, seed: SEED, endOnFailure: true })
}

export const ask = ({ snapshot, question }: Asked): Answer => findHookups(snapshot, question)

/** The axes of an answer, in no order. */
export const axesOf = ({ hookups }: Answer): string[] =>
  hookups.map((h) => nameOf(vectorOf(h))).sort()

const isHeard = (h: Hookup): boolean => h.axes.sound >= SOUND_RANK.mono

/**
 * Hookups of which nothing in an answer is as good on every axis. Silent ones are not shown at all where
 * there is sound with a picture of their tier (what is best), so they are not missed there.
 */
export const unmatched = (hookups: readonly Hookup[], by: Answer): string[] =>
  hookups
    .filter((h) => !by.hookups.some((other) => noWorse(vectorOf(other), vectorOf(h))))
    .filter((h) => isHeard(h) || !by.hookups.some((other) => isHeard(other) && isOfTier(other, h)))
    .map((h) => nameOf(vectorOf(h)))

const isOfTier = (a: Hookup, b: Hookup): boolean =>
  TIER[a.picture.quality] === TIER[b.picture.quality]
