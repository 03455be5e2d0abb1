import {
  PROBLEM_CONTENT_TYPE,
  PROBLEMS,
  type FieldError,
  type ProblemDocument,
} from '@coaxwain/contract'
import { sentence, type Locale } from '@coaxwain/wording'
import { AppError, type FieldTrouble } from '../app-error'
import { translateDbError } from '../db/translate-db-error'

const MOST_FIELD_ERRORS = 50

interface HttpFault {
  readonly type?: string
  readonly status?: number
}

/** Faults found by the body parser, by the router, and by what sends files. */
function translateHttpFault(error: unknown): unknown {
  const { type, status } = error as HttpFault
  switch (type) {
    case 'entity.parse.failed':
      return new AppError('malformed-json')
    case 'entity.too.large':
      return new AppError('too-large', { details: { limit: '100 kB' } })
    case 'encoding.unsupported':
    case 'charset.unsupported':
      return new AppError('wrong-content-type')
    case 'request.aborted':
    case 'request.size.invalid':
    case 'entity.verify.failed':
      return new AppError('invalid-request')
    default:
      return status !== undefined && status >= 400 && status < 500
        ? new AppError(status === 404 ? 'not-found' : 'invalid-request', { cause: error })
        : error
  }
}

/** Every failure as one of ours; what is unknown becomes `internal`, and keeps its cause for the log. */
export function toAppError(error: unknown): AppError {
  const known = translateHttpFault(translateDbError(error))
  return known instanceof AppError ? known : new AppError('internal', { cause: known })
}

const toFieldError = (trouble: FieldTrouble, locale: Locale): FieldError => ({
  path: trouble.path,
  code: trouble.code,
  details: { ...trouble.details },
  detail: sentence(`field.${trouble.code}`, trouble.details, locale),
})

export const STATUS_TITLES: Readonly<Record<number, string>> = {
  400: 'Bad Request',
  401: 'Unauthorized',
  403: 'Forbidden',
  404: 'Not Found',
  405: 'Method Not Allowed',
  409: 'Conflict',
  412: 'Precondition Failed',
  413: 'Content Too Large',
  415: 'Unsupported Media Type',
  422: 'Unprocessable Content',
  428: 'Precondition Required',
  429: 'Too Many Requests',
  500: 'Internal Server Error',
  503: 'Service Unavailable',
}

export function toProblem(error: AppError, requestId: string, locale: Locale): ProblemDocument {
  const { status, retryable } = PROBLEMS[error.code]
  return {
    type: `urn:coaxwain:problem:${error.code}`,
    title: STATUS_TITLES[status] ?? 'Error',
    status,
    detail: sentence(`problem.${error.code}`, error.details, locale),
    code: error.code,
    details: { ...error.details },
    requestId,
    retryable,
    errors: error.errors.slice(0, MOST_FIELD_ERRORS).map((e) => toFieldError(e, locale)),
    ...(error.current === undefined ? {} : { current: error.current }),
  }
}

export { PROBLEM_CONTENT_TYPE }
