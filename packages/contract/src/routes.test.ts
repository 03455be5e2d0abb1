import { describe, expect, test } from 'vitest'
import { RIGHTS, ROLES } from './roles'
import { ROUTES, type Route } from './routes'

const routes = Object.entries(ROUTES) as [string, Route][]

describe('the table of routes', () => {
  test('names every address and method once', () => {
    const all = routes.map(([, r]) => `${r.method} ${r.path}`)
    expect(new Set(all).size).toBe(all.length)
  })

  test.each(routes)('%s keeps the rules of the house', (_, route) => {
    const inCollection = route.path.startsWith('/collections/:collection')
    expect(route.who in RIGHTS).toBe(inCollection)
    const edits = ['PUT', 'PATCH', 'DELETE'].includes(route.method) && inCollection
    if (edits) expect(route.ifMatch).toBe(true)
    if (route.method === 'GET') expect(route.body).toBeNull()
    expect(route.status === 204).toBe(route.reply === null)
  })
})

test('an owner may do all that others may', () => {
  for (const right of Object.values(RIGHTS)) expect(right).toContain('owner')
})

test('a viewer only reads', () => {
  const mine = Object.entries(RIGHTS).filter(([, roles]) =>
    (roles as readonly string[]).includes('viewer'),
  )
  expect(mine.every(([right]) => right.endsWith('.read'))).toBe(true)
  expect(ROLES).toHaveLength(5)
})
