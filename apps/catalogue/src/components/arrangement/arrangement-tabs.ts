import { stepsOfArrangement, type Arrangement, type Snapshot } from '@coaxwain/shelf'
import { doubtsOf, doubtWords } from '../../format/doubts'
import type { Lookup } from '../../format/lookup'
import { pickAnswers, type Compared } from '../../format/pick-answers'
import type { Speak } from '../../format/words'
import { meritWords, type AnswerTab } from '../hookup/answer-tabs'
import { picturePart } from '../hookup/summary-words'

/** An arrangement is as good as its uses are together; in what it is the best is said without any "but". */
function compared({ uses, axes }: Arrangement): Compared {
  const sum = (axis: 'picture' | 'sound'): number =>
    uses.reduce((all, use) => all + use.hookup.axes[axis], 0)
  return {
    worksFully: true,
    axes: { ...axes, picture: sum('picture'), sound: sum('sound'), disturbance: 0 },
  }
}

interface Context {
  readonly snapshot: Snapshot
  readonly lookup: Lookup
  readonly say: Speak
}

/** Arrangements to choose from; those that are best in nothing come last. */
export function arrangementTabs(
  arrangements: readonly Arrangement[],
  { snapshot, lookup, say }: Context,
): AnswerTab[] {
  const picks = pickAnswers(arrangements.map(compared))
  const tab = (value: number, title: string): AnswerTab[] => {
    const arrangement = arrangements[value]
    const wiring = arrangement && stepsOfArrangement(arrangement, snapshot)?.wiring
    if (!wiring) return []
    const doubt = doubtWords(doubtsOf(wiring, lookup), say)
    const pictures = new Set(arrangement.uses.map((u) => picturePart(u.hookup, say)))
    return [
      {
        value,
        title,
        state: doubt.state,
        doubt: doubt.words,
        through: say('arrangement.plugged', {
          boxes: say('answer.boxes', { count: arrangement.axes.boxes }),
          pieces: say('answer.pieces', { count: arrangement.axes.pieces }),
        }),
        summary: [...pictures].reduce((first, second) =>
          say('arrangement.pictures', { first, second }),
        ),
      },
    ]
  }
  return [
    ...picks.flatMap((p) => tab(p.index, meritWords(p.merits, say))),
    ...arrangements.flatMap((_, i) =>
      picks.some((p) => p.index === i) ? [] : tab(i, say('answer.another', { number: i + 1 })),
    ),
  ]
}
