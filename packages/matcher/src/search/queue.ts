interface Cell<T> {
  readonly things: T[]
  next: number
}

/** Things in the order of two small numbers, the first before the second; equal ones first come, first served. */
export class Queue<T> {
  private readonly rows: Cell<T>[][] = []
  private row = 0
  private column = 0

  put(thing: T, first: number, second: number): void {
    const row = (this.rows[first] ??= [])
    const cell = (row[second] ??= { things: [], next: 0 })
    cell.things.push(thing)
    if (first < this.row || (first === this.row && second < this.column)) {
      this.row = first
      this.column = second
    }
  }

  take(): T | null {
    for (; this.row < this.rows.length; this.row++, this.column = 0) {
      const row = this.rows[this.row] ?? []
      for (; this.column < row.length; this.column++) {
        const cell = row[this.column]
        const thing = cell?.things[cell.next]
        if (cell && thing !== undefined) {
          cell.next++
          return thing
        }
      }
    }
    return null
  }
}
