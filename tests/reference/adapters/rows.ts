import { cores, piece, wire } from '@coaxwain/models/build'
import { ADAPTER_FACTS, FORM_CIRCUITS, type AdapterId } from '@coaxwain/signal'
import { lead, monitor, player, sender, type AerialSocket, type Sockets } from '../bench/devices'
import {
  BESIDE,
  BESIDE_LEAD,
  CARRIER,
  CHANNEL_3,
  pictureIn,
  receiving,
  SCREEN,
  sending,
} from '../bench/usual'
import type { World } from '../bench/world'
import { BOXES } from './boxes'
import { leadBy } from './parts'
import { wired, type Outcome, type Trial } from './trials'

const trial = (title: string, outcome: Outcome, world: World): Trial => ({ title, outcome, world })

// ---------------------------------------------------------------- ends and leads

const F_75: AerialSocket = { connector: 'f-socket', ohm: 75 }
const B_75: AerialSocket = { connector: 'bnc-socket', ohm: 75 }
const SCREWS: AerialSocket = { connector: 'screws', ohm: 300 }

const COAX = lead('f-plug', 'f-plug')
const RUNS = [COAX, lead('bnc-plug', 'bnc-plug'), lead('spades', 'spades')]

const phono = (form: Sockets['form'], circuits?: Sockets['circuits']): Sockets => ({
  connector: 'phono-socket',
  form,
  ...(circuits ? { circuits } : {}),
})
const scart = (form: Sockets['form'], circuits?: Sockets['circuits']): Sockets => ({
  ...phono(form, circuits),
  connector: 'scart-socket',
})
const S_VIDEO: Sockets = { connector: 'svideo4-socket', form: 's-video' }
const PHONOS = lead('phono-plug', 'phono-plug')
const S_VIDEO_LEAD = leadBy(
  { ...ADAPTER_FACTS['y-only'], carries: ['y', 'c'], b: ADAPTER_FACTS['y-only'].a },
  'both',
)

const plays = (out: Sockets) => player(pictureIn(out.form), out)
const shows = (into: Sockets) => monitor(SCREEN, into)

// ---------------------------------------------------------------- boxes

/** A box whose first end is F and whose second is another connector, in the middle of two runs. */
function aerialBox(id: keyof typeof BOXES, away: AerialSocket, backwards: Outcome): Trial[] {
  const between = { boxes: [BOXES[id]], pieces: RUNS }
  return [
    trial('forwards', 'colour', { source: sending(F_75), display: receiving(away), ...between }),
    trial('backwards', backwards, { source: sending(away), display: receiving(F_75), ...between }),
  ]
}

const videoBox = (
  id: keyof typeof BOXES,
  [from, into]: readonly [Sockets, Sockets],
  pieces: World['pieces'] = [],
): Trial[] => {
  const between = { boxes: [BOXES[id]], pieces }
  return [
    trial('forwards', 'colour', { source: plays(from), display: shows(into), ...between }),
    trial('backwards', 'nothing', { source: plays(into), display: shows(from), ...between }),
  ]
}

const AV_RUNS = [COAX, PHONOS]

/** Picture and sound go in together; only a carrier comes out, with the sound in it. */
const MODULATOR: Trial[] = [
  trial('forwards', 'colour', {
    source: player(pictureIn('composite'), phono('composite'), phono('sound')),
    display: receiving(F_75),
    boxes: [BOXES.modulator],
    pieces: AV_RUNS,
  }),
  trial('forwards, its sound', 'mono', {
    source: player(pictureIn('composite'), phono('composite'), phono('sound')),
    display: receiving(F_75),
    boxes: [BOXES.modulator],
    pieces: AV_RUNS,
  }),
  trial('backwards', 'nothing', {
    source: sending(F_75),
    display: shows(phono('composite')),
    boxes: [BOXES.modulator],
    pieces: AV_RUNS,
  }),
]

const DEMODULATOR: Trial[] = [
  trial('forwards', 'colour', {
    source: sending(F_75),
    display: shows(phono('composite')),
    boxes: [BOXES.demodulator],
    pieces: AV_RUNS,
  }),
  trial('backwards', 'nothing', {
    source: plays(phono('composite')),
    display: receiving(F_75),
    boxes: [BOXES.demodulator],
    pieces: AV_RUNS,
  }),
]

