import { err, ok, problem, type Problem, type Result } from '@coaxwain/result'

export const QUANTITY_PROBLEMS = [
  'not-positive',
  'negative',
  'too-few',
  'wrong-order',
  'out-of-range',
] as const

export type QuantityProblemCode = (typeof QUANTITY_PROBLEMS)[number]

/** Which value of a calculation cannot be. */
export type QuantityProblem = Problem<
  QuantityProblemCode,
  { readonly what: string; readonly value: number }
>

export const impossible = (
  code: QuantityProblemCode,
  what: string,
  value: number,
): Result<never, QuantityProblem> => err(problem(code, { what, value }))

type Named = Readonly<Record<string, number>>

const firstNot = (values: Named, holds: (value: number) => boolean): [string, number] | undefined =>
  Object.entries(values).find(([, value]) => !holds(value))

/** Computes only when every named value lies above zero; otherwise names the first that does not. */
export function whenPositive<T>(values: Named, compute: () => T): Result<T, QuantityProblem> {
  const bad = firstNot(values, (v) => v > 0)
  return bad ? impossible('not-positive', ...bad) : ok(compute())
}

/** Computes only when no named value lies below zero. */
export function whenNotNegative<T>(values: Named, compute: () => T): Result<T, QuantityProblem> {
  const bad = firstNot(values, (v) => v >= 0)
  return bad ? impossible('negative', ...bad) : ok(compute())
}

/** Computes only when there are at least so many. */
export const whenAtLeast = <T>(
  least: number,
  what: string,
  count: number,
  compute: () => T,
): Result<T, QuantityProblem> =>
  count >= least ? ok(compute()) : impossible('too-few', what, count)
