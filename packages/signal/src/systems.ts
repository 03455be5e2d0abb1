/** ITU television systems: letters that fix lines, sound spacing and vision polarity, not colour. */
export const RF_SYSTEM_IDS = [
  'A',
  'B',
  'C',
  'D',
  'E',
  'F',
  'G',
  'H',
  'I',
  'K',
  'K1',
  'L',
  "L'",
  'M',
  'N',
] as const

export type RfSystemId = (typeof RF_SYSTEM_IDS)[number]

export const DIGITAL_SYSTEMS = ['atsc', 'qam', 'dvb-t', 'isdb-t'] as const
export type DigitalSystem = (typeof DIGITAL_SYSTEMS)[number]

export interface RfSystem {
  readonly id: RfSystemId
  readonly lines: 405 | 525 | 625 | 819
  readonly fieldHz: number
  /** Width of a channel of its raster. */
  readonly channelMhz: number
  /** Sound carrier relative to vision; negative where it lies below. E has it on either side. */
  readonly soundMhz: number
  readonly soundModulation: 'FM' | 'AM'
  /** Further sound carriers relative to vision, for stereo or a second programme; by country. */
  readonly moreSoundMhz: readonly number[]
  readonly polarity: 'negative' | 'positive'
  readonly videoMhz: number
  /** The part of the other sideband that is kept, on the side away from the sound. */
  readonly vestigeMhz: number
  /** White level as a share of peak carrier, in percent, at nominal video. */
  readonly whitePercent: number
  readonly blankingPercent: number
  readonly source: string
}

const BT470 = 'ITU-R BT.470; open-source TV modulator configuration'
const BT470_MEMORY = 'ITU-R BT.470, from memory'
const OLD = 'ITU-R BT.470 older editions, from memory'

type Sound = Pick<RfSystem, 'soundMhz' | 'soundModulation' | 'moreSoundMhz'>
type Picture = Pick<RfSystem, 'polarity' | 'videoMhz' | 'vestigeMhz' | 'blankingPercent'> & {
  readonly whitePercent: number
}
type Raster = Pick<RfSystem, 'lines' | 'fieldHz' | 'channelMhz'>

const raster = (lines: RfSystem['lines'], fieldHz: number, channelMhz: number): Raster => ({
  lines,
  fieldHz,
  channelMhz,
})

const fm = (soundMhz: number, moreSoundMhz: readonly number[] = []): Sound => ({
  soundMhz,
  soundModulation: 'FM',
  moreSoundMhz,
})

const am = (soundMhz: number, moreSoundMhz: readonly number[] = []): Sound => ({
  ...fm(soundMhz, moreSoundMhz),
  soundModulation: 'AM',
})

/** Sync at the peak of the carrier; white at 10 to 12.5 % where it is not stated. */
const negative = (
  videoMhz: number,
  vestigeMhz = 0.75,
  [whitePercent, blankingPercent]: readonly [number, number] = [12.5, 75],
): Picture => ({ polarity: 'negative', videoMhz, vestigeMhz, whitePercent, blankingPercent })

/** White at the peak of the carrier, sync near its end. */
const positive = (videoMhz: number, vestigeMhz: number, blankingPercent: number): Picture => ({
  polarity: 'positive',
  videoMhz,
  vestigeMhz,
  whitePercent: 100,
  blankingPercent,
})

type Parts = readonly [Raster, Sound, Picture]

const row = (id: RfSystemId, [lines, sound, picture]: Parts, source: string): RfSystem => ({
  id,
  ...lines,
  ...sound,
  ...picture,
  source,
})

const OF_7_MHZ = raster(625, 50, 7)
const OF_8_MHZ = raster(625, 50, 8)
/** 47 CFR 73.682(a): 59.94 fields a second with colour, 60 without. */
const OF_6_MHZ = raster(525, 60 / 1.001, 6)

const SOUND_BG = fm(5.5, [5.742, 5.85])
const SOUND_DK = fm(6.5, [6.258, 6.742, 5.742, 5.85])

