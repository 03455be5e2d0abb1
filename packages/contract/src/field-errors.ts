import type { z } from 'zod'
import type { FieldFault } from './problems'

type Issue = z.core.$ZodIssue

/** A fault without its sentence. */
export interface BareFieldError {
  readonly path: string
  readonly code: FieldFault
  readonly details: Readonly<Record<string, string | number>>
}

/** Whatever is sent comes back in part only. */
const SHOWN_OF_KEY = 60

export const shownKey = (key: PropertyKey): string => String(key).slice(0, SHOWN_OF_KEY)

/** The path of a field, dotted; no key in it is longer than a key of ours may be. */
export const fieldPath = (path: readonly PropertyKey[]): string => path.map(shownKey).join('.')

const SIZED = ['array', 'set', 'map']

function tooBig(issue: Extract<Issue, { code: 'too_big' }>): BareFieldError {
  const details = { limit: Number(issue.maximum) }
  const code =
    issue.origin === 'string' ? 'too-long' : SIZED.includes(issue.origin) ? 'too-many' : 'too-big'
  return { path: fieldPath(issue.path), code, details }
}

function tooSmall(issue: Extract<Issue, { code: 'too_small' }>): BareFieldError {
  const details = { limit: Number(issue.minimum) }
  const code =
    issue.origin === 'string' ? 'too-short' : SIZED.includes(issue.origin) ? 'too-few' : 'too-small'
  return { path: fieldPath(issue.path), code, details }
}

/** Of the readings of a union the one that got furthest is the one that was meant. */
function ofUnion(issue: Extract<Issue, { code: 'invalid_union' }>): BareFieldError[] {
  const readings = issue.errors.map((branch) =>
    branch.flatMap((inner) => toBare({ ...inner, path: [...issue.path, ...inner.path] })),
  )
  const depth = (errors: BareFieldError[]): number =>
    Math.max(0, ...errors.map((e) => e.path.split('.').length))
  const best = readings.sort((a, b) => depth(b) - depth(a))[0]
  if (best && depth(best) > issue.path.length) return best
  const tag = 'discriminator' in issue ? issue.discriminator : undefined
  const path = fieldPath(issue.path)
  const given = tag === undefined ? issue.input : (issue.input as Record<string, unknown>)[tag]
  return [{ path, code: given === undefined ? 'required' : 'bad-format', details: {} }]
}

const choices = (values: readonly unknown[]): string => {
  const some = values.slice(0, 12).map(String).join(', ')
  return values.length > 12 ? `${some} ...` : some
}

/** What our own rules say of themselves. */
function ofRule({ path, params }: Extract<Issue, { code: 'custom' }>): BareFieldError {
  const { code = 'bad-format', details = {} } = (params ?? {}) as Partial<BareFieldError>
  return { path: fieldPath(path), code, details }
}

const MISSING_WITHOUT_INPUT: readonly Issue['code'][] = ['invalid_type', 'invalid_value']

function toBare(issue: Issue): BareFieldError[] {
  const path = fieldPath(issue.path)
  if (issue.input === undefined && MISSING_WITHOUT_INPUT.includes(issue.code)) {
    return [{ path, code: 'required', details: {} }]
  }
  switch (issue.code) {
    case 'invalid_type':
      return [{ path, code: 'wrong-type', details: { wanted: issue.expected } }]
    case 'unrecognized_keys':
      return issue.keys.map((k) => ({
        path: fieldPath([...issue.path, k]),
        code: 'unknown-field',
        details: { name: shownKey(k) },
      }))
    case 'too_big':
      return [tooBig(issue)]
    case 'too_small':
      return [tooSmall(issue)]
    case 'invalid_value':
      return [{ path, code: 'not-in-list', details: { choices: choices(issue.values) } }]
    case 'invalid_union':
      return ofUnion(issue)
    case 'custom':
      return [ofRule(issue)]
    default:
      return [{ path, code: 'bad-format', details: {} }]
  }
}

/** Parse with `{ reportInput: true }`, or a missing field cannot be told from one of a wrong type. */
export const toFieldErrors = (error: z.ZodError): BareFieldError[] => error.issues.flatMap(toBare)
