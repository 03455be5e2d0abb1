import type { Key } from '@coaxwain/models'
import type { Hookup, Question } from './hookup'
import type { Uid } from './unit'

/** What one test is about: a form on a port, or a function. */
export type Signal = { readonly jack: Key; readonly port: Key } | { readonly function: Key }

export interface ProveQuestion {
  readonly format: 1
  readonly unit: Uid
  /** Only this one, whatever is noted of it; else everything that nobody has tried. */
  readonly signal?: Signal | undefined
  /** Units that must not be used. */
  readonly avoid: readonly Uid[]
}

/**
 * A chain that is a test: all of it is known to work, but for what it tries. What is seen is the verdict on
 * the one list, what is heard on the other.
 */
export interface Proof {
  /** What was asked of the source and the display that the chain runs between. */
  readonly question: Question
  readonly hookup: Hookup
  readonly seen: readonly Signal[]
  readonly heard: readonly Signal[]
  /** Nothing can be tried without something else: when it fails, one of several is to blame. */
  readonly several: boolean
}

export const PROOF_OBSTACLES = [
  'no-way-inside',
  'would-harm',
  'out-of-reach',
  'no-tried-source',
  'no-tried-display',
  'no-tried-lead',
  'nothing-arrives',
  'nothing-shows',
  'not-known-yet',
] as const
/** Why there is no chain: what is missing, or what stands in the way. */
export type ProofObstacle = (typeof PROOF_OBSTACLES)[number]

export interface ProveAnswer {
  readonly format: 1
  /** Nothing shorter has been left out; false when a budget ran out. */
  readonly complete: boolean
  readonly work: number
  /** In the order in which they are to be tried: each counts on what those before it have proved. */
  readonly proofs: readonly Proof[]
  readonly left: readonly { readonly signal: Signal; readonly code: ProofObstacle }[]
}

/** Equal for equal signals. */
export const nameOf = (signal: Signal): string =>
  'function' in signal ? `function ${signal.function}` : `form ${signal.jack} ${signal.port}`

/** Both sides of one sound are tried at once: added into one channel, the one would hide that the other is dead. */
export const triesBothSides = (heard: readonly Signal[]): boolean => {
  const jacks = heard.flatMap((s) => ('jack' in s ? [s.jack] : []))
  return new Set(jacks).size < jacks.length
}

/** Signals that only one plug-up can try, so that they are one thing: a form over all its ports, a function. */
export const thingOf = (signal: Signal): string =>
  'function' in signal ? `function ${signal.function}` : `form ${signal.jack}`
