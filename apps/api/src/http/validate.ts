import { toFieldErrors } from '@coaxwain/contract'
import type { z } from 'zod'
import { AppError } from '../app-error'

/** The parsed value, or every fault of it with its path. */
export function validate<S extends z.ZodType>(schema: S, value: unknown, prefix = ''): z.output<S> {
  const found = schema.safeParse(value, { reportInput: true })
  if (found.success) return found.data
  const errors = toFieldErrors(found.error)
  throw new AppError('invalid-request', {
    errors: errors.map((e) => ({ ...e, path: (prefix + e.path).replace(/\.$/, '') })),
  })
}
