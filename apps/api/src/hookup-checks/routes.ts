import type { Handlers } from '../http/call'
import type { HookupChecksService } from './service'

export const hookupCheckRoutes = (checks: HookupChecksService) =>
  ({
    checkChain: ({ scope, body }) => checks.check(scope, body.question, body.chain),
  }) satisfies Handlers
