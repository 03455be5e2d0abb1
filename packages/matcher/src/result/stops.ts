import type { OffAir } from '@coaxwain/shelf'
import type { Sig } from '../compile/signal'
import type { Frame, Solved } from '../search/solve'
import type { Placing } from './settings'

export interface BuildInput {
  readonly solved: Solved
  readonly frame: Frame
  readonly offAir: readonly OffAir[]
}

/** One unit of the picture's path, first to last. */
export interface PathStop extends Placing {
  /** What leaves it; at the display, what arrives. */
  readonly sig: Sig
}
