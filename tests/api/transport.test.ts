import { request } from 'node:http'
import { connect } from 'node:net'
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { Client, problemOf } from '../support/client'
import { useRig } from '../support/rig'
import { startApi, type RunningApi } from '../support/server'
import { COLLECTION, emailOf, PASS_PHRASE } from '../support/world'

const client = mkdtempSync(join(tmpdir(), 'coaxwain-client-'))
writeFileSync(join(client, 'index.html'), '<!doctype html><title>Coaxwain</title>')
mkdirSync(join(client, 'assets'))
writeFileSync(join(client, 'assets', 'main-abc.js'), 'export {}')

const rig = useRig({ clientFolder: client })
afterAll(() => rmSync(client, { recursive: true }))

const stranger = (): Client => new Client(rig.api.address)

const ADDRESSES = [
  '/',
  '/shelf/some-page',
  '/assets/main-abc.js',
  '/assets/missing.js',
  '/robots.txt',
  '/healthz',
  '/readyz',
  '/api/v1/session',
  '/api/v1/collections',
  '/api/v1/nothing',
  '/api/docs/',
  '/%E0%A4%A',
]

describe('every answer', () => {
  test.each(ADDRESSES)('of %s carries the protecting headers', async (address) => {
    const { headers } = await fetch(rig.api.address + address)
    expect(headers.get('x-content-type-options')).toBe('nosniff')
    expect(headers.get('referrer-policy')).toBe('strict-origin-when-cross-origin')
    const policy = headers.get('content-security-policy') ?? ''
    for (const part of [
      "default-src 'self'",
      "object-src 'none'",
      "base-uri 'none'",
      "frame-ancestors 'none'",
      "form-action 'self'",
      "script-src 'self'",
      "worker-src 'self'",
    ]) {
      expect(policy).toContain(part)
    }
    expect(policy).not.toContain('unsafe-eval')
    expect(policy).not.toMatch(/script-src[^;]*unsafe-inline/)
    expect(policy).not.toContain('upgrade-insecure-requests')
    expect(headers.get('cross-origin-opener-policy')).toBe('same-origin')
    expect(headers.get('cross-origin-resource-policy')).toBe('same-origin')
    expect(headers.get('permissions-policy')).toContain('geolocation=()')
    expect(headers.get('x-powered-by')).toBeNull()
    expect(headers.get('server')).toBeNull()
    expect(headers.get('access-control-allow-origin')).toBeNull()
    expect(headers.get('x-request-id')).toMatch(/^[0-9a-f-]{36}$/)
  })

  test('of the API is not to be stored', async () => {
    const { headers } = await (await rig.as('owner')).get(`/collections/${COLLECTION}/units`)
    expect(headers.get('cache-control')).toBe('no-store')
  })

  test('of the API ignores what a request says of its own address', async () => {
    const response = await fetch(`${rig.api.address}/api/v1/collections`, {
      headers: { 'x-forwarded-host': 'evil.invalid', 'x-forwarded-proto': 'https' },
    })
    expect(await response.text()).not.toContain('evil.invalid')
  })
})

describe('the client', () => {
  test.each([
    ['/', 200, 'text/html'],
    ['/shelf/units/abc', 200, 'text/html'],
    ['/assets/main-abc.js', 200, 'text/javascript'],
    ['/assets/missing.js', 404, 'application/problem+json'],
    ['/api/v1/missing', 404, 'application/problem+json'],
    ['/api/missing', 404, 'application/problem+json'],
    ['/package.json', 404, 'application/problem+json'],
    ['/.env', 404, 'application/problem+json'],
    ['/.git/config', 404, 'application/problem+json'],
    ['/..%2f..%2fpackage.json', 404, 'application/problem+json'],
    ['/robots.txt', 200, 'text/plain'],
  ])('%s gives %i as %s', async (path, status, type) => {
    const response = await fetch(rig.api.address + path)
    expect(response.status).toBe(status)
    expect(response.headers.get('content-type')).toContain(type)
  })
})

describe('a request that changes something', () => {
  const attempt = (headers: Record<string, string>) =>
    new Promise<number>((resolve, reject) => {
      const url = new URL(`${rig.api.address}/api/v1/session`)
      const sent = request(
        url,
        { method: 'POST', headers: { 'content-type': 'application/json', ...headers } },
        (response) => {
          response.resume()
          resolve(response.statusCode ?? 0)
        },
      )
      sent.once('error', reject)
      sent.end(JSON.stringify({ email: emailOf('owner'), password: PASS_PHRASE }))
    })

  test('is refused from another site, and from nowhere', async () => {
    const own = rig.api.address
    expect(await attempt({ 'sec-fetch-site': 'cross-site' })).toBe(403)
    expect(await attempt({ 'sec-fetch-site': 'same-site' })).toBe(403)
    expect(await attempt({ 'sec-fetch-site': 'none' })).toBe(403)
    expect(await attempt({ origin: 'https://evil.invalid' })).toBe(403)
    expect(await attempt({ origin: 'null' })).toBe(403)
    expect(await attempt({ 'sec-fetch-site': 'same-origin', origin: 'https://evil.invalid' })).toBe(
      403,
    )
    expect(await attempt({})).toBe(403)
    expect(await attempt({ origin: own })).toBe(200)
    expect(await attempt({ 'sec-fetch-site': 'same-origin' })).toBe(200)
  })
})

