import type { Handlers } from '../http/call'
import { newUid } from '../http/new-uid'
import type { PlacesService } from './service'

export const placeRoutes = (places: PlacesService) =>
  ({
    listPlaces: async ({ scope }) => ({ items: await places.list(scope) }),

    createPlace: ({ scope, body, idempotencyKey }) =>
      places.create(scope, newUid(body.uid, idempotencyKey), body),

    changePlace: ({ scope, params, version, body }) =>
      places.change(scope, { uid: params.place, version }, body),

    deletePlace: async ({ scope, params, version }) => {
      await places.remove(scope, { uid: params.place, version })
      return null
    },
  }) satisfies Handlers
