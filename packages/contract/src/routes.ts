import { z } from 'zod'
import { arrangementReply, arrangementRequest } from './arrangements'
import { hookupCheckReply, hookupCheckRequest } from './hookup-checks'
import {
  answerReply,
  answerRequest,
  hookupChange,
  hookupDetail,
  hookupPage,
  hookupQuery,
  newHookup,
} from './hookups'
import { modelChange, modelDetail, modelPage, modelQuery, modelRevision, newModel } from './models'
import { collection, collections, demoSignIns, members, session, signIn } from './people'
import { proveReply, proveRequest } from './proofs'
import { newPlace, place, placeChange, places } from './places'
import type { Right } from './roles'
import { uid } from './text'
import {
  manyStateChanges,
  modificationChange,
  newUnit,
  snapshot,
  standChange,
  stateChange,
  unitChange,
  unitDetail,
  unitDetails,
  unitPage,
  unitQuery,
} from './units'

export const API_ROOT = '/api/v1'

/** `anyone` is everybody, `signed-in` any person; a right is looked up in the table of roles. */
export type Who = 'anyone' | 'signed-in' | Right

export interface Route {
  readonly method: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE'
  /** Below {@link API_ROOT}. */
  readonly path: string
  readonly who: Who
  readonly summary: string
  readonly params: z.ZodType
  readonly query: z.ZodType
  readonly body: z.ZodType | null
  /** What comes back; null with status 204. */
  readonly reply: z.ZodType | null
  readonly status: 200 | 201 | 204
  /** Needs the version that was read, in `If-Match`. */
  readonly ifMatch: boolean
  /** Answers carry a strong ETag. */
  readonly etag: boolean
  /** Exists only in the demonstration. */
  readonly demoOnly: boolean
}

const NOTHING = z.strictObject({})
const OF_COLLECTION = z.strictObject({ collection: uid })
const OF_PLACE = z.strictObject({ collection: uid, place: uid })
const OF_MODEL = z.strictObject({ collection: uid, model: uid })
const OF_REVISION = z.strictObject({
  collection: uid,
  model: uid,
  revision: z
    .string()
    .regex(/^[1-9]\d{0,8}$/)
    .transform(Number),
})
const OF_UNIT = z.strictObject({ collection: uid, unit: uid })
const OF_HOOKUP = z.strictObject({ collection: uid, hookup: uid })

const PLAIN = {
  params: NOTHING,
  query: NOTHING,
  body: null,
  reply: null,
  ifMatch: false,
  etag: false,
  demoOnly: false,
} as const

const IN = '/collections/:collection'

/**
 * Every route of the API. The server refuses to mount anything that is not here, and one test walks
 * the table with every role.
 */
