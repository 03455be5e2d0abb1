import type { Circuit } from '../circuits'
import type { ConnectorFamily } from '../connectors'
import type { AdapterEnd, AdapterFact, AdapterId, AdapterLoss, AdapterWay } from './adapter-fact'

const LORE = { source: 'common practice, no source', confidence: 'common practice' } as const
const MEMORY = { source: 'from memory', confidence: 'from memory' } as const
const TWO = 'two independent sources agree'

const end = (
  families: AdapterEnd['families'],
  count = 1,
  ohm: AdapterEnd['ohm'] = null,
): AdapterEnd => ({ families, count, ohm })

const coax = (...families: readonly ConnectorFamily[]): AdapterEnd => end(families, 1, 75)
const twin = (count = 1): AdapterEnd => end(['spades'], count, 300)
const phonos = (count = 1): AdapterEnd => end(['phono'], count)
const scart = end(['scart'])
const none = end([], 0)

const loss = (band: AdapterLoss['band'], least: number, most: number = least): AdapterLoss => ({
  band,
  db: [least, most],
})

const LOSSLESS = [loss('any', 0)]

type Path = readonly [a: AdapterEnd, b: AdapterEnd, way: AdapterWay]
type Rest = Pick<AdapterFact, 'carries' | 'loss'> & Partial<AdapterFact>

/** Passive and common practice unless it says otherwise. */
const adapter = ([a, b, way]: Path, rest: Rest): AdapterFact => ({
  a,
  b,
  way,
  passive: true,
  ...LORE,
  ...rest,
})

const RF: readonly Circuit[] = ['rf']
const COMPONENT: readonly Circuit[] = ['y', 'pb', 'pr']
const RGB: readonly Circuit[] = ['r', 'g', 'b']
const STEREO: readonly Circuit[] = ['audio-l', 'audio-r']
const AV: readonly Circuit[] = ['cvbs', ...STEREO]
const RGBHV: readonly Circuit[] = [...RGB, 'hsync', 'vsync']

const AERIAL_PARTS = {
  'rca-f': adapter([phonos(), end(['f']), 'both'], { carries: RF, loss: [loss('any', 0.1, 0.5)] }),
  /** An input is a socket, an output a plug. */
  'f-iec': adapter([coax('f'), coax('iec'), 'both'], {
    carries: RF,
    loss: [loss('vhf', 0.1, 0.3), loss('uhf', 0.2, 0.5)],
  }),
  'f-bnc': adapter([end(['f']), end(['bnc']), 'both'], {
    carries: [...RF, 'cvbs'],
    loss: [loss('any', 0.1, 0.3)],
  }),
  /** Counts as one joint; old ones lose up to 0.5 dB at 1 GHz. */
  'f-barrel': adapter([coax('f'), coax('f'), 'both'], {
    carries: RF,
    loss: [loss('any', 0.1, 0.3), loss('satellite', 0.1, 0.5)],
  }),
  /** Works backwards as well; it is no isolator from the mains. */
  'balun-75-300': adapter([coax('f', 'iec'), twin(), 'both'], {
    carries: RF,
    loss: [loss('vhf', 0.5, 1), loss('uhf', 1, 2)],
    source: 'ideal: theory; losses: common practice, no source',
  }),
  /** A diplexer and two transformers; backwards it joins two aerials. */
  'band-separator': adapter([coax('f'), twin(2), 'both'], {
    carries: RF,
    loss: [loss('vhf', 0.5, 1.5), loss('uhf', 1, 2)],
  }),
  'direct-300-75': adapter([twin(), coax('f', 'iec'), 'both'], {
    carries: RF,
    loss: [loss('any', 1.94)],
    condition: 'mismatched',
    source: 'transmission-line theory',
    confidence: TWO,
  }),
  'pad-300-75': adapter([twin(), coax('f', 'iec'), 'both'], {
    carries: RF,
    loss: [loss('any', 11.44)],
    source: 'pad theory, checked by simulation',
    confidence: TWO,
  }),
  /** Sold as 3, 6, 10 and 20 dB; betters a match by twice its loss. */
  'pad-75': adapter([coax('f'), coax('f'), 'both'], { carries: RF, loss: [loss('any', 3, 20)] }),
  'terminator-75': adapter([end(['f', 'bnc', 'phono'], 1, 75), none, 'none'], {
    carries: [],
    loss: [],
  }),
  'dc-block': adapter([coax('f'), coax('f'), 'both'], {
    carries: RF,
    loss: [loss('any', 0.1, 0.5)],
  }),
} as const

