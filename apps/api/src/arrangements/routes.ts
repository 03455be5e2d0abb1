import type { Handlers } from '../http/call'
import type { ArrangementsService } from './service'

export const arrangementRoutes = (arrangements: ArrangementsService) =>
  ({
    arrange: ({ scope, body }) => arrangements.ask(scope, body.question),
  }) satisfies Handlers
