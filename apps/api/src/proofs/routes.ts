import type { Handlers } from '../http/call'
import type { ProofsService } from './service'

export const proofRoutes = (proofs: ProofsService) =>
  ({
    prove: ({ scope, body }) => proofs.ask(scope, body.question),
  }) satisfies Handlers
