import type { RfSystemId } from '../systems'

/** What is wanted, or what disturbs it. */
export type Service = RfSystemId | 'atsc' | 'dvb-t'

/** How a DVB-T multiplex is modulated and how much of it is error correction. */
export const DVB_MODES = [
  'QPSK 1/2',
  'QPSK 2/3',
  'QPSK 3/4',
  '16-QAM 1/2',
  '16-QAM 2/3',
  '16-QAM 3/4',
  '64-QAM 1/2',
  '64-QAM 2/3',
  '64-QAM 3/4',
] as const

export type DvbMode = (typeof DVB_MODES)[number]

/** How two carriers on one channel stand to each other; no home modulator is locked to an offset. */
export type CarrierOffset = 'none' | '10-khz' | '8/12-line' | '4/12-line'

/** Least level of the wanted above the unwanted, in dB; a negative one lets the unwanted be stronger. */
export interface ProtectionRow {
  readonly wanted: readonly Service[]
  readonly mode?: DvbMode
  readonly unwanted: readonly Service[]
  /** Where the unwanted lies, in channels of the raster above the wanted. */
  readonly channels: readonly number[]
  readonly band?: 'VHF' | 'UHF'
  readonly offset?: CarrierOffset
  /** Off air unless it says cable, where filtered head-ends stand side by side. */
  readonly medium?: 'cable'
  /** Planning of broadcasts: tropospheric, a small share of the time. */
  readonly planningDb: number
  /** Interference that is always there, as inside a house; null where nobody tabulated it. */
  readonly continuousDb: number | null
  readonly source: string
}

const ANALOGUE_RULE = '47 CFR 74.705(d), signs turned to wanted over unwanted'
const DIGITAL_RULE = '47 CFR 73.623(c)(2)'
const BT655 = 'ITU-R BT.655, read through a public open-source coding of its tables'
const BT1368 = 'ITU-R BT.1368, read through a public open-source coding of its tables'
const BT1368_MEMORY = 'ITU-R BT.1368, from memory, unsure to 3 dB'

const LINES_625: readonly RfSystemId[] = ['B', 'G', 'H', 'I', 'D', 'K', 'K1', 'L']
const AM_SOUND: readonly RfSystemId[] = ['L', "L'"]

type Ratios = readonly [planningDb: number, continuousDb?: number]
type Place = Pick<ProtectionRow, 'channels' | 'band' | 'offset' | 'mode' | 'medium'>

const rows =
  (source: string) =>
  (
    wanted: readonly Service[],
    unwanted: readonly Service[],
    table: readonly (readonly [Place, Ratios])[],
  ): ProtectionRow[] =>
    table.map(([place, [planningDb, continuousDb = null]]) => ({
      ...place,
      wanted,
      unwanted,
      planningDb,
      continuousDb,
      source,
    }))

const at = (...channels: readonly number[]): Place => ({ channels })
const vhf = (...channels: readonly number[]): Place => ({ channels, band: 'VHF' })
const uhf = (...channels: readonly number[]): Place => ({ channels, band: 'UHF' })
const offset = (kind: CarrierOffset): Place => ({ channels: [0], offset: kind })
const onCable = (...channels: readonly number[]): Place => ({ channels, medium: 'cable' })
const mode = (channels: readonly number[], of: DvbMode): Place => ({ channels, mode: of })

const byRule = rows(ANALOGUE_RULE)
const byDigitalRule = rows(DIGITAL_RULE)
const by655 = rows(BT655)
const by1368 = rows(BT1368)

const M_ROWS = [
  ...byRule(
    ['M'],
    ['M'],
    [
      [offset('none'), [45]],
      [offset('10-khz'), [28]],
      [vhf(-1), [-6]],
      [vhf(1), [-12]],
      [uhf(-1, 1), [-15]],
      [at(14), [-23]],
      [at(15), [-6]],
    ],
  ),
  ...rows('47 CFR 76.605(a)(4)(i)')(['M'], ['M'], [[onCable(-1, 1), [-3]]]),
  ...byDigitalRule(
    ['M'],
    ['atsc'],
    [
      [at(0), [34]],
      [at(-1), [-14]],
      [at(1), [-17]],
      [at(-2), [-24]],
      [at(2), [-28]],
      [at(-3), [-30]],
      [at(3), [-34]],
      [at(-4), [-34]],
      [at(4), [-25]],
      [at(-7), [-35]],
      [at(7), [-43]],
      [at(-8), [-32]],
      [at(8), [-43]],
      [at(14), [-33]],
      [at(15), [-31]],
    ],
  ),
]

