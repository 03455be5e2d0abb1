import { controlOf, type DeviceModel, type JackContact, type Key } from '@coaxwain/models'
import type {
  Evidence,
  FormState,
  FunctionState,
  Modification,
  TestState,
  Unit,
} from '@coaxwain/shelf'
import { modelOf, type DeviceSlug, type PieceSlug } from '../catalogue/index'
import type { DemoKey, DemoUnit } from '../demo-data'
import { demoUid, modelUid } from '../uid'

/** How something was found out. */
export const on = (date: string, by: DemoKey, how: string): Evidence => ({ on: date, by, how })

/**
 * What was tried: a jack (on all its ports), one port of it as `jack/port`, a function as `does:function`,
 * or `*` for everything. Where two tests speak of the same thing, the later one holds.
 */
export interface Test {
  readonly state: TestState
  readonly evidence: Evidence
  readonly what: readonly string[]
}

const test =
  (state: TestState) =>
  (evidence: Evidence, ...what: readonly string[]): Test => ({ state, evidence, what })

export const works = test('works')
export const intermittent = test('intermittent')
export const dead = test('dead')

export interface UnitDraft extends Partial<
  Pick<Unit, 'working' | 'holding' | 'modifications' | 'stands' | 'remotePresent'>
> {
  readonly place: DemoKey | null
  readonly addedOn: string
  readonly tests?: readonly Test[]
  readonly label?: string
  readonly serial?: string
  readonly note?: string
}

/** What holds of a thing where nothing else is said. */
const USUAL = {
  working: 'untested',
  holding: 'kept',
  modifications: [],
  stands: {},
  remotePresent: false,
  label: '',
  serial: '',
  note: '',
} as const

/** Makes the units of one collection; `mark` keeps their ids apart from those of other collections. */
export function unitMaker(mark: string) {
  return (number: number, slug: DeviceSlug, draft: UnitDraft): DemoUnit => {
    const model = modelOf(slug)
    if (model.type !== 'device') throw new Error(`${slug} is not a device`)
    const { tests = [], ...stated } = { ...USUAL, ...draft }
    const device = withAdded(model, stated.modifications)
    for (const key of Object.keys(stated.stands)) controlOf(device, key)
    return {
      ...stated,
      ...statesOf(device, tests),
      uid: demoUid(`u-${mark}-${number}`),
      number,
      model: modelUid(slug),
      quantity: 1,
    }
  }
}

/** Makes the leads and adapters of one collection, all in one place. */
export function drawerMaker(mark: string, place: DemoKey, addedOn: string) {
  return (number: number, slug: PieceSlug, quantity: number, note = ''): DemoUnit => ({
    ...USUAL,
    uid: demoUid(`u-${mark}-${number}`),
    number,
    model: modelUid(slug),
    quantity,
    working: 'works',
    place,
    forms: [],
    functions: [],
    note,
    addedOn,
  })
}

function withAdded(model: DeviceModel, modifications: readonly Modification[]): DeviceModel {
  const added = modifications.filter((m) => m.kind === 'added')
  return {
    ...model,
    ports: [...model.ports, ...added.flatMap((m) => m.ports)],
    jacks: [...model.jacks, ...added.flatMap((m) => m.jacks)],
    functions: [...model.functions, ...added.flatMap((m) => m.functions)],
  }
}

function statesOf(device: DeviceModel, tests: readonly Test[]): Pick<Unit, 'forms' | 'functions'> {
  const forms = new Map<string, FormState>()
  const functions = new Map<Key, FunctionState>()
  for (const { state, evidence, what } of tests) {
    for (const name of what) {
      for (const { jack, port } of contactsNamed(device, name)) {
        forms.set(`${jack}/${port}`, { jack, port, state, ...evidence })
      }
      for (const key of functionsNamed(device, name)) {
        functions.set(key, { function: key, state, ...evidence })
      }
    }
  }
  return { forms: [...forms.values()], functions: [...functions.values()] }
}

const EVERYTHING = '*'
const FUNCTION_MARK = 'does:'

const portsOf = (contacts: readonly JackContact[]): readonly Key[] => [
  ...new Set(contacts.map((c) => c.port)),
]

function contactsNamed(device: DeviceModel, name: string): readonly { jack: Key; port: Key }[] {
  if (name.startsWith(FUNCTION_MARK)) return []
  const [jackName, portName] = name.split('/')
  const found = device.jacks
    .filter((j) => name === EVERYTHING || j.key === jackName)
    .flatMap((j) => portsOf(j.contacts).map((port) => ({ jack: j.key, port })))
    .filter((c) => portName === undefined || c.port === portName)
  if (found.length === 0) throw new Error(`${device.name} has no jack ${name}`)
  return found
}

function functionsNamed(device: DeviceModel, name: string): readonly Key[] {
  if (name === EVERYTHING) return device.functions.map((f) => f.key)
  if (!name.startsWith(FUNCTION_MARK)) return []
  const key = name.slice(FUNCTION_MARK.length)
  if (!device.functions.some((f) => f.key === key)) {
    throw new Error(`${device.name} has no function ${key}`)
  }
  return [key]
}
