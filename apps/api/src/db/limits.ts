import type { Knex } from 'knex'
import { RateLimiterMySQL, RateLimiterRes } from 'rate-limiter-flexible'

const PERIOD_SECONDS = 15 * 60
const ACCOUNT_FAILURES = 10
const ADDRESS_FAILURES = 50
const FIRST_WAIT_SECONDS = 60

/** A refusal, with the seconds after which another try makes sense; null when the try is allowed. */
export type Refusal = { readonly retryAfterSeconds: number } | null

export interface SignInTry {
  readonly account: string
  readonly address: string
  /** Comes from a session in which this very account is signed in already. */
  readonly knownSession: boolean
}

/** Counts sign-ins that fail; in the database, so that it holds over processes and restarts. */
export interface SignInLimits {
  /** Counts the try before anything slow is done, so that many at once gain nothing. */
  beforeTry(attempt: SignInTry): Promise<Refusal>
  afterSuccess(attempt: SignInTry): Promise<void>
}

const seconds = (ms: number): number => Math.max(1, Math.ceil(ms / 1000))

export function createSignInLimits(db: Knex): SignInLimits {
  const limiter = (keyPrefix: string, points: number, duration: number): RateLimiterMySQL =>
    new RateLimiterMySQL({
      storeClient: db,
      storeType: 'knex',
      dbName: (db.client as { config: { connection: { database: string } } }).config.connection
        .database,
      tableName: 'limits',
      tableCreated: true,
      keyPrefix,
      points,
      duration,
    })
  const account = limiter('account', ACCOUNT_FAILURES, PERIOD_SECONDS)
  const address = limiter('address', ADDRESS_FAILURES, PERIOD_SECONDS)
  const pause = limiter('pause', 1, PERIOD_SECONDS)

  /** One try gets through, and the next has to wait for twice as long as the last one. */
  const behindPause = async (who: string, tries: number): Promise<Refusal> => {
    const wait = Math.min(PERIOD_SECONDS, FIRST_WAIT_SECONDS * 2 ** (tries - ACCOUNT_FAILURES))
    return refusalOf(() => pause.consume(who, 1, { customDuration: wait }))
  }

  const byAccount = async (who: string): Promise<Refusal> => {
    const found = await pause.get(who)
    if (found && found.msBeforeNext > 0) return { retryAfterSeconds: seconds(found.msBeforeNext) }
    const { consumedPoints: tries } = await account.penalty(who)
    if (tries < ACCOUNT_FAILURES) return null
    const refusal = await behindPause(who, tries)
    return tries === ACCOUNT_FAILURES ? null : refusal
  }

  return {
    async beforeTry({ account: who, address: from, knownSession }) {
      const byAddress = await refusalOf(() => address.consume(from))
      return byAddress || knownSession ? byAddress : byAccount(who)
    },
    async afterSuccess({ account: who, address: from }) {
      await Promise.all([account.delete(who), pause.delete(who), address.reward(from)])
    },
  }
}

async function refusalOf(take: () => Promise<unknown>): Promise<Refusal> {
  try {
    await take()
    return null
  } catch (refusal) {
    if (!(refusal instanceof RateLimiterRes)) throw refusal
    return { retryAfterSeconds: seconds(refusal.msBeforeNext) }
  }
}