// ---------------------------------------------------------------- leads that need more than their wires

const barrel = piece({
  name: 'Barrel',
  kind: 'adapter',
  a: ['f-socket'],
  b: ['f-socket'],
  wires: cores(1),
})

/** Leads too short to do without the barrel: the far one ends in a plug of another kind at the set. */
const BARREL: Trial[] = [
  ['forwards', F_75, B_75],
  ['backwards', B_75, F_75],
].flatMap(([title, from, into]) => {
  const world = {
    source: sending(from as AerialSocket),
    display: receiving(into as AerialSocket),
  }
  const pieces = [COAX, lead('f-plug', 'bnc-plug')]
  return [
    trial(title as string, 'colour', { ...world, pieces: [...pieces, barrel] }),
    trial(`${title as string}, without it both leads end in plugs`, 'nothing', {
      ...world,
      pieces: [COAX, lead('f-plug', 'f-plug')],
    }),
  ]
})

const direct = ADAPTER_FACTS['direct-300-75']
const balun = ADAPTER_FACTS['balun-75-300']

/** Twelve volts up the lead, and an aerial socket that does not stand them. */
function dcBlock(): Trial[] {
  const source = sender(CARRIER, CHANNEL_3, { ...F_75, suppliesDc: true })
  const display = receiving({ ...F_75, suppliesDc: false })
  const block = leadBy(ADAPTER_FACTS['dc-block'], 'both', { blocksDc: true })
  return [
    ...wired(ADAPTER_FACTS['dc-block'], { blocksDc: true }),
    trial('keeps direct current away', 'colour', { source, display, pieces: [block] }),
    trial('without it nothing may be joined', 'nothing', { source, display, pieces: [COAX] }),
  ]
}

/** Luma alone, grey; the other way about it is not wired. */
const Y_ONLY: Trial[] = (() => {
  const part = piece({
    name: 'Luma lead',
    kind: 'lead',
    a: ['svideo4-plug'],
    b: ['phono-plug'],
    wires: [wire([0, 'y'], [0, 'any'], 'a-to-b')],
  })
  const composite = phono('composite')
  return [
    trial('forwards', 'grey', {
      source: plays(S_VIDEO),
      display: shows(composite),
      pieces: [part],
    }),
    trial('backwards', 'nothing', {
      source: plays(composite),
      display: shows(S_VIDEO),
      pieces: [part],
    }),
    trial('luma of component', 'grey', {
      source: plays(phono('component')),
      display: shows(composite),
      pieces: [PHONOS],
    }),
  ]
})()

/** Composite on the luma pin is no better than composite, and here grey. */
const COMPOSITE_S_VIDEO: Trial[] = (() => {
  const part = piece({
    name: 'Composite to S-Video',
    kind: 'lead',
    a: ['phono-plug'],
    b: ['svideo4-plug'],
    wires: [wire([0, 'any'], [0, 'y'], 'a-to-b')],
  })
  const [composite, pieces] = [phono('composite'), [part]]
  return [
    trial('forwards', 'grey', { source: plays(composite), display: shows(S_VIDEO), pieces }),
    trial('backwards', 'nothing', { source: plays(S_VIDEO), display: shows(composite), pieces }),
  ]
})()

function scartSVideo(): Trial[] {
  const fact = ADAPTER_FACTS['scart-svideo']
  return [
    ...wired(fact),
    trial('grey where the socket is not told of Y/C', 'grey', {
      source: plays(S_VIDEO),
      display: shows(scart('composite')),
      pieces: [leadBy(fact, 'a-to-b')],
    }),
  ]
}

/** Wire never turns RGB into component. */
function neverConverts(id: 'scart-ypbpr' | 'de15-component', rgb: Sockets): Trial[] {
  const fact = ADAPTER_FACTS[id]
  const colours = leadBy({ ...fact, carries: ['r', 'g', 'b'] }, 'both')
  return [
    ...wired(fact),
    trial('RGB at the same pins makes no component', 'nothing', {
      source: plays(rgb),
      display: shows(phono('component')),
      pieces: [colours],
    }),
  ]
}