export const ROUTES = {
  readSession: {
    ...PLAIN,
    method: 'GET',
    path: '/session',
    who: 'anyone',
    summary: 'Who is looking, and where they belong',
    reply: session,
    status: 200,
  },
  signIn: {
    ...PLAIN,
    method: 'POST',
    path: '/session',
    who: 'anyone',
    summary: 'Sign in',
    body: signIn,
    reply: session,
    status: 200,
  },
  signOut: {
    ...PLAIN,
    method: 'DELETE',
    path: '/session',
    who: 'signed-in',
    summary: 'Sign out',
    status: 204,
  },
  listDemoSignIns: {
    ...PLAIN,
    method: 'GET',
    path: '/demo-sign-ins',
    who: 'anyone',
    summary: 'People of the demonstration',
    reply: demoSignIns,
    status: 200,
    demoOnly: true,
  },
  listCollections: {
    ...PLAIN,
    method: 'GET',
    path: '/collections',
    who: 'signed-in',
    summary: 'Collections that one belongs to',
    reply: collections,
    status: 200,
  },
  readCollection: {
    ...PLAIN,
    method: 'GET',
    path: IN,
    who: 'collection.read',
    summary: 'One collection',
    params: OF_COLLECTION,
    reply: collection,
    status: 200,
  },
  listMembers: {
    ...PLAIN,
    method: 'GET',
    path: `${IN}/members`,
    who: 'members.read',
    summary: 'Who belongs to a collection',
    params: OF_COLLECTION,
    reply: members,
    status: 200,
  },
  listPlaces: {
    ...PLAIN,
    method: 'GET',
    path: `${IN}/places`,
    who: 'shelf.read',
    summary: 'All places',
    params: OF_COLLECTION,
    reply: places,
    status: 200,
  },
  createPlace: {
    ...PLAIN,
    method: 'POST',
    path: `${IN}/places`,
    who: 'shelf.write',
    summary: 'Make a place',
    params: OF_COLLECTION,
    body: newPlace,
    reply: place,
    status: 201,
    etag: true,
  },
  changePlace: {
    ...PLAIN,
    method: 'PATCH',
    path: `${IN}/places/:place`,
    who: 'shelf.write',
    summary: 'Rename or move a place',
    params: OF_PLACE,
    body: placeChange,
    reply: place,
    status: 200,
    ifMatch: true,
    etag: true,
  },
  deletePlace: {
    ...PLAIN,
    method: 'DELETE',
    path: `${IN}/places/:place`,
    who: 'shelf.write',
    summary: 'Delete an empty place',
    params: OF_PLACE,
    status: 204,
    ifMatch: true,
  },
  listModels: {
    ...PLAIN,
    method: 'GET',
    path: `${IN}/models`,
    who: 'models.read',
    summary: 'Models that a collection sees: shared ones and its own',
    params: OF_COLLECTION,
    query: modelQuery,
    reply: modelPage,
    status: 200,
  },
  readModel: {
    ...PLAIN,
    method: 'GET',
    path: `${IN}/models/:model`,
    who: 'models.read',
    summary: 'One model with its latest revision',
    params: OF_MODEL,
    reply: modelDetail,
    status: 200,
    etag: true,
  },
  createModel: {
    ...PLAIN,
    method: 'POST',
    path: `${IN}/models`,
    who: 'models.write',
    summary: "Make a model of the collection's own",
    params: OF_COLLECTION,
    body: newModel,
    reply: modelDetail,
    status: 201,
    etag: true,
  },
  changeModel: {
    ...PLAIN,
    method: 'PUT',
    path: `${IN}/models/:model`,
    who: 'models.write',
    summary: 'Write a new revision of an own model',
    params: OF_MODEL,
    body: modelChange,
    reply: modelDetail,
    status: 200,
    ifMatch: true,
    etag: true,
  },
  deleteModel: {
    ...PLAIN,
    method: 'DELETE',
    path: `${IN}/models/:model`,
    who: 'models.write',
    summary: 'Delete an own model that no unit is of',
    params: OF_MODEL,
    status: 204,
    ifMatch: true,
  },
  restoreModel: {
    ...PLAIN,
    method: 'POST',
    path: `${IN}/models/:model/restore`,
    who: 'models.write',
    summary: 'Bring a deleted model back',
    params: OF_MODEL,
    reply: modelDetail,
    status: 200,
    ifMatch: true,
    etag: true,
  },
  readModelRevision: {
    ...PLAIN,
    method: 'GET',
    path: `${IN}/models/:model/revisions/:revision`,
    who: 'models.read',
    summary: 'An earlier description of a model',
    params: OF_REVISION,
    reply: modelRevision,
    status: 200,
  },
  listUnits: {
    ...PLAIN,
    method: 'GET',
    path: `${IN}/units`,
    who: 'shelf.read',
    summary: 'Units, filtered and sorted',
    params: OF_COLLECTION,
    query: unitQuery,
    reply: unitPage,
    status: 200,
  },
  readUnit: {
    ...PLAIN,
    method: 'GET',
    path: `${IN}/units/:unit`,
    who: 'shelf.read',
    summary: 'One unit with its states',
    params: OF_UNIT,
    reply: unitDetail,
    status: 200,
    etag: true,
  },
  createUnit: {
    ...PLAIN,
    method: 'POST',
    path: `${IN}/units`,
    who: 'shelf.write',
    summary: 'Put a unit on the shelf',
    params: OF_COLLECTION,
    body: newUnit,
    reply: unitDetail,
    status: 201,
    etag: true,
  },
  changeUnit: {
    ...PLAIN,
    method: 'PATCH',
    path: `${IN}/units/:unit`,
    who: 'shelf.hold',
    summary: 'Change what is noted of a unit; some roles only whether it is kept or spare',
    params: OF_UNIT,
    body: unitChange,
    reply: unitDetail,
    status: 200,
    ifMatch: true,
    etag: true,
  },
  deleteUnit: {
    ...PLAIN,
    method: 'DELETE',
    path: `${IN}/units/:unit`,
    who: 'shelf.write',
    summary: 'Delete a unit; it can be brought back',
    params: OF_UNIT,
    status: 204,
    ifMatch: true,
  },
  restoreUnit: {
    ...PLAIN,
    method: 'POST',
    path: `${IN}/units/:unit/restore`,
    who: 'shelf.write',
    summary: 'Bring a deleted unit back',
    params: OF_UNIT,
    reply: unitDetail,
    status: 200,
    ifMatch: true,
    etag: true,
  },
  changeUnitStates: {
    ...PLAIN,
    method: 'PATCH',
    path: `${IN}/units/:unit/states`,
    who: 'shelf.write',
    summary: 'Note what was tried: forms on ports, and functions',
    params: OF_UNIT,
    body: stateChange,
    reply: unitDetail,
    status: 200,
    ifMatch: true,
    etag: true,
  },
  changeStatesOfUnits: {
    ...PLAIN,
    method: 'POST',
    path: `${IN}/unit-states`,
    who: 'shelf.write',
    summary:
      'Note what was tried on several units: all of it, or nothing; versions stand in the body',
    params: OF_COLLECTION,
    body: manyStateChanges,
    reply: unitDetails,
    status: 200,
  },
  changeUnitModifications: {
    ...PLAIN,
    method: 'PUT',
    path: `${IN}/units/:unit/modifications`,
    who: 'shelf.write',
    summary: 'Say what was done to this very unit',
    params: OF_UNIT,
    body: modificationChange,
    reply: unitDetail,
    status: 200,
    ifMatch: true,
    etag: true,
  },
  changeUnitStands: {
    ...PLAIN,
    method: 'PUT',
    path: `${IN}/units/:unit/stands`,
    who: 'shelf.write',
    summary: 'Say where its controls stand',
    params: OF_UNIT,
    body: standChange,
    reply: unitDetail,
    status: 200,
    ifMatch: true,
    etag: true,
  },
  readSnapshot: {
    ...PLAIN,
    method: 'GET',
    path: `${IN}/snapshot`,
    who: 'shelf.read',
    summary: 'Everything that an answer may rest on; answers 304 to a matching If-None-Match',
    params: OF_COLLECTION,
    reply: snapshot,
    status: 200,
    etag: true,
  },
  ask: {
    ...PLAIN,
    method: 'POST',
    path: `${IN}/answers`,
    who: 'hookups.read',
    summary: 'Ask how to connect a source to a display; nothing is kept',
    params: OF_COLLECTION,
    body: answerRequest,
    reply: answerReply,
    status: 200,
  },
  arrange: {
    ...PLAIN,
    method: 'POST',
    path: `${IN}/arrangements`,
    who: 'hookups.read',
    summary: 'Wire several sources to one display, or one source to several displays, once for all',
    params: OF_COLLECTION,
    body: arrangementRequest,
    reply: arrangementReply,
    status: 200,
  },
  prove: {
    ...PLAIN,
    method: 'POST',
    path: `${IN}/proofs`,
    who: 'hookups.read',
    summary: 'The shortest chains that try what nobody has tried of a unit; nothing is kept',
    params: OF_COLLECTION,
    body: proveRequest,
    reply: proveReply,
    status: 200,
  },
  checkChain: {
    ...PLAIN,
    method: 'POST',
    path: `${IN}/hookup-checks`,
    who: 'hookups.read',
    summary: 'Have a chain that was wired by hand judged link by link; nothing is kept',
    params: OF_COLLECTION,
    body: hookupCheckRequest,
    reply: hookupCheckReply,
    status: 200,
  },
  listHookups: {
    ...PLAIN,
    method: 'GET',
    path: `${IN}/hookups`,
    who: 'hookups.read',
    summary: 'Saved hookups',
    params: OF_COLLECTION,
    query: hookupQuery,
    reply: hookupPage,
    status: 200,
  },
  readHookup: {
    ...PLAIN,
    method: 'GET',
    path: `${IN}/hookups/:hookup`,
    who: 'hookups.read',
    summary: 'One saved hookup and how it stands today',
    params: OF_HOOKUP,
    reply: hookupDetail,
    status: 200,
    etag: true,
  },
  saveHookup: {
    ...PLAIN,
    method: 'POST',
    path: `${IN}/hookups`,
    who: 'hookups.write',
    summary: 'Keep a hookup of an answer',
    params: OF_COLLECTION,
    body: newHookup,
    reply: hookupDetail,
    status: 201,
    etag: true,
  },
  renameHookup: {
    ...PLAIN,
    method: 'PATCH',
    path: `${IN}/hookups/:hookup`,
    who: 'hookups.write',
    summary: 'Give a saved hookup another title',
    params: OF_HOOKUP,
    body: hookupChange,
    reply: hookupDetail,
    status: 200,
    ifMatch: true,
    etag: true,
  },
  deleteHookup: {
    ...PLAIN,
    method: 'DELETE',
    path: `${IN}/hookups/:hookup`,
    who: 'hookups.write',
    summary: 'Delete a saved hookup; it can be brought back',
    params: OF_HOOKUP,
    status: 204,
    ifMatch: true,
  },
  restoreHookup: {
    ...PLAIN,
    method: 'POST',
    path: `${IN}/hookups/:hookup/restore`,
    who: 'hookups.write',
    summary: 'Bring a deleted hookup back',
    params: OF_HOOKUP,
    reply: hookupDetail,
    status: 200,
    ifMatch: true,
    etag: true,
  },
} as const satisfies Record<string, Route>

export type RouteName = keyof typeof ROUTES

type In<S> = S extends z.ZodType ? z.input<S> : undefined
type Out<S> = S extends z.ZodType ? z.output<S> : undefined

/** What a caller hands over, before defaults and transformations. */
export type ParamsOf<N extends RouteName> = In<(typeof ROUTES)[N]['params']>
export type QueryOf<N extends RouteName> = In<(typeof ROUTES)[N]['query']>
export type BodyOf<N extends RouteName> = In<(typeof ROUTES)[N]['body']>

/** What a handler gets, and what a caller gets back. */
export type ParsedParamsOf<N extends RouteName> = Out<(typeof ROUTES)[N]['params']>
export type ParsedQueryOf<N extends RouteName> = Out<(typeof ROUTES)[N]['query']>
export type ParsedBodyOf<N extends RouteName> = Out<(typeof ROUTES)[N]['body']>
export type ReplyOf<N extends RouteName> = Out<(typeof ROUTES)[N]['reply']>
