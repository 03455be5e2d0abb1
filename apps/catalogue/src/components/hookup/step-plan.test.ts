import { stepsOf, type Hookup, type HookupStep } from '@coaxwain/shelf'
import { describe, expect, it } from 'vitest'
import { uidOf } from '../../fixtures/builders'
import { HOOKUP, QUESTION, SNAPSHOT } from '../../fixtures/disc-to-set'
import { createLookup } from '../../format/lookup'
import { sayIn } from '../../format/words'
import { linkParts } from './link-parts'
import { stepEnds } from './step-ends'
import { runNumbers } from './step-plan'
import { toDrawing } from './to-drawing'
import { unitOrder } from './unit-order'

const lookup = createLookup(SNAPSHOT)
const steps = stepsOf(HOOKUP, SNAPSHOT)

/** A hookup whose only link goes through such pieces. */
const through = (pieces: readonly string[]): Hookup => {
  const link = HOOKUP.links[3]
  if (!link) throw new Error('no aerial link')
  return {
    ...HOOKUP,
    links: [
      {
        ...link,
        pieces: pieces.map((p, copy) => ({
          model: uidOf(p),
          copy,
          wayRound: 'forward' as const,
          inPlug: 0,
          outPlug: 0,
        })),
      },
    ],
  }
}

const numbersOf = (hookup: Hookup): number[][] => {
  const link = hookup.links[0]
  if (!link) throw new Error('no link')
  const joins = stepsOf(hookup, SNAPSHOT)
  const parts = linkParts(link, lookup)
  return runNumbers(joins, 0, parts).map((run) => run.map((n) => n - 2))
}

describe('numbers along a link', () => {
  it('stand on the run that the step plugs', () => {
    expect(numbersOf(through(['m-f']))).toEqual([[0]])
    expect(numbersOf(through(['m-f', 'm-balun']))).toEqual([[0], [1]])
    expect(numbersOf(through(['m-balun', 'm-f']))).toEqual([[0], [1]])
  })

  it('stand together where one run is plugged in two steps', () => {
    expect(numbersOf(through(['m-f', 'm-balun', 'm-f']))).toEqual([[0], [1, 2]])
  })

  it('leave no step of the list out of the drawing', () => {
    const drawn = toDrawing({
      hookup: HOOKUP,
      question: QUESTION,
      lookup,
      steps,
      say: sayIn('en-GB'),
      carried: true,
    })
    const numbers = new Set([
      ...drawn.cables.flatMap((c) => c.parts.flatMap((p) => (p.kind === 'run' ? p.numbers : []))),
      ...drawn.units.flatMap((u) => [
        ...u.controls.map((c) => c.number),
        ...(u.screen?.lines.map((l) => l.number) ?? []),
      ]),
    ])
    const listed = steps.filter((s) => s.kind === 'join' || s.kind === 'set').map((s) => s.number)
    expect(listed.filter((n) => !numbers.has(n))).toEqual([])
  })
})

describe('marks beside a step', () => {
  const endsOf = (step: HookupStep | undefined) =>
    step ? stepEnds(step, steps, HOOKUP, lookup).map((e) => [e.ends[0], e.tag, e.ends[1]]) : []

  it('show the two ends and the letter of every cable that it plugs', () => {
    const joins = steps.filter((s) => s.kind === 'join')
    expect(joins.map(endsOf)).toEqual([
      [['phono', 'V', 'phono']],
      [
        ['phono', 'L', 'phono'],
        ['phono', 'R', 'phono'],
      ],
      [['f', '75', 'f']],
      [['spade', '300', 'screws']],
    ])
  })

  it('are none for fetching and setting', () => {
    expect(steps.filter((s) => s.kind === 'fetch' || s.kind === 'set').flatMap(endsOf)).toEqual([])
  })
})

describe('order of units', () => {
  it('puts the source left and the display right, whatever the order of links', () => {
    const turned = {
      ...HOOKUP,
      links: [...HOOKUP.links].reverse(),
      legs: [...HOOKUP.legs].reverse(),
    }
    expect(unitOrder(turned)).toEqual(['disc', 'mod', 'tv'].map(uidOf))
  })

  it('ends where signals run in a ring', () => {
    const [first] = HOOKUP.links
    if (!first) throw new Error('no link')
    const ring = { ...HOOKUP, links: [first, { ...first, from: first.to, to: first.from }] }
    expect(unitOrder(ring)).toHaveLength(3)
  })
})
