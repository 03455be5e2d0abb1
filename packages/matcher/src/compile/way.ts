import type { Condition, Give, Key, ModelFunction, Port } from '@coaxwain/models'
import type { Unit } from '@coaxwain/shelf'
import type { Circuit } from '@coaxwain/signal'
import type { Placed } from './face'
import type { Leans, Variant } from './variant'

/** A sound jack, or a part of one: both channels, one of them, or the mono wire. */
export interface SoundEnd {
  readonly jack: Key
  readonly circuits: readonly Circuit[]
}

/** Where sound comes from and goes to inside a unit: inside the picture signal, by a jack, or not at all. */
export type SoundPlace = 'picture' | SoundEnd | null

export const soundEnd = (place: SoundPlace): SoundEnd | null =>
  place !== null && place !== 'picture' ? place : null

/** What a way does, before it is known which units offer it. */
export interface Draft {
  readonly fn: ModelFunction
  readonly in: Key | null
  readonly out: Give | null
  readonly soundFrom: SoundPlace
  readonly soundTo: SoundPlace
  /** Sound added up to one channel inside, whatever comes in. */
  readonly soundMono: boolean
  readonly functions: readonly Key[]
  readonly stand: Condition
}

/** One way through a unit: a picture in and out, and what it does with the sound meanwhile. */
export interface Way extends Draft {
  readonly id: number
  /** The same for ways whose inputs take the same signals in the same way. */
  readonly takeId: number
  /** The same for ways whose outputs make the same of what was taken. */
  readonly leaveId: number
  readonly variant: Variant
  /** The part of its positions that ends the line, or lets it go on. */
  readonly lineStand: Condition
  /** Loop sockets that want a terminator, so that the line ends. */
  readonly terminate: readonly Key[]
  /** Nothing at this input ends the line. */
  readonly openEnded: boolean
  /** What a unit must be able to do for it. */
  readonly leans: Leans
  readonly into: Placed | null
  readonly from: Placed | null
  /** The socket by which this way would harm somebody. */
  readonly harm: Port | null
  /** The socket that is recorded as dead, so that no unit offers this way. */
  readonly dead: Port | null
  /** Least doubt first; units in which something needed is dead are left out. */
  readonly offers: readonly Offer[]
}

export interface Offer {
  readonly unit: Unit
  readonly doubt: number
}

/** May be part of an answer: harms nobody, and some unit offers it. */
export const isUsable = (way: Way): boolean => way.harm === null && way.dead === null

/** The least doubt that a unit brings by this way. */
export const leastDoubt = (way: Way): number => way.offers[0]?.doubt ?? 0

/** Sound shares a socket with the picture, so that one plug takes both or none. */
export const sharesSocket = (placed: Placed | null): boolean =>
  placed?.face.sound.some((s) => placed.face.picture.some((p) => p.port === s.port)) === true
