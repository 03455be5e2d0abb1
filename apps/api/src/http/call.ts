import type {
  ParsedBodyOf,
  ParsedParamsOf,
  ParsedQueryOf,
  ReplyOf,
  Role,
  RouteName,
  ROUTES,
} from '@coaxwain/contract'
import type { KnownPerson } from '../people/repository'

/** One person inside one collection: read anew for each request, never taken from it. */
export interface Scope {
  readonly collectionId: number
  readonly collectionUid: string
  readonly role: Role
  readonly person: KnownPerson
}

type RouteOf<N extends RouteName> = (typeof ROUTES)[N]

type Looker<N extends RouteName> = RouteOf<N>['who'] extends 'anyone'
  ? { readonly person: KnownPerson | null }
  : RouteOf<N>['who'] extends 'signed-in'
    ? { readonly person: KnownPerson }
    : { readonly person: KnownPerson; readonly scope: Scope }

type Version<N extends RouteName> = RouteOf<N>['ifMatch'] extends true
  ? {
      /** The version that was read, from `If-Match`. */
      readonly version: number
    }
  : unknown

/** A request as a handler sees it: checked, typed, and free of Express. */
export type Call<N extends RouteName> = {
  readonly params: ParsedParamsOf<N>
  readonly query: ParsedQueryOf<N>
  readonly body: ParsedBodyOf<N>
  /** What a repeated request has in common with the first one. */
  readonly idempotencyKey: string | null
  readonly ifNoneMatch: string | null
  readonly signIn: () => Promise<KnownPerson>
  readonly signOut: () => Promise<void>
} & Looker<N> &
  Version<N>

/** Says that the caller has it already. */
export class NotModified {
  constructor(readonly etag: string) {}
}

/** A reply whose ETag is not its version. */
export class Tagged<Body> {
  constructor(
    readonly body: Body,
    readonly etag: string,
  ) {}
}

type Reply<N extends RouteName> =
  ReplyOf<N> extends undefined ? null : ReplyOf<N> | Tagged<ReplyOf<N>> | NotModified

export type Handler<N extends RouteName> = (call: Call<N>) => Reply<N> | Promise<Reply<N>>

export type Handlers = { readonly [N in RouteName]?: Handler<N> }

export type AllHandlers = { readonly [N in RouteName]: Handler<N> }
