import type { Knex } from 'knex'
import { AppError } from '../app-error'

/** How a list is ordered. `column` is SQL, and only ever comes from a fixed table. */
export interface Order {
  readonly column: string
  readonly descending: boolean
  readonly tie: string
}

export interface PageWish {
  readonly order: Order
  readonly limit: number
  readonly cursor: string | undefined
}

const UID = /^[A-Za-z0-9_-]{22}$/

/** Where the next page begins: the last row's sort value and uid, bound to the order they belong to. */
const encode = (order: Order, value: string, uid: string): string =>
  Buffer.from(JSON.stringify([order.column, order.descending, value, uid])).toString('base64url')

function decode(order: Order, cursor: string): [value: string, uid: string] {
  try {
    const found: unknown = JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'))
    if (Array.isArray(found) && found.length === 4) {
      const [column, descending, value, uid] = found as unknown[]
      const fits = column === order.column && descending === order.descending
      if (fits && typeof value === 'string' && UID.test(String(uid))) return [value, String(uid)]
    }
  } catch {
    // Whatever it is, it is none of our cursors.
  }
  throw new AppError('invalid-request', {
    errors: [{ path: 'query.cursor', code: 'bad-format', details: {} }],
  })
}

/** Restricts a query to what follows the cursor; one row more than wanted tells whether there is a next page. */
export function onPage(query: Knex.QueryBuilder, wish: PageWish): Knex.QueryBuilder {
  const { column, descending, tie } = wish.order
  if (wish.cursor !== undefined) {
    const [value, uid] = decode(wish.order, wish.cursor)
    const beyond = descending ? '<' : '>'
    void query.whereRaw(`(${column} ${beyond} ? or (${column} = ? and ${tie} > ?))`, [
      value,
      value,
      uid,
    ])
  }
  return query
    .orderByRaw(`${column} ${descending ? 'desc' : 'asc'}, ${tie} asc`)
    .limit(wish.limit + 1)
}

export interface Page<Row> {
  readonly items: readonly Row[]
  readonly next: string | null
}

export function cutPage<Row extends { uid: string }>(
  rows: readonly Row[],
  wish: PageWish,
  sortValue: (row: Row) => string,
): Page<Row> {
  const items = rows.slice(0, wish.limit)
  const last = items.at(-1)
  const more = rows.length > wish.limit && last
  return { items, next: more ? encode(wish.order, sortValue(last), last.uid) : null }
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
