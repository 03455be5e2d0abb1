import type { Handlers } from '../http/call'
import { newUid } from '../http/new-uid'
import type { HookupsService } from './service'

export const hookupRoutes = (hookups: HookupsService) =>
  ({
    listHookups: ({ scope, query }) => hookups.list(scope, query),

    readHookup: ({ scope, params }) => hookups.read(scope, params.hookup),

    saveHookup: ({ scope, body, idempotencyKey }) =>
      hookups.save(scope, newUid(body.uid, idempotencyKey), body),

    renameHookup: ({ scope, params, version, body }) =>
      hookups.rename(scope, { uid: params.hookup, version }, body.title),

    deleteHookup: async ({ scope, params, version }) => {
      await hookups.remove(scope, { uid: params.hookup, version })
      return null
    },

    restoreHookup: ({ scope, params, version }) =>
      hookups.restore(scope, { uid: params.hookup, version }),
  }) satisfies Handlers
