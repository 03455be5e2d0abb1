import type { Jack, Key, Model, ModelFunction, Port } from '@coaxwain/models'

/** Outward id of a stored thing: 22 base64url characters. The engine only compares them. */
export type Uid = string

export const WORKING_STATES = ['untested', 'works', 'faulty', 'parts-only'] as const
/** What a person says of a unit as a whole. */
export type WorkingState = (typeof WORKING_STATES)[number]

export const TEST_STATES = ['untested', 'works', 'intermittent', 'dead'] as const
/** State of a form on a port, or of a function. Untested whatever the unit says. */
export type TestState = (typeof TEST_STATES)[number]

export const HOLDING_STATES = ['kept', 'spare', 'listed', 'held', 'sold', 'gone'] as const
export type HoldingState = (typeof HOLDING_STATES)[number]

/** How it was found out, when and by whom; `on` is a plain date. */
export interface Evidence {
  readonly on?: string | undefined
  readonly how?: string | undefined
  readonly by?: string | undefined
}

export interface FormState extends Evidence {
  readonly jack: Key
  readonly port: Key
  readonly state: TestState
}

export interface FunctionState extends Evidence {
  readonly function: Key
  readonly state: TestState
}

/** What somebody has done to this very unit. */
export type Modification =
  | {
      readonly kind: 'added'
      readonly ports: readonly Port[]
      readonly jacks: readonly Jack[]
      readonly functions: readonly ModelFunction[]
      readonly note?: string | undefined
    }
  | { readonly kind: 'bypassed'; readonly function: Key; readonly note?: string | undefined }
  | {
      readonly kind: 'aerial-isolator'
      readonly state: 'tested-good' | 'bad' | 'bypassed'
      readonly on?: string | undefined
    }

export interface Unit {
  readonly uid: Uid
  readonly model: Uid
  /** Above 1 only for leads, adapters and small parts. */
  readonly quantity: number
  readonly working: WorkingState
  readonly holding: HoldingState
  readonly place: string | null
  readonly forms: readonly FormState[]
  readonly functions: readonly FunctionState[]
  readonly modifications: readonly Modification[]
  /** Where its controls stand now, as far as noted. */
  readonly stands: Readonly<Record<Key, string>>
  readonly remotePresent: boolean
}

/** Everything that an answer may rest on: one collection's units and the models they are of. */
export interface Snapshot {
  readonly shelfVersion: number
  readonly catalogueVersion: number
  readonly models: Readonly<Record<Uid, Model>>
  readonly units: readonly Unit[]
}
