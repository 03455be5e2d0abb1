import type { Handlers } from '../http/call'
import { newUid } from '../http/new-uid'
import type { UnitsService } from './service'

export const unitRoutes = (units: UnitsService) =>
  ({
    listUnits: ({ scope, query }) => units.list(scope, query),

    readUnit: ({ scope, params }) => units.read(scope, params.unit),

    createUnit: ({ scope, body, idempotencyKey }) =>
      units.create(scope, newUid(body.uid, idempotencyKey), body),

    changeUnit: ({ scope, params, version, body }) =>
      units.change(scope, { uid: params.unit, version }, body),

    changeUnitStates: ({ scope, params, version, body }) =>
      units.changeStates(scope, { uid: params.unit, version }, body),

    changeStatesOfUnits: async ({ scope, body }) => ({
      items: await units.changeStatesOfMany(scope, body),
    }),

    changeUnitModifications: ({ scope, params, version, body }) =>
      units.changeModifications(scope, { uid: params.unit, version }, body),

    changeUnitStands: ({ scope, params, version, body }) =>
      units.changeStands(scope, { uid: params.unit, version }, body.stands),

    deleteUnit: async ({ scope, params, version }) => {
      await units.remove(scope, { uid: params.unit, version })
      return null
    },

    restoreUnit: ({ scope, params, version }) =>
      units.restore(scope, { uid: params.unit, version }),
  }) satisfies Handlers
