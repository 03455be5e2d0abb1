import type { Answer, Hookup, Question, TestState } from '@coaxwain/shelf'
import { doubtsOf, doubtWords } from '../../format/doubts'
import type { Lookup } from '../../format/lookup'
import { pickAnswers, type Merit } from '../../format/pick-answers'
import type { Speak } from '../../format/words'
import { summaryWords, throughWords } from './summary-words'

/** One answer among those to choose from. */
export interface AnswerTab {
  readonly value: number
  readonly title: string
  readonly state: TestState
  readonly doubt: string
  readonly through: string
  readonly summary: string
}

export function meritWords(merits: readonly Merit[], say: Speak): string {
  const [first = '', second = '', third = ''] = merits.map((m) => say(`answer.merit.${m}`))
  const lower = (words: string): string => words.charAt(0).toLowerCase() + words.slice(1)
  if (third !== '') {
    return say('answer.merits-three', { first, second: lower(second), third: lower(third) })
  }
  return second === '' ? first : say('answer.merits-two', { first, second: lower(second) })
}

function toTab(
  hookup: Hookup,
  value: number,
  title: string,
  context: { question: Question; lookup: Lookup; say: Speak },
): AnswerTab {
  const { question, lookup, say } = context
  const doubt = doubtWords(doubtsOf(hookup, lookup), say)
  return {
    value,
    title,
    state: doubt.state,
    doubt: doubt.words,
    through: throughWords(hookup, [question.source.unit, question.display.unit], lookup, say),
    summary: summaryWords(hookup, say),
  }
}

/** The first three answers, and all others behind them. */
export function answerTabs(answer: Answer, question: Question, lookup: Lookup, say: Speak) {
  const context = { question, lookup, say }
  const picks = pickAnswers(answer.hookups)
  const first = picks.flatMap((p) => {
    const hookup = answer.hookups[p.index]
    return hookup ? [toTab(hookup, p.index, meritWords(p.merits, say), context)] : []
  })
  const more = answer.hookups.flatMap((hookup, i) =>
    picks.some((p) => p.index === i)
      ? []
      : [toTab(hookup, i, say('answer.another', { number: i + 1 }), context)],
  )
  return { first, more }
}
