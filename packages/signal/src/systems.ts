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
  /** Sound carrier relative to vision; negative where it lies below. */
  readonly soundMhz: number
  readonly polarity: 'negative' | 'positive'
  readonly videoMhz: number
  /** White level as a share of peak carrier, in percent, at nominal video. */
  readonly whitePercent: number
  readonly source: string
}

const BT470 = 'ITU-R BT.470; open-source TV modulator configuration'
const OLD = 'ITU-R BT.470 older editions, from memory'

/** The columns of the table below, in the units of {@link RfSystem}. */
type Columns = readonly [
  lines: RfSystem['lines'],
  soundMhz: number,
  polarity: RfSystem['polarity'],
  videoMhz: number,
  whitePercent: number,
]

const row = (id: RfSystemId, columns: Columns, source: string): RfSystem => {
  const [lines, soundMhz, polarity, videoMhz, whitePercent] = columns
  return { id, lines, soundMhz, polarity, videoMhz, whitePercent, source }
}

export const RF_SYSTEMS: Readonly<Record<RfSystemId, RfSystem>> = {
  A: row('A', [405, -3.5, 'positive', 3, 100], BT470),
  B: row('B', [625, 5.5, 'negative', 5, 12.5], BT470),
  C: row('C', [625, 5.5, 'positive', 5, 100], OLD),
  D: row('D', [625, 6.5, 'negative', 6, 12.5], BT470),
  E: row('E', [819, 11.15, 'positive', 10, 100], BT470),
  F: row('F', [819, 5.5, 'positive', 5, 100], OLD),
  G: row('G', [625, 5.5, 'negative', 5, 12.5], BT470),
  H: row('H', [625, 5.5, 'negative', 5, 12.5], 'ITU-R BT.470, from memory'),
  I: row('I', [625, 5.9996, 'negative', 5.5, 20], BT470),
  K: row('K', [625, 6.5, 'negative', 6, 12.5], BT470),
  K1: row('K1', [625, 6.5, 'negative', 6, 12.5], 'ITU-R BT.470, from memory'),
  L: row('L', [625, 6.5, 'positive', 6, 100], 'open-source TV modulator configuration'),
  "L'": row("L'", [625, -6.5, 'positive', 6, 100], 'public encyclopedia, channel table'),
  M: row('M', [525, 4.5, 'negative', 4.2, 12.5], '47 CFR 73.682(a), 73.687(b)'),
  N: row('N', [625, 4.5, 'negative', 4.2, 12.5], BT470),
}

/** Two systems share sound spacing when their carriers lie within 50 kHz (the deviation of FM sound). */
export const sameSoundSpacing = (a: RfSystemId, b: RfSystemId): boolean =>
  Math.abs(RF_SYSTEMS[a].soundMhz - RF_SYSTEMS[b].soundMhz) < 0.05

export const samePolarity = (a: RfSystemId, b: RfSystemId): boolean =>
  RF_SYSTEMS[a].polarity === RF_SYSTEMS[b].polarity
