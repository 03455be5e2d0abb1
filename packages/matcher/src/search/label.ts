import type { Condition, Key, ModelFunction } from '@coaxwain/models'
import type { Axes, SeenPicture } from '@coaxwain/shelf'
import type { Sound } from '@coaxwain/signal'
import type { Sig } from '../compile/signal'
import type { Taken } from '../compile/accept'
import type { Placed } from '../compile/face'
import type { Variant } from '../compile/variant'
import type { Way } from '../compile/way'
import type { Join } from '../join/join'

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

/** Sound on the sound outputs of a unit of the chain, under that unit's positions. */
export interface Waiting {
  readonly kind: 'waits'
  readonly sound: Sound
  readonly at: Label
}

/** Where the sound is that does not ride in the picture signal. */
export type SoundState = { readonly kind: 'none' } | Waiting

export interface Cost {
  readonly boxes: number
  readonly pieces: number
  readonly doubt: number
  /** Boxes and pieces that are not there and would have to be bought. */
  readonly bought: number
}

/** How a signal gets from an aerial to the place where it joins a chain. */
export interface AerialRoute extends Cost {
  /** The aerial, then boxes that pass it on. */
  readonly ways: readonly Way[]
  readonly joins: readonly Join[]
  /** Isolation backwards through the boxes in dB; what nobody knows counts as none. */
  readonly reverseDb: number
  /** Somewhere on the way nobody knows it. */
  readonly reverseUnknown: boolean
}

/** The aerial as part of a chain: where it joins, and by what. */
export interface AerialUse extends Cost {
  readonly route: AerialRoute
  /** The way of the unit where it joins, with all that the aerial leans on there. */
  readonly at: Way
  readonly variant: Variant
  readonly fn: ModelFunction
  readonly in: Key
  readonly into: Placed
  readonly stand: Condition
  /** On the lead together with the modulated carrier, and not switched. */
  readonly together: boolean
  /** What reaches the aerial terminal at most, in dBmV; null where it might be too much and nobody knows. */
  readonly radiatesDbmv: number | null
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
  /** Terminators that end the lines, by sort. */
  readonly terminators: readonly number[]
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

/** The step by which the picture has left a unit of a chain, and the way it goes into; null while it is there. */
export function leftBy(at: Label, chain: Label): { readonly join: Join; readonly way: Way } | null {
  for (let l = chain; l.prev && l.step; l = l.prev)
    if (l.prev === at) return { join: l.step.join, way: l.way }
  return null
}

/** The ways of every unit that a chain has taken from the shelf, but for those of sound alone. */
export function waysUsed(label: Label): Way[] {
  const ways: Way[] = []
  for (let at = label; at.prev; at = at.prev) ways.push(at.way)
  return [...ways, ...(label.aerial?.route.ways ?? [])]
}

export const plus = (a: Cost, b: Cost): Cost => ({
  boxes: a.boxes + b.boxes,
  pieces: a.pieces + b.pieces,
  doubt: a.doubt + b.doubt,
  bought: a.bought + b.bought,
})

export const noWorseCost = (a: Cost, b: Cost): boolean =>
  a.boxes <= b.boxes && a.pieces <= b.pieces && a.doubt <= b.doubt && a.bought <= b.bought
