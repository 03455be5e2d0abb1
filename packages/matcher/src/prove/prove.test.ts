import type { DeviceModel, Model } from '@coaxwain/models'
import {
  at,
  carrier,
  channelSwitch,
  choice,
  compositeIn,
  compositeOut,
  cores,
  DEFLECTION_60,
  device,
  gives,
  heardOn,
  mains120,
  monoIn,
  NTSC_SET,
  passes,
  picture,
  piece,
  plays,
  rfIn,
  rfOut,
  SAME,
  shows,
  sounds,
  stereoIn,
  stereoOut,
  THREE_FOUR,
  tube,
  tuner,
  turns,
} from '@coaxwain/models/build'
import { nameOf, type Proof, type Signal, type Snapshot, type Unit } from '@coaxwain/shelf'
import { describe, expect, it } from 'vitest'
import { createProveSearch } from './create-prove-search'
import { compileTried } from './trial'

const PLAYER = device({
  maker: 'Rig',
  name: 'player',
  kind: 'disc-player',
  market: '525-m',
  mains: mains120(20),
  back: [
    [
      compositeOut('video', 'VIDEO'),
      compositeOut('monitor', 'MONITOR'),
      stereoOut('sound'),
      rfOut('rf', 'RF', 'f-socket'),
    ],
  ],
  controls: [channelSwitch(THREE_FOUR)],
  functions: [
    plays('play', 'Plays', [
      gives('video', [picture('525i60', 'ntsc-m')]),
      gives('monitor', [picture('525i60', 'ntsc-m')]),
      sounds('sound', 'stereo'),
      gives('rf', [picture('525i60', 'ntsc-m')], { rf: [carrier('M', { levelDbmv: 8 })] }),
    ]),
  ],
})

const SET = device({
  maker: 'Rig',
  name: 'set',
  kind: 'television',
  market: '525-m',
  mains: mains120(90),
  display: tube(DEFLECTION_60, 'stereo'),
  back: [
    [
      compositeIn('video', 'VIDEO'),
      stereoIn('sound'),
      rfIn('aerial', 'ANT', 'f-socket', { standsDc: 'yes' }),
    ],
  ],
  controls: [tuner('tuned-to', 'CHANNEL', 'numbers', { reaches: [THREE_FOUR] })],
  functions: [
    shows('line', 'VIDEO', 'video', { sound: 'sound', accepts: NTSC_SET }),
    shows('tuner', 'TV', 'aerial', { accepts: heardOn(NTSC_SET, ['M']), tunedBy: 'tuned-to' }),
  ],
})

const SMALL_SET = device({
  maker: 'Rig',
  name: 'small set',
  kind: 'television',
  market: '525-m',
  mains: mains120(60),
  display: tube(DEFLECTION_60, 'mono'),
  back: [[compositeIn('video', 'VIDEO'), monoIn('sound', 'AUDIO')]],
  functions: [shows('line', 'VIDEO', 'video', { sound: 'sound', accepts: NTSC_SET })],
})

/** Two inputs to one output. */
const SWITCH = device({
  maker: 'Rig',
  name: 'switch',
  kind: 'selector',
  market: 'any',
  back: [[compositeIn('a', 'A'), compositeIn('b', 'B'), compositeOut('out', 'OUT')]],
  controls: [choice('pick', 'A/B', 'input', { positions: { a: 'A', b: 'B' }, access: 'front' })],
  functions: (['a', 'b'] as const).map((side) =>
    passes(`select-${side}`, 'selects', side, { to: ['out'], while: at('pick', side) }),
  ),
})

const MODULATOR = device({
  maker: 'Rig',
  name: 'modulator',
  kind: 'modulator',
  market: '525-m',
  mains: mains120(4),
  back: [[compositeIn('video', 'VIDEO'), rfOut('rf', 'TO TV', 'f-socket')]],
  controls: [channelSwitch(THREE_FOUR)],
  functions: [
    turns('modulate', 'modulates', 'video', {
      gives: [gives('rf', SAME, { rf: [carrier('M', { levelDbmv: 8 })] })],
    }),
  ],
})

const PHONO = piece({
  name: 'phono',
  kind: 'lead',
  a: ['phono-plug'],
  b: ['phono-plug'],
  wires: cores(1),
})
const COAX = piece({ name: 'coax', kind: 'lead', a: ['f-plug'], b: ['f-plug'], wires: cores(1) })

const MODELS = { PLAYER, SET, SMALL_SET, SWITCH, MODULATOR, PHONO, COAX } as const
type Slug = keyof typeof MODELS

const plain = (uid: string, model: Slug): Unit => ({
  ...{ uid, model, quantity: 9, working: 'untested', holding: 'kept', place: null },
  ...{ forms: [], functions: [], modifications: [], stands: {}, remotePresent: true },
})

