/** Read-only all the way down, so that two ways of writing one type can be compared. */
export type Frozen<T> = T extends object ? { readonly [K in keyof T]: Frozen<T[K]> } : T

/** The same with nothing left optional: assignment alone does not miss an optional field. */
type Whole<T> = T extends object ? { readonly [K in keyof T]-?: Whole<T[K]> } : T

type Fits<A, B> = [A] extends [B] ? true : false

type Alike<A, B> = Fits<A, B> extends true ? Fits<B, A> : false

/** `true` when either type can stand for the other and both have the same fields; else a compile error where it is used. */
export type Same<A, B> =
  Alike<Frozen<A>, Frozen<B>> extends true
    ? Alike<Whole<A>, Whole<B>> extends true
      ? true
      : { fieldsDiffer: [A, B] }
    : { typesDiffer: [A, B] }

export type Holds<T extends true> = T
