import type { FieldError, ProblemDocument } from '@coaxwain/contract'

/** Why a call did not give what it should. `offline` never reached the server. */
export type Failure =
  | { readonly kind: 'problem'; readonly problem: ProblemDocument }
  | { readonly kind: 'offline' }
  | { readonly kind: 'unreadable'; readonly status: number }

export const codeOf = (failure: Failure): string =>
  failure.kind === 'problem' ? failure.problem.code : failure.kind

export const isSignedOut = (failure: Failure): boolean => codeOf(failure) === 'sign-in-required'

export const fieldErrorsOf = (failure: Failure): readonly FieldError[] =>
  failure.kind === 'problem' ? failure.problem.errors : []
