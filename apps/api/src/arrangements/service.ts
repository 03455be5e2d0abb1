import type { ArrangementReply } from '@coaxwain/contract'
import {
  questionsOfUses,
  type Arrangement,
  type ArrangementAnswer,
  type ArrangementQuestion,
  type Question,
  type Snapshot,
} from '@coaxwain/shelf'
import { listFaults, unitFaults, type OnRefusal } from '../answers/service'
import { AppError, type FieldTrouble } from '../app-error'
import type { Scope } from '../http/call'
import type { SnapshotService } from '../snapshot/service'

/** Finds what can stay wired for all uses. Gives way to other requests in between. */
export type Arranger = (
  snapshot: Snapshot,
  question: ArrangementQuestion,
) => Promise<ArrangementAnswer>

/** Judges uses that are wired at once without knowing how they were found. */
export type ArrangementChecker = (
  snapshot: Snapshot,
  questions: readonly Question[],
  arrangement: Arrangement,
  atOnce: boolean,
) => {
  readonly ok: boolean
  readonly findings: readonly { readonly code: string; readonly use: number | null }[]
}

export type ArrangementsService = ReturnType<typeof createArrangementsService>

/** Whatever stands in a list before, by what makes it the same thing. */
const repeated = <T>(list: readonly T[], path: string, same: (item: T) => string): FieldTrouble[] =>
  list.flatMap((item, i) =>
    list.findIndex((other) => same(other) === same(item)) < i
      ? [{ path: `question.${path}.${i}.unit`, code: 'given-twice', details: {} }]
      : [],
  )

/** One end must be single, no end may be named twice, and everything named must be on this shelf. */
function questionMustFit(snapshot: Snapshot, question: ArrangementQuestion): void {
  const { sources, displays } = question
  const errors: FieldTrouble[] = [
    ...(sources.length > 1 && displays.length > 1
      ? [{ path: 'question.displays', code: 'several-of-both', details: {} }]
      : []),
    // A recorder may be one source by its tape and another by its tuner; a set shows one thing at a time.
    ...repeated(sources, 'sources', (s) => `${s.unit} ${s.playing}`),
    ...repeated(displays, 'displays', (d) => d.unit),
    ...sources.flatMap(({ unit, playing }, i) =>
      unitFaults(snapshot, `sources.${i}`, unit, { field: 'playing', key: playing }),
    ),
    ...displays.flatMap(({ unit, input }, i) =>
      unitFaults(
        snapshot,
        `displays.${i}`,
        unit,
        input === undefined ? null : { field: 'input', key: input },
      ),
    ),
    ...listFaults(snapshot, question),
  ]
  if (errors.length > 0) throw new AppError('question-unsound', { errors })
}

interface Needs {
  readonly snapshots: SnapshotService
  readonly arrange: Arranger
  readonly checkArrangement: ArrangementChecker
  readonly onRefusal: OnRefusal
}

export function createArrangementsService({ snapshots, arrange, ...needs }: Needs) {
  /** An arrangement stands when the check lets every one of its uses stand, with all that is plugged. */
  function stands(
    snapshot: Snapshot,
    question: ArrangementQuestion,
    arrangement: Arrangement,
  ): boolean {
    const { shelfVersion, catalogueVersion } = snapshot
    const questions = questionsOfUses(question)
    const atOnce = question.displays.length > 1
    const { ok, findings } = needs.checkArrangement(snapshot, questions, arrangement, atOnce)
    const [use = 0] = findings.flatMap((f) => f.use ?? [])
    const [asked, hookup] = [questions[use], arrangement.uses[use]?.hookup]
    if (!asked || !hookup) throw new Error('an arrangement lacks a use')
    if (!ok) needs.onRefusal({ question: asked, hookup, findings, shelfVersion, catalogueVersion })
    return ok
  }

  return {
    async ask(scope: Scope, question: ArrangementQuestion): Promise<ArrangementReply> {
      const snapshot = await snapshots.read(scope)
      questionMustFit(snapshot, question)
      const found = await arrange(snapshot, question)
      const arrangements = found.arrangements.filter((a) => stands(snapshot, question, a))
      // When nothing that was found can be shown, that is said.
      if (found.arrangements.length > 0 && arrangements.length === 0)
        throw new AppError('answer-refused')
      return {
        question,
        answer: { ...found, arrangements },
        shelfVersion: snapshot.shelfVersion,
        catalogueVersion: snapshot.catalogueVersion,
      }
    },
  }
}
