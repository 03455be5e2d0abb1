import { z } from 'zod'

export const ROLES = ['owner', 'collector', 'restorer', 'reseller', 'viewer'] as const
export type Role = (typeof ROLES)[number]
export const role = z.enum(ROLES)

const EVERYBODY: readonly Role[] = ROLES
const EDITORS: readonly Role[] = ['owner', 'collector', 'restorer']

/**
 * Who may do what inside a collection. This is the only place that knows; routes name a right,
 * and the client asks the same table which buttons to show.
 */
export const RIGHTS = {
  'collection.read': EVERYBODY,
  'members.read': ['owner'],
  'shelf.read': EVERYBODY,
  'shelf.write': EDITORS,
  /** Changing the holding state, and nothing else of a unit. */
  'shelf.hold': [...EDITORS, 'reseller'],
  'models.read': EVERYBODY,
  'models.write': EDITORS,
  'hookups.read': EVERYBODY,
  'hookups.write': EDITORS,
} as const satisfies Record<string, readonly Role[]>

export type Right = keyof typeof RIGHTS

export const hasRight = (has: Role, right: Right): boolean =>
  (RIGHTS[right] as readonly Role[]).includes(has)
