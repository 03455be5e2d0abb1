import type { FindingCode } from '../finding'

/** What is said of a chain made by hand beyond the faults of a hookup. */
export const CHAIN_CODES = [
  'nothing-across',
  'grey-only',
  'sound-crossed',
  'other-circuit',
  'logic-level',
  'plug-unsaid',
  'onto-the-aerial',
  'socket-untested',
  'socket-intermittent',
  'chassis-unknown',
  'dc-unknown',
  'stands-wrong',
  'stands-wrong-power',
  'stands-unsaid',
  'function-untested',
  'function-intermittent',
  'picture-ends',
  'silent',
  'tangled',
] as const

export type ChainCode = (typeof CHAIN_CODES)[number]

/** Something to say, before it is weighed and put into words. */
export interface Said {
  readonly code: FindingCode | ChainCode
  readonly details: Readonly<Record<string, string | number>>
}

export const said = (code: Said['code'], details: Said['details'] = {}): Said => ({ code, details })
