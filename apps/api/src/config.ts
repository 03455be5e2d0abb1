import { MODES } from '@coaxwain/contract'
import { z } from 'zod'

const LEAST_SECRET_BYTES = 32
const LEAST_DIFFERENT_LETTERS = 10
const EXAMPLE = /change.?me|example|secret|password|placeholder/i

const port = z.coerce.number().int().min(0).max(65535)

const environment = z.object({
  COAXWAIN_MODE: z.enum(MODES).default('server'),
  COAXWAIN_HOST: z.string().default('127.0.0.1'),
  PORT: port.default(8080),
  COAXWAIN_DB_HOST: z.string().default('127.0.0.1'),
  COAXWAIN_DB_PORT: port.default(3306),
  COAXWAIN_DB_USER: z.string().default('coaxwain'),
  COAXWAIN_DB_PASSWORD: z.string().default(''),
  COAXWAIN_DB_NAME: z.string().default('coaxwain'),
  COAXWAIN_SECRET: z.string().default(''),
  /** The address by which people reach the server, such as https://shelf.invalid. */
  COAXWAIN_ORIGIN: z.url({ protocol: /^https$/ }).optional(),
  /** Addresses, with commas between them, of what ends TLS and passes requests on. */
  COAXWAIN_TRUSTED_PROXIES: z.string().default(''),
  COAXWAIN_CLIENT: z.string().optional(),
  COAXWAIN_DEMO_FILE: z.string().optional(),
  COAXWAIN_LOG_LEVEL: z.enum(['debug', 'info', 'warn', 'error', 'silent']).default('info'),
  /** For tests: a database that forgets is not refused. */
  COAXWAIN_DISPOSABLE_DATABASE: z.enum(['0', '1']).default('0'),
})

export type Config = ReturnType<typeof readConfig>

const namesIn = (list: string): string[] =>
  list
    .split(',')
    .map((name) => name.trim())
    .filter((name) => name !== '')

function faultsOfServer(env: z.infer<typeof environment>): string[] {
  return [
    ...(secretIsWeak(env.COAXWAIN_SECRET)
      ? [
          `COAXWAIN_SECRET must hold at least ${LEAST_SECRET_BYTES} bytes of chance, and be no example`,
        ]
      : []),
    ...(env.COAXWAIN_ORIGIN === undefined
      ? ['COAXWAIN_ORIGIN must be the https address of this server']
      : []),
    ...(namesIn(env.COAXWAIN_TRUSTED_PROXIES).length === 0
      ? ['COAXWAIN_TRUSTED_PROXIES must name what ends TLS, or no cookie is ever set']
      : []),
    ...(env.COAXWAIN_DB_PASSWORD === '' ? ['COAXWAIN_DB_PASSWORD is missing'] : []),
    ...(env.COAXWAIN_DISPOSABLE_DATABASE === '1'
      ? ['COAXWAIN_DISPOSABLE_DATABASE is for tests only']
      : []),
    ...(env.COAXWAIN_DEMO_FILE !== undefined ? ['COAXWAIN_DEMO_FILE is for the demo only'] : []),
  ]
}

export const secretIsWeak = (secret: string): boolean =>
  Buffer.byteLength(secret) < LEAST_SECRET_BYTES ||
  new Set(secret).size < LEAST_DIFFERENT_LETTERS ||
  EXAMPLE.test(secret)

function faultsOfDemo(env: z.infer<typeof environment>): string[] {
  const loopback = ['127.0.0.1', '::1', 'localhost'].includes(env.COAXWAIN_HOST)
  return [
    ...(loopback ? [] : ['the demo listens on this machine only; COAXWAIN_HOST says otherwise']),
    ...(secretIsWeak(env.COAXWAIN_SECRET) ? ['COAXWAIN_SECRET is missing or weak'] : []),
  ]
}

/** Reads the environment once; throws with every fault named. Nothing else touches it. */
export function readConfig(source: NodeJS.ProcessEnv) {
  const env = environment.parse(source)
  const faults = env.COAXWAIN_MODE === 'server' ? faultsOfServer(env) : faultsOfDemo(env)
  if (faults.length > 0) throw new Error(`The set-up cannot be used: ${faults.join('; ')}.`)
  return {
    mode: env.COAXWAIN_MODE,
    host: env.COAXWAIN_HOST,
    port: env.PORT,
    origin: env.COAXWAIN_ORIGIN === undefined ? null : new URL(env.COAXWAIN_ORIGIN).origin,
    secret: env.COAXWAIN_SECRET,
    trustedProxies: namesIn(env.COAXWAIN_TRUSTED_PROXIES),
    clientFolder: env.COAXWAIN_CLIENT ?? null,
    demoFile: env.COAXWAIN_DEMO_FILE ?? null,
    logLevel: env.COAXWAIN_LOG_LEVEL,
    disposableDatabase: env.COAXWAIN_DISPOSABLE_DATABASE === '1',
    database: {
      host: env.COAXWAIN_DB_HOST,
      port: env.COAXWAIN_DB_PORT,
      user: env.COAXWAIN_DB_USER,
      password: env.COAXWAIN_DB_PASSWORD,
      database: env.COAXWAIN_DB_NAME,
    },
  } as const
}
