/** A point of a published loss table: MHz, and dB for 100 ft. */
export type LossPoint = readonly [mhz: number, dbPer100ft: number]

export interface CableFacts {
  readonly impedanceOhm: 75 | 300
  /** Speed on the cable over the speed of light. */
  readonly velocityFactor: number
  /** Rising in frequency. */
  readonly points: readonly LossPoint[]
  /** dB per 100 ft is a sqrt(f) + b f with f in MHz, good within the span; null where nobody fitted one. */
  readonly fit: LossFit | null
  readonly source: string
}

export interface LossFit {
  /** Skin effect of the conductors. */
  readonly a: number
  /** Dielectric; slightly negative where the steel core of the cable bends the fit. */
  readonly b: number
  readonly mhz: readonly [low: number, high: number]
}

export const CABLE_IDS = [
  'RG-59',
  'RG-6',
  'RG-11',
  'RG-59 solid',
  'twin lead 22 AWG',
  'twin lead 20 AWG',
] as const

/** Foam cables of today, the solid-dielectric one of the 1970s, and flat 300 ohm ribbon. */
export type CableId = (typeof CABLE_IDS)[number]

/** Where drop cables are tabulated. */
const DROP_MHZ = [
  5, 55, 83, 187, 211, 250, 300, 350, 400, 450, 500, 550, 600, 750, 862, 1000,
] as const

const drop = (...losses: readonly number[]): readonly LossPoint[] => {
  if (losses.length !== DROP_MHZ.length) throw new Error('a loss is missing from a table')
  return DROP_MHZ.map((mhz, i) => [mhz, losses[i] as number])
}

const FOAM = { impedanceOhm: 75, velocityFactor: 0.82 } as const
const RIBBON = { impedanceOhm: 300, velocityFactor: 0.8 } as const
const DROP_SPAN = [55, 1000] as const

const TABLE = 'drop-cable maximum table, from memory'

/** Dry and whole cable; wet or corroded cable has no bound. */
export const CABLES: Readonly<Record<CableId, CableFacts>> = {
  'RG-59': {
    ...FOAM,
    points: drop(
      ...[0.86, 2.05, 2.45, 3.6, 3.8, 4.1, 4.45, 4.8],
      ...[5.1, 5.4, 5.7, 5.95, 6.2, 6.97, 7.52, 8.12],
    ),
    fit: { a: 0.27274, b: -0.000712, mhz: DROP_SPAN },
    source: `${TABLE}; a skin-effect calculation gives 0.85 to 0.95 of it above 55 MHz`,
  },
  'RG-6': {
    ...FOAM,
    points: drop(
      ...[0.58, 1.6, 1.95, 2.85, 3.05, 3.3, 3.55, 3.85],
      ...[4.15, 4.4, 4.66, 4.9, 5.1, 5.65, 6.1, 6.55],
    ),
    fit: { a: 0.21378, b: -0.000263, mhz: DROP_SPAN },
    source: `${TABLE}; an installer page and a catalogue agree within 0.16 dB`,
  },
  'RG-11': {
    ...FOAM,
    velocityFactor: 0.83,
    points: drop(
      ...[0.38, 0.96, 1.18, 1.75, 1.9, 2.05, 2.25, 2.42],
      ...[2.6, 2.75, 2.9, 3.04, 3.18, 3.65, 3.98, 4.35],
    ),
    fit: { a: 0.12558, b: 0.000261, mhz: DROP_SPAN },
    source: `${TABLE}; a skin-effect calculation gives 0.92 to 0.96 of it above 55 MHz`,
  },
  'RG-59 solid': {
    impedanceOhm: 75,
    velocityFactor: 0.66,
    points: [
      [50, 2.4],
      [100, 3.4],
      [200, 4.9],
      [400, 7],
      [900, 11.1],
      [1000, 12],
    ],
    fit: null,
    source: 'wire catalogue figures, from memory',
  },
  'twin lead 22 AWG': {
    ...RIBBON,
    points: [
      [57, 1.06],
      [100, 1.4],
      [213, 2.04],
      [473, 3.04],
      [695, 3.69],
    ],
    fit: { a: 0.14, b: 0, mhz: [50, 300] },
    source:
      'wire catalogue figure at 100 MHz quoted in a public mailing list; the rest by the square-root rule, a lower bound at UHF',
  },
  'twin lead 20 AWG': {
    ...RIBBON,
    points: [[100, 1.1]],
    fit: null,
    source: 'wire catalogue figure at 100 MHz quoted in a public mailing list',
  },
}