const signalsOf = (model: DeviceModel): Signal[] => [
  ...model.jacks.flatMap((j) => j.contacts.map(({ port }) => ({ jack: j.key, port }))),
  ...model.functions.map((f) => ({ function: f.key })),
]

/** Known to work, but for what is named: `form JACK PORT`, `function KEY`. */
function known(uid: string, slug: Slug, ...untried: readonly string[]): Unit {
  const model: Model = MODELS[slug]
  const signals = model.type === 'device' ? signalsOf(model) : []
  const good = signals.filter((s) => !untried.includes(nameOf(s)))
  const works = { state: 'works' as const }
  return {
    ...plain(uid, slug),
    working: 'works',
    forms: good.flatMap((s) => ('jack' in s ? [{ ...s, ...works }] : [])),
    functions: good.flatMap((s) => ('function' in s ? [{ ...s, ...works }] : [])),
  }
}

const LEADS = [known('phono', 'PHONO'), known('coax', 'COAX')]

const shelf = (...units: readonly Unit[]): Snapshot => ({
  shelfVersion: 1,
  catalogueVersion: 1,
  models: MODELS,
  units,
})

function prove(snapshot: Snapshot, unit: string, signal?: Signal) {
  const search = createProveSearch(compileTried(snapshot), { format: 1, unit, signal, avoid: [] })
  while (!search.done) search.step(1)
  return search.best()
}

/** Units on the way of the picture, then all that is tried. */
const told = ({ hookup, seen, heard, several }: Proof): string =>
  [
    hookup.legs[0]?.stops.map((s) => s.unit).join('>'),
    [...seen, ...heard].map(nameOf).sort().join(', '),
    ...(several ? ['several'] : []),
  ].join(': ')

describe('the shortest chain for one signal', () => {
  it('plays an output into a display that is known to work', () => {
    const snapshot = shelf(known('p', 'PLAYER', 'form video video'), known('s', 'SET'), ...LEADS)
    const { proofs, left, complete } = prove(snapshot, 'p')
    expect(proofs.map(told)).toEqual(['p>s: form video video'])
    expect({ left, complete }).toEqual({ left: [], complete: true })
  })

  it('feeds an input from a source that is known to work', () => {
    const snapshot = shelf(known('p', 'PLAYER'), known('s', 'SET', 'form video video'), ...LEADS)
    expect(prove(snapshot, 's').proofs.map(told)).toEqual(['p>s: form video video'])
  })

  it('puts a box between a source and a display that are known to work', () => {
    const snapshot = shelf(
      known('p', 'PLAYER'),
      known('s', 'SET'),
      known('w', 'SWITCH', 'form b b'),
      ...LEADS,
    )
    expect(prove(snapshot, 'w').proofs.map(told)).toEqual(['p>w>s: form b b'])
  })

  it('takes another box on the way only where it must', () => {
    const set = known('s', 'SET', 'form video video', 'function line')
    const units = [known('p', 'PLAYER', 'form video video'), set, ...LEADS]
    const signal = { jack: 'video', port: 'video' }
    expect(prove(shelf(...units), 'p', signal).left.map((l) => l.code)).toEqual(['nothing-shows'])
    const [proof] = prove(shelf(...units, known('m', 'MODULATOR')), 'p', signal).proofs
    expect(proof && told(proof)).toBe('p>m>s: form video video')
  })

  it('plays the right sound alone into a set with one socket for it', () => {
    const player = known('p', 'PLAYER', 'form sound sound-r')
    const snapshot = shelf(player, known('s', 'SMALL_SET'), ...LEADS)
    expect(prove(snapshot, 'p').proofs.map(told)).toEqual(['p>s: form sound sound-r'])
  })

  it('tries again what has been noted, when asked for it', () => {
    const player = known('p', 'PLAYER')
    const signal = { jack: 'video', port: 'video' }
    const dead = player.forms.map((f) =>
      f.jack === 'video' ? { ...f, state: 'dead' as const } : f,
    )
    const snapshot = shelf({ ...player, forms: dead }, known('s', 'SET'), ...LEADS)
    expect(prove(snapshot, 'p').proofs).toEqual([])
    expect(prove(snapshot, 'p', signal).proofs.map(told)).toEqual(['p>s: form video video'])
  })

  it('tries a unit that is said to be faulty', () => {
    const player = { ...known('p', 'PLAYER', 'form video video'), working: 'faulty' as const }
    const snapshot = shelf(player, known('s', 'SET'), ...LEADS)
    expect(prove(snapshot, 'p').proofs.map(told)).toEqual(['p>s: form video video'])
  })
})

