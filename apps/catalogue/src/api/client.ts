import {
  API_ROOT,
  problemDocument,
  ROUTES,
  toEtag,
  type BodyOf,
  type ParamsOf,
  type QueryOf,
  type ReplyOf,
  type RouteName,
} from '@coaxwain/contract'
import { err, ok, type Result } from '@coaxwain/result'
import { isSignedOut, type Failure } from './failure'

type Params<N extends RouteName> = string extends keyof ParamsOf<N>
  ? { readonly params?: undefined }
  : { readonly params: ParamsOf<N> }
type Body<N extends RouteName> =
  BodyOf<N> extends undefined ? { readonly body?: undefined } : { readonly body: BodyOf<N> }

export type CallInput<N extends RouteName> = Params<N> &
  Body<N> & {
    readonly query?: QueryOf<N> | undefined
    /** The version that was read and is now to be changed. */
    readonly version?: number | undefined
    readonly signal?: AbortSignal | undefined
  }

let locale = 'en-GB'
let whenSignedOut: () => void = () => undefined

/** What happens when the server no longer knows who is asking. */
export const setSignedOutHandler = (handler: () => void): void => {
  whenSignedOut = handler
}

/** In which language problems are told. */
export const setClientLocale = (value: string): void => {
  locale = value
}

function addressOf(
  path: string,
  params: Record<string, unknown>,
  query: Record<string, unknown>,
): string {
  const filled = path.replace(/:(\w+)/g, (_, name: string) =>
    encodeURIComponent(String(params[name])),
  )
  const search = new URLSearchParams()
  for (const [key, value] of Object.entries(query)) {
    if (value !== undefined && value !== '') search.set(key, String(value))
  }
  const text = search.toString()
  return `${API_ROOT}${filled}${text === '' ? '' : `?${text}`}`
}

async function toFailure(response: Response): Promise<Failure> {
  const body: unknown = await response.json().catch(() => null)
  const parsed = problemDocument.safeParse(body)
  return parsed.success
    ? { kind: 'problem', problem: parsed.data }
    : { kind: 'unreadable', status: response.status }
}

/** One call of the API. What comes back has been checked against the contract. */
export async function call<N extends RouteName>(
  name: N,
  input: CallInput<N>,
): Promise<Result<ReplyOf<N>, Failure>> {
  const route = ROUTES[name]
  const address = addressOf(route.path, { ...input.params }, { ...input.query })
  const headers: Record<string, string> = { accept: 'application/json', 'accept-language': locale }
  if (input.body !== undefined) headers['content-type'] = 'application/json'
  if (input.version !== undefined) headers['if-match'] = toEtag(input.version)
  let response: Response
  try {
    response = await fetch(address, {
      method: route.method,
      headers,
      credentials: 'same-origin',
      ...(input.body === undefined ? {} : { body: JSON.stringify(input.body) }),
      ...(input.signal ? { signal: input.signal } : {}),
    })
  } catch {
    return err({ kind: 'offline' })
  }
  if (!response.ok) {
    const failure = await toFailure(response)
    if (isSignedOut(failure)) whenSignedOut()
    return err(failure)
  }
  if (route.reply === null) return ok(undefined as ReplyOf<N>)
  const body: unknown = await response.json().catch(() => undefined)
  // The body itself: what the check makes of it has its keys in another order, and texts of it would differ.
  return route.reply.safeParse(body).success
    ? ok(body as ReplyOf<N>)
    : err({ kind: 'unreadable', status: response.status })
}
