import { describe, expect, test } from 'vitest'
import { readConfig } from './config'

const SECRET = 'f3Kq9_zWm2-aPl7RtyX0vBnCe5uHdJ8sQ1'
const server = {
  COAXWAIN_MODE: 'server',
  COAXWAIN_SECRET: SECRET,
  COAXWAIN_ORIGIN: 'https://shelf.invalid',
  COAXWAIN_DB_PASSWORD: 'x7',
  COAXWAIN_TRUSTED_PROXIES: '127.0.0.1, 10.0.0.2',
}
const demo = { COAXWAIN_MODE: 'demo', COAXWAIN_SECRET: SECRET }

describe('a server', () => {
  test('starts with secret, address and database', () => {
    expect(readConfig(server)).toMatchObject({
      mode: 'server',
      origin: 'https://shelf.invalid',
      trustedProxies: ['127.0.0.1', '10.0.0.2'],
    })
  })

  test('is what one gets without saying', () => {
    expect(() => readConfig({})).toThrow(/COAXWAIN_SECRET/)
  })

  test.each([
    ['a missing secret', { COAXWAIN_SECRET: '' }],
    ['a short secret', { COAXWAIN_SECRET: 'f3Kq9_zWm2-aPl7RtyX0vBn' }],
    ['an even secret', { COAXWAIN_SECRET: 'ab'.repeat(40) }],
    ['an example', { COAXWAIN_SECRET: `please-change-me-${SECRET}` }],
    ['plain http', { COAXWAIN_ORIGIN: 'http://shelf.invalid' }],
    ['no address', { COAXWAIN_ORIGIN: undefined }],
    ['nothing in front that ends TLS', { COAXWAIN_TRUSTED_PROXIES: ' ,' }],
    ['a database without password', { COAXWAIN_DB_PASSWORD: '' }],
    ['a database that forgets', { COAXWAIN_DISPOSABLE_DATABASE: '1' }],
    ['people of the demonstration', { COAXWAIN_DEMO_FILE: '/somewhere.json' }],
  ])('refuses %s', (_, change) => {
    expect(() => readConfig({ ...server, ...change })).toThrow()
  })
})

describe('the demonstration', () => {
  test('listens on this machine alone', () => {
    expect(readConfig(demo).host).toBe('127.0.0.1')
    expect(() => readConfig({ ...demo, COAXWAIN_HOST: '0.0.0.0' })).toThrow(/this machine/)
  })
})
