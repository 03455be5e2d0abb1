import type {
  FormState,
  FunctionState,
  HoldingState,
  Modification,
  TestState,
  WorkingState,
} from '@coaxwain/shelf'

export interface UnitRow {
  readonly id: number
  readonly uid: string
  readonly number: number
  readonly label: string
  readonly sortName: string
  readonly serial: string
  readonly note: string
  readonly quantity: number
  readonly working: WorkingState
  readonly holding: HoldingState
  readonly placeId: number | null
  readonly placeName: string | null
  readonly remotePresent: boolean
  readonly madeFrom: string | null
  readonly version: number
  readonly addedAt: Date
  readonly changedAt: Date
  readonly deletedAt: Date | null
  readonly modelId: number
  readonly modelUid: string
  readonly modelType: 'device' | 'piece'
  readonly modelKind: string
  readonly maker: string
  readonly modelName: string
  readonly market: string
  readonly revision: number
  readonly neededByCount: number
}

/** What is noted of one unit beside its own row. */
export interface Overlays {
  readonly forms: readonly FormState[]
  readonly functions: readonly FunctionState[]
  readonly modifications: readonly Modification[]
  readonly stands: Readonly<Record<string, string>>
}

export interface NewUnitRow {
  readonly uid: string
  readonly number: number
  readonly modelId: number
  readonly modelHomeKey: number
  readonly label: string
  readonly sortName: string
  readonly serial: string
  readonly note: string
  readonly quantity: number
  readonly working: WorkingState
  readonly holding: HoldingState
  readonly placeId: number | null
  readonly remotePresent: boolean
  readonly madeFrom: string | null
  readonly by: number | null
}

export type UnitFields = Partial<
  Pick<
    NewUnitRow,
    | 'label'
    | 'sortName'
    | 'serial'
    | 'note'
    | 'quantity'
    | 'working'
    | 'holding'
    | 'placeId'
    | 'remotePresent'
  >
>

interface Found {
  readonly state: TestState
  readonly on: string | null
  readonly how: string | null
  readonly byId: number | null
  readonly byName: string | null
}

export type FormFound = Found & { readonly jack: string; readonly port: string }
export type FunctionFound = Found & { readonly function: string }
