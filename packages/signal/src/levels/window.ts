import { dbmv, dbuv, dbuvToDbmv, type Dbmv } from '@coaxwain/quantities'

/** What a level at a set or an outlet should lie between; null where no number is given. */
export interface LevelWindow {
  readonly low: Dbmv
  readonly high: Dbmv | null
  readonly source: string
}

const IEC = 'IEC 60728-1 as tabulated by an equipment maker; not read in print'

const outlet = (lowDbuv: number, highDbuv: number): LevelWindow => ({
  low: dbuvToDbmv(dbuv(lowDbuv)),
  high: dbuvToDbmv(dbuv(highDbuv)),
  source: IEC,
})

export const LEVEL_WINDOWS = {
  /** At the terminals of a set; "no overload" has no number. */
  'fcc-terminal': { low: dbmv(0), high: null, source: '47 CFR 76.605(a)(3), (4)(iii)' },
  /** At the end of a drop of 30 m. */
  'fcc-drop-end': { low: dbmv(3), high: null, source: '47 CFR 76.605(a)(3)' },
  'iec-outlet-am': outlet(60, 77),
  'iec-outlet-fm-mono': outlet(40, 70),
  'iec-outlet-fm-stereo': outlet(50, 70),
  'iec-outlet-dvb-t': outlet(45, 74),
  'iec-outlet-dvb-c-64qam': outlet(47, 67),
  'iec-outlet-dvb-c-256qam': outlet(54, 74),
  'iec-outlet-dvb-t2': outlet(39, 74),
  /** +3 to +10 dBmV is the aim; above +15 dBmV a cable-ready set need not stand it. */
  'working-target': {
    low: dbmv(3),
    high: dbmv(15),
    source: 'common practice, no source; overload test level of 47 CFR 15.118(c)(4)',
  },
} as const satisfies Readonly<Record<string, LevelWindow>>

export type LevelWindowId = keyof typeof LEVEL_WINDOWS

export type LevelPlace = 'low' | 'ok' | 'high'

/** Where a level lies; the ends of a window belong to it. */
export function placeInWindow(level: Dbmv, { low, high }: LevelWindow): LevelPlace {
  if (level < low) return 'low'
  return high !== null && level > high ? 'high' : 'ok'
}
