/** Read-only all the way down, so that two ways of writing one type can be compared. */
export type Frozen<T> = T extends object ? { readonly [K in keyof T]: Frozen<T[K]> } : T

/** `true` when either type can stand for the other; anything else is a compile error where it is used. */
export type Same<A, B> = [Frozen<A>] extends [Frozen<B>]
  ? [Frozen<B>] extends [Frozen<A>]
    ? true
    : { missingInFirst: B }
  : { missingInSecond: A }

export type Holds<T extends true> = T
