import { differences, type Check } from './check'
import { Inputs, type Kinds } from './inputs'
import { CARRIER_KINDS } from './kinds/carriers'
import { CIRCUIT_KINDS } from './kinds/circuits'
import { LEVEL_KINDS } from './kinds/levels'
import { LIMIT_KINDS } from './kinds/limits'

/** One small function to each kind of check. */
export const KINDS: Kinds = {
  ...CIRCUIT_KINDS,
  ...LEVEL_KINDS,
  ...CARRIER_KINDS,
  ...LIMIT_KINDS,
}

/** Reads the text of a file of checks. Throws where it is no such file. */
export function readChecks(text: string): readonly Check[] {
  const parsed: unknown = JSON.parse(text)
  const checks = Array.isArray(parsed) ? parsed : (parsed as { checks?: unknown } | null)?.checks
  if (!Array.isArray(checks)) throw new Error('no list of checks')
  return checks as Check[]
}

/** Why a check fails; nothing where it passes. */
export function failuresOf(check: Check): string[] {
  const kind = Object.hasOwn(KINDS, check.kind) ? KINDS[check.kind] : undefined
  if (!kind) return [`unknown kind ${check.kind}`]
  try {
    const found = kind(new Inputs(check.inputs))
    return differences(check.expected, found, check.tolerance ?? 0)
  } catch (error) {
    return [error instanceof Error ? error.message : String(error)]
  }
}

export interface KindCount {
  readonly kind: string
  readonly passed: number
  readonly failed: number
}

export interface Report {
  readonly kinds: readonly KindCount[]
  readonly failures: readonly { readonly id: string; readonly why: readonly string[] }[]
  readonly passed: number
  readonly failed: number
}

/** Runs checks, and counts them by kind in the order in which the kinds first come up. */
export function runChecks(checks: readonly Check[]): Report {
  const judged = checks.map((check) => ({ check, why: failuresOf(check) }))
  const failures = judged
    .filter(({ why }) => why.length > 0)
    .map(({ check, why }) => ({ id: `${check.kind} ${check.id}`, why }))
  const kinds = [...new Set(checks.map((c) => c.kind))].map((kind): KindCount => {
    const own = judged.filter(({ check }) => check.kind === kind)
    const failed = own.filter(({ why }) => why.length > 0).length
    return { kind, passed: own.length - failed, failed }
  })
  return { kinds, failures, passed: checks.length - failures.length, failed: failures.length }
}
