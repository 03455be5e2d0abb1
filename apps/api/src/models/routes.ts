import type { Handlers } from '../http/call'
import { newUid } from '../http/new-uid'
import type { ModelsService } from './service'

export const modelRoutes = (models: ModelsService) =>
  ({
    listModels: ({ scope, query }) => models.list(scope, query),

    readModel: ({ scope, params }) => models.read(scope, params.model),

    readModelRevision: ({ scope, params }) =>
      models.readRevision(scope, params.model, params.revision),

    createModel: ({ scope, body, idempotencyKey }) =>
      models.create(scope, newUid(body.uid, idempotencyKey), body),

    changeModel: ({ scope, params, version, body }) =>
      models.change(scope, { uid: params.model, version }, body.document),

    deleteModel: async ({ scope, params, version }) => {
      await models.remove(scope, { uid: params.model, version })
      return null
    },

    restoreModel: ({ scope, params, version }) =>
      models.restore(scope, { uid: params.model, version }),
  }) satisfies Handlers
