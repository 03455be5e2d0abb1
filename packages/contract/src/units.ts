import { FUNCTION_KINDS } from '@coaxwain/models'
import {
  HOLDING_STATES,
  TEST_STATES,
  WORKING_STATES,
  type FormState,
  type FunctionState,
  type Modification,
  type Snapshot,
  type Unit,
} from '@coaxwain/shelf'
import { CONNECTORS, FORMS } from '@coaxwain/signal'
import { z } from 'zod'
import { jack, modelDocument, modelFunction, port } from './model-document'
import { modelKind, modelSummary } from './models'
import { page, pageQuery } from './page'
import type { Holds, Same } from './same'
import { instant, key, line, plainDate, prose, queryFlag, queryNumber, uid, version } from './text'

export const workingState = z.enum(WORKING_STATES)
export const testState = z.enum(TEST_STATES)
export const holdingState = z.enum(HOLDING_STATES)

const evidence = {
  on: plainDate.optional(),
  how: line(200).optional(),
}

const formStateDocument = z.strictObject({
  jack: key,
  port: key,
  state: testState,
  ...evidence,
  by: z.string().optional(),
})

const functionStateDocument = z.strictObject({
  function: key,
  state: testState,
  ...evidence,
  by: z.string().optional(),
})

const modificationDocument = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('added'),
    ports: z.array(port).max(40),
    jacks: z.array(jack).max(60),
    functions: z.array(modelFunction).max(40),
    note: prose(1000).optional(),
  }),
  z.strictObject({ kind: z.literal('bypassed'), function: key, note: prose(1000).optional() }),
  z.strictObject({
    kind: z.literal('aerial-isolator'),
    state: z.enum(['tested-good', 'bad', 'bypassed']),
    on: plainDate.optional(),
  }),
])

const stands = z.record(key, line(60))

const unitDocument = z.strictObject({
  uid,
  model: uid,
  quantity: z.int().min(0).max(10_000),
  working: workingState,
  holding: holdingState,
  place: z.string().nullable(),
  forms: z.array(formStateDocument),
  functions: z.array(functionStateDocument),
  modifications: z.array(modificationDocument),
  stands,
  remotePresent: z.boolean(),
})

const snapshotDocument = z.strictObject({
  shelfVersion: version,
  catalogueVersion: version,
  models: z.record(uid, modelDocument),
  units: z.array(unitDocument),
})

export type UnitAgrees = [
  Holds<Same<z.infer<typeof formStateDocument>, FormState>>,
  Holds<Same<z.infer<typeof functionStateDocument>, FunctionState>>,
  Holds<Same<z.infer<typeof modificationDocument>, Modification>>,
  Holds<Same<z.infer<typeof unitDocument>, Unit>>,
  Holds<Same<z.infer<typeof snapshotDocument>, Snapshot>>,
]

const modification: z.ZodType<Modification> = modificationDocument

/** The matcher's view. `place` of a unit is the path of its names, outermost first. */
export const snapshot: z.ZodType<Snapshot> = snapshotDocument

/** Worst of what was tried, how many ports are so, how many were tried of how many. */
export const unitBadge = z.strictObject({
  state: testState,
  inThatState: z.int().min(0),
  tried: z.int().min(0),
  of: z.int().min(0),
})

/** What the shelf list shows of a unit. */
export const unitSummary = z.strictObject({
  uid,
  version,
  /** Runs up within its collection and is never given again. */
  number: z.int().min(1),
  /** What its people call it; may be empty. */
  label: line(80),
  model: modelSummary.pick({
    uid: true,
    type: true,
    kind: true,
    maker: true,
    name: true,
    market: true,
    revision: true,
  }),
  quantity: z.int().min(1).max(10_000),
  working: workingState,
  holding: holdingState,
  place: uid.nullable(),
  /** Names from the outermost place inwards. */
  placePath: z.array(z.string()),
  remotePresent: z.boolean(),
  badge: unitBadge,
  /** How many saved hookups use it. */
  neededByCount: z.int().min(0),
  addedAt: instant,
  changedAt: instant,
  deletedAt: instant.nullable(),
})
export type UnitSummary = z.infer<typeof unitSummary>

