/** Chance from a printed seed, so that every run draws the same; mulberry32. */
export class Chance {
  private state: number

  constructor(seed: number) {
    this.state = Math.imul(seed ^ 0x9e37_79b9, 0x85eb_ca6b) | 0
  }

  /** From 0 up to 1, without it. */
  next(): number {
    this.state = (this.state + 0x6d2b_79f5) | 0
    let mixed = Math.imul(this.state ^ (this.state >>> 15), 1 | this.state)
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296
  }

  below(count: number): number {
    return Math.floor(this.next() * count)
  }

  isHit(share: number): boolean {
    return this.next() < share
  }

  /** One of several; throws when there is none. */
  pick<T>(things: readonly T[]): T {
    if (things.length === 0) throw new Error('nothing to pick from')
    return things[this.below(things.length)] as T
  }

  pickIfAny<T>(things: readonly T[]): T | undefined {
    return things.length === 0 ? undefined : this.pick(things)
  }

  shuffled<T>(things: readonly T[]): T[] {
    const left = [...things]
    return things.map(() => left.splice(this.below(left.length), 1)[0] as T)
  }
}
