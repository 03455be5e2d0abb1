import type { Knex } from 'knex'
import { expect, test } from 'vitest'
import { transact } from './transact'

const lost = (errno: number): Error => Object.assign(new Error('lost'), { errno })

/** A database whose transactions fail as they are told, one after another. */
const failing = (...errors: (Error | null)[]): Knex =>
  ({
    transaction: (job: (trx: unknown) => Promise<unknown>) => {
      const error = errors.shift()
      return error ? Promise.reject(error) : job({})
    },
  }) as unknown as Knex

test.each([1020, 1205, 1213])('a race lost with %i is run again', async (errno) => {
  const db = failing(lost(errno), lost(errno), lost(errno), null)
  expect(await transact(db, () => Promise.resolve('done'))).toBe('done')
})

test('after three tries more it is given up', async () => {
  const db = failing(lost(1213), lost(1213), lost(1213), lost(1213), null)
  await expect(transact(db, () => Promise.resolve('done'))).rejects.toThrow('lost')
})

test('any other failure is not repeated', async () => {
  const db = failing(lost(1062), null)
  await expect(transact(db, () => Promise.resolve('done'))).rejects.toThrow('lost')
})
