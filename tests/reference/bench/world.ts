import { checkHookup } from '@coaxwain/checker'
import { findHookups } from '@coaxwain/matcher'
import { checkModel, type DeviceModel, type Model, type PieceModel } from '@coaxwain/models'
import type {
  Answer,
  Hookup,
  Link,
  Material,
  PieceUse,
  Question,
  Snapshot,
  Unit,
} from '@coaxwain/shelf'

/** A source, a display, and what else lies on the shelf: everything in working order. */
export interface World {
  readonly source: DeviceModel
  readonly display: DeviceModel
  readonly boxes?: readonly DeviceModel[]
  readonly pieces?: readonly PieceModel[]
  readonly material?: Material
}

const unit = (uid: string, quantity: number): Unit => ({
  uid,
  model: uid,
  quantity,
  working: 'works',
  holding: 'kept',
  place: null,
  forms: [],
  functions: [],
  modifications: [],
  stands: {},
  remotePresent: true,
})

function snapshotOf({ source, display, boxes = [], pieces = [] }: World): Snapshot {
  const models: Record<string, Model> = { source, display }
  boxes.forEach((box, i) => (models[`box-${i}`] = box))
  pieces.forEach((piece, i) => (models[`piece-${i}`] = piece))
  const units = Object.entries(models).map(([uid, model]) =>
    unit(uid, model.type === 'piece' ? 4 : 1),
  )
  return { shelfVersion: 1, catalogueVersion: 1, models, units }
}

/** The question of a world: its source plays, its display shows. Nothing has been tried, so doubt is no matter. */
const questionOf = ({ source, material }: World): Question => ({
  format: 1,
  source: { unit: 'source', playing: source.functions[0]?.key ?? '' },
  material: material ?? { protection: 'none' },
  display: { unit: 'display' },
  demands: {},
  avoid: [],
  offAir: [],
  assumedLeads: [],
})

export interface Asked {
  readonly answer: Answer
  /** The first hookup, if there is one. */
  readonly best: Hookup | null
  /** What the checker has against any of them; empty when both agree. */
  readonly findings: readonly string[]
  /** What the checker has against another hookup in the same world. */
  readonly check: (hookup: Hookup) => readonly string[]
}

/** Asks the engine, and has every answer checked. Throws where a model of the world does not hold together. */
export function ask(world: World): Asked {
  const snapshot = snapshotOf(world)
  const faults = Object.entries(snapshot.models).flatMap(([uid, model]) =>
    checkModel(model).map((p) => `${uid} ${p.code} ${p.details.path}`),
  )
  if (faults.length > 0) throw new Error(faults.join('; '))
  const question = questionOf(world)
  const answer = findHookups(snapshot, question)
  const check = (hookup: Hookup): string[] => [
    ...new Set(checkHookup(snapshot, question, hookup).findings.map((f) => f.code)),
  ]
  return {
    answer,
    best: answer.hookups[0] ?? null,
    findings: answer.hookups.flatMap(check),
    check,
  }
}

const turnedRound = ({ from, to, pieces, circuits }: Link): Link => ({
  from: to,
  to: from,
  pieces: [...pieces].reverse().map((use): PieceUse => ({
    ...use,
    wayRound: use.wayRound === 'forward' ? 'reverse' : 'forward',
    inPlug: use.outPlug,
    outPlug: use.inPlug,
  })),
  circuits: circuits.map((c) => ({ from: c.to, to: c.from })),
})

/** The same leads in the same sockets, with what drives and what is driven the other way about. */
export const backwards = (hookup: Hookup): Hookup => ({
  ...hookup,
  links: hookup.links.map(turnedRound),
})
