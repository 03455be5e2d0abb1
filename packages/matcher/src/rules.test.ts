import type { DeviceModel, Model } from '@coaxwain/models'
import {
  compositeIn,
  DEFLECTION_60,
  device,
  monoIn,
  NTSC_SET,
  sVideoOut,
  picture,
  plays,
  gives,
  piece,
  shows,
  tube,
  tuner,
  wire,
} from '@coaxwain/models/build'
import type { Snapshot, TestState, Unit } from '@coaxwain/shelf'
import { describe, expect, it } from 'vitest'
import {
  asked,
  AERIAL,
  LOOP,
  MODULATOR,
  PIECES,
  PLAYER,
  SET,
  SWITCH,
  tried,
} from '@coaxwain/shelf/rig'
import { searched, shelfOf, ways } from './test-rig'

/** Rules of what a hookup is and which are shown, each on the smallest shelf on which it bites. */

const shelf = (models: Readonly<Record<string, Model>>, ...more: readonly Unit[]): Snapshot => {
  const named = Object.entries(models).filter(([uid]) => !more.some((u) => u.uid === uid))
  return shelfOf(models, [
    ...named.map(([uid, m]) => tried(uid, m, m.type === 'piece' ? 5 : 1)),
    ...more,
  ])
}

const { phonos, coax, y } = PIECES
const ENDS = { player: PLAYER, set: SET }

/** The set with another input in place of its own. */
const setWith = (
  input: ReturnType<typeof compositeIn>,
  more: Partial<DeviceModel> = {},
): DeviceModel => ({
  ...device({
    maker: 'Rig',
    name: 'other set',
    kind: 'television',
    market: '525-m',
    display: tube(DEFLECTION_60, 'mono'),
    back: [[input, monoIn('sound-in', 'AUDIO')]],
    functions: [shows('line', 'VIDEO', 'video-in', { sound: 'sound-in', accepts: NTSC_SET })],
  }),
  ...more,
})

const inState = (uid: string, model: DeviceModel, state: TestState): Unit => ({
  ...tried(uid, model),
  functions: model.functions.map((f) => ({ function: f.key, state })),
})

describe('harm', () => {
  const live = setWith(compositeIn('video-in', 'VIDEO', { origin: 'added', isolated: 'no' }), {
    chassis: 'live',
  })

  it('is a reason and never a hookup: a lead to a socket added to a live chassis', () => {
    const { answer } = searched(shelf({ player: PLAYER, set: live, phonos }))
    expect(answer.verdict).toBe('none')
    expect(answer.obstacles[0]).toMatchObject({ code: 'added-socket', harmful: true })
  })

  it('is not undone by a purchase', () => {
    const parts = { phonos: phonos as Model }
    const { answer } = searched(shelf({ player: PLAYER, set: live }), asked(), { parts })
    expect(answer.purchases).toEqual([])
  })
})

it('a modulator that no tuner of the set reaches is told with both bands', () => {
  const uhf: DeviceModel = {
    ...SET,
    controls: [
      tuner('tuned-to', 'CHANNEL', 'numbers', {
        reaches: [{ plan: 'us-broadcast', names: '14..69' }],
      }),
    ],
    functions: SET.functions.filter((f) => f.key === 'tuner'),
  }
  const { answer } = searched(
    shelf({ player: PLAYER, modulator: MODULATOR, set: uhf, phonos, coax }),
  )
  expect(answer.verdict).toBe('none')
  expect(answer.obstacles.map((o) => o.code)).toContain('band')
})

describe('stereo into a set with one sound socket', () => {
  const models = { player: PLAYER, set: setWith(compositeIn('video-in', 'VIDEO')), phonos }
  const heard = (more: Readonly<Record<string, Model>>) =>
    searched(shelf({ ...models, ...more })).answer.hookups.map((h) => h.sound.sound)

  it('is half lost by one channel alone', () => {
    expect(heard({})).toEqual(['half'])
  })

  it('is folded by a Y adapter, and the half is not shown beside it', () => {
    expect(heard({ y })).toEqual(['mono'])
  })
})

it('luma alone in a composite input is a steady picture without colour', () => {
  const player = device({
    maker: 'Rig',
    name: 'S-Video player',
    kind: 'disc-player',
    market: '525-m',
    back: [[sVideoOut('video-out', 'S-VIDEO')]],
    functions: [plays('play', 'Plays', [gives('video-out', [picture('525i60', 'ntsc-m')])])],
  })
  const fan = piece({
    name: 'fan',
    kind: 'lead',
    a: ['svideo4-plug'],
    b: ['phono-plug', 'phono-plug'],
    wires: [wire([0, 'y'], [0, 'any']), wire([0, 'c'], [1, 'any'])],
  })
  const { answer } = searched(shelf({ player, set: SET, fan }))
  expect(answer.hookups[0]?.picture).toMatchObject({ quality: 'luma-only', colour: false })
})

