import { createHash, randomBytes } from 'node:crypto'

const UID_BYTES = 16

/** 128 random bits, as 22 letters of base64url. */
export const randomUid = (): string => randomBytes(UID_BYTES).toString('base64url')

/** The same parts give the same id, so that a repeated request meets what the first one made. */
export const uidFrom = (...parts: readonly string[]): string =>
  createHash('sha256')
    .update(parts.join('\0'))
    .digest()
    .subarray(0, UID_BYTES)
    .toString('base64url')

function sorted(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(sorted)
  if (value === null || typeof value !== 'object') return value
  return Object.fromEntries(
    Object.entries(value)
      .filter(([, v]) => v !== undefined)
      .sort(([a], [b]) => (a < b ? -1 : 1))
      .map(([k, v]) => [k, sorted(v)]),
  )
}

/** Equal for values that are equal, whatever the order of their fields. */
export const fingerprint = (value: unknown): string =>
  createHash('sha256')
    .update(JSON.stringify(sorted(value)))
    .digest('hex')
