/** The same, with everything in it open to change. */
export type Loose<T> = { -readonly [K in keyof T]: Loose<T[K]> }

/** A copy that may be changed. */
export const loose = <T>(facts: T): Loose<T> => structuredClone(facts) as Loose<T>
