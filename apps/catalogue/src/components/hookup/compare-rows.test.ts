import type { Answer, Hookup } from '@coaxwain/shelf'
import { describe, expect, it } from 'vitest'
import { HOOKUP, QUESTION, SNAPSHOT } from '../../fixtures/disc-to-set'
import { createLookup } from '../../format/lookup'
import { sayIn } from '../../format/words'
import { answerTabs } from './answer-tabs'
import { compareRows } from './compare-rows'
import { answerEffect, effectWords } from './effect-words'

const lookup = createLookup(SNAPSHOT)
const say = sayIn('en-GB')
const context = { ends: [QUESTION.source.unit, QUESTION.display.unit], lookup, say }

const LONGER: Hookup = { ...HOOKUP, axes: { ...HOOKUP.axes, pieces: HOOKUP.axes.pieces + 2 } }
const answerOf = (...hookups: Hookup[]): Answer => ({
  format: 1,
  verdict: hookups.length > 0 ? 'yes' : 'none',
  complete: true,
  work: 0,
  hookups,
  moreCount: 0,
  obstacles: [],
  purchases: [],
})

const compared = (...hookups: Hookup[]) => {
  const answer = answerOf(...hookups)
  const { first, more } = answerTabs(answer, QUESTION, lookup, say)
  return compareRows([...first, ...more], hookups, lookup, say)
}

describe('answers side by side', () => {
  it('differ in nothing where they are the same', () => {
    expect(compared(HOOKUP, HOOKUP).differs).toEqual([])
  })

  it('show only what differs, with a row for every answer', () => {
    const { rows, differs } = compared(HOOKUP, LONGER)
    expect(differs).toEqual(['pieces'])
    expect(rows).toHaveLength(2)
  })
})

describe('what a switch would change', () => {
  it('is nothing where the same is joined and set', () => {
    expect(effectWords(HOOKUP, LONGER, context)).toBe('Changes nothing.')
  })

  it('is said in what one gets and what it takes', () => {
    const otherwise = { ...LONGER, settings: [], picture: { ...HOOKUP.picture, colour: false } }
    expect(effectWords(HOOKUP, otherwise, context)).toBe(
      'The same boxes, joined or set otherwise. Black and white, 2 pieces more.',
    )
  })

  it('names what to buy where the shelf no longer does it', () => {
    const bought = {
      parts: ['no-such-part'],
      hookup: HOOKUP,
      brings: [],
      doesNot: [],
    }
    expect(answerEffect(HOOKUP, answerOf(), context)).toBe('Not with what is on this shelf.')
    expect(answerEffect(HOOKUP, { ...answerOf(), purchases: [bought] }, context)).toMatch(
      /no-such-part would do it/,
    )
  })
})