/** Three phonos, and an S-Video plug beside them. */
function withSVideo(): Trial[] {
  const fact = ADAPTER_FACTS['scart-switched']
  const beside = fact.b.also
  if (!beside) throw new Error('no plug beside the phonos')
  return [
    ...wired(fact),
    ...wired({ ...fact, b: { families: [beside], count: 1, ohm: null }, carries: ['y', 'c'] }),
  ]
}

/** The body fits, and the pins are others: only the rewired lead does it. */
function japanese(): Trial[] {
  const rgb = { circuits: ['r', 'g', 'b', 'cvbs'] } as const
  const straight = leadBy(ADAPTER_FACTS['scart-male-male'], 'both')
  const jp21: Sockets = { connector: 'jp21-socket', form: 'rgbs' }
  return [
    ...wired(ADAPTER_FACTS['scart-jp21']),
    trial('pin for pin from Japan', 'nothing', {
      source: plays({ ...jp21, ...rgb }),
      display: shows(scart('rgbs')),
      pieces: [straight],
    }),
    trial('pin for pin to Japan', 'nothing', {
      source: plays(scart('rgbs', rgb.circuits)),
      display: shows(jp21),
      pieces: [straight],
    }),
  ]
}

/** Cheap leads leave wires out, and then what they carried does not come. */
function bothPlugs(): Trial[] {
  const fact = ADAPTER_FACTS['scart-male-male']
  const cheap = leadBy({ ...fact, carries: ['cvbs', 'audio-l', 'audio-r'] }, 'both')
  return [
    ...wired(fact),
    trial('a cheap one carries no RGB', 'nothing', {
      source: plays(scart('rgbs', ['r', 'g', 'b', 'cvbs'])),
      display: shows(scart('rgbs')),
      pieces: [cheap],
    }),
    trial('a cheap one carries composite', 'colour', {
      source: plays(scart('composite')),
      display: shows(scart('composite')),
      pieces: [cheap],
    }),
  ]
}

/** Five wires stay five: no sync is combined on the way. */
function fiveWires(): Trial[] {
  const fact = ADAPTER_FACTS['de15-bnc']
  return [
    ...wired(fact),
    trial('into a monitor that wants one sync', 'nothing', {
      source: plays({ connector: 'hd15-socket', form: 'rgbhv' }),
      display: shows({ connector: 'bnc-socket', form: 'rgbs' }),
      pieces: [leadBy(fact, 'both')],
    }),
  ]
}

/** The set's socket opens only to the voltage that the lead must bring. */
function switched(): Trial[] {
  const fact = ADAPTER_FACTS['din6-rca']
  const source = plays(phono('composite'))
  const into: Sockets = { connector: 'din6-socket', form: 'composite' }
  const display = monitor(SCREEN, into, { volts: ['av-select'] })
  const towards = { ...fact, a: fact.b, b: fact.a }
  return [
    ...wired(fact),
    trial('with 12 V on the switching pin', 'colour', {
      source,
      display,
      pieces: [leadBy(towards, 'a-to-b', { suppliesVolts: ['av-select'] })],
    }),
    trial('without the 12 V', 'nothing', { source, display, pieces: [leadBy(towards, 'a-to-b')] }),
  ]
}

// ---------------------------------------------------------------- sound

const MONO = ['audio-mono'] as const
const stereo = phono('sound')

const heard = (from: Sockets, into: Sockets, pieces: NonNullable<World['pieces']>): World => ({
  source: player(pictureIn('composite'), BESIDE, from),
  display: monitor(SCREEN, BESIDE, { sound: into }),
  pieces: [...pieces, BESIDE_LEAD],
})

/** The single end has another connector here, so that the part cannot be used the other way round unseen. */
const BNC_END = { families: ['bnc'], count: 1, ohm: null } as const
const bncMono: Sockets = { connector: 'bnc-socket', form: 'sound', circuits: MONO }

function mixing(): Trial[] {
  const fact = { ...ADAPTER_FACTS['mono-mix'], b: BNC_END }
  const resistors = leadBy(fact, 'a-to-b', { mixes: true })
  const bare = leadBy(fact, 'a-to-b')
  return [
    trial('forwards', 'mono', heard(stereo, bncMono, [resistors])),
    trial('backwards', 'silence', heard(bncMono, stereo, [resistors])),
    trial('never without resistors', 'silence', heard(stereo, bncMono, [bare])),
  ]
}