describe('what is not known to work', () => {
  const player = known('p', 'PLAYER', 'form video video')
  const codes = (...units: readonly Unit[]) => {
    const { proofs, left } = prove(shelf(...units), 'p')
    expect(proofs).toEqual([])
    return left.map((l) => l.code)
  }

  it('is no display, lead or source of a chain', () => {
    expect(codes(player, plain('s', 'SET'), ...LEADS)).toEqual(['no-tried-display'])
    expect(codes(player, known('s', 'SET'), plain('phono', 'PHONO'))).toEqual(['no-tried-lead'])
    const set = known('p', 'SET', 'form video video')
    expect(codes(set, plain('other', 'PLAYER'), ...LEADS)).toEqual(['no-tried-source'])
  })

  it('is said with the side that it is on', () => {
    const set = known('s', 'SET', 'form video video')
    expect(codes(player, set, known('coax', 'COAX'))).toEqual(['nothing-shows'])
    const fed = known('p', 'SET', 'form video video')
    expect(codes(fed, known('other', 'PLAYER'), known('coax', 'COAX'))).toEqual(['nothing-arrives'])
  })

  it('is passed over where there is something else', () => {
    const snapshot = shelf(player, plain('a', 'SET'), known('b', 'SET'), ...LEADS)
    expect(prove(snapshot, 'p').proofs.map(told)).toEqual(['p>b: form video video'])
  })

  it('is passed over among leads', () => {
    const snapshot = shelf(player, known('s', 'SET'), plain('worn', 'PHONO'), ...LEADS)
    const [proof] = prove(snapshot, 'p').proofs
    expect(proof?.hookup.links[0]?.pieces).toHaveLength(1)
  })

  it('inside the unit leaves nothing to try with', () => {
    const dead = { function: 'play', state: 'dead' as const }
    const broken = { ...player, functions: [dead] }
    expect(codes(broken, known('s', 'SET'), ...LEADS)).toEqual(['no-way-inside'])
  })
})

describe('the fewest chains for a unit', () => {
  it('try a picture and a sound at once, which the eye and the ear tell apart', () => {
    const untried = ['form video video', 'form sound sound-l', 'form sound sound-r']
    const snapshot = shelf(known('p', 'PLAYER', ...untried), known('s', 'SET'), ...LEADS)
    expect(prove(snapshot, 'p').proofs.map(told)).toEqual([
      `p>s: ${[...untried].sort().join(', ')}`,
    ])
  })

  it('never try two pictures at once that can be tried apart', () => {
    const untried = ['form a a', 'form b b']
    const snapshot = shelf(
      known('p', 'PLAYER'),
      known('s', 'SET'),
      known('w', 'SWITCH', ...untried),
      ...LEADS,
    )
    expect(prove(snapshot, 'w').proofs.map(told).sort()).toEqual([
      'p>w>s: form a a',
      'p>w>s: form b b',
    ])
  })

  it('count what one has proved as known, and say where several things are tried at once', () => {
    const snapshot = shelf(known('p', 'PLAYER'), known('s', 'SET'), plain('w', 'SWITCH'), ...LEADS)
    const { proofs, left } = prove(snapshot, 'w')
    expect(left).toEqual([])
    expect(proofs).toHaveLength(2)
    expect(proofs.map((p) => [p.several, p.seen.length])).toEqual([
      [true, 3],
      [true, 2],
    ])
    const tried = proofs.flatMap((p) => [...p.seen, ...p.heard]).map(nameOf)
    expect(tried.sort()).toEqual(signalsOf(SWITCH).map(nameOf).sort())
  })

  it('are the same whatever the order in which things are noted', () => {
    const turned = (snapshot: Snapshot): Snapshot => ({
      ...snapshot,
      models: Object.fromEntries(Object.entries(snapshot.models).reverse()),
      units: [...snapshot.units].reverse().map((u) => ({
        ...u,
        forms: [...u.forms].reverse(),
        functions: [...u.functions].reverse(),
      })),
    })
    const units = [known('q', 'PLAYER'), known('s', 'SET'), known('w', 'SWITCH', 'form a a')]
    const snapshot = shelf(plain('p', 'PLAYER'), known('m', 'MODULATOR'), ...units, ...LEADS)
    for (const unit of ['p', 'w'])
      expect(prove(turned(snapshot), unit).proofs).toEqual(prove(snapshot, unit).proofs)
  })
})

it('stops when its budget is spent, and says so', () => {
  const snapshot = shelf(plain('p', 'PLAYER'), known('s', 'SET'), ...LEADS)
  const question = { format: 1, unit: 'p', avoid: [] } as const
  const search = createProveSearch(compileTried(snapshot), question, 0)
  while (!search.done) search.step(1)
  const { complete, proofs, left } = search.best()
  expect({ complete, proofs }).toEqual({ complete: false, proofs: [] })
  expect(new Set(left.map((l) => l.code))).toEqual(new Set(['not-known-yet']))
})

it('throws for a unit that is not on the shelf, and for a lead', () => {
  expect(() => prove(shelf(...LEADS), 'nowhere')).toThrow('no unit nowhere')
  expect(() => prove(shelf(...LEADS), 'phono')).toThrow('is not a device')
})
