import type { AnswerReply } from '@coaxwain/contract'
import {
  answered,
  fitted,
  type Answer,
  type Hookup,
  type Question,
  type Snapshot,
  type Stands,
} from '@coaxwain/shelf'
import { AppError, type FieldTrouble } from '../app-error'
import type { Scope } from '../http/call'
import type { SnapshotService } from '../snapshot/service'

/** Finds hookups. Gives way to other requests at least every 50 ms. */
export type Matcher = (snapshot: Snapshot, question: Question) => Promise<Answer> | Answer

/** The shelf with everything on it that an answer may tell to buy. */
export type Stocker = (snapshot: Snapshot) => Snapshot

/** Judges a hookup without knowing how it was found. */
export type Checker = (
  snapshot: Snapshot,
  question: Question,
  hookup: Hookup,
) => { readonly ok: boolean; readonly findings: readonly { readonly code: string }[] }

/** Tells the people who run the server that the engine contradicts itself. */
export type OnRefusal = (refused: {
  readonly question: Question
  readonly hookup: Hookup
  readonly findings: readonly unknown[]
  /** Of the shelf that it was found on. */
  readonly shelfVersion: number
  readonly catalogueVersion: number
}) => void

export type AnswersService = ReturnType<typeof createAnswersService>

export const fault = (path: string, code: string, name: string): FieldTrouble => ({
  path: `question.${path}`,
  code,
  details: { name },
})

export function unitFaults(
  snapshot: Snapshot,
  end: string,
  uid: string,
  fn: { readonly field: string; readonly key: string } | null,
): FieldTrouble[] {
  const unit = snapshot.units.find((u) => u.uid === uid)
  const model = unit && snapshot.models[unit.model]
  if (!unit || model?.type !== 'device') return [fault(`${end}.unit`, 'unknown-reference', uid)]
  if (!fn) return []
  return fitted(model, unit.modifications).functions.some((f) => f.key === fn.key)
    ? []
    : [fault(`${end}.${fn.field}`, 'unknown-function', fn.key)]
}

export function listFaults(
  snapshot: Snapshot,
  { avoid, assumedLeads }: Pick<Question, 'avoid' | 'assumedLeads'>,
): FieldTrouble[] {
  const known = new Set(snapshot.units.map((u) => u.uid))
  return [
    ...avoid.flatMap((uid, i) =>
      known.has(uid) ? [] : [fault(`avoid.${i}`, 'unknown-reference', uid)],
    ),
    ...assumedLeads.flatMap((uid, i) =>
      snapshot.models[uid]?.type === 'piece'
        ? []
        : [fault(`assumedLeads.${i}`, 'unknown-reference', uid)],
    ),
  ]
}

/** Everything that a question names must be on this shelf. */
export function questionMustFit(snapshot: Snapshot, question: Question): void {
  const { source, display } = question
  const errors = [
    ...unitFaults(snapshot, 'source', source.unit, { field: 'playing', key: source.playing }),
    ...unitFaults(
      snapshot,
      'display',
      display.unit,
      display.input === undefined ? null : { field: 'input', key: display.input },
    ),
    ...listFaults(snapshot, question),
  ]
  if (errors.length > 0) throw new AppError('question-unsound', { errors })
}

interface Needs {
  readonly snapshots: SnapshotService
  readonly findHookups: Matcher
  readonly withParts: Stocker
  readonly checkHookup: Checker
  readonly onRefusal: OnRefusal
}

export function createAnswersService({ snapshots, findHookups, ...needs }: Needs) {
  const stands: Stands = (shelf, question, hookup) => {
    const { ok, findings } = needs.checkHookup(shelf, question, hookup)
    const { shelfVersion, catalogueVersion } = shelf
    if (!ok) needs.onRefusal({ question, hookup, findings, shelfVersion, catalogueVersion })
    return ok
  }

  return {
    async ask(scope: Scope, question: Question): Promise<AnswerReply> {
      const snapshot = await snapshots.read(scope)
      questionMustFit(snapshot, question)
      const answer = await findHookups(snapshot, question)
      const stocked = (): Snapshot => needs.withParts(snapshot)
      const reply = answered({ snapshot, stocked, question, answer }, stands)
      // When nothing that was found can be shown, that is said.
      if (!reply) throw new AppError('answer-refused')
      return reply
    },
  }
}