export const MOST_NEEDED_BY = 50

export const unitDetail = z.strictObject({
  ...unitSummary.shape,
  serial: line(80),
  note: prose(4000),
  forms: z.array(formStateDocument),
  functions: z.array(functionStateDocument),
  modifications: z.array(modification),
  stands,
  /** Saved hookups that use it, the first by title; `neededByCount` tells of them all. */
  neededBy: z.array(z.strictObject({ uid, title: z.string() })).max(MOST_NEEDED_BY),
})
export type UnitDetail = z.infer<typeof unitDetail>

export const UNIT_SORTS = [
  'name',
  '-name',
  'added',
  '-added',
  'changed',
  '-changed',
  'place',
  '-place',
] as const

/** VHF is 30-300 MHz, UHF 300-3000 MHz. Source: ITU-R V.431, bands 8 and 9. */
export const RF_BANDS = { vhf: [30, 300], uhf: [300, 3000] } as const satisfies Record<
  string,
  readonly [number, number]
>
export const RF_BAND_NAMES = ['vhf', 'uhf'] as const

const queryMhz = queryNumber(z.number().min(0).max(3000))

export const unitQuery = z.strictObject({
  ...pageQuery,
  sort: z.enum(UNIT_SORTS).optional(),
  q: line(100).optional(),
  model: uid.optional(),
  type: z.enum(['device', 'piece']).optional(),
  kind: modelKind.optional(),
  connector: z.enum(CONNECTORS).optional(),
  form: z.enum(FORMS).optional(),
  /** With `form`: which way it goes. */
  dir: z.enum(['in', 'out']).optional(),
  function: z.enum(FUNCTION_KINDS).optional(),
  working: workingState.optional(),
  /** Has at least one form or function in that state. */
  state: testState.optional(),
  holding: holdingState.optional(),
  /** `true`: neither sold nor gone. */
  present: queryFlag.optional(),
  /** That place and all places in it. */
  place: uid.optional(),
  /** Puts out RF on a carrier in this band, or in this span. */
  rfOut: z.enum(RF_BAND_NAMES).optional(),
  rfOutFromMhz: queryMhz.optional(),
  rfOutToMhz: queryMhz.optional(),
  deleted: queryFlag.optional(),
})
export type UnitQuery = z.infer<typeof unitQuery>

export const unitPage = page(unitSummary)
export type UnitPage = z.infer<typeof unitPage>

const quantity = z.int().min(1).max(10_000)

export const newUnit = z.strictObject({
  uid: uid.optional(),
  model: uid,
  label: line(80).optional(),
  serial: line(80).optional(),
  note: prose(4000).optional(),
  quantity: quantity.optional(),
  working: workingState.optional(),
  holding: holdingState.optional(),
  place: uid.nullable().optional(),
  remotePresent: z.boolean().optional(),
})
export type NewUnit = z.infer<typeof newUnit>

/** An absent field stays as it is; `place: null` takes it out of its place. */
export const unitChange = newUnit.omit({ uid: true, model: true })
export type UnitChange = z.infer<typeof unitChange>

/** Sets states one by one or many at once; `untested` clears. Who and, if absent, when are filled in. */
export const stateChange = z.strictObject({
  forms: z
    .array(z.strictObject({ jack: key, port: key, state: testState, ...evidence }))
    .max(500)
    .optional(),
  functions: z
    .array(z.strictObject({ function: key, state: testState, ...evidence }))
    .max(200)
    .optional(),
})
export type StateChange = z.infer<typeof stateChange>

/** Of several units at once, each with the version that was read. */
export const manyStateChanges = z.strictObject({
  units: z
    .array(z.strictObject({ unit: uid, version, changes: stateChange }))
    .min(1)
    .max(50),
})
export type ManyStateChanges = z.infer<typeof manyStateChanges>

/** The units as they are afterwards, in the order of the request. */
export const unitDetails = z.strictObject({ items: z.array(unitDetail) })

export const modificationChange = z.strictObject({ modifications: z.array(modification).max(20) })
export type ModificationChange = z.infer<typeof modificationChange>

/** Where controls stand now; replaces what was noted before. */
export const standChange = z.strictObject({ stands })
