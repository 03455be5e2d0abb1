import { API_ROOT, type ProblemDocument } from '@coaxwain/contract'

type Json = Record<string, unknown>

export interface Answer {
  readonly status: number
  readonly headers: Headers
  readonly body: Json
  readonly text: string
}

export interface Sending {
  readonly body?: unknown
  /** Sent as it is, instead of JSON. */
  readonly raw?: string
  readonly version?: number
  readonly headers?: Readonly<Record<string, string>>
}

/** A browser of our own: keeps its cookie, says where it comes from. */
export class Client {
  cookie: string | null = null

  constructor(readonly address: string) {}

  async send(method: string, path: string, sending: Sending = {}): Promise<Answer> {
    const url = this.address + (path.startsWith('/api') ? '' : API_ROOT) + path
    const response = await fetch(url, { redirect: 'manual', ...this.prepare(method, sending) })
    const set = response.headers.get('set-cookie')
    if (set !== null) this.cookie = set.split(';')[0] ?? null
    const text = await response.text()
    const isJson = (response.headers.get('content-type') ?? '').includes('json')
    const parsed = isJson && text !== '' ? (JSON.parse(text) as Json) : {}
    return { status: response.status, headers: response.headers, body: parsed, text }
  }

  private prepare(method: string, { body, raw, version, headers = {} }: Sending): RequestInit {
    const payload = raw ?? (body === undefined ? undefined : JSON.stringify(body))
    return {
      method,
      headers: {
        origin: this.address,
        ...(this.cookie === null ? {} : { cookie: this.cookie }),
        ...(payload === undefined ? {} : { 'content-type': 'application/json' }),
        ...(version === undefined ? {} : { 'if-match': `"${version}"` }),
        ...headers,
      },
      ...(payload === undefined ? {} : { body: payload }),
    }
  }

  get = (path: string, headers: Record<string, string> = {}) => this.send('GET', path, { headers })
  post = (path: string, body?: unknown, more: Sending = {}) =>
    this.send('POST', path, { ...more, body })
  put = (path: string, version: number, body: unknown) => this.send('PUT', path, { version, body })
  patch = (path: string, version: number, body: unknown) =>
    this.send('PATCH', path, { version, body })
  delete = (path: string, version?: number) =>
    this.send('DELETE', path, version === undefined ? {} : { version })
}

export const problemOf = (answer: Answer): ProblemDocument =>
  answer.body as unknown as ProblemDocument

/** Paths and codes of the faults found, for a short comparison. */
export const faultsOf = (answer: Answer): string[] =>
  problemOf(answer).errors.map((e) => `${e.path} ${e.code}`)
