import { readFileSync } from 'node:fs'

export type CsvRow = Readonly<Record<string, string>>

const CELL = /("([^"]|"")*"|[^,]*)(,|$)/gu

function cells(line: string): string[] {
  const found = [...line.matchAll(CELL)].map((m) => m[1] ?? '')
  // An empty match stands behind the last cell, unless the line ends with a comma.
  if (!line.endsWith(',')) found.pop()
  return found.map((cell) => cell.replace(/^"|"$/gu, '').replaceAll('""', '"'))
}

/** A published table that lies beside the tests. No cell runs over a line. */
export function readTable(name: string): readonly CsvRow[] {
  const text = readFileSync(new URL(`./data/${name}.csv`, import.meta.url), 'utf8')
  const [head = '', ...lines] = text.trim().split(/\r?\n/u)
  const names = cells(head)
  return lines.map((line) => {
    const values = cells(line)
    return Object.fromEntries(names.map((column, i) => [column, values[i] ?? '']))
  })
}

/** Every number that stands in a text, in order; a minus counts only where no figure stands before it. */
export const numbersIn = (text: string): number[] =>
  [...text.matchAll(/(?<![\d.])-?\d+(?:\.\d+)?/gu)].map((m) => Number(m[0]))
