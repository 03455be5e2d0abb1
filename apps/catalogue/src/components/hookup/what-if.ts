import type { Hookup, Question } from '@coaxwain/shelf'
import type { Lookup } from '../../format/lookup'
import type { Speak } from '../../format/words'
import { unitOrder } from './unit-order'

/** A change of the question that can be switched on and off. */
export interface WhatIf {
  readonly key: string
  readonly label: string
  readonly on: boolean
}

const DEMANDS = ['keepAerial', 'stereo', 'colour'] as const
const DEMAND_WORDS = {
  keepAerial: 'answer.if-aerial',
  stereo: 'answer.if-stereo',
  colour: 'answer.if-colour',
} as const

const isDemand = (key: string): key is (typeof DEMANDS)[number] =>
  (DEMANDS as readonly string[]).includes(key)

/** What matters, and which boxes on the way may not be used. Without a hookup only what can be given up. */
export function whatIfs(
  question: Question,
  hookup: Hookup | null,
  lookup: Lookup,
  say: Speak,
): WhatIf[] {
  const { demands, avoid, source, display } = question
  const ends = [source.unit, display.unit]
  const through = hookup ? unitOrder(hookup).filter((u) => !ends.includes(u)) : []
  const all = [
    ...DEMANDS.map((key) => ({ key, label: say(DEMAND_WORDS[key]), on: demands[key] === true })),
    ...[...new Set([...avoid, ...through])].flatMap((uid): WhatIf[] => {
      const device = lookup.device(uid)
      if (!device) return []
      return [
        { key: uid, label: say('answer.if-sold', { name: device.name }), on: avoid.includes(uid) },
      ]
    }),
  ]
  return hookup ? all : all.filter((item) => item.on)
}

/** The question with one switch thrown. */
export function withSwitched(question: Question, key: string): Question {
  const { demands, avoid } = question
  if (isDemand(key)) {
    return { ...question, demands: { ...demands, [key]: demands[key] ? undefined : true } }
  }
  return {
    ...question,
    avoid: avoid.includes(key) ? avoid.filter((u) => u !== key) : [...avoid, key],
  }
}
