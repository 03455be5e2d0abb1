import { checkChain, checkHookup, type FindingCode } from '@coaxwain/checker'
import { findHookups } from '@coaxwain/matcher'
import type { DeviceModel, Model, PieceModel } from '@coaxwain/models'
import {
  compositeIn,
  compositeOut,
  cores,
  DEFLECTION_50_60,
  device,
  gives,
  mains230,
  NTSC_SET,
  PAL_SET,
  picture,
  piece,
  plays,
  scart,
  shows,
  sounds,
  stereoIn,
  stereoOut,
  tube,
  turns,
  wire,
} from '@coaxwain/models/build'
import {
  chainOf,
  stepsOf,
  type Hookup,
  type Question,
  type Snapshot,
  type Unit,
} from '@coaxwain/shelf'
import { MESSAGES } from '@coaxwain/wording'
import { describe, expect, it } from 'vitest'

const made = { maker: 'Rig', market: '625-bg', mains: mains230(30) } as const

const PLAYS = [picture('625i50', 'pal')]

const PLAYER = device({
  ...made,
  name: 'player',
  kind: 'disc-player',
  back: [[scart('av', 'AV', { gives: ['composite', 'sound'] })]],
  functions: [
    plays('play', 'Plays', [gives('av-composite-out', PLAYS), sounds('av-sound-out', 'stereo')]),
  ],
})

const PHONO_PLAYER = device({
  ...made,
  name: 'player',
  kind: 'disc-player',
  back: [[compositeOut('video', 'VIDEO'), stereoOut('sound')]],
  functions: [plays('play', 'Plays', [gives('video', PLAYS), sounds('sound', 'stereo')])],
})

const MONITOR = device({
  ...made,
  name: 'monitor',
  kind: 'monitor',
  display: tube(DEFLECTION_50_60, 'none'),
  back: [[compositeIn('video', 'VIDEO IN')]],
  functions: [shows('line', 'Line', 'video', { accepts: PAL_SET })],
})

const SET = device({
  ...made,
  name: 'set',
  kind: 'television',
  display: tube(DEFLECTION_50_60, 'stereo'),
  back: [[scart('av', 'AV', { takes: ['composite', 'sound'] })]],
  functions: [shows('av', 'AV', 'av-composite-in', { sound: 'av-sound-in', accepts: PAL_SET })],
})

const ABROAD = device({
  ...made,
  name: 'player from abroad',
  kind: 'disc-player',
  back: [[compositeOut('video', 'VIDEO'), stereoOut('sound')]],
  functions: [
    plays('play', 'Plays', [
      gives('video', [picture('525i60', 'ntsc-m')]),
      sounds('sound', 'stereo'),
    ]),
  ],
})

/** It has no sockets for sound, which goes past it. */
const CONVERTER = device({
  ...made,
  name: 'converter',
  kind: 'standards-converter',
  back: [[compositeIn('in', 'IN'), compositeOut('out', 'OUT')]],
  functions: [
    turns('work', 'converts-scan', 'in', {
      gives: [gives('out', [{ ...picture('625i50', 'pal'), converts: true }])],
      accepts: NTSC_SET,
    }),
  ],
})

const SPEAKERS = device({
  ...made,
  name: 'loudspeakers',
  kind: 'loudspeakers',
  back: [[stereoIn('line')]],
  functions: [turns('speak', 'makes-sound', 'line', {})],
})

const PHONOS = [
  ['phono-plug', 'yellow'],
  ['phono-plug', 'white'],
  ['phono-plug', 'red'],
] as const

const AV = ['cvbs', 'audio-l', 'audio-r'] as const

const TAILS = piece({
  name: 'breakout lead',
  kind: 'lead',
  a: ['scart-plug'],
  b: PHONOS,
  wires: AV.map((c, i) => wire([0, c], [i, 'any'])),
})

const THREE = piece({ name: '3-way lead', kind: 'lead', a: PHONOS, b: PHONOS, wires: cores(3) })
const ONE = piece({
  name: 'single lead',
  kind: 'lead',
  a: ['phono-plug'],
  b: ['phono-plug'],
  wires: cores(1),
})

interface Bench {
  readonly snapshot: Snapshot
  readonly question: Question
}

function tried(uid: string, model: Model, quantity = 1): Unit {
  const states = model.type === 'device' ? model : null
  return {
    ...{ uid, model: uid, quantity, working: 'works', holding: 'kept', place: null },
    forms: (states?.jacks ?? []).flatMap((j) =>
      j.contacts.map(({ port }) => ({ jack: j.key, port, state: 'works' as const })),
    ),
    functions: (states?.functions ?? []).map((f) => ({ function: f.key, state: 'works' as const })),
    ...{ modifications: [], stands: {}, remotePresent: true },
  }
}

function bench(devices: Record<string, DeviceModel>, pieces: Record<string, PieceModel>): Bench {
  const models = { ...devices, ...pieces }
  return {
    snapshot: {
      shelfVersion: 1,
      catalogueVersion: 1,
      models,
      units: Object.entries(models).map(([uid, model]) => tried(uid, model)),
    },
    question: {
      ...{
        format: 1,
        source: { unit: 'player', playing: 'play' },
        material: { protection: 'none' },
      },
      ...{ display: { unit: 'display' }, demands: {}, avoid: [], offAir: [], assumedLeads: [] },
    },
  }
}

const bestOf = ({ snapshot, question }: Bench): Hookup => {
  const [best] = findHookups(snapshot, question).hookups
  if (!best) throw new Error('nothing was found')
  return best
}

