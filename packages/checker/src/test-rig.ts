import type { DeviceModel, Model } from '@coaxwain/models'
import type {
  Hookup,
  Leg,
  Link,
  PieceUse,
  Question,
  Setting,
  Snapshot,
  Unit,
} from '@coaxwain/shelf'
import {
  AERIAL,
  asked,
  LOOP,
  MODULATOR,
  PIECES,
  PLAYER,
  SET,
  SWITCH,
  tried,
} from '@coaxwain/shelf/rig'
import type { Circuit, PictureSignal } from '@coaxwain/signal'
import { checkHookup, RULES } from './check-hookup'
import type { FindingCode } from './finding'

/** Whole hookups for the tests beside this file: right as they stand, and built anew by every call. */

/** The same, with everything in it open to change. */
export type Loose<T> = { -readonly [K in keyof T]: Loose<T[K]> }

interface Built {
  readonly models: Readonly<Record<string, Model>>
  readonly units: readonly Unit[]
  readonly question: Question
  readonly hookup: Hookup
}

export type Rig = Loose<Built>

/** The rig as the check takes it. */
export function laid(rig: Rig) {
  const { models, units, question, hookup } = rig as Built
  const snapshot: Snapshot = { shelfVersion: 1, catalogueVersion: 1, models, units }
  return [snapshot, question, hookup] as const
}

export const check = (rig: Rig) => checkHookup(...laid(rig))

/** Codes of everything that is found by some rules, each once. */
export const codes = (rig: Rig, rules = RULES): FindingCode[] => [
  ...new Set(checkHookup(...laid(rig), rules).findings.map((f) => f.code)),
]

export function deviceIn(rig: Rig, uid: string): Loose<DeviceModel> {
  const model = rig.models[uid]
  if (model?.type !== 'device') throw new Error(`no device ${uid}`)
  return model
}

export function pieceIn(rig: Rig, uid: string) {
  const model = rig.models[uid]
  if (model?.type !== 'piece') throw new Error(`no piece ${uid}`)
  return model
}

function find<T>(things: T[], is: (thing: T) => boolean): T {
  const found = things.find(is)
  if (!found) throw new Error('no such thing in the rig')
  return found
}

export const unitIn = (rig: Rig, uid: string) => find(rig.units, (u) => u.uid === uid)

export const portIn = (rig: Rig, uid: string, key: string) =>
  find(deviceIn(rig, uid).ports, (p) => p.key === key)

export const functionIn = (rig: Rig, uid: string, key: string) =>
  find(deviceIn(rig, uid).functions, (f) => f.key === key)

// ---------------------------------------------------------------- units, links, claims

export const use = (model: string, plug = 0, copy = 1): PieceUse => ({
  model,
  copy,
  wayRound: 'forward',
  inPlug: plug,
  outPlug: plug,
})

/** `UNIT:PORT`, a piece, `UNIT:PORT`, and the one circuit that they carry. */
function link(from: string, by: PieceUse, to: string, circuit: Circuit): Link {
  const ref = (text: string) => {
    const [unit = '', port = ''] = text.split(':')
    return { unit, port }
  }
  return { from: ref(from), pieces: [by], to: ref(to), circuits: [{ from: circuit, to: circuit }] }
}

const set = (unit: string, control: string, position: string): Setting => ({
  unit,
  control,
  position,
  orElse: [],
  plan: 'us-broadcast',
  access: 'front',
  why: 'opens-way',
  must: true,
})

const COMPOSITE: PictureSignal = {
  form: 'composite',
  scan: '525i60',
  colour: 'ntsc-m',
  poorest: 'composite',
  lumaMhz: 4.2,
  protection: 'none',
  shape: '4:3',
  direct: true,
  delayMs: 0,
  carrier: null,
}

const ON_AIR: PictureSignal = { ...COMPOSITE, form: 'rf', poorest: 'rf' }

type StopDraft = readonly [
  unit: string,
  fn: string,
  jacks: readonly [into: string | null, out: string | null],
  picture?: PictureSignal,
]

const leg = (
  purpose: Leg['purpose'],
  links: readonly number[],
  ...stops: readonly StopDraft[]
): Leg => ({
  purpose,
  links,
  stops: stops.map(([unit, fn, [into, out], seen]) => ({
    unit,
    function: fn,
    in: into,
    out,
    picture: seen ?? null,
    sound: 'stereo',
  })),
})

type Parts = Pick<Hookup, 'legs' | 'links' | 'settings' | 'axes' | 'picture'> & {
  readonly sound: Hookup['sound']['sound']
}

function rigOf(devices: Readonly<Record<string, DeviceModel>>, parts: Parts): Rig {
  const built: Built = {
    models: { ...devices, ...PIECES },
    units: [
      ...Object.entries(devices).map(([uid, model]) => tried(uid, model)),
      ...Object.entries(PIECES).map(([uid, model]) => tried(uid, model, 5)),
    ],
    question: asked(),
    hookup: {
      ...parts,
      sound: { sound: parts.sound, from: 'set' },
      worksFully: true,
      cautions: [],
    },
  }
  return JSON.parse(JSON.stringify(built)) as Rig
}