describe('what is known of a unit', () => {
  const dark: DeviceModel = {
    ...SET,
    functions: SET.functions.filter((f) => f.key === 'tuner'),
  }
  const models = { player: PLAYER, modulator: MODULATOR, set: dark, phonos, coax }

  it.each([
    ['works', [0]],
    ['untested', [1]],
    ['intermittent', [2]],
    ['dead', []],
  ] as const)('%s in its one function makes so much doubt', (state, doubts) => {
    const { answer } = searched(shelf(models, inState('modulator', MODULATOR, state)))
    expect(answer.hookups.map((h) => h.axes.doubt)).toEqual(doubts)
  })

  it.each([
    ['faulty', 'works', 'yes'],
    ['faulty', 'untested', 'none'],
    ['parts-only', 'works', 'none'],
  ] as const)('a unit that is %s lends what %s: %s', (working, state, verdict) => {
    const unit = { ...inState('modulator', MODULATOR, state), working }
    expect(searched(shelf(models, unit)).answer.verdict).toBe(verdict)
  })

  it('makes no second answer of a unit that is like another', () => {
    const twin = { ...tried('twin', MODULATOR), model: 'modulator' }
    const one = searched(shelf(models)).answer
    const two = searched(shelf(models, twin)).answer
    expect(two.hookups.map((h) => h.axes)).toEqual(one.hookups.map((h) => h.axes))
  })
})

it('what nobody needs is left out: a loop on the way has no place beside the straight lead', () => {
  const { answer } = searched(shelf({ ...ENDS, loop: LOOP, phonos }))
  expect(ways(answer)).toEqual(['player > set'])
})

describe('an aerial that is to be kept', () => {
  const bare: DeviceModel = { ...SET, functions: SET.functions.filter((f) => f.key === 'tuner') }
  const models = { player: PLAYER, modulator: MODULATOR, set: bare, aerial: AERIAL, phonos, coax }
  const question = asked({ demands: { keepAerial: true } })

  it('joins by a switch that keeps the modulator from it', () => {
    const { answer } = searched(shelf({ ...models, switch: SWITCH }), question)
    const aerial = answer.hookups[0]?.legs.find((l) => l.purpose === 'aerial')
    expect(aerial?.stops.map((s) => s.unit)).toEqual(['aerial', 'switch', 'set'])
  })

  it('is not given up where there is no switch', () => {
    expect(searched(shelf(models), question).answer).toMatchObject({
      verdict: 'none',
      complete: true,
    })
  })

  it('is bought the switch that is missing, and nothing else', () => {
    const parts = { switch: SWITCH, loop: LOOP, modulator: MODULATOR }
    const { answer } = searched(shelf(models), question, { parts })
    expect(answer.purchases.map((p) => p.parts)).toEqual([['switch']])
    expect(answer.complete).toBe(true)
  })
})

describe('purchases', () => {
  it('open a way by the least that does it', () => {
    const parts = { phonos, modulator: MODULATOR, coax }
    const { answer } = searched(shelf(ENDS), asked(), { parts })
    expect(answer.verdict).toBe('none')
    expect(answer.purchases.map((p) => p.parts)).toEqual([['phonos']])
  })

  it('are none where the shelf does it in full', () => {
    const parts = { modulator: MODULATOR, coax }
    expect(searched(shelf({ ...ENDS, phonos }), asked(), { parts }).answer.purchases).toEqual([])
  })

  it('are not said to be all there is when their search is cut short', () => {
    const parts = { phonos, modulator: MODULATOR, coax }
    const { answer } = searched(shelf(ENDS), asked(), { parts, budget: 0 })
    expect(answer).toMatchObject({ complete: false, purchases: [], work: 0 })
  })
})

it('a light gun has no answer on a set that stores fields', () => {
  const set: DeviceModel = { ...SET, display: { ...SET.display!, storesFields: true } }
  const { answer } = searched(
    shelf({ player: PLAYER, set, phonos }),
    asked({ demands: { aim: 'light-gun' } }),
  )
  expect(answer.verdict).toBe('none')
  expect(answer.obstacles[0]?.code).toBe('light-gun')
})
