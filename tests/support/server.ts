import type { Server } from 'node:http'
import type { AddressInfo } from 'node:net'
import { checkHookup } from '@coaxwain/checker'
import { createApp, type AppSettings } from '@coaxwain/api/app'
import { compose } from '@coaxwain/api/compose'
import { createHttpServer } from '@coaxwain/api/http-server'
import { createLogger } from '@coaxwain/api/logger'
import { findHookups } from '@coaxwain/api/matcher'
import type { Knex } from 'knex'

export interface RunningApi {
  readonly address: string
  readonly server: Server
  /** Every method and address that was mounted. */
  readonly mounted: readonly string[]
  stop(): Promise<void>
}

type Choices = Partial<AppSettings> & {
  readonly matcher?: Parameters<typeof compose>[0]['matcher']
  readonly checker?: Parameters<typeof compose>[0]['checker']
  readonly arrangementChecker?: Parameters<typeof compose>[0]['arrangementChecker']
  readonly proofChecker?: Parameters<typeof compose>[0]['proofChecker']
}

interface Layer {
  readonly route?: { readonly path: string; readonly stack: readonly { method?: string }[] }
  readonly handle?: { readonly stack?: readonly Layer[] }
}

/** What the router really holds, whatever any table says. */
const mountedIn = (stack: readonly Layer[]): string[] =>
  stack.flatMap(({ route, handle }) =>
    route
      ? route.stack.flatMap(({ method }) =>
          method === undefined ? [] : [`${method.toUpperCase()} ${route.path}`],
        )
      : mountedIn(handle?.stack ?? []),
  )

/** The whole application on a port of its own, in this process. */
export async function startApi(db: Knex, choices: Choices = {}): Promise<RunningApi> {
  const { matcher = findHookups, checker = checkHookup, ...rest } = choices
  const { arrangementChecker, proofChecker, ...settings } = rest
  const logger = choices.logger ?? createLogger(process.env['COAXWAIN_TEST_LOG'] ?? 'silent')
  const mode = choices.mode ?? 'demo'
  const services = await compose({
    db,
    mode,
    matcher,
    checker,
    arrangementChecker,
    proofChecker,
    logger,
  })
  const app = createApp(services, {
    mode,
    secret: 'for tests alone, and long enough for that',
    origin: null,
    trustedProxies: [],
    clientFolder: null,
    logger,
    checkReplies: true,
    ...settings,
  })
  const server = createHttpServer(app)
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve))
  const { port } = server.address() as AddressInfo
  return {
    address: `http://127.0.0.1:${port}`,
    server,
    mounted: mountedIn((app as unknown as { router: { stack: Layer[] } }).router.stack),
    stop: () =>
      new Promise((resolve) => {
        server.close(() => resolve())
        server.closeAllConnections()
      }),
  }
}
