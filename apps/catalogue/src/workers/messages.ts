import type { WhenWrong } from '@coaxwain/checker'
import type { Parts } from '@coaxwain/matcher'
import type { Answered, Hookup, Question, Snapshot } from '@coaxwain/shelf'

/** What is held beside the page: a shelf, and what can be bought for it. */
export interface Held {
  readonly snapshot: Snapshot
  readonly parts: Parts
}

export interface Asked {
  readonly id: number
  readonly question: Question
  /** After that the best so far will do; may be endless. */
  readonly patienceMs: number
}

export interface AskedWhenWrong {
  readonly id: number
  readonly question: Question
  readonly hookup: Hookup
}

/** What the worker is told. The shelf goes once; every question after it is about the shelf sent last. */
export type ToEngine =
  | ({ readonly kind: 'shelf' } & Held)
  | ({ readonly kind: 'ask' } & Asked)
  | ({ readonly kind: 'when-wrong' } & AskedWhenWrong)
  | { readonly kind: 'cancel'; readonly id: number }

/** How a piece of work ends; `refused`: the check lets nothing stand of what was found. */
export type Outcome =
  | { readonly kind: 'answer'; readonly id: number; readonly reply: Answered }
  | { readonly kind: 'wrongs'; readonly id: number; readonly wrongs: readonly WhenWrong[] }
  | { readonly kind: 'refused'; readonly id: number }

/** What the worker says; `work` counts the small steps of a search. */
export type FromEngine =
  Outcome | { readonly kind: 'progress'; readonly id: number; readonly work: number }
