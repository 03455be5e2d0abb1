/** How colour travels. The first eight are encoded on a subcarrier; the rest need no decoder. */
export const COLOURS = [
  'ntsc-m',
  'ntsc-j',
  'ntsc-443',
  'pal',
  'pal-60',
  'pal-m',
  'pal-n',
  'secam',
  'rgb',
  'ypbpr',
  'digital',
  'rgbi',
  'mono',
] as const

export type Colour = (typeof COLOURS)[number]

/** Colour that rides on a subcarrier. */
export type EncodedColour = Exclude<Colour, 'rgb' | 'ypbpr' | 'digital' | 'rgbi' | 'mono'>

export interface ColourSystem {
  readonly lines: 525 | 625
  readonly coding: 'ntsc' | 'pal' | 'secam'
  /** One, or the two of alternate lines. */
  readonly subcarrierHz: readonly number[]
  /** Black above blanking, in percent of white; null where countries differ. */
  readonly setUpPercent: number | null
  readonly source: string
}

const BT470 = 'ITU-R BT.470; open-source TV modulator configuration'
const PRACTICE = 'common practice, no source'

const NTSC_HZ = [3_579_545.4545] as const
const PAL_HZ = [4_433_618.75] as const

/** The letter of the RF system changes nothing here: PAL is one for B, G, H, I, D and K. */
export const COLOUR_SYSTEMS: Readonly<Record<EncodedColour, ColourSystem>> = {
  'ntsc-m': {
    lines: 525,
    coding: 'ntsc',
    subcarrierHz: NTSC_HZ,
    setUpPercent: 7.5,
    source: '47 CFR 73.682(a)(5),(6),(17),(20)(iii); open-source TV modulator configuration',
  },
  'ntsc-j': {
    lines: 525,
    coding: 'ntsc',
    subcarrierHz: NTSC_HZ,
    setUpPercent: 0,
    source: PRACTICE,
  },
  /** An output of multi-standard players, never broadcast. */
  'ntsc-443': {
    lines: 525,
    coding: 'ntsc',
    subcarrierHz: PAL_HZ,
    setUpPercent: null,
    source: PRACTICE,
  },
  pal: { lines: 625, coding: 'pal', subcarrierHz: PAL_HZ, setUpPercent: 0, source: BT470 },
  /** An output of players and consoles for sets that follow 60 Hz, never broadcast. */
  'pal-60': {
    lines: 525,
    coding: 'pal',
    subcarrierHz: PAL_HZ,
    setUpPercent: 0,
    source: `open-source TV modulator configuration; ${PRACTICE}`,
  },
  /** 3.9 kHz from the subcarrier of NTSC, and not it. */
  'pal-m': {
    lines: 525,
    coding: 'pal',
    subcarrierHz: [3_575_611.49],
    setUpPercent: 7.5,
    source: BT470,
  },
  'pal-n': {
    lines: 625,
    coding: 'pal',
    subcarrierHz: [3_582_056.25],
    setUpPercent: null,
    source: BT470,
  },
  secam: {
    lines: 625,
    coding: 'secam',
    subcarrierHz: [4_250_000, 4_406_250],
    setUpPercent: 0,
    source: `open-source TV modulator configuration; ${BT470}`,
  },
}

/**
 * Two ways of recording SECAM on tape. A tape of one kind plays in grey on a machine of the other.
 * Source: common practice, no source.
 */
export const SECAM_TAPE_METHODS = ['frequency-division', 'mixing'] as const

/** Rides on a subcarrier and so needs the right decoder. */
export const isEncoded = (colour: Colour): colour is EncodedColour => colour in COLOUR_SYSTEMS

/** How far a crystal decoder follows a subcarrier (common practice, no source). */
const COLOUR_PULL_HZ = 500

/** Coded alike on the same subcarrier: NTSC-M and NTSC-J, PAL and PAL-60. */
function decodedAlike(a: EncodedColour, b: EncodedColour): boolean {
  const [one, other] = [COLOUR_SYSTEMS[a], COLOUR_SYSTEMS[b]]
  return (
    one.coding === other.coding &&
    one.subcarrierHz.every(
      (hz, i) => Math.abs(hz - (other.subcarrierHz[i] ?? Infinity)) <= COLOUR_PULL_HZ,
    )
  )
}

/**
 * What a decoder for `accepted` makes of a signal whose scan it follows. A decoder that does not know the
 * subcarrier or the coding leaves the picture grey and steady: ITU-R BT.470 for the pairs that share a raster;
 * common practice, no source, for the rest.
 */
export function decode(signal: Colour, accepted: readonly Colour[]): 'colour' | 'monochrome' {
  if (signal === 'mono') return 'monochrome'
  const known = accepted.some(
    (c) => c === signal || (isEncoded(c) && isEncoded(signal) && decodedAlike(c, signal)),
  )
  return known ? 'colour' : 'monochrome'
}

/**
 * What becomes of black where signal and set are of one coding with different set-up: shadows are crushed
 * without it, blacks are grey with too much. A brightness control puts it right. Null where nothing differs.
 */
export function setUpFault(signal: Colour, set: Colour): 'crushed' | 'greyed' | null {
  if (!isEncoded(signal) || !isEncoded(set) || !decodedAlike(signal, set)) return null
  const [sent, expected] = [COLOUR_SYSTEMS[signal].setUpPercent, COLOUR_SYSTEMS[set].setUpPercent]
  if (sent === null || expected === null || sent === expected) return null
  return sent < expected ? 'crushed' : 'greyed'
}
