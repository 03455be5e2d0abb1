import type { ProveReply } from '@coaxwain/contract'
import {
  fitted,
  type Proof,
  type ProveAnswer,
  type ProveQuestion,
  type Signal,
  type Snapshot,
} from '@coaxwain/shelf'
import { fault, listFaults, unitFaults, type OnRefusal } from '../answers/service'
import { AppError, type FieldTrouble } from '../app-error'
import type { Scope } from '../http/call'
import type { SnapshotService } from '../snapshot/service'

/** Finds chains that try a unit. Gives way to other requests in between. */
export type Prover = (snapshot: Snapshot, question: ProveQuestion) => Promise<ProveAnswer>

/** Judges such chains, in their order, without knowing how they were found. */
export type ProofChecker = (
  snapshot: Snapshot,
  question: ProveQuestion,
  proofs: readonly Proof[],
) => {
  readonly ok: boolean
  readonly findings: readonly (readonly { readonly code: string }[])[]
}

export type ProofsService = ReturnType<typeof createProofsService>

/** A form that the unit has on that port, or a function of it. */
function signalFaults(snapshot: Snapshot, uid: string, signal: Signal): FieldTrouble[] {
  const unit = snapshot.units.find((u) => u.uid === uid)
  const model = unit && snapshot.models[unit.model]
  if (!unit || model?.type !== 'device') return []
  const device = fitted(model, unit.modifications)
  if ('function' in signal)
    return device.functions.some((f) => f.key === signal.function)
      ? []
      : [fault('signal.function', 'unknown-function', signal.function)]
  const jack = device.jacks.find((j) => j.key === signal.jack)
  if (!jack) return [fault('signal.jack', 'unknown-jack', signal.jack)]
  return jack.contacts.some((c) => c.port === signal.port)
    ? []
    : [fault('signal.port', 'unknown-port', signal.port)]
}

/** Everything that a question names must be on this shelf. */
function questionMustFit(snapshot: Snapshot, { unit, signal, avoid }: ProveQuestion): void {
  const known = unitFaults(snapshot, '', unit, null).map((f) => ({ ...f, path: 'question.unit' }))
  const errors = [
    ...known,
    ...(signal ? signalFaults(snapshot, unit, signal) : []),
    ...listFaults(snapshot, { avoid, assumedLeads: [] }),
  ]
  if (errors.length > 0) throw new AppError('question-unsound', { errors })
}

interface Needs {
  readonly snapshots: SnapshotService
  readonly prove: Prover
  readonly checkProofs: ProofChecker
  readonly onRefusal: OnRefusal
}

export function createProofsService({ snapshots, prove, checkProofs, onRefusal }: Needs) {
  return {
    async ask(scope: Scope, question: ProveQuestion): Promise<ProveReply> {
      const snapshot = await snapshots.read(scope)
      questionMustFit(snapshot, question)
      const answer = await prove(snapshot, question)
      const { shelfVersion, catalogueVersion } = snapshot
      const { ok, findings } = checkProofs(snapshot, question, answer.proofs)
      answer.proofs.forEach(({ question: asked, hookup }, i) => {
        const found = findings[i] ?? []
        if (found.length > 0)
          onRefusal({ question: asked, hookup, findings: found, shelfVersion, catalogueVersion })
      })
      // Each counts on those before it, so that one that does not stand takes the others with it.
      if (!ok) throw new AppError('answer-refused')
      return { question, answer, shelfVersion, catalogueVersion }
    },
  }
}
