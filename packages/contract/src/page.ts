import { z } from 'zod'
import { queryNumber } from './text'

export const PAGE_LIMIT = 200
export const PAGE_DEFAULT = 50

/** Room for the longest name there is, of 170 letters with three bytes each, in base64. */
const CURSOR_LENGTH = 800

/** Opaque; made by the server, good only for the same filters and order. */
export const cursor = z
  .string()
  .max(CURSOR_LENGTH)
  .regex(/^[A-Za-z0-9_-]+$/)

export const pageQuery = {
  cursor: cursor.optional(),
  limit: queryNumber(z.int().min(1).max(PAGE_LIMIT)).optional(),
}

export const page = <Item extends z.ZodType>(item: Item) =>
  z.strictObject({
    items: z.array(item),
    /** Asks for what follows; null at the end. */
    next: cursor.nullable(),
    /** How many there are in all under these filters. */
    total: z.int().min(0),
  })
