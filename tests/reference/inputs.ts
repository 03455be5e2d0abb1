import type { Result } from '@coaxwain/result'

/** What a check gives, read by name; a name that is missing or of the wrong sort fails that check alone. */
export class Inputs {
  constructor(private readonly given: Readonly<Record<string, unknown>>) {}

  get names(): readonly string[] {
    return Object.keys(this.given)
  }

  has(name: string): boolean {
    return this.given[name] !== undefined && this.given[name] !== null
  }

  number(name: string): number {
    const value = this.given[name]
    if (typeof value !== 'number') throw new Error(`inputs have no number ${name}`)
    return value
  }

  numberOr(name: string, otherwise: number): number {
    return this.has(name) ? this.number(name) : otherwise
  }

  text(name: string): string {
    const value = this.given[name]
    if (typeof value === 'number') return String(value)
    if (typeof value !== 'string') throw new Error(`inputs have no text ${name}`)
    return value
  }

  textOr(name: string, otherwise: string): string {
    return this.has(name) ? this.text(name) : otherwise
  }

  flag(name: string): boolean {
    return this.given[name] === true
  }

  flagOr(name: string, otherwise: boolean): boolean {
    return this.has(name) ? this.flag(name) : otherwise
  }

  numbers(name: string): readonly number[] {
    const value = this.given[name]
    if (!Array.isArray(value) || !value.every((v) => typeof v === 'number')) {
      throw new Error(`inputs have no list of numbers ${name}`)
    }
    return value
  }

  records(name: string): readonly Inputs[] {
    const value = this.given[name]
    if (!Array.isArray(value)) throw new Error(`inputs have no list ${name}`)
    return value.map((v) => new Inputs(v as Record<string, unknown>))
  }
}

/** One of a closed list. */
export function oneOf<T extends string>(list: readonly T[], word: string, what: string): T {
  const found = list.find((known) => known === word)
  if (found === undefined) throw new Error(`${what} ${word} is not known`)
  return found
}

/** The value of a calculation, or the reason why there is none as the reason why the check fails. */
export function got<T>(result: Result<T>): T {
  if (!result.ok) {
    throw new Error(`${result.problem.code} ${JSON.stringify(result.problem.details)}`)
  }
  return result.value
}

/** What a kind of check works out. */
export type Kind = (inputs: Inputs) => unknown

export type Kinds = Readonly<Record<string, Kind>>

export const passOrFail = (passes: boolean): 'pass' | 'fail' => (passes ? 'pass' : 'fail')
