import type { BareFieldError, ProblemCode } from '@coaxwain/contract'

type Details = Readonly<Record<string, string | number>>

/** A field error whose code may also come from the check of a model. */
export type FieldTrouble = Omit<BareFieldError, 'code'> & { readonly code: string }

interface More {
  readonly details?: Details
  readonly errors?: readonly FieldTrouble[]
  /** What the thing looks like now, for an edit that came too late. */
  readonly current?: unknown
  readonly retryAfterSeconds?: number
  /** Methods that the address knows, for one that it does not. */
  readonly allow?: string
  readonly cause?: unknown
}

/** The one kind of failure that reaches a client with its code. */
export class AppError extends Error {
  readonly details: Details
  readonly errors: readonly FieldTrouble[]
  readonly current: unknown
  readonly retryAfterSeconds: number | null
  readonly allow: string | null

  constructor(
    readonly code: ProblemCode,
    more: More = {},
  ) {
    super(code, { cause: more.cause })
    this.name = 'AppError'
    this.details = more.details ?? {}
    this.errors = more.errors ?? []
    this.current = more.current
    this.retryAfterSeconds = more.retryAfterSeconds ?? null
    this.allow = more.allow ?? null
  }
}

export const notFound = (): AppError => new AppError('not-found')

/** One field that names something that is not there, or not within reach. */
export const unknownReference = (path: string): AppError =>
  new AppError('unknown-reference', { errors: [{ path, code: 'unknown-reference', details: {} }] })