const AERIAL_BOXES = {
  /** The isolation of cheap ones is far below what an aerial socket needs. */
  'switchbox-manual': adapter([end(['f'], 2, 75), coax('f'), 'a-to-b'], {
    carries: RF,
    loss: [loss('any', 0.5, 2)],
    source: '47 CFR 15.115(c); common practice',
  }),
  'switch-ab': adapter([end(['f'], 2, 75), coax('f'), 'both'], {
    carries: RF,
    loss: [loss('any', 0.5, 1)],
    source: '47 CFR 15.115(h)',
    confidence: 'one source',
  }),
  /** A splitter or booster and a modulator; off in some machines without power. */
  'recorder-passthrough': adapter([coax('f', 'iec'), coax('f', 'iec'), 'a-to-b'], {
    carries: RF,
    loss: [loss('any', -3, 4)],
    passive: false,
  }),
  /** Two, three, four and eight ways; as a combiner it costs the same. */
  splitter: adapter([coax('f'), end(['f'], 2, 75), 'both'], {
    carries: RF,
    loss: [loss('any', 3.5, 11)],
    source: 'two published pages; ideal: theory',
    confidence: TWO,
  }),
  /** What goes through; the tapped socket lies its value below. */
  tap: adapter([coax('f'), end(['f'], 2, 75), 'a-to-b'], {
    carries: RF,
    loss: [loss('any', 0.3, 2.5)],
  }),
  diplexer: adapter([end(['f'], 2, 75), coax('f'), 'both'], {
    carries: RF,
    loss: [loss('vhf', 0.5), loss('uhf', 0.5, 1.5), loss('satellite', 0.5, 1)],
    source: 'one published measurement',
    confidence: 'one source',
  }),
  modulator: adapter([phonos(3), coax('f', 'iec'), 'a-to-b'], {
    carries: AV,
    loss: [],
    passive: false,
  }),
  demodulator: adapter([coax('f', 'iec'), phonos(3), 'a-to-b'], {
    carries: AV,
    loss: [],
    passive: false,
  }),
} as const

const VIDEO_PARTS = {
  'rca-bnc': adapter([phonos(), end(['bnc']), 'both'], {
    carries: ['cvbs', ...COMPONENT, 'rf'],
    loss: [loss('baseband', 0), loss('uhf', 0, 0.2)],
  }),
  /** 470 pF from chroma into the luma line; fine detail then crosses into colour. */
  'svideo-composite': adapter([end(['svideo4']), phonos(), 'a-to-b'], {
    carries: ['y', 'c'],
    loss: [loss('video', 1.7, 5.8)],
    source: 'public circuit; ngspice',
    confidence: TWO,
  }),
  'composite-svideo': adapter([phonos(), end(['svideo4']), 'a-to-b'], {
    carries: ['cvbs'],
    loss: [],
    condition: 'pointless',
    source: 'public circuit page; theory',
    confidence: TWO,
  }),
  /** Grey, and often the sharpest grey there is. */
  'y-only': adapter([end(['svideo4', 'phono']), phonos(), 'a-to-b'], {
    carries: ['y'],
    loss: LOSSLESS,
  }),
  'component-rca-bnc': adapter([phonos(3), end(['bnc'], 3), 'both'], {
    carries: [...COMPONENT, ...RGB],
    loss: LOSSLESS,
  }),
  'd-rca': adapter([end(['dterm']), phonos(3), 'both'], { carries: COMPONENT, loss: LOSSLESS }),
  /** Changes no line rate and combines no syncs. */
  'de15-bnc': adapter([end(['hd15']), end(['bnc'], 5), 'both'], {
    carries: RGBHV,
    loss: LOSSLESS,
  }),
  'de15-component': adapter([end(['hd15']), phonos(3), 'both'], {
    carries: COMPONENT,
    loss: LOSSLESS,
    condition: 'source-gives-component',
  }),
  /** A pair of resistors does on some displays; a logic gate is right. */
  'hv-combine': adapter([end(['bnc'], 5), end(['bnc'], 4), 'a-to-b'], {
    carries: ['hsync', 'vsync'],
    loss: [],
  }),
} as const

