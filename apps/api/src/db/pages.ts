import type { Knex } from 'knex'
import { AppError } from '../app-error'

/** One way to order a list. */
export interface Sorting<Row> {
  /** SQL, which only ever comes from a fixed table. */
  readonly column: string
  /** What that column holds in a row that was read. */
  readonly value: (row: Row) => string
}

export interface PageWish {
  /** A name out of the table of sortings; with `-` before it, backwards. */
  readonly sort: string
  readonly limit: number
  readonly cursor: string | undefined
}

export interface Page<Row> {
  readonly items: readonly Row[]
  readonly next: string | null
}

const UID = /^[A-Za-z0-9_-]{22}$/

/** Where the next page begins: the last row's sort value and uid, bound to the order that they belong to. */
const encode = (sort: string, value: string, uid: string): string =>
  Buffer.from(JSON.stringify([sort, value, uid])).toString('base64url')

function decode(sort: string, cursor: string): [value: string, uid: string] {
  try {
    const found: unknown = JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'))
    if (Array.isArray(found) && found.length === 3) {
      const [of, value, uid] = found as unknown[]
      if (of === sort && typeof value === 'string' && UID.test(String(uid))) {
        return [value, String(uid)]
      }
    }
  } catch {
    // Whatever it is, it is none of our cursors.
  }
  throw new AppError('invalid-request', {
    errors: [{ path: 'query.cursor', code: 'bad-format', details: {} }],
  })
}

/** Pages of one list; `tie` is the column that decides among equals. */
export const createPages = <Row extends { readonly uid: string }>(
  tie: string,
  sortings: Readonly<Record<string, Sorting<Row>>>,
) => {
  const sortingOf = (sort: string): Sorting<Row> & { readonly descending: boolean } => {
    const descending = sort.startsWith('-')
    const found = sortings[descending ? sort.slice(1) : sort]
    if (!found) throw new Error(`no order ${sort}`)
    return { ...found, descending }
  }
  return {
    /** Restricts a query to what follows the cursor; one row more than wanted tells whether more follows. */
    onPage: (query: Knex.QueryBuilder, { sort, limit, cursor }: PageWish): Knex.QueryBuilder => {
      const { column, descending } = sortingOf(sort)
      if (cursor !== undefined) {
        const [value, uid] = decode(sort, cursor)
        const beyond = descending ? '<' : '>'
        void query.whereRaw(`(${column} ${beyond} ? or (${column} = ? and ${tie} > ?))`, [
          value,
          value,
          uid,
        ])
      }
      return query
        .orderByRaw(`${column} ${descending ? 'desc' : 'asc'}, ${tie} asc`)
        .limit(limit + 1)
    },

    cutPage: (rows: readonly Row[], { sort, limit }: PageWish): Page<Row> => {
      const items = rows.slice(0, limit)
      const last = items.at(-1)
      const more = rows.length > limit && last
      return { items, next: more ? encode(sort, sortingOf(sort).value(last), last.uid) : null }
    },
  }
}

/** A search text as plain words, each with the signs of LIKE made harmless. */
export const likePatterns = (text: string): string[] =>
  text
    .split(/\s+/)
    .filter((word) => word !== '')
    .slice(0, 8)
    .map((word) => `%${word.replace(/[\\%_]/g, '\\$&')}%`)

/** MariaDB's own writing of an instant, which compares as text in a cursor. */
export const sqlInstant = (date: Date): string => date.toISOString().slice(0, 23).replace('T', ' ')
