import { jackOf, portOf, type DeviceModel, type Key, type PieceModel } from '@coaxwain/models'
import { doubtOf, fitted, formState, functionState, mayLend } from '@coaxwain/shelf'
import type { PortRef, Question, Snapshot, Uid, Unit } from '@coaxwain/shelf'

/** One device of the shelf with everything that was done to it. */
export interface Box {
  readonly unit: Unit
  readonly device: DeviceModel
  /** Counts as a box of a hookup; without power it counts as a piece. */
  readonly powered: boolean
}

/** A sort of lead or adapter, and how many of it there are. */
export interface Stock {
  readonly model: Uid
  readonly piece: PieceModel
  readonly count: number
}

/** A small shelf laid out for one question: everything that may be tried. */
export interface Bench {
  readonly snapshot: Snapshot
  readonly question: Question
  readonly source: Box
  readonly display: Box
  /** Everything else that has sockets and may be used. */
  readonly boxes: readonly Box[]
  readonly drawer: readonly Stock[]
}

/** As many of an assumed lead as no hookup on a small shelf needs. */
const PLENTY = 12

export function benchOf(snapshot: Snapshot, question: Question): Bench {
  const box = (unit: Unit): Box[] => {
    const model = snapshot.models[unit.model]
    return model?.type === 'device' ? [boxOf(unit, fitted(model, unit.modifications))] : []
  }
  const end = (uid: Uid): Box => {
    const [found] = snapshot.units.filter((u) => u.uid === uid).flatMap(box)
    if (!found) throw new Error(`no device ${uid}`)
    return found
  }
  const ends = [question.source.unit, question.display.unit]
  const free = snapshot.units.filter(
    (u) => !ends.includes(u.uid) && !question.avoid.includes(u.uid),
  )
  return {
    snapshot,
    question,
    source: end(question.source.unit),
    display: end(question.display.unit),
    boxes: free.filter(mayLend).flatMap(box),
    drawer: drawerOf(snapshot, question),
  }
}

const boxOf = (unit: Unit, device: DeviceModel): Box => ({
  unit,
  device,
  powered:
    device.mains !== undefined ||
    device.pack !== undefined ||
    device.functions.some((f) => f.power !== 'none'),
})

function drawerOf({ models, units }: Snapshot, { avoid, assumedLeads }: Question): Stock[] {
  const counts = new Map<Uid, number>()
  for (const unit of units) {
    if (avoid.includes(unit.uid) || !mayLend(unit) || unit.working === 'faulty') continue
    counts.set(unit.model, (counts.get(unit.model) ?? 0) + unit.quantity)
  }
  for (const model of assumedLeads) counts.set(model, PLENTY)
  return [...counts].flatMap(([model, count]): Stock[] => {
    const piece = models[model]
    return piece?.type === 'piece' && count > 0 ? [{ model, piece, count }] : []
  })
}

export const refOf = (box: Box, port: Key): PortRef => ({ unit: box.unit.uid, port })

export const jackIn = (box: Box, key: Key) => jackOf(box.device, key)
export const portIn = (box: Box, key: Key) => portOf(box.device, key)

/** Something that a hookup leans on: a form on a port, or a function. */
export type Leant =
  | { readonly box: Box; readonly jack: Key; readonly port: Key }
  | { readonly box: Box; readonly fn: Key }

const nameOf = (l: Leant): string =>
  'fn' in l ? `${l.box.unit.uid} ${l.fn}` : `${l.box.unit.uid} ${l.jack} ${l.port}`

/** The doubt in what is leant on, each thing once; null when something is dead. Other doubts may come on top. */
export function doubtIn(leant: readonly Leant[]): number | null {
  let sum = 0
  for (const l of new Map(leant.map((each) => [nameOf(each), each])).values()) {
    const { unit } = l.box
    const state = 'fn' in l ? functionState(unit, l.fn) : formState(unit, l.jack, l.port)
    const doubt = doubtOf(unit, state)
    if (doubt === null) return null
    sum += doubt
  }
  return sum
}
