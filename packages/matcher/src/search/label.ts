import type { Condition } from '@coaxwain/models'
import type { Axes, SeenPicture } from '@coaxwain/shelf'
import type { Sound } from '@coaxwain/signal'
import type { Sig } from '../compile/sig'
import type { Taken } from '../compile/accept'
import type { Way } from '../compile/way'
import type { Join } from '../join/join'
import type { AerialUse } from './aerial'

/** Sound on its own wires: from where it waits to where it is taken, perhaps through one box. */
export interface SoundRoute {
  readonly joins: readonly Join[]
  readonly via: Way | null
  readonly sound: Sound
  readonly boxes: number
  readonly pieces: number
  readonly doubt: number
  readonly bought: number
}

/** Where the sound is that does not ride in the picture signal. */
export type SoundState =
  | { readonly kind: 'none' }
  /** On the sound outputs of a unit of the chain, under that unit's positions. */
  | { readonly kind: 'waits'; readonly sound: Sound; readonly at: Label }

export interface Cost {
  readonly boxes: number
  readonly pieces: number
  readonly doubt: number
  /** Boxes and pieces that are not there and would have to be bought. */
  readonly bought: number
}

/** A chain so far: the last unit, what leaves it, where the sound is, and what it cost. */
export interface Label extends Cost {
  readonly way: Way
  readonly sig: Sig
  readonly stand: Condition
  readonly sound: SoundState
  /** Where an aerial has joined; null while none has. */
  readonly aerial: AerialUse | null
  readonly depth: number
  readonly prev: Label | null
  readonly step: Step | null
}

/** How a unit was reached from the one before. */
export interface Step {
  readonly join: Join
  readonly taken: Taken
  readonly soundRoute: SoundRoute | null
  /** Sound that came in by this step, by whatever way. */
  readonly soundIn: Sound
}

/** Loudspeakers outside the display, and how the waiting sound gets there. */
export interface SpeakersUse {
  readonly route: SoundRoute
  readonly way: Way
}

/** A chain that has reached the display. */
export interface Finished {
  readonly last: Label
  readonly end: Way
  readonly step: Step
  readonly stand: Condition
  readonly speakers: SpeakersUse | null
  readonly aerial: AerialUse | null
  readonly picture: SeenPicture
  readonly sound: Sound
  readonly axes: Axes
  readonly bought: number
}

export const pathOf = (label: Label): Label[] => {
  const path: Label[] = []
  for (let at: Label | null = label; at; at = at.prev) path.unshift(at)
  return path
}

export const noWorseCost = (a: Cost, b: Cost): boolean =>
  a.boxes <= b.boxes && a.pieces <= b.pieces && a.doubt <= b.doubt && a.bought <= b.bought