describe('odd requests', () => {
  const raw = (text: string): Promise<string> =>
    new Promise((resolve, reject) => {
      const { port } = new URL(rig.api.address)
      const socket = connect(Number(port), '127.0.0.1', () => socket.write(text))
      const chunks: Buffer[] = []
      socket.on('data', (chunk) => chunks.push(chunk))
      socket.on('close', () => resolve(Buffer.concat(chunks).toString()))
      socket.on('error', reject)
    })

  test('with headers beyond 16 KiB get 431', async () => {
    const answer = await raw(
      `GET / HTTP/1.1\r\nHost: x\r\nX-Long: ${'a'.repeat(20_000)}\r\nConnection: close\r\n\r\n`,
    )
    expect(answer).toContain('431')
  })

  test('whose body is slow to come are not given up for that', async () => {
    const { cookie } = await rig.as('owner')
    const body = JSON.stringify({ name: 'Loft' })
    const { address } = rig.api
    const status = await new Promise<number>((resolve, reject) => {
      const sent = request(`${address}/api/v1/collections/${COLLECTION}/places`, {
        method: 'POST',
        headers: {
          cookie: cookie ?? '',
          origin: address,
          'content-type': 'application/json',
          'content-length': body.length,
        },
      })
      sent.once('response', (response) => resolve(response.resume().statusCode ?? 0))
      sent.once('error', reject)
      sent.write(body.slice(0, 5))
      setTimeout(() => sent.end(body.slice(5)), 6500)
    })
    expect(status).toBe(201)
  })

  test('that trace are refused', async () => {
    const answer = await raw(
      'TRACE /api/v1/session HTTP/1.1\r\nHost: x\r\nConnection: close\r\n\r\n',
    )
    expect(answer).toMatch(/^HTTP\/1\.1 40[0-5]/)
    expect(answer).not.toContain('TRACE /api')
  })
})

describe('in server mode', () => {
  let api: RunningApi
  beforeAll(async () => {
    api = await startApi(rig.db, {
      mode: 'server',
      origin: 'https://shelf.invalid',
      trustedProxies: ['127.0.0.1'],
    })
  })
  afterAll(() => api.stop())

  const behindProxy = { origin: 'https://shelf.invalid', 'x-forwarded-proto': 'https' }
  const body = { email: emailOf('owner'), password: PASS_PHRASE }

  test('the cookie is bound to host and TLS', async () => {
    const answer = await new Client(api.address).post('/session', body, { headers: behindProxy })
    expect(answer.status).toBe(200)
    const cookie = answer.headers.get('set-cookie') ?? ''
    expect(cookie).toMatch(/^__Host-coaxwain=/)
    expect(cookie).toMatch(/Secure/)
    expect(answer.headers.get('strict-transport-security')).toContain('max-age=31536000')
  })

  test('explorer and demo sign-ins do not exist', async () => {
    for (const path of ['/api/docs/', '/api/docs/openapi.json', '/api/v1/demo-sign-ins']) {
      expect((await fetch(api.address + path)).status).toBe(404)
    }
  })

  test('people of the demonstration cannot come in', async () => {
    await rig.db('people').where({ email: body.email }).update({ is_demo: true })
    const answer = await new Client(api.address).post('/session', body, { headers: behindProxy })
    expect(answer.status).toBe(401)
    expect(problemOf(answer).code).toBe('sign-in-failed')
  })
})

describe('the explorer', () => {
  test('describes every route, without a script in the page', async () => {
    const answer = await stranger().get('/api/docs/openapi.json')
    const { openapi, paths } = answer.body as { openapi: string; paths: Record<string, object> }
    expect(openapi).toBe('3.1.0')
    expect(Object.keys(paths)).toContain('/api/v1/collections/{collection}/units/{unit}/states')
    const page = await fetch(`${rig.api.address}/api/docs/`)
    expect(await page.text()).not.toMatch(/<script>/)
    expect((await fetch(`${rig.api.address}/api/docs/swagger-ui-bundle.js`)).status).toBe(200)
  })
})