function splitting(): Trial[] {
  const y = leadBy({ ...ADAPTER_FACTS['rca-y-split'], a: BNC_END }, 'a-to-b')
  return [
    trial('one source to two inputs', 'mono', heard(bncMono, stereo, [y])),
    trial('two sources to one input', 'silence', heard(stereo, bncMono, [y])),
  ]
}

/** A load in a plug: nothing comes out of it on any side. */
function ending(): Trial[] {
  const load = piece({ name: 'Terminator', kind: 'terminator', a: ['f-plug'], b: [], wires: [] })
  const there = { source: sending(F_75), display: receiving(B_75) }
  const back = { source: sending(B_75), display: receiving(F_75) }
  const through = lead('f-plug', 'bnc-plug')
  return [
    trial('forwards', 'nothing', { ...there, pieces: [load, load] }),
    trial('backwards', 'nothing', { ...back, pieces: [load, load] }),
    trial('beside a lead it is in nobody’s way', 'colour', { ...there, pieces: [load, through] }),
  ]
}

const plain = (id: AdapterId): Trial[] => wired(ADAPTER_FACTS[id])

/** What is asked of the engine for each row of the table. */
export const ROWS: Readonly<Record<AdapterId, readonly Trial[]>> = {
  'rca-bnc': plain('rca-bnc'),
  'rca-f': plain('rca-f'),
  'f-iec': plain('f-iec'),
  'f-bnc': plain('f-bnc'),
  'f-barrel': BARREL,
  'balun-75-300': wired(balun, { impedanceOhm: [75, 300] }),
  'band-separator': aerialBox('band-separator', SCREWS, 'colour'),
  'direct-300-75': wired(direct).map((t) => ({ ...t, outcome: 'nothing' })),
  'pad-300-75': wired(ADAPTER_FACTS['pad-300-75'], { impedanceOhm: [300, 75], lossDb: 11.44 }),
  'pad-75': wired(ADAPTER_FACTS['pad-75'], { lossDb: 6 }),
  'terminator-75': ending(),
  'dc-block': dcBlock(),
  'switchbox-manual': aerialBox('switchbox-manual', B_75, 'nothing'),
  'switch-ab': aerialBox('switch-ab', B_75, 'colour'),
  'recorder-passthrough': aerialBox('recorder-passthrough', B_75, 'nothing'),
  'svideo-composite': videoBox(
    'svideo-composite',
    [S_VIDEO, phono('composite')],
    [S_VIDEO_LEAD, PHONOS],
  ),
  'composite-svideo': COMPOSITE_S_VIDEO,
  'y-only': Y_ONLY,
  'scart-in-av': plain('scart-in-av'),
  'scart-out-av': plain('scart-out-av'),
  'scart-switched': withSVideo(),
  'scart-svideo': scartSVideo(),
  'scart-rgb-bnc': plain('scart-rgb-bnc'),
  'scart-ypbpr': neverConverts('scart-ypbpr', scart('rgbs', ['r', 'g', 'b', 'cvbs'])),
  'scart-jp21': japanese(),
  'scart-male-male': bothPlugs(),
  'component-rca-bnc': plain('component-rca-bnc'),
  'd-rca': plain('d-rca'),
  'de15-bnc': fiveWires(),
  'de15-component': neverConverts('de15-component', {
    connector: 'hd15-socket',
    form: 'rgbhv',
    circuits: FORM_CIRCUITS.rgbhv,
  }),
  'hv-combine': videoBox(
    'hv-combine',
    [
      { connector: 'bnc-socket', form: 'rgbhv' },
      { connector: 'phono-socket', form: 'rgbs' },
    ],
    [BESIDE_LEAD, BESIDE_LEAD, PHONOS],
  ),
  'jack-rca-stereo': plain('jack-rca-stereo'),
  'jack-rca-av': plain('jack-rca-av'),
  'rca-y-split': splitting(),
  'mono-mix': mixing(),
  'din5-rca': plain('din5-rca'),
  'din6-rca': switched(),
  splitter: aerialBox('splitter', B_75, 'colour'),
  tap: aerialBox('tap', B_75, 'nothing'),
  diplexer: aerialBox('diplexer', B_75, 'colour'),
  modulator: MODULATOR,
  demodulator: DEMODULATOR,
}
