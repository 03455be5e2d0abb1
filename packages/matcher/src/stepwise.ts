/** A search that its caller slices, and may leave whenever it likes. */
export interface Stepwise<A> {
  /** Goes on for so many small steps. */
  step(steps: number): void
  readonly done: boolean
  /** Labels expanded so far. */
  readonly work: number
  /** The answer as far as it is known. */
  best(): A
}
