import { snapshotEtag } from '@coaxwain/contract'
import { NotModified, Tagged, type Handlers } from '../http/call'
import type { SnapshotService } from './service'

export const snapshotRoutes = (snapshots: SnapshotService) =>
  ({
    readSnapshot: async ({ scope, ifNoneMatch }) => {
      if (ifNoneMatch !== null && ifNoneMatch === (await snapshots.etag(scope))) {
        return new NotModified(ifNoneMatch)
      }
      const found = await snapshots.read(scope)
      return new Tagged(found, snapshotEtag(found.shelfVersion, found.catalogueVersion))
    },
  }) satisfies Handlers
