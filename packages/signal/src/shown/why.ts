const BT470 = 'ITU-R BT.470; common practice'
const PRACTICE = 'common practice, no source'
const MATRIX = 'derived from the BT.601 matrix (coefficients from memory)'
const CHANNELS = 'channel tables of this package'

/** Why a set shows what it shows, each with where the rule comes from. */
export const WHY_SOURCES = {
  'same-system': '47 CFR 73.682; ITU-R BT.470',
  'set-up': PRACTICE,
  /** The decoder knows another subcarrier or another coding. */
  'other-colour': BT470,
  'other-field-rate': BT470,
  'other-line-rate': BT470,
  'other-sound-spacing': BT470,
  /** AM where FM is looked for, or the other way about. */
  'other-sound-modulation': BT470,
  'other-polarity': BT470,
  'off-frequency': CHANNELS,
  'out-of-reach': CHANNELS,
  /** No vision carrier: 47 CFR 73.682(d). */
  'digital-carrier': '47 CFR 73.682(d)',
  'digital-only-tuner': PRACTICE,
  'mono-modulator': PRACTICE,
  'not-interlaced': PRACTICE,
  'protection-pulses': PRACTICE,
  /** No decoder is needed, so no colour system matters: EIA-770.2. */
  'no-subcarrier': 'EIA-770.2, from memory',
  'colour-difference-into-rgb': MATRIX,
  'rgb-into-colour-difference': MATRIX,
  'luma-alone': PRACTICE,
  'composite-as-luma': PRACTICE,
  'no-sync': PRACTICE,
  /** 3 to 5 V where 0.7 V is expected. */
  'logic-level': PRACTICE,
  'other-signal': PRACTICE,
  /** About 40 dB too much gain, and an equaliser. */
  'turntable-gain': PRACTICE,
  'digital-sound': 'IEC 60958-3, from memory; common practice',
} as const

export type Why = keyof typeof WHY_SOURCES