const SCART_PARTS = {
  /** Pins 20, 2 and 6. One wired the other way looks the same. */
  'scart-in-av': adapter([phonos(3), scart, 'a-to-b'], { carries: AV, loss: LOSSLESS }),
  /** Pins 19, 1 and 3. */
  'scart-out-av': adapter([scart, phonos(3), 'a-to-b'], { carries: AV, loss: LOSSLESS }),
  'scart-switched': adapter([scart, { ...phonos(3), also: 'svideo4' }, 'as-made'], {
    carries: [...AV, 'y', 'c'],
    loss: LOSSLESS,
  }),
  /** Pins 20 and 15; grey where the socket takes no Y/C. */
  'scart-svideo': adapter([end(['svideo4']), scart, 'a-to-b'], {
    carries: ['y', 'c'],
    loss: LOSSLESS,
    condition: 'socket-set-to-yc',
  }),
  /** Composite goes along as sync; a monitor that wants clean sync needs a separator. */
  'scart-rgb-bnc': adapter([scart, end(['bnc'], 4), 'a-to-b'], {
    carries: [...RGB, 'cvbs'],
    loss: LOSSLESS,
  }),
  'scart-ypbpr': adapter([scart, phonos(3), 'a-to-b'], {
    carries: COMPONENT,
    loss: LOSSLESS,
    condition: 'source-gives-component',
  }),
  /** Rewired; never pin for pin. */
  'scart-jp21': adapter([scart, end(['jp21']), 'as-made'], {
    carries: [...RGB, 'cvbs'],
    loss: LOSSLESS,
  }),
  /** Cheap ones leave out RGB or switching wires. */
  'scart-male-male': adapter([scart, scart, 'both'], {
    carries: [...AV, ...RGB, 'switch-volts'],
    loss: LOSSLESS,
  }),
} as const

const SOUND_PARTS = {
  'jack-rca-stereo': adapter([end(['jack35']), phonos(2), 'both'], {
    carries: STEREO,
    loss: LOSSLESS,
  }),
  'jack-rca-av': adapter([end(['jack35']), phonos(3), 'both'], {
    carries: AV,
    loss: LOSSLESS,
    condition: 'pins-agree',
  }),
  /** For sound. Two ended video inputs on one output take 3.5 dB. */
  'rca-y-split': adapter([phonos(), phonos(2), 'a-to-b'], {
    carries: ['audio-l', 'audio-r', 'audio-mono'],
    loss: [loss('baseband', 0), loss('video', 3.5)],
    source: 'divider theory',
    confidence: TWO,
  }),
  /** Never without its resistors. */
  'mono-mix': adapter([phonos(2), phonos(), 'a-to-b'], {
    carries: STEREO,
    loss: [loss('any', 0.2, 1)],
    source: 'divider theory',
    confidence: TWO,
  }),
  /** An old output that gives a current loses 10 to 20 dB into a line input. */
  'din5-rca': adapter([end(['din5']), phonos(2), 'as-made'], {
    carries: STEREO,
    loss: [loss('any', 0, 20)],
    condition: 'pins-agree',
    ...MEMORY,
  }),
  'din6-rca': adapter([end(['din6']), phonos(3), 'as-made'], {
    carries: AV,
    loss: LOSSLESS,
    condition: 'switching-volts',
    ...MEMORY,
  }),
} as const

/** Leads, adapters and small boxes of the trade: what they join, which way, and what it costs. */
export const ADAPTER_FACTS: Readonly<Record<AdapterId, AdapterFact>> = {
  ...AERIAL_PARTS,
  ...AERIAL_BOXES,
  ...VIDEO_PARTS,
  ...SCART_PARTS,
  ...SOUND_PARTS,
}
