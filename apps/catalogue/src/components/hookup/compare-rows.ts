import type { Hookup } from '@coaxwain/shelf'
import type { Lookup } from '../../format/lookup'
import type { Speak } from '../../format/words'
import type { AnswerTab } from './answer-tabs'
import { picturePart } from './summary-words'

export const COMPARED = ['picture', 'sound', 'through', 'pieces', 'doubt'] as const
/** What answers are compared by. */
export type Compared = (typeof COMPARED)[number]

export interface CompareRow {
  readonly tab: AnswerTab
  readonly facts: Readonly<Record<Compared, string>>
  /** The pieces by name, each once. */
  readonly parts: string
}

export interface Comparison {
  readonly rows: readonly CompareRow[]
  /** In which of them the answers differ; the others are said once for all. */
  readonly differs: readonly Compared[]
}

/** All answers that are shown, beside each other. */
export function compareRows(
  tabs: readonly AnswerTab[],
  hookups: readonly Hookup[],
  lookup: Lookup,
  say: Speak,
): Comparison {
  const rows = tabs.flatMap((tab): CompareRow[] => {
    const hookup = hookups[tab.value]
    if (!hookup) return []
    const { axes, sound } = hookup
    return [
      {
        tab,
        facts: {
          picture: say('answer.compare-bandwidth', {
            picture: picturePart(hookup, say),
            mhz: hookup.picture.lumaMhz,
          }),
          sound: say(`answer.sound.${sound.sound}`),
          through: tab.through,
          pieces: say('answer.pieces', { count: axes.pieces }),
          doubt: tab.doubt,
        },
        parts: partNames(hookup, lookup),
      },
    ]
  })
  return {
    rows,
    differs: COMPARED.filter((fact) => new Set(rows.map((row) => row.facts[fact])).size > 1),
  }
}

const partNames = (hookup: Hookup, lookup: Lookup): string =>
  [
    ...new Set(
      hookup.links.flatMap((link) => link.pieces.map((p) => lookup.piece(p.model)?.name ?? '')),
    ),
  ].join('; ')