const waysOf = ({ links }: Hookup): string[] =>
  links.map(
    ({ from, pieces, to }) =>
      `${from.unit}:${from.port} ${pieces.map((p) => `${p.model}#${p.copy}`).join(' ')} ${to.unit}:${to.port}`,
  )

const codesOf = ({ snapshot, question }: Bench, hookup: Hookup): FindingCode[] =>
  checkHookup(snapshot, question, hookup).findings.map((f) => f.code)

const saidIn = (hookup: Hookup, { snapshot }: Bench): string[] =>
  stepsOf(hookup, snapshot)
    .filter((s) => s.kind === 'join')
    .flatMap(({ say, lines }) => [say, ...lines])
    .map(({ code, details }) =>
      (MESSAGES as Record<string, string>)[code]!.replace(/\{(\w+)\}/g, (_, key: string) =>
        String(details[key]),
      ),
    )

const beside = bench({ player: PLAYER, display: MONITOR, speakers: SPEAKERS }, { tails: TAILS })

const past = bench({ player: ABROAD, box: CONVERTER, display: SET }, { three: THREE, tails: TAILS })

const atTheSource = bench(
  { player: PHONO_PLAYER, display: MONITOR, speakers: SPEAKERS },
  { three: THREE, single: ONE },
)

describe('one lead between three units', () => {
  it('goes from one socket to the screen and to loudspeakers, counted once', () => {
    const hookup = bestOf(beside)
    expect(waysOf(hookup)).toEqual([
      'player:av tails#1 display:video',
      'player:av tails#1 speakers:line-l',
      'player:av tails#1 speakers:line-r',
    ])
    expect(hookup.axes).toMatchObject({ sound: 3, boxes: 1, pieces: 1 })
    expect(hookup.sound).toEqual({ sound: 'stereo', from: 'speakers' })
  })

  it('has cores for a picture and for a sound between sockets of their own', () => {
    expect(bestOf(atTheSource).axes).toMatchObject({ sound: 3, pieces: 1 })
  })

  it('goes into one socket from the box that the picture comes by and from the player', () => {
    const hookup = bestOf(past)
    expect(waysOf(hookup)).toEqual([
      'player:video three#1 box:in',
      'box:out tails#1 display:av',
      'player:sound-l tails#1 display:av',
      'player:sound-r tails#1 display:av',
    ])
    expect(hookup.axes).toMatchObject({ sound: 3, boxes: 1, pieces: 2 })
  })

  it('may leave tails hanging', () => {
    const question = {
      ...beside.question,
      material: { protection: 'none', sound: 'none' },
    } as const
    expect(waysOf(bestOf({ ...beside, question }))).toEqual(['player:av tails#1 display:video'])
  })

  it.each([
    ['a breakout lead', beside],
    ['cores', atTheSource],
    ['one socket', past],
  ])('passes the check, wired by hand as well: %s', (_, asked) => {
    const hookup = bestOf(asked)
    const { snapshot, question } = asked
    expect(codesOf(asked, hookup)).toEqual([])
    const { links, settings } = chainOf(hookup)
    const bare = links.map((l) => ({ ...l, pieces: l.pieces.map(({ model }) => ({ model })) }))
    expect(checkChain(snapshot, question, { links: bare, settings })).toMatchObject({
      verdict: 'right',
      sound: hookup.sound,
    })
  })

  it('says of cores between sockets of their own that they are of one lead', () => {
    expect(saidIn(bestOf(atTheSource), atTheSource)).toEqual([
      'Yellow: player VIDEO to monitor VIDEO IN.',
      '[Colour] to [colour] at both ends: player L, R to loudspeakers L, R.',
      'It is the 3-way lead from before, not a second one.',
    ])
  })

  it('says where each tail goes, and that it is one lead', () => {
    expect(saidIn(bestOf(beside), beside)).toEqual([
      'breakout lead: player AV to monitor VIDEO IN.',
      'Yellow: monitor VIDEO IN.',
      'Next end of the same breakout lead: to loudspeakers L.',
      'White: loudspeakers L.',
      'Red: loudspeakers R.',
    ])
  })
})

/** Spoiled, by the code of what must be found. */
const SPOILED: readonly (readonly [FindingCode, (hookup: Hookup) => Hookup])[] = [
  // a tail in two sockets
  ['plug-taken-twice', (h) => withPiece(h, 2, { outPlug: 1 })],
  // its one plug in the socket of another unit as well
  ['plug-taken-twice', (h) => withLink(h, 1, { from: { unit: 'display', port: 'video' } })],
  // two plugs in the one socket
  ['port-taken-twice', (h) => withPiece(withPiece(h, 1, { copy: 2 }), 2, { copy: 2 })],
  ['piece-short', (h) => withPiece(withPiece(h, 1, { copy: 2 }), 2, { copy: 2 })],
  // a tail that has no wire for it
  ['wire-missing', (h) => withPiece(h, 0, { outPlug: 2 })],
]

const withLink = (
  hookup: Hookup,
  at: number,
  change: Partial<Hookup['links'][number]>,
): Hookup => ({
  ...hookup,
  links: hookup.links.map((l, i) => (i === at ? { ...l, ...change } : l)),
})

const withPiece = (
  hookup: Hookup,
  at: number,
  change: Partial<Hookup['links'][number]['pieces'][number]>,
): Hookup =>
  withLink(hookup, at, { pieces: hookup.links[at]!.pieces.map((p) => ({ ...p, ...change })) })

describe('one lead between three units, spoiled', () => {
  it.each(SPOILED)('is refused: %s', (code, spoil) => {
    expect(codesOf(beside, spoil(bestOf(beside)))).toContain(code)
  })
})
