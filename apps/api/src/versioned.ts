import { AppError } from './app-error'

/** What is edited, and the version that was read before. */
export interface At {
  readonly uid: string
  readonly version: number
}

/** A conditional write that met no row: somebody was quicker. Throws, so that the rest is undone. */
export function mustHold(written: boolean): void {
  if (!written) throw new AppError('version-stale')
}

/** Shows an edit that came too late what the thing looks like now. */
export async function orLate<T>(
  edit: () => Promise<T>,
  current: () => Promise<unknown>,
): Promise<T> {
  try {
    return await edit()
  } catch (error) {
    if (!(error instanceof AppError) || error.code !== 'version-stale') throw error
    throw new AppError('version-stale', { current: await current() })
  }
}
