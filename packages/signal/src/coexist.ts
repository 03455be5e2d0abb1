import type { RfSystemId } from './systems'
import { RF_SYSTEMS } from './systems'

/** Something that occupies spectrum on a cable: edges and vision carrier in MHz, level in dBmV. */
export interface Occupant {
  readonly lowerMhz: number
  readonly upperMhz: number
  /** Null for a digital multiplex. */
  readonly visionMhz: number | null
  /** Null for a digital multiplex. */
  readonly system: RfSystemId | null
  readonly sideband: 'vestigial' | 'double'
  readonly levelDbmv: number
}

export const FOULINGS = ['co-channel', 'overlap', 'sideband', 'adjacent'] as const
export type Fouling = (typeof FOULINGS)[number]

export interface Clash {
  readonly how: Fouling
  /** Which of the two is spoilt. */
  readonly victim: 'first' | 'second'
  /** How far the level difference lies above what is needed; negative means harm. In dB. */
  readonly marginDb: number
}

/** Two edges meet within this much. */
const TOUCH_MHZ = 0.05
/** Sound carrier below vision in a consumer modulator: ratio of the two limits in 47 CFR 15.115(b)(1). */
const SOUND_BELOW_DB = 13
/** Needed against a mirrored carrier inside a used analogue channel (common practice, no source). */
const SIDEBAND_DB = 47
/** Co-channel, carriers not offset: 47 CFR 74.705(d); ITU-R BT.655. */
const CO_CHANNEL_DB = 45
/** Analogue against an 8-VSB multiplex on its channel: 47 CFR 73.623(c)(2). */
const DIGITAL_ON_ANALOGUE_DB = 34
/** An 8-VSB multiplex against analogue spill on its channel; 12 dB taken as between 2 and 21, 47 CFR 73.623(c). */
const ANALOGUE_ON_DIGITAL_DB = 12

/**
 * Least wanted minus unwanted level of an analogue channel against its neighbour, in dB.
 * M: 47 CFR 74.705(d), VHF and UHF. 625 lines: ITU-R BT.655, read through a public coding of its tables.
 */
function neighbourDb(system: RfSystemId, side: 'below' | 'above', uhf: boolean): number {
  if (RF_SYSTEMS[system].lines !== 525) return side === 'below' ? -9 : -12
  if (uhf) return -15
  return side === 'below' ? -6 : -12
}

/** Analogue wanted against a digital neighbour: 47 CFR 73.623(c)(2); DVB-T from memory. */
function digitalNeighbourDb(system: RfSystemId, side: 'below' | 'above'): number {
  if (RF_SYSTEMS[system].lines !== 525) return side === 'below' ? -8 : -10
  return side === 'below' ? -14 : -17
}

/** A digital multiplex beside an analogue channel: 47 CFR 73.623(c)(2); DVB-T from memory. */
const analogueBesideDigitalDb = (system: RfSystemId): number =>
  RF_SYSTEMS[system].lines === 525 ? -48 : -35

const isUhf = (o: Occupant): boolean => o.lowerMhz >= 300

const overlap = (a: Occupant, b: Occupant): boolean =>
  a.lowerMhz < b.upperMhz - TOUCH_MHZ && b.lowerMhz < a.upperMhz - TOUCH_MHZ

const sameChannel = (a: Occupant, b: Occupant): boolean =>
  Math.abs(a.lowerMhz - b.lowerMhz) < TOUCH_MHZ && Math.abs(a.upperMhz - b.upperMhz) < TOUCH_MHZ

/** Where b lies beside a, edge to edge; null when they do not touch. */
function beside(a: Occupant, b: Occupant): 'below' | 'above' | null {
  if (Math.abs(b.upperMhz - a.lowerMhz) < TOUCH_MHZ) return 'below'
  return Math.abs(b.lowerMhz - a.upperMhz) < TOUCH_MHZ ? 'above' : null
}

/** What an unfiltered modulator mirrors to the other side of its vision carrier falls into a channel. */
function mirroredInto(from: Occupant, into: Occupant): boolean {
  if (from.sideband !== 'double' || from.visionMhz === null || from.system === null) return false
  const mirrored = from.visionMhz - RF_SYSTEMS[from.system].soundMhz
  return mirrored > into.lowerMhz + TOUCH_MHZ && mirrored < into.upperMhz - TOUCH_MHZ
}

/** How one occupant suffers from another on the same cable; null where they do not meet. */
function suffers(wanted: Occupant, other: Occupant): { how: Fouling; marginDb: number } | null {
  const difference = wanted.levelDbmv - other.levelDbmv
  if (overlap(wanted, other)) {
    const needed =
      wanted.system === null
        ? ANALOGUE_ON_DIGITAL_DB
        : other.system === null
          ? DIGITAL_ON_ANALOGUE_DB
          : CO_CHANNEL_DB
    return {
      how: sameChannel(wanted, other) ? 'co-channel' : 'overlap',
      marginDb: difference - needed,
    }
  }
  if (mirroredInto(other, wanted)) {
    const needed = wanted.system === null ? ANALOGUE_ON_DIGITAL_DB : SIDEBAND_DB
    return { how: 'sideband', marginDb: difference + SOUND_BELOW_DB - needed }
  }
  const side = beside(wanted, other)
  if (!side) return null
  const needed =
    wanted.system === null
      ? other.system === null
        ? -26
        : analogueBesideDigitalDb(other.system)
      : other.system === null
        ? digitalNeighbourDb(wanted.system, side)
        : neighbourDb(wanted.system, side, isUhf(wanted))
  return { how: 'adjacent', marginDb: difference - needed }
}

/** Everything by which two occupants of one cable spoil each other or come near it. */
export function clashes(a: Occupant, b: Occupant): Clash[] {
  const first = suffers(a, b)
  const second = suffers(b, a)
  return [
    ...(first ? [{ ...first, victim: 'first' as const }] : []),
    ...(second ? [{ ...second, victim: 'second' as const }] : []),
  ]
}

/** The least margin between two occupants in dB; Infinity where they do not meet. */
export const leastMargin = (a: Occupant, b: Occupant): number =>
  clashes(a, b).reduce((least, c) => Math.min(least, c.marginDb), Infinity)