const axes = (boxes: number, pieces: number): Hookup['axes'] => ({
  picture: 0,
  sound: 0,
  boxes,
  pieces,
  doubt: 0,
  disturbance: 0,
})

// ---------------------------------------------------------------- rigs

/** A player by three phonos to a set: composite picture, stereo sound. */
export const straight = (): Rig =>
  rigOf(
    { player: PLAYER, set: SET },
    {
      legs: [
        leg(
          'picture',
          [0],
          ['player', 'play', [null, 'video-out'], COMPOSITE],
          ['set', 'line', ['video-in', null], COMPOSITE],
        ),
        leg(
          'sound',
          [1, 2],
          ['player', 'play', [null, 'sound-out']],
          ['set', 'line', ['sound-in', null]],
        ),
      ],
      links: [
        link('player:video-out', use('phonos', 0), 'set:video-in', 'cvbs'),
        link('player:sound-out-l', use('phonos', 1), 'set:sound-in-l', 'audio-l'),
        link('player:sound-out-r', use('phonos', 2), 'set:sound-in-r', 'audio-r'),
      ],
      settings: [],
      axes: axes(0, 1),
      picture: { colour: true, quality: 'composite', lumaMhz: 4.2, degradations: [] },
      sound: 'stereo',
    },
  )

/** The same player without its sound, through a box that passes the line on. */
export const looped = (): Rig =>
  rigOf(
    { player: PLAYER, loop: LOOP, set: SET },
    {
      legs: [
        leg(
          'picture',
          [0, 1],
          ['player', 'play', [null, 'video-out'], COMPOSITE],
          ['loop', 'loop', ['video-in', 'video-loop'], COMPOSITE],
          ['set', 'line', ['video-in', null], COMPOSITE],
        ),
      ],
      links: [
        link('player:video-out', use('phonos', 0), 'loop:video-in', 'cvbs'),
        link('loop:video-loop', use('phonos', 0, 2), 'set:video-in', 'cvbs'),
      ],
      settings: [],
      axes: axes(0, 3),
      picture: { colour: true, quality: 'composite', lumaMhz: 4.2, degradations: [] },
      sound: 'none',
    },
  )

const MODULATED_PICTURE = {
  colour: true,
  quality: 'rf',
  lumaMhz: 4.2,
  degradations: [],
} as const

const toModulator = (): Link[] => [
  link('player:video-out', use('phonos', 0), 'modulator:video-in', 'cvbs'),
  link('player:sound-out-l', use('phonos', 1), 'modulator:sound-in-l', 'audio-l'),
  link('player:sound-out-r', use('phonos', 2), 'modulator:sound-in-r', 'audio-r'),
]

const onChannel3 = (): Setting[] => [set('modulator', 'channel', '3'), set('set', 'tuned-to', '3')]

/** The same player through a modulator on channel 3: sound is folded to mono. */
export const modulated = (): Rig =>
  rigOf(
    { player: PLAYER, modulator: MODULATOR, set: SET },
    {
      legs: [
        leg(
          'picture',
          [0, 1, 2, 3],
          ['player', 'play', [null, 'video-out'], COMPOSITE],
          ['modulator', 'modulate', ['video-in', 'rf-out'], ON_AIR],
          ['set', 'tuner', ['aerial-in', null], ON_AIR],
        ),
      ],
      links: [...toModulator(), link('modulator:rf-out', use('coax'), 'set:aerial-in', 'rf')],
      settings: onChannel3(),
      axes: axes(1, 2),
      picture: MODULATED_PICTURE,
      sound: 'mono',
    },
  )

/** The same again, with the aerial kept on the other side of a switch that parts them by 60 dB. */
export const withAerial = (): Rig => {
  const rig = rigOf(
    { player: PLAYER, modulator: MODULATOR, switch: SWITCH, aerial: AERIAL, set: SET },
    {
      legs: [
        leg(
          'picture',
          [0, 1, 2, 3, 4],
          ['player', 'play', [null, 'video-out'], COMPOSITE],
          ['modulator', 'modulate', ['video-in', 'rf-out'], ON_AIR],
          ['switch', 'select-b', ['b', 'out'], ON_AIR],
          ['set', 'tuner', ['aerial-in', null], ON_AIR],
        ),
        leg(
          'aerial',
          [5, 4],
          ['aerial', 'receive', [null, 'out']],
          ['switch', 'select-a', ['a', 'out']],
          ['set', 'tuner', ['aerial-in', null]],
        ),
      ],
      links: [
        ...toModulator(),
        link('modulator:rf-out', use('coax', 0, 1), 'switch:b', 'rf'),
        link('switch:out', use('coax', 0, 2), 'set:aerial-in', 'rf'),
        link('aerial:out', use('coax', 0, 3), 'switch:a', 'rf'),
      ],
      settings: [...onChannel3(), set('switch', 'switch', 'b')],
      axes: axes(1, 5),
      picture: MODULATED_PICTURE,
      sound: 'mono',
    },
  )
  rig.question.demands.keepAerial = true
  return rig
}
