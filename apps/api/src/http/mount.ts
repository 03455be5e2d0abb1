import { createHash } from 'node:crypto'
import {
  API_ROOT,
  ROUTES,
  hasRight,
  toEtag,
  versionOf,
  type Mode,
  type Route,
  type RouteName,
} from '@coaxwain/contract'
import { json, type Request, type RequestHandler, type Response, type Router } from 'express'
import { AppError, notFound } from '../app-error'
import type { CollectionsService } from '../collections/service'
import { asError } from './as-error'
import { NotModified, Tagged, type AllHandlers, type Scope } from './call'
import { guardBody } from './body-guard'
import { personOf } from './context'
import { startDeadline, stopDeadline } from './deadline'
import { signIn, signOut, type Authenticator } from './sign-in'
import { validate } from './validate'

const BODY_LIMIT = '100kb'

export interface MountNeeds {
  readonly router: Router
  readonly handlers: AllHandlers
  readonly collections: CollectionsService
  readonly mode: Mode
  readonly cookie: string
  readonly authenticator: Authenticator
  /** In tests: what goes out is held against the contract too. */
  readonly checkReplies: boolean
}

type AnyCall = Readonly<Record<string, unknown>>
type AnyHandler = (call: AnyCall) => Promise<unknown>

const readJson = json({ limit: BODY_LIMIT, strict: true, type: 'application/json' })

interface Admitted {
  readonly params: unknown
  readonly scope: Scope | null
}

/** Before the body is read: whoever may not do this need not send it. */
async function admit(
  route: Route,
  req: Request,
  collections: CollectionsService,
): Promise<Admitted> {
  const person = personOf(req)
  if (route.who !== 'anyone' && !person) throw new AppError('sign-in-required')
  const params = readParams(route, req)
  if (route.who === 'anyone' || route.who === 'signed-in' || !person) return { params, scope: null }
  const scope = await collections.scopeOf(person, params['collection'] as string)
  if (!hasRight(scope.role, route.who)) throw new AppError('forbidden')
  return { params, scope }
}

function readVersion(route: Route, req: Request): number | null {
  if (!route.ifMatch) return null
  const version = versionOf(req.get('if-match') ?? '')
  if (version === null) throw new AppError('version-missing')
  return version
}

function idempotencyKey(req: Request, scope: Scope | null): string | null {
  const key = req.get('idempotency-key')
  if (key === undefined) return null
  const from = [req.method, req.path, scope?.person.uid ?? '', key]
  return createHash('sha256').update(from.join('\0')).digest('base64url')
}

async function readBody(route: Route, req: Request, res: Response): Promise<unknown> {
  const length = Number(req.get('content-length') ?? 0)
  const some = length > 0 || req.get('transfer-encoding') !== undefined
  if (route.body === null) {
    if (some) throw new AppError('invalid-request')
    return null
  }
  if (!req.is('application/json'))
    throw new AppError(some ? 'wrong-content-type' : 'malformed-json')
  stopDeadline(res)
  await new Promise<void>((resolve, reject) => {
    readJson(req, res, (error?: unknown) =>
      error === undefined ? resolve() : reject(asError(error)),
    )
  }).finally(() => startDeadline(req, res))
  guardBody(req.body)
  // Whoever else looks at the request sees what was judged, and nothing beside it.
  req.body = validate(route.body, req.body)
  return req.body as unknown
}

/** An id in an address that has the wrong form names nothing, like any other that is not there. */
function readParams(route: Route, req: Request): Readonly<Record<string, unknown>> {
  const found = route.params.safeParse({ ...req.params })
  if (!found.success) throw notFound()
  return found.data as Readonly<Record<string, unknown>>
}

function send(route: Route, res: Response, reply: unknown, checkReplies: boolean): void {
  if (res.headersSent) return
  if (reply instanceof NotModified) {
    res.set('ETag', reply.etag).status(304).end()
    return
  }
  if (route.reply === null) {
    res.status(route.status).end()
    return
  }
  const body: unknown = reply instanceof Tagged ? reply.body : reply
  if (checkReplies) route.reply.parse(body)
  if (route.etag) res.set('ETag', etagOf(reply))
  res.status(route.status).type('application/json').send(JSON.stringify(body))
}

function etagOf(reply: unknown): string {
  if (reply instanceof Tagged) return reply.etag
  const { version } = reply as { version?: number }
  if (version === undefined) throw new Error('a reply with an ETag needs a version')
  return toEtag(version)
}

const toHandler =
  (name: RouteName, needs: MountNeeds): RequestHandler =>
  async (req, res) => {
    const route: Route = ROUTES[name]
    const { params, scope } = await admit(route, req, needs.collections)
    const query = validate(route.query, { ...req.query }, 'query.')
    const version = readVersion(route, req)
    const body = await readBody(route, req, res)
    if (res.headersSent) return
    const reply = await (needs.handlers[name] as unknown as AnyHandler)({
      params,
      query,
      body,
      version,
      scope,
      person: personOf(req),
      idempotencyKey: idempotencyKey(req, scope),
      ifNoneMatch: req.get('if-none-match') ?? null,
      signIn: () => signIn(needs.authenticator, req, res),
      signOut: () => signOut(req, res, needs.cookie),
    })
    send(route, res, reply, needs.checkReplies)
  }

const METHODS = { GET: 'get', POST: 'post', PUT: 'put', PATCH: 'patch', DELETE: 'delete' } as const

/** Mounts the table of routes: every one of it, and nothing else. */
export function mountRoutes(needs: MountNeeds): void {
  const allowed = new Map<string, string[]>()
  for (const [name, route] of Object.entries(ROUTES) as [RouteName, Route][]) {
    if (route.demoOnly && needs.mode !== 'demo') continue
    const address = API_ROOT + route.path
    needs.router[METHODS[route.method]](address, toHandler(name, needs))
    allowed.set(address, [...(allowed.get(address) ?? []), route.method])
  }
  for (const [address, methods] of allowed) {
    needs.router.all(address, () => {
      throw new AppError('method-not-allowed', { allow: methods.join(', ') })
    })
  }
}
