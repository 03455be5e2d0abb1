import type { DeviceModel, Model } from '@coaxwain/models'
import type { FormState, Modification, Snapshot, TestState, Uid, Unit } from '@coaxwain/shelf'
import { BOXES, DEVICES, DISPLAYS, PIECES, SOURCES } from '../../enumeration/shelves/parts'
import { mutated } from '../../enumeration/shelves/mutate'
import type { Chance } from '../../support/chance'

export interface ShelfSize {
  readonly units: number
  readonly models: number
}

/** Of a catalogue so many in a hundred are leads and adapters. */
const PIECES_SHARE = 0.3
const MODIFIED_SHARE = 0.05

/**
 * A shelf of so many units over so many models. Models beyond those of the demonstration are these with one
 * to three things changed. As far as the count goes, every model has two units or more; each form works,
 * is untested or dead by itself (55, 35 and 10 in a hundred), and 5 units in a hundred were worked on.
 */
export function drawShelf(size: ShelfSize, chance: Chance): Snapshot {
  const pieces = drawModels(PIECES, Math.round(size.models * PIECES_SHARE), chance)
  const devices = drawDevices(size.models - pieces.length, chance)
  const models = [...devices, ...pieces]
  const units = Array.from({ length: size.units }, (_, i) => {
    const { uid, model } = models[i % models.length]!
    const name = `unit-${i}`
    return model.type === 'device' ? deviceUnit(name, uid, model, chance) : pieceUnit(name, uid)
  })
  return {
    shelfVersion: 1,
    catalogueVersion: 1,
    models: Object.fromEntries(models.map((m) => [m.uid, m.model])),
    units: chance.shuffled(units),
  }
}

interface Named<M extends Model> {
  readonly uid: Uid
  readonly model: M
}

function drawModels<M extends Model>(from: readonly Named<M>[], count: number, chance: Chance) {
  const first = chance.shuffled(from).slice(0, count)
  return Array.from({ length: count }, (_, i): Named<M> => {
    const { uid, model } = first[i % first.length]!
    return i < first.length
      ? { uid, model }
      : { uid: `${uid}-${i}`, model: { ...model, name: `${model.name} ${i}` } }
  })
}

/** A third each of sources and displays and boxes at least, so that there is something to ask. */
function drawDevices(count: number, chance: Chance): Named<DeviceModel>[] {
  const sorts = [SOURCES, DISPLAYS, BOXES, DEVICES]
  const known = new Set<Uid>()
  return Array.from({ length: count }, (_, i) => {
    const { uid, model } = chance.pick(sorts[i % sorts.length]!)
    if (!known.has(uid)) {
      known.add(uid)
      return { uid, model }
    }
    let changed: DeviceModel = { ...model, name: `${model.name} ${i}` }
    for (let n = 1 + chance.below(3); n > 0; n--) changed = mutated(changed, chance)
    return { uid: `${uid}-${i}`, model: changed }
  })
}

const NOTHING_NOTED = {
  holding: 'kept',
  place: null,
  stands: {},
  working: 'works',
} as const

const pieceUnit = (uid: Uid, model: Uid): Unit => ({
  ...NOTHING_NOTED,
  uid,
  model,
  quantity: 2,
  forms: [],
  functions: [],
  modifications: [],
  remotePresent: false,
})

function stateOf(chance: Chance): TestState {
  const drawn = chance.next()
  if (drawn < 0.55) return 'works'
  return drawn < 0.9 ? 'untested' : 'dead'
}

function deviceUnit(uid: Uid, model: Uid, device: DeviceModel, chance: Chance): Unit {
  const forms = device.jacks.flatMap((jack): FormState[] =>
    [...new Set(jack.contacts.map((c) => c.port))].map((port) => ({
      jack: jack.key,
      port,
      state: stateOf(chance),
    })),
  )
  const modifications = chance.isHit(MODIFIED_SHARE) ? modificationOf(device, chance) : []
  return {
    ...NOTHING_NOTED,
    uid,
    model,
    quantity: 1,
    forms,
    functions: [],
    modifications,
    remotePresent: true,
  }
}

function modificationOf(device: DeviceModel, chance: Chance): Modification[] {
  const fn = chance.pickIfAny(device.functions.filter((f) => f.kind !== 'plays'))
  return fn ? [{ kind: 'bypassed', function: fn.key }] : []
}
