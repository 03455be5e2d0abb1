/**
 * The driver parses JSON columns where the server says that they are JSON, and only there. What comes
 * out was checked before it was written, so the caller names its type.
 */
export const parseJson = <T>(value: unknown): T =>
  (typeof value === 'string' ? JSON.parse(value) : value) as T
