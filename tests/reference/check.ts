/** One check of a reference file: a kind, what goes in, and what must come out. */
export interface Check {
  readonly id: string
  readonly kind: string
  readonly inputs: Readonly<Record<string, unknown>>
  readonly expected: unknown
  readonly tolerance?: number
}

/** Guards against the last bits of a binary fraction, never against a figure. */
const ROUNDING = 1e-9

const show = (value: unknown): string => JSON.stringify(value) ?? 'nothing'

/**
 * Where what came out is not what was expected: numbers within the tolerance, strings and booleans exactly,
 * lists of equal length, every named figure. A null is not compared.
 */
export function differences(
  expected: unknown,
  found: unknown,
  tolerance: number,
  at = '',
): string[] {
  if (expected === null) return []
  if (typeof expected === 'number') return ofNumbers(expected, found, tolerance, at)
  if (Array.isArray(expected)) return ofLists(expected, found, tolerance, at)
  if (typeof expected === 'object') {
    return ofRecords(expected as Record<string, unknown>, found, tolerance, at)
  }
  return expected === found ? [] : [`${at}expected ${show(expected)}, found ${show(found)}`]
}

function ofNumbers(expected: number, found: unknown, tolerance: number, at: string): string[] {
  const near = typeof found === 'number' && Math.abs(found - expected) <= tolerance + ROUNDING
  return near ? [] : [`${at}expected ${expected} within ${tolerance}, found ${show(found)}`]
}

function ofLists(
  expected: readonly unknown[],
  found: unknown,
  tolerance: number,
  at: string,
): string[] {
  if (!Array.isArray(found) || found.length !== expected.length) {
    return [`${at}expected ${show(expected)}, found ${show(found)}`]
  }
  return expected.flatMap((e, i) => differences(e, found[i], tolerance, `${at}${i}: `))
}

function ofRecords(
  expected: Readonly<Record<string, unknown>>,
  found: unknown,
  tolerance: number,
  at: string,
): string[] {
  if (typeof found !== 'object' || found === null) {
    return [`${at}expected ${show(expected)}, found ${show(found)}`]
  }
  const given = found as Readonly<Record<string, unknown>>
  return Object.entries(expected).flatMap(([name, value]) =>
    differences(value, given[name], tolerance, `${at}${name}: `),
  )
}
