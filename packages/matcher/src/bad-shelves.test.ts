import type { Model } from '@coaxwain/models'
import {
  at,
  choice,
  compositeIn,
  compositeOut,
  DEFLECTION_60,
  device,
  every,
  gives,
  NTSC_SET,
  passes,
  picture,
  plays,
  rfIn,
  rfOut,
  shows,
  tube,
} from '@coaxwain/models/build'
import { LIMITS } from '@coaxwain/shelf'
import { describe, expect, it } from 'vitest'
import { asked, AERIAL, LOOP, MODULATOR, PIECES, PLAYER, SET, tried } from '@coaxwain/shelf/rig'
import { checkHookup } from '@coaxwain/checker'
import { searched, shelfOf, ways } from './test-rig'

/** Shelves that nobody should have: each gets a clear answer after bounded work, counted in steps. */

const ENDS = { player: PLAYER, set: SET }

const named = (models: Readonly<Record<string, Model>>, stock = 5) =>
  Object.entries(models).map(([uid, m]) => tried(uid, m, m.type === 'piece' ? stock : 1))

const shelf = (models: Readonly<Record<string, Model>>, pieces: number) => {
  const all = { ...ENDS, ...models, ...(pieces > 0 ? PIECES : {}) }
  return shelfOf(all, named(all, pieces))
}

/** As many copies of a model as are wanted, each a model of its own. */
const many = (model: Model, count: number): Record<string, Model> =>
  Object.fromEntries(
    Array.from({ length: count }, (_, i) => [`${model.name} ${i}`, { ...model, name: `x${i}` }]),
  )

it('an empty shelf lacks a lead, and that is all there is to say', () => {
  const { answer } = searched(shelf({}, 0))
  expect(answer).toMatchObject({ verdict: 'none', complete: true, hookups: [], purchases: [] })
  expect(answer.obstacles.map((o) => o.code)).toEqual(['no-lead'])
  expect(answer.work).toBeLessThan(20)
})

describe('a thousand identical adapters', () => {
  const crowded = (count: number) => {
    const all = { ...ENDS, collar: PIECES.collar, extension: PIECES.extension }
    const units = named({ ...all }, count)
    return searched(
      shelfOf({ ...all, phonos: PIECES.phonos }, [...units, tried('phonos', PIECES.phonos)]),
    )
  }

  it('cost not a step more than five', () => {
    expect(crowded(1000)).toEqual(crowded(LIMITS.piecesInLink + 1))
  })

  it('leave the one lead that does it the answer', () => {
    const { answer } = crowded(1000)
    expect(answer).toMatchObject({ verdict: 'yes', complete: true })
    expect(answer.hookups[0]!.links.flatMap((l) => l.pieces.map((p) => p.model))).toEqual(
      Array(3).fill('phonos'),
    )
  })
})

describe('a unit without ports', () => {
  const bare = device({
    maker: 'Rig',
    name: 'bare',
    kind: 'selector',
    market: 'any',
    back: [],
    functions: [],
  })

  it('is in nobody’s way', () => {
    const { answer } = searched(shelf({ bare }, 5))
    expect(ways(answer)).toEqual(['player > set'])
  })

  it.each([
    ['a source', { source: { unit: 'bare', playing: 'play' } }],
    ['a display', { display: { unit: 'bare' } }],
  ])('is no use as %s', (_, changes) => {
    const { answer } = searched(shelf({ bare }, 5), asked(changes))
    expect(answer).toMatchObject({ verdict: 'none', complete: true, work: 0 })
  })
})

describe('functions that contradict', () => {
  const torn = device({
    maker: 'Rig',
    name: 'torn',
    kind: 'selector',
    market: 'any',
    back: [[compositeIn('in', 'IN'), compositeOut('out', 'OUT')]],
    controls: [choice('way', 'A/B', 'input', { positions: ['a', 'b'], access: 'front' })],
    functions: [
      passes('never', 'selects', 'in', {
        to: ['out'],
        while: every(at('way', 'a'), at('way', 'b')),
      }),
    ],
  })

  it('are never part of a hookup', () => {
    const { answer } = searched(shelf({ torn }, 5))
    expect(answer.complete).toBe(true)
    expect(ways(answer)).toEqual(['player > set'])
  })

  it('are no source: a picture in a position that cannot be', () => {
    const player = device({
      maker: 'Rig',
      name: 'torn player',
      kind: 'disc-player',
      market: 'any',
      back: [[compositeOut('video-out', 'VIDEO')]],
      controls: torn.controls,
      functions: [
        plays('play', 'Plays', [
          gives('video-out', [picture('525i60', 'ntsc-m', every(at('way', 'a'), at('way', 'b')))]),
        ]),
      ],
    })
    const all = { ...ENDS, ...PIECES, player }
    const { answer } = searched(shelfOf(all, named(all)))
    expect(answer).toMatchObject({ verdict: 'none', complete: true })
  })
})

describe('cycles', () => {
  it('of loop-throughs are not run round: the straight lead is the answer', () => {
    const { answer, steps } = searched(shelf(many(LOOP, 12), 40))
    expect(answer).toMatchObject({ verdict: 'yes', complete: true })
    expect(ways(answer)[0]).toBe('player > set')
    expect(answer.work).toBeLessThan(50)
    expect(steps).toBeLessThan(500)
  })

  const splitter = device({
    maker: 'Rig',
    name: 'splitter',
    kind: 'splitter',
    market: 'any',
    back: [
      [
        rfIn('in', 'IN', 'f-socket', { standsDc: 'yes' }),
        rfOut('out-1', 'OUT', 'f-socket'),
        rfOut('out-2', 'OUT', 'f-socket'),
      ],
    ],
    functions: [passes('splits', 'splits', 'in', { to: ['out-1', 'out-2'] })],
  })

  it('of aerial leads cost no more than the boxes there are, and not their combinations', () => {
    const run = (count: number) => {
      const boxes = { aerial: AERIAL, modulator: MODULATOR, ...many(splitter, count) }
      return searched(shelf(boxes, 40), asked({ demands: { keepAerial: true } }))
    }
    const [few, more] = [run(20), run(60)]
    expect(more.answer.complete).toBe(true)
    expect(more.answer.hookups.map((h) => h.axes)).toEqual(few.answer.hookups.map((h) => h.axes))
    expect(more.answer.work).toBe(few.answer.work)
    expect(more.steps).toBeLessThan(few.steps * 4)
  })
})

describe('a combination set as source and display at once', () => {
  const combination = device({
    maker: 'Rig',
    name: 'combination',
    kind: 'television',
    market: '525-m',
    display: tube(DEFLECTION_60, 'stereo'),
    back: [[compositeIn('video-in', 'VIDEO'), compositeOut('video-out', 'OUT')]],
    functions: [
      plays('play', 'Plays', [gives('video-out', [picture('525i60', 'ntsc-m')])]),
      shows('line', 'VIDEO', 'video-in', { accepts: NTSC_SET }),
    ],
  })
  const both = asked({ source: { unit: 'both', playing: 'play' }, display: { unit: 'both' } })

  it('is answered by its own input', () => {
    const snapshot = shelf({ both: combination }, 5)
    const { answer } = searched(snapshot, both)
    expect(answer).toMatchObject({ verdict: 'yes', complete: true })
    const [hookup] = answer.hookups
    expect(hookup!.links.map((l) => [l.from, l.to])).toEqual([
      [
        { unit: 'both', port: 'video-out' },
        { unit: 'both', port: 'video-in' },
      ],
    ])
    expect(checkHookup(snapshot, both, hookup!).findings).toEqual([])
  })
})
