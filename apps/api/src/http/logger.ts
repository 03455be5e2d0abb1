import { pino, stdSerializers, type DestinationStream, type Logger } from 'pino'

/** The driver puts whole statements with their values into its messages; only its numbers are kept. */
export function serializeError(error: unknown): unknown {
  if (!(error instanceof Error)) return { type: typeof error }
  const { code, errno } = error as { code?: unknown; errno?: unknown }
  if (errno === undefined && !('sql' in error)) return stdSerializers.err(error)
  const frames = (error.stack ?? '').split('\n').filter((line) => line.startsWith('    at '))
  return { type: error.name, code, errno, stack: frames.join('\n') }
}

const SECRETS = [
  'password',
  'passPhrase',
  'passwordHash',
  'password_hash',
  'cookie',
  'authorization',
]

/** JSON lines; what might be a secret is struck out wherever it turns up. */
export const createLogger = (level: string, to: DestinationStream = pino.destination(1)): Logger =>
  pino(
    {
      level,
      base: null,
      timestamp: pino.stdTimeFunctions.isoTime,
      serializers: { err: serializeError },
      redact: { paths: SECRETS.flatMap((name) => [name, `*.${name}`, `*.*.${name}`]), censor: '-' },
    },
    to,
  )
