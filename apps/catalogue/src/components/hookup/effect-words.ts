import type { Answer, Hookup, Uid } from '@coaxwain/shelf'
import { doubtsOf, doubtWords } from '../../format/doubts'
import type { Lookup } from '../../format/lookup'
import { pickAnswers } from '../../format/pick-answers'
import { capital, type Speak } from '../../format/words'
import { purchaseWords } from './purchase-words'
import { summaryWords, throughWords } from './summary-words'
import { unitOrder } from './unit-order'

export interface EffectContext {
  /** Source and display. */
  readonly ends: readonly Uid[]
  readonly lookup: Lookup
  readonly say: Speak
}

/** The hookup that an answer shows first. */
export function firstHookup(answer: Answer): Hookup | null {
  const [pick] = pickAnswers(answer.hookups)
  return (pick && answer.hookups[pick.index]) ?? null
}

/** Which leads go where, and how everything is set: what a person would have to do. */
const deedsOf = ({ links, ends, settings }: Hookup): string =>
  JSON.stringify([links, ends ?? [], settings])

const boxesOf = (hookup: Hookup, ends: readonly Uid[]): string =>
  unitOrder(hookup)
    .filter((unit) => !ends.includes(unit))
    .join(' ')

/** What would be otherwise if the second hookup stood there and not the first. */
export function effectWords(from: Hookup, to: Hookup, context: EffectContext): string {
  const { ends, lookup, say } = context
  if (deedsOf(from) === deedsOf(to)) return say('what-if.nothing')
  const found = differences(from, to, context)
  return say('what-if.effect', {
    way:
      boxesOf(from, ends) === boxesOf(to, ends)
        ? say('what-if.same-way')
        : throughWords(to, ends, lookup, say),
    differences: capital(found.length > 0 ? found.join(', ') : say('what-if.as-good')),
  })
}

/** What would be shown instead of a hookup, told in one line. */
export function answerEffect(from: Hookup, answer: Answer, context: EffectContext): string {
  const to = firstHookup(answer)
  if (to) return effectWords(from, to, context)
  const [least] = answer.purchases
  return least
    ? context.say('what-if.none-buy', { parts: purchaseWords(least.parts, context.say) })
    : context.say('what-if.none')
}

/** What a way back from nothing would bring. */
export function wayOutWords(answer: Answer, { ends, lookup, say }: EffectContext): string {
  const to = firstHookup(answer)
  const effect = to
    ? `${throughWords(to, ends, lookup, say)}. ${summaryWords(to, say)}`
    : say('what-if.none')
  return say('what-if.without', { effect })
}

function differences(from: Hookup, to: Hookup, { lookup, say }: EffectContext): string[] {
  return [
    ...pictureDifference(from, to, say),
    ...(from.sound.sound === to.sound.sound ? [] : [say(`what-if.sound.${to.sound.sound}`)]),
    ...counted(to.axes.boxes - from.axes.boxes, 'boxes', say),
    ...counted(to.axes.pieces - from.axes.pieces, 'pieces', say),
    ...doubtDifference(from, to, lookup, say),
  ]
}

function pictureDifference(from: Hookup, to: Hookup, say: Speak): string[] {
  if (from.picture.colour !== to.picture.colour) {
    return [say(to.picture.colour ? 'what-if.colour' : 'what-if.grey')]
  }
  if (from.axes.picture === to.axes.picture) return []
  return [say(to.axes.picture > from.axes.picture ? 'what-if.sharper' : 'what-if.softer')]
}

function counted(by: number, what: 'boxes' | 'pieces', say: Speak): string[] {
  if (by === 0) return []
  return [say(by > 0 ? `what-if.more-${what}` : `what-if.fewer-${what}`, { count: Math.abs(by) })]
}

function doubtDifference(from: Hookup, to: Hookup, lookup: Lookup, say: Speak): string[] {
  const [before, after] = [from, to].map((h) => doubtWords(doubtsOf(h, lookup), say).words)
  return before === after || after === undefined ? [] : [after]
}
