import type { Handlers } from '../http/call'
import type { CollectionsService } from './service'

export const collectionRoutes = (collections: CollectionsService) =>
  ({
    listCollections: async ({ person }) => ({ items: await collections.list(person) }),
    readCollection: ({ scope }) => collections.read(scope),
    listMembers: async ({ scope }) => ({ items: await collections.members(scope) }),
  }) satisfies Handlers