export const RF_SYSTEMS: Readonly<Record<RfSystemId, RfSystem>> = {
  A: row('A', [raster(405, 50, 5), am(-3.5), positive(3, 0.75, 30)], BT470),
  B: row('B', [OF_7_MHZ, SOUND_BG, negative(5)], BT470),
  C: row('C', [OF_7_MHZ, am(5.5), positive(5, 0.75, 25)], OLD),
  D: row('D', [OF_8_MHZ, SOUND_DK, negative(6)], BT470),
  E: row('E', [raster(819, 50, 14), am(11.15), positive(10, 2, 30)], BT470),
  F: row('F', [raster(819, 50, 7), am(5.5), positive(5, 0.75, 25)], OLD),
  G: row('G', [OF_8_MHZ, SOUND_BG, negative(5)], BT470),
  H: row('H', [OF_8_MHZ, fm(5.5), negative(5, 1.25)], BT470_MEMORY),
  I: row('I', [OF_8_MHZ, fm(5.9996, [6.552]), negative(5.5, 1.25, [20, 76])], BT470),
  K: row('K', [OF_8_MHZ, SOUND_DK, negative(6)], BT470),
  K1: row('K1', [OF_8_MHZ, fm(6.5), negative(6, 1.25)], BT470_MEMORY),
  L: row(
    'L',
    [OF_8_MHZ, am(6.5, [5.85]), positive(6, 1.25, 30)],
    'open-source TV modulator configuration; public encyclopedia',
  ),
  "L'": row(
    "L'",
    [OF_8_MHZ, am(-6.5), positive(6, 1.25, 30)],
    'public encyclopedia, channel table',
  ),
  M: row(
    'M',
    [OF_6_MHZ, fm(4.5, [4.724]), negative(4.2)],
    '47 CFR 73.682(a), 73.687(b); open-source TV modulator configuration',
  ),
  N: row('N', [raster(625, 50, 6), fm(4.5), negative(4.2)], BT470),
}

/** Lines a second: half the fields, for both halves of an interlaced picture are one (definition). */
export const lineHzOf = (id: RfSystemId): number =>
  (RF_SYSTEMS[id].lines * RF_SYSTEMS[id].fieldHz) / 2

/** A digital multiplex: no vision carrier, so an analogue set shows noise. */
export interface DigitalFacts {
  readonly widthsMhz: readonly number[]
  readonly modulation: '8-VSB' | 'QAM' | 'COFDM'
  /** Middle of the multiplex above the lower edge of a channel. */
  readonly centreMhz: (widthMhz: number) => number
  readonly source: string
}

const half = (widthMhz: number): number => widthMhz / 2

export const DIGITAL_FACTS: Readonly<Record<DigitalSystem, DigitalFacts>> = {
  atsc: {
    widthsMhz: [6],
    modulation: '8-VSB',
    centreMhz: half,
    source: '47 CFR 73.682(d); Debian dtv-scan-tables',
  },
  qam: { widthsMhz: [6, 8], modulation: 'QAM', centreMhz: half, source: 'from memory' },
  'dvb-t': {
    widthsMhz: [8, 7, 6],
    modulation: 'COFDM',
    centreMhz: half,
    source: 'Debian dtv-scan-tables',
  },
  'isdb-t': {
    widthsMhz: [6],
    modulation: 'COFDM',
    /** A seventh of a megahertz above the middle. */
    centreMhz: (widthMhz) => widthMhz / 2 + 1 / 7,
    source: 'Debian dtv-scan-tables; public encyclopedia',
  },
}

/** Two systems share sound spacing when their carriers lie within 50 kHz (the deviation of FM sound). */
export const sameSoundSpacing = (a: RfSystemId, b: RfSystemId): boolean =>
  Math.abs(RF_SYSTEMS[a].soundMhz - RF_SYSTEMS[b].soundMhz) < 0.05

export const samePolarity = (a: RfSystemId, b: RfSystemId): boolean =>
  RF_SYSTEMS[a].polarity === RF_SYSTEMS[b].polarity
