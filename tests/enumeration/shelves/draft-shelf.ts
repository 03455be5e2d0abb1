import type { DeviceModel, Key, Model } from '@coaxwain/models'
import type { Modification, Question, Snapshot, TestState, Uid, Unit } from '@coaxwain/shelf'
import { Chance } from '../../support/chance'
import type { Asked } from '../shrink'

/** A shelf with the question that is put to it, and by what recipe it was drawn. */
export interface Shelf {
  readonly recipe: string
  readonly snapshot: Snapshot
  readonly question: Question
}

export interface DeviceDraft {
  readonly model: Uid
  readonly device: DeviceModel
}

/** What is to stand on a shelf. */
export interface ShelfDraft {
  readonly recipe: string
  readonly source: DeviceDraft
  readonly playing: Key
  readonly display: DeviceDraft
  readonly boxes: readonly DeviceDraft[]
  /** Models of pieces, each as often as it is there. */
  readonly pieces: readonly { readonly model: Uid; readonly piece: Model }[]
  /** Share of sockets and functions that were tried and found right. */
  readonly tried: number
}

const STATES: readonly TestState[] = ['untested', 'untested', 'works', 'intermittent', 'dead']

/** Puts a draft on a shelf: units with what is known of them, and a question about two of them. */
export function shelve(draft: ShelfDraft, chance: Chance): Shelf {
  const devices = [draft.source, draft.display, ...draft.boxes]
  const units = devices.map((d, i) => unitOf(d, `unit-${i}`, draft.tried, chance))
  const counts = new Map<Uid, number>()
  for (const { model } of draft.pieces) counts.set(model, (counts.get(model) ?? 0) + 1)
  const pieces = [...counts].map(([model, quantity]) => pieceUnit(model, quantity))
  const models = Object.fromEntries([
    ...devices.map((d) => [d.model, d.device] as const),
    ...draft.pieces.map((p) => [p.model, p.piece] as const),
  ])
  const all = chance.shuffled([...units, ...pieces])
  return {
    recipe: draft.recipe,
    snapshot: { shelfVersion: 1, catalogueVersion: 1, models, units: all },
    question: questionFor(draft, chance),
  }
}

/** Nothing that is left to chance comes about. */
class Certainty extends Chance {
  override next(): number {
    return 0
  }

  override isHit(): boolean {
    return false
  }
}

/** The same with everything tried and in order, and nothing asked for but a picture and its sound. */
export function bareShelf(draft: ShelfDraft): Asked {
  const { snapshot, question } = shelve(draft, new Certainty(0))
  const units = snapshot.units.map((u): Unit => ({
    ...u,
    working: 'works',
    forms: u.forms.map((f) => ({ ...f, state: 'works' })),
    functions: u.functions.map((f) => ({ ...f, state: 'works' })),
    modifications: [],
    remotePresent: true,
  }))
  return { snapshot: { ...snapshot, units }, question }
}

function questionFor(draft: ShelfDraft, chance: Chance): Question {
  const stereo = chance.isHit(0.03)
  const colour = chance.isHit(0.03)
  const lightGun = chance.isHit(0.02)
  return {
    format: 1,
    source: { unit: 'unit-0', playing: draft.playing },
    material: {
      protection: chance.isHit(0.04) ? chance.pick(['agc-pulses', 'hdcp'] as const) : 'none',
      ...(chance.isHit(0.05) ? { sound: chance.pick(['none', 'mono'] as const) } : {}),
    },
    display: { unit: 'unit-1' },
    demands: {
      ...(stereo ? { stereo } : {}),
      ...(colour ? { colour } : {}),
      ...(lightGun ? { aim: 'light-gun' as const } : {}),
    },
    avoid: chance.isHit(0.03) && draft.boxes.length > 0 ? ['unit-2'] : [],
    offAir: [],
    assumedLeads: [],
  }
}

const NOTHING_NOTED = {
  quantity: 1,
  holding: 'kept',
  place: null,
  forms: [],
  functions: [],
  modifications: [],
  stands: {},
} as const

const pieceUnit = (model: Uid, quantity: number): Unit => ({
  ...NOTHING_NOTED,
  uid: `piece-${model}`,
  model,
  quantity,
  working: 'works',
  remotePresent: false,
})

function unitOf({ model, device }: DeviceDraft, uid: Uid, tried: number, chance: Chance): Unit {
  const state = (): TestState => (chance.isHit(tried) ? 'works' : chance.pick(STATES))
  return {
    ...NOTHING_NOTED,
    uid,
    model,
    working: chance.isHit(0.97)
      ? 'works'
      : chance.pick(['faulty', 'parts-only', 'untested'] as const),
    forms: device.jacks.flatMap((j) =>
      [...new Set(j.contacts.map((c) => c.port))].map((port) => ({
        jack: j.key,
        port,
        state: state(),
      })),
    ),
    functions: device.functions.map((f) => ({ function: f.key, state: state() })),
    modifications: modificationsOf(device, chance),
    stands: standsIn(device, chance),
    remotePresent: chance.isHit(0.9),
  }
}

function modificationsOf(device: DeviceModel, chance: Chance): Modification[] {
  const made: Modification[] = []
  const fn = chance.pickIfAny(device.functions.filter((f) => f.kind !== 'plays'))
  if (fn && device.functions.length > 2 && chance.isHit(0.03)) {
    made.push({ kind: 'bypassed', function: fn.key })
  }
  if (device.chassis !== 'isolated' && chance.isHit(0.3)) {
    made.push({
      kind: 'aerial-isolator',
      state: chance.pick(['tested-good', 'bad', 'bypassed'] as const),
    })
  }
  return made
}

function standsIn(device: DeviceModel, chance: Chance): Readonly<Record<Key, string>> {
  return Object.fromEntries(
    device.controls.flatMap((control) =>
      control.kind === 'positions' && chance.isHit(0.6)
        ? [[control.key, chance.pick(control.positions).key]]
        : [],
    ),
  )
}
