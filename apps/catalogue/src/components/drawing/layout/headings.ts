import type { FacePort } from './face-input'
import { textWidth } from './text-width'

/** A printed name over a run of neighbouring sockets. */
export interface HeadingRun {
  readonly row: number
  readonly text: string
  readonly half: number
  /** Columns of the bracket's ends. */
  readonly first: number
  readonly last: number
  /** The columns over which the name itself stands: those that no cable parts from the rest. */
  readonly textFirst: number
  readonly textLast: number
}

/** A cable of an upper row that comes down right of a column, or through it where it is empty. */
export interface WayDown {
  readonly port: string
  readonly row: number
  readonly column: number
  /** Nothing stands beneath it: it goes straight down. */
  readonly straight: boolean
  /** Its place among those right of the same column. */
  readonly slot: number
}

type IndexOf = (port: string) => number

/** Runs of sockets under one name, row by row; in compact panels only over those that are drawn. */
export function headingRuns(
  rows: readonly (readonly FacePort[])[],
  indexOf: IndexOf,
  shown: (p: FacePort) => boolean,
  ways: readonly WayDown[],
): HeadingRun[] {
  return rows.flatMap((row, i) => {
    const runs: { text: string; ports: FacePort[] }[] = []
    let before: FacePort | undefined
    for (const port of row) {
      const run = runs.at(-1)
      if (port.heading !== null && before?.heading === port.heading && run) run.ports.push(port)
      else if (port.heading !== null) runs.push({ text: port.heading, ports: [port] })
      before = port
    }
    return runs.flatMap(({ text, ports }): HeadingRun[] => {
      const columns = ports.filter(shown).map((p) => indexOf(p.key))
      const first = columns[0]
      const last = columns.at(-1)
      if (first === undefined || last === undefined) return []
      const widest = widestPart(
        columns,
        ways.filter((w) => w.row < i),
      )
      return [{ row: i, text, half: textWidth(text, 12, 400) / 2, first, last, ...widest }]
    })
  })
}

/** The longest stretch of columns that no cable cuts. */
function widestPart(columns: readonly number[], ways: readonly WayDown[]) {
  const cuts = (a: number, b: number): boolean =>
    ways.some((w) => (w.straight ? w.column > a && w.column < b : w.column >= a && w.column < b))
  const parts: number[][] = []
  for (const column of columns) {
    const part = parts.at(-1)
    const last = part?.at(-1)
    if (part && last !== undefined && !cuts(last, column)) part.push(column)
    else parts.push([column])
  }
  const widest = parts.reduce<number[]>((best, p) => (p.length > best.length ? p : best), [])
  return { textFirst: widest[0] ?? 0, textLast: widest.at(-1) ?? 0 }
}