/** With the wanted multiplex well above noise: 25 dB against M, 28 dB against another. */
const ATSC_ROWS = [
  ...byDigitalRule(
    ['atsc'],
    ['M'],
    [
      [at(0), [2]],
      [at(-1), [-48]],
      [at(1), [-49]],
    ],
  ),
  ...byDigitalRule(
    ['atsc'],
    ['atsc'],
    [
      [at(0), [15]],
      [at(-1), [-28]],
      [at(1), [-26]],
    ],
  ),
]

/** 6.5 MHz sound of the channel below falls 1.5 MHz below the wanted vision: inside the vestige of H and I. */
const BELOW_625 = [
  ...by655(['B'], ['B'], [[vhf(-1), [-9, 1]]]),
  ...by655(AM_SOUND, AM_SOUND, [[vhf(-1), [-8, 2]]]),
  ...by655(['G', 'H', 'I', 'D', 'K'], ['G', 'H', 'I'], [[uhf(-1), [-9, 1]]]),
  ...by655(['G', 'D', 'K'], ['D', 'K'], [[uhf(-1), [-9, 1]]]),
  ...by655(['H', 'I'], ['D', 'K'], [[uhf(-1), [13, 23]]]),
  ...by655(['H', 'I', 'K1'], ['L'], [[uhf(-1), [17, 27]]]),
  ...by655(['G', 'D', 'K'], ['L'], [[uhf(-1), [-5, 5]]]),
  ...by655(['L'], ['L'], [[uhf(-1), [-8, 2]]]),
]

const ANALOGUE_625 = [
  ...by655(LINES_625, LINES_625, [
    [offset('none'), [45, 52]],
    [offset('8/12-line'), [30, 40]],
    [offset('4/12-line'), [22, 27]],
  ]),
  ...BELOW_625,
  ...by655(['B', 'G', 'H', 'I', 'L'], ['B', 'G', 'H', 'I', 'L'], [[at(1), [-12, -2]]]),
  ...by655(['D', 'K'], ['D', 'K'], [[at(1), [-6, 4]]]),
  ...by655(['G'], ['G'], [[at(9), [-1, 6]]]),
  ...by655(['I'], ['I'], [[at(9), [-10, -2]]]),
  ...by655(
    ['D'],
    ['D'],
    [
      [at(9), [3, 11]],
      [at(8), [-20, -10]],
    ],
  ),
  ...by655(['L'], ['L'], [[at(-9), [0, 7]]]),
]

const ANALOGUE_AND_DVB = [
  ...by1368(['B', 'G', 'D', 'K'], ['dvb-t'], [[at(0), [34, 40]]]),
  ...by1368(
    ['G'],
    ['dvb-t'],
    [
      [at(-1), [-7, -4]],
      [at(1), [-9, -7]],
      [at(9), [-19, -15]],
    ],
  ),
  ...by1368(
    ['I'],
    ['dvb-t'],
    [
      [at(0), [37, 41]],
      [at(-1), [-8, -4]],
      [at(1), [-10, -6]],
    ],
  ),
  ...by1368(
    ['L'],
    ['dvb-t'],
    [
      [at(0), [37, 42]],
      [at(-1), [-9, -7]],
      [at(1), [-1, -1]],
    ],
  ),
]

/** Ratio of each mode of DVB-T against an analogue carrier on its channel, in the order of {@link DVB_MODES}. */
const DVB_ON_ANALOGUE_DB = [-12, -8, -4, -8, -3, 3, -3, 3, 9] as const

const DVB_ROWS = [
  ...by1368(
    ['dvb-t'],
    LINES_625,
    DVB_MODES.map((of, i) => {
      const ratio = DVB_ON_ANALOGUE_DB[i] ?? 0
      return [mode([0], of), [ratio, ratio]] as const
    }),
  ),
  ...rows(BT1368_MEMORY)(['dvb-t'], LINES_625, [
    [mode([-1], '64-QAM 2/3'), [-35]],
    [mode([1], '64-QAM 2/3'), [-38]],
  ]),
  ...rows(BT1368_MEMORY)(
    ['dvb-t'],
    ['dvb-t'],
    [
      [mode([-1, 1], '64-QAM 2/3'), [-30]],
      [mode([0], '64-QAM 2/3'), [20]],
    ],
  ),
]

export const PROTECTION_ROWS: readonly ProtectionRow[] = [
  ...M_ROWS,
  ...ATSC_ROWS,
  ...ANALOGUE_625,
  ...ANALOGUE_AND_DVB,
  ...DVB_ROWS,
]
