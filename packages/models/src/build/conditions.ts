import type { Condition, Key } from '../model'

/** The control stands at one of these positions. */
export const at = (control: Key, ...positions: string[]): Condition => [{ control, in: positions }]

/** Every one of several conditions. */
export const every = (...conditions: readonly Condition[]): Condition => conditions.flat()
