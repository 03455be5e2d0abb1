import { z } from 'zod'
import { line } from './text'

interface ProblemKind {
  readonly status: number
  /** The same request may succeed later without being changed. */
  readonly retryable: boolean
}

const no = (status: number): ProblemKind => ({ status, retryable: false })
const later = (status: number): ProblemKind => ({ status, retryable: true })

/**
 * Every failure that the API tells of. The sentence for each is in the wording package, under
 * `problem.` and its code.
 */
export const PROBLEMS = {
  'invalid-request': no(400),
  'malformed-json': no(400),
  'too-deep': no(400),
  'sign-in-required': no(401),
  'sign-in-failed': no(401),
  forbidden: no(403),
  'other-site': no(403),
  'not-found': no(404),
  'method-not-allowed': no(405),
  'uid-taken': no(409),
  'model-in-use': no(409),
  'part-in-use': no(409),
  'key-reused': no(409),
  'place-in-use': no(409),
  'place-within-itself': no(409),
  'edited-meanwhile': later(409),
  'version-stale': no(412),
  'too-large': no(413),
  'wrong-content-type': no(415),
  'model-unsound': no(422),
  'unit-unsound': no(422),
  'question-unsound': no(422),
  'unknown-reference': no(422),
  'hookup-refused': no(422),
  'version-missing': no(428),
  'too-many-requests': later(429),
  'answer-refused': no(500),
  internal: no(500),
  busy: later(503),
  'database-unavailable': later(503),
} as const satisfies Record<string, ProblemKind>

export type ProblemCode = keyof typeof PROBLEMS

/**
 * What may be wrong with one field; sentences under `field.` and the code. Faults of a model
 * description come through with their own codes.
 */
export const FIELD_FAULTS = [
  'required',
  'unknown-field',
  'wrong-type',
  'too-long',
  'too-short',
  'too-small',
  'too-big',
  'too-many',
  'too-few',
  'not-in-list',
  'bad-format',
  'blank',
  'several-lines',
  'control-character',
  'given-twice',
  'several-of-both',
  'not-yours-to-change',
  'unknown-reference',
  'in-use',
  'clashes-with-fitting',
  'used-before',
  'quantity-of-device',
  'check-failed',
] as const

export type FieldFault = (typeof FIELD_FAULTS)[number]

const details = z.record(z.string(), z.union([z.string(), z.number()]))

export const fieldError = z.strictObject({
  /** Dotted, from the body; `query.` or `path.` goes before what came in the address. */
  path: z.string(),
  code: line(60),
  details,
  /** A sentence in the reader's language. */
  detail: z.string(),
})
export type FieldError = z.infer<typeof fieldError>

/** RFC 9457 problem details, with our own members. */
export const problemDocument = z.strictObject({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  detail: z.string(),
  code: line(60),
  details,
  requestId: z.string(),
  retryable: z.boolean(),
  errors: z.array(fieldError),
  /** With `version-stale`: what the thing looks like now. */
  current: z.unknown().optional(),
})
export type ProblemDocument = z.infer<typeof problemDocument>

export const PROBLEM_CONTENT_TYPE = 'application/problem+json'
