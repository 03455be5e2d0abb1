import type { BodyOf, ParamsOf, QueryOf, RouteName } from '@coaxwain/contract'
import { findHookups } from '@coaxwain/matcher'
import {
  chainOf,
  type ArrangementQuestion,
  type Hookup,
  type ProveQuestion,
  type Question,
  type Snapshot,
  type Unit,
} from '@coaxwain/shelf'
import { lead, modulator, monitor, player } from './models'
import { uidOf } from './uids'
import { COLLECTION, emailOf, MODELS, PASS_PHRASE, PLACES, UNITS } from './world'

export const question = (rest: Partial<Question> = {}): Question => ({
  format: 1,
  source: { unit: UNITS.player, playing: 'plays' },
  material: { protection: 'none' },
  display: { unit: UNITS.monitor },
  demands: {},
  avoid: [],
  offAir: [],
  assumedLeads: [],
  ...rest,
})

/** What is asked of the player and one set, in the form for several of either. */
export const arrangementQuestion = (
  rest: Partial<ArrangementQuestion> = {},
): ArrangementQuestion => ({
  format: 1,
  sources: [{ unit: UNITS.player, playing: 'plays', material: { protection: 'none' } }],
  displays: [{ unit: UNITS.monitor }],
  demands: {},
  avoid: [],
  offAir: [],
  assumedLeads: [],
  ...rest,
})

/** What is asked to try the player. */
export const proveQuestion = (rest: Partial<ProveQuestion> = {}): ProveQuestion => ({
  format: 1,
  unit: UNITS.player,
  avoid: [],
  ...rest,
})

const unit = (uid: string, model: string, quantity = 1): Unit => ({
  uid,
  model,
  quantity,
  working: 'untested',
  holding: 'kept',
  place: null,
  forms: [],
  functions: [],
  modifications: [],
  stands: {},
  remotePresent: true,
})

/** The small world as the engine sees it. */
export const worldSnapshot = (): Snapshot => ({
  shelfVersion: 1,
  catalogueVersion: 1,
  models: {
    [MODELS.player]: player(),
    [MODELS.monitor]: monitor(),
    [MODELS.modulator]: modulator(),
    [MODELS.lead]: lead(),
  },
  units: [
    unit(UNITS.player, MODELS.player),
    unit(UNITS.monitor, MODELS.monitor),
    unit(UNITS.modulator, MODELS.modulator),
    unit(UNITS.lead, MODELS.lead, 5),
  ],
})

/** The player by leads into the monitor, as the engine finds it. */
export function hookup(): Hookup {
  const [found] = findHookups(worldSnapshot(), question()).hookups
  if (!found) throw new Error('the engine finds no hookup in the small world')
  return found
}

export interface Example<N extends RouteName> {
  readonly params: ParamsOf<N>
  readonly query?: QueryOf<N>
  readonly body?: BodyOf<N>
  /** Made before by the first member who may, so that there is something to work on. */
  readonly before?: 'delete' | 'save-hookup' | 'save-and-delete-hookup'
  readonly version?: number
}

const IN = { collection: COLLECTION }
const UNIT = { ...IN, unit: UNITS.player }
export const HOOKUP = { ...IN, hookup: uidOf('hookup-saved') }

/** A request to every route that succeeds for whoever may make it. */
export const EXAMPLES: { readonly [N in RouteName]: Example<N> } = {
  readSession: { params: {} },
  signIn: { params: {}, body: { email: emailOf('owner'), password: PASS_PHRASE } },
  signOut: { params: {} },
  listDemoSignIns: { params: {} },
  listCollections: { params: {} },
  readCollection: { params: IN },
  listMembers: { params: IN },
  listPlaces: { params: IN },
  createPlace: { params: IN, body: { name: 'Loft' } },
  changePlace: { params: { ...IN, place: PLACES.shelf }, version: 1, body: { name: 'Rack' } },
  deletePlace: { params: { ...IN, place: PLACES.shelf }, version: 1 },
  listModels: { params: IN, query: { q: 'testmaker', limit: '5' } },
  readModel: { params: { ...IN, model: MODELS.own } },
  createModel: { params: IN, body: { document: player({ name: 'New model' }) } },
  changeModel: {
    params: { ...IN, model: MODELS.own },
    version: 1,
    body: { document: player({ name: 'Better model' }) },
  },
  deleteModel: { params: { ...IN, model: MODELS.own }, version: 1 },
  restoreModel: { params: { ...IN, model: MODELS.own }, before: 'delete', version: 2 },
  readModelRevision: { params: { ...IN, model: MODELS.own, revision: '1' } },
  listUnits: { params: IN, query: { rfOut: 'uhf' } },
  readUnit: { params: UNIT },
  createUnit: { params: IN, body: { model: MODELS.player, label: 'Second player' } },
  changeUnit: { params: UNIT, version: 1, body: { holding: 'spare' } },
  deleteUnit: { params: UNIT, version: 1 },
  restoreUnit: { params: UNIT, before: 'delete', version: 2 },
  changeUnitStates: {
    params: UNIT,
    version: 1,
    body: { forms: [{ jack: 'composite', port: 'video', state: 'works' }] },
  },
  changeStatesOfUnits: {
    params: IN,
    body: {
      units: [
        {
          unit: UNITS.player,
          version: 1,
          changes: { forms: [{ jack: 'composite', port: 'video', state: 'works' }] },
        },
      ],
    },
  },
  changeUnitModifications: {
    params: UNIT,
    version: 1,
    body: { modifications: [{ kind: 'bypassed', function: 'plays' }] },
  },
  changeUnitStands: {
    params: { ...IN, unit: UNITS.monitor },
    version: 1,
    body: { stands: { input: 'b' } },
  },
  readSnapshot: { params: IN },
  ask: { params: IN, body: { question: question() } },
  arrange: { params: IN, body: { question: arrangementQuestion() } },
  prove: { params: IN, body: { question: proveQuestion() } },
  checkChain: { params: IN, body: { question: question(), chain: chainOf(hookup()) } },
  listHookups: { params: IN },
  readHookup: { params: HOOKUP, before: 'save-hookup' },
  saveHookup: {
    params: IN,
    body: { title: 'Player to monitor', question: question(), hookup: hookup() },
  },
  renameHookup: {
    params: HOOKUP,
    before: 'save-hookup',
    version: 1,
    body: { title: 'Another title' },
  },
  deleteHookup: { params: HOOKUP, before: 'save-hookup', version: 1 },
  restoreHookup: { params: HOOKUP, before: 'save-and-delete-hookup', version: 2 },
}

/** The address of a route with its values filled in. */
export function addressOf(path: string, params: object, query: object = {}): string {
  const filled = path.replace(/:(\w+)/g, (_, name: string) =>
    String((params as Record<string, unknown>)[name]),
  )
  const text = new URLSearchParams(query as Record<string, string>).toString()
  return text === '' ? filled : `${filled}?${text}`
}
