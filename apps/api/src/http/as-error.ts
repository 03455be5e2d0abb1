/** Libraries may hand over anything; what is no error becomes one, so that nothing is lost. */
export const asError = (thrown: unknown): Error =>
  thrown instanceof Error ? thrown : new Error(String(thrown), { cause: thrown })
