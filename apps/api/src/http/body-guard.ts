import { fieldPath, shownKey } from '@coaxwain/contract'
import { AppError } from '../app-error'

const MOST_DEPTH = 20
const MOST_ITEMS = 1000
const FORBIDDEN_KEYS: readonly string[] = ['__proto__', 'constructor', 'prototype']

/** Refuses what no schema should have to look at: too deep, too long, or aimed at the language itself. */
export function guardBody(value: unknown, path: readonly string[] = []): void {
  if (value === null || typeof value !== 'object') return
  if (path.length >= MOST_DEPTH) throw new AppError('too-deep', { details: { limit: MOST_DEPTH } })
  if (Array.isArray(value)) {
    if (value.length > MOST_ITEMS) {
      throw new AppError('invalid-request', {
        errors: [{ path: fieldPath(path), code: 'too-many', details: { limit: MOST_ITEMS } }],
      })
    }
    value.forEach((item, i) => guardBody(item, [...path, String(i)]))
    return
  }
  for (const key of Object.keys(value)) {
    if (FORBIDDEN_KEYS.includes(key)) {
      throw new AppError('invalid-request', {
        errors: [
          {
            path: fieldPath([...path, key]),
            code: 'unknown-field',
            details: { name: shownKey(key) },
          },
        ],
      })
    }
    guardBody((value as Record<string, unknown>)[key], [...path, key])
  }
}
