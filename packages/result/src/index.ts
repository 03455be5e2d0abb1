/** An expected "no": a code from a closed list, with details that a sentence can be made from. */
export interface Problem<Code extends string = string, Details extends object = object> {
  readonly code: Code
  readonly details: Details
}

export interface Ok<T> {
  readonly ok: true
  readonly value: T
}

export interface Err<P> {
  readonly ok: false
  readonly problem: P
}

/** Either a value or the reason why there is none. Domain functions return this instead of throwing. */
export type Result<T, P = Problem> = Ok<T> | Err<P>

export const ok = <T>(value: T): Ok<T> => ({ ok: true, value })

export const err = <P>(problem: P): Err<P> => ({ ok: false, problem })

export const problem = <Code extends string, Details extends object>(
  code: Code,
  details: Details,
): Problem<Code, Details> => ({ code, details })

/** Throws when a promise between programmers is broken; never for what a user may have typed. */
export function invariant(condition: unknown, message: string): asserts condition {
  if (!condition) throw new Error(message)
}
