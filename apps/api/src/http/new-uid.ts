import { randomUid, uidFrom } from '../uid'

/**
 * The id of what is about to be made: the client's own, or one that every repetition of the request
 * arrives at, or a new one.
 */
export const newUid = (given: string | undefined, idempotencyKey: string | null): string =>
  given ?? (idempotencyKey === null ? randomUid() : uidFrom(idempotencyKey))
