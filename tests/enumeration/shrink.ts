import type { DeviceModel, Model } from '@coaxwain/models'
import type { Question, Snapshot, Unit } from '@coaxwain/shelf'

/** A shelf with its question. */
export interface Asked {
  readonly snapshot: Snapshot
  readonly question: Question
}

const WHOLE_ROUNDS = 3

/**
 * A smaller shelf on which something is still so: units, pieces, notes, functions and sockets are taken away
 * one by one for as long as it stays so.
 */
export function shrunk(asked: Asked, isSo: (asked: Asked) => boolean): Asked {
  let best = asked
  for (let round = 0; round < WHOLE_ROUNDS; round++) {
    const before = best
    for (const smaller of STEPS) best = shrunkBy(smaller, best, isSo)
    if (best === before) break
  }
  return best
}

type Step = (asked: Asked) => readonly Asked[]

function shrunkBy(smaller: Step, asked: Asked, isSo: (asked: Asked) => boolean): Asked {
  let best = asked
  let tried = 0
  for (let next = smaller(best)[tried]; next; next = smaller(best)[tried]) {
    if (holds(isSo, next)) best = next
    else tried++
  }
  return best
}

function holds(isSo: (asked: Asked) => boolean, asked: Asked): boolean {
  try {
    return isSo(asked)
  } catch {
    return false
  }
}

const withUnits = ({ snapshot, question }: Asked, units: readonly Unit[]): Asked => {
  const used = new Set(units.map((u) => u.model))
  const models = Object.fromEntries(
    Object.entries(snapshot.models).filter(([uid]) => used.has(uid)),
  )
  return { question, snapshot: { ...snapshot, units, models } }
}

const replaced = <T>(list: readonly T[], at: number, by: readonly T[]): T[] => [
  ...list.slice(0, at),
  ...by,
  ...list.slice(at + 1),
]

function fewerUnits(asked: Asked): Asked[] {
  const { units } = asked.snapshot
  const ends = [asked.question.source.unit, asked.question.display.unit]
  return units.flatMap((unit, i) => {
    if (ends.includes(unit.uid)) return []
    const less = unit.quantity > 1 ? [{ ...unit, quantity: unit.quantity - 1 }] : []
    return [
      withUnits(asked, replaced(units, i, [])),
      ...less.map((u) => withUnits(asked, replaced(units, i, [u]))),
    ]
  })
}

/** Everything of a unit tried and in order, nothing done to it. */
function plainUnits(asked: Asked): Asked[] {
  const { units, models } = asked.snapshot
  return units.flatMap((unit, i) => {
    const model = models[unit.model]
    if (model?.type !== 'device') return []
    const changes: Partial<Unit>[] = [
      { forms: unit.forms.map((f) => ({ ...f, state: 'works' })) },
      { functions: unit.functions.map((f) => ({ ...f, state: 'works' })) },
      ...unit.forms.map((f, n) => ({
        forms: replaced(unit.forms, n, [{ ...f, state: 'works' as const }]),
      })),
      ...unit.functions.map((f, n) => ({
        functions: replaced(unit.functions, n, [{ ...f, state: 'works' as const }]),
      })),
      { modifications: [] },
      { stands: {} },
      { remotePresent: true },
      { working: 'works' },
    ]
    return changes
      .map((change) => ({ ...unit, ...change }))
      .filter((changed) => JSON.stringify(changed) !== JSON.stringify(unit))
      .map((changed) => withUnits(asked, replaced(units, i, [changed])))
  })
}

const withModel = (asked: Asked, uid: string, model: Model): Asked => ({
  ...asked,
  snapshot: { ...asked.snapshot, models: { ...asked.snapshot.models, [uid]: model } },
})

/** Functions, outputs, rows and controls that are not needed for it. */
function smallerModels(asked: Asked): Asked[] {
  return Object.entries(asked.snapshot.models).flatMap(([uid, model]) =>
    model.type === 'device' ? smallerDevices(model).map((m) => withModel(asked, uid, m)) : [],
  )
}

const LISTS = ['functions', 'controls', 'jacks', 'ports', 'groups', 'leaks'] as const

function smallerDevices(model: DeviceModel): DeviceModel[] {
  const lists = LISTS.flatMap((list) =>
    model[list].map((_, i): DeviceModel => ({
      ...model,
      [list]: replaced<unknown>(model[list], i, []),
    })),
  )
  const functions = model.functions.flatMap((fn, i) =>
    [
      ...fn.gives.map((_, n) => ({ ...fn, gives: replaced(fn.gives, n, []) })),
      ...fn.accepts.map((_, n) => ({ ...fn, accepts: replaced(fn.accepts, n, []) })),
      ...(fn.optional?.length ? [{ ...fn, optional: [] }] : []),
      ...fn.gives.flatMap((give, n) =>
        (give.picture ?? []).map((_, row) => ({
          ...fn,
          gives: replaced(fn.gives, n, [
            { ...give, picture: replaced(give.picture ?? [], row, []) },
          ]),
        })),
      ),
    ].map((smaller): DeviceModel => ({
      ...model,
      functions: replaced(model.functions, i, [smaller]),
    })),
  )
  return [...lists, ...functions]
}

const plainQuestions = (asked: Asked): Asked[] =>
  [
    { demands: {} },
    { avoid: [] },
    { material: { protection: 'none' as const } },
    { assumedLeads: [] },
  ]
    .map((change): Question => ({ ...asked.question, ...change }))
    .filter((q) => JSON.stringify(q) !== JSON.stringify(asked.question))
    .map((question) => ({ ...asked, question }))

const STEPS: readonly Step[] = [fewerUnits, plainQuestions, plainUnits, smallerModels]
