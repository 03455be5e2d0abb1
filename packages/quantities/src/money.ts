import { err, ok, problem, type Problem, type Result } from '@coaxwain/result'

/** An amount in the smallest coin of its currency (cents, pence, yen). */
export interface Money {
  readonly minor: number
  /** ISO 4217 letters. */
  readonly currency: string
}

export type MoneyProblem = Problem<'money-currencies-differ', { left: string; right: string }>

/** Sum of two amounts of one currency. */
export const addMoney = (a: Money, b: Money): Result<Money, MoneyProblem> =>
  a.currency === b.currency
    ? ok({ minor: a.minor + b.minor, currency: a.currency })
    : err(problem('money-currencies-differ', { left: a.currency, right: b.currency }))
