/** A scan format is numbers; its id is only a label. */
export interface Scan {
  readonly id: ScanId
  readonly totalLines: number
  readonly fieldHz: number
  readonly interlaced: boolean
  readonly lineKhz: number
  readonly source: string
}

export const SCAN_IDS = [
  '525i60',
  '262p60',
  '625i50',
  '312p50',
  '525p60',
  '625p50',
  '750p60',
  '1125i60',
  '1125p60',
  '405i50',
  '819i50',
  'cga-15k7',
  'mda-18k4',
  'ega-21k8',
  'mono-24k',
  'vga-31k-60',
  'vga-31k-70',
  'mono-35k7-71',
] as const

export type ScanId = (typeof SCAN_IDS)[number]

const M = '47 CFR 73.682'
const BT470 = 'ITU-R BT.470 (through open configurations)'
const HD = 'SMPTE 274M, 296M (from memory)'
const COMPUTER = 'common practice, no source'

/** The columns of the table below, in the units of {@link Scan}. */
type Columns = readonly [totalLines: number, fieldHz: number, lineKhz: number]

const scan =
  (interlaced: boolean) =>
  (id: ScanId, [totalLines, fieldHz, lineKhz]: Columns, source: string): Scan => ({
    id,
    totalLines,
    fieldHz,
    interlaced,
    lineKhz,
    source,
  })

const interlaced = scan(true)
const progressive = scan(false)

export const SCANS: Readonly<Record<ScanId, Scan>> = {
  '525i60': interlaced('525i60', [525, 59.94, 15.734], M),
  '262p60': progressive('262p60', [262, 60.05, 15.734], COMPUTER),
  '625i50': interlaced('625i50', [625, 50, 15.625], BT470),
  '312p50': progressive('312p50', [312, 50.08, 15.625], COMPUTER),
  '525p60': progressive('525p60', [525, 59.94, 31.47], M),
  '625p50': progressive('625p50', [625, 50, 31.25], BT470),
  '750p60': progressive('750p60', [750, 60, 45], HD),
  '1125i60': interlaced('1125i60', [1125, 60, 33.75], HD),
  '1125p60': progressive('1125p60', [1125, 60, 67.5], HD),
  '405i50': interlaced('405i50', [405, 50, 10.125], BT470),
  '819i50': interlaced('819i50', [819, 50, 20.475], BT470),
  'cga-15k7': progressive('cga-15k7', [262, 59.9, 15.7], COMPUTER),
  'mda-18k4': progressive('mda-18k4', [370, 50, 18.43], COMPUTER),
  'ega-21k8': progressive('ega-21k8', [366, 59.7, 21.85], COMPUTER),
  'mono-24k': progressive('mono-24k', [440, 56.4, 24.8], COMPUTER),
  'vga-31k-60': progressive('vga-31k-60', [525, 59.94, 31.47], COMPUTER),
  'vga-31k-70': progressive('vga-31k-70', [449, 70.1, 31.47], COMPUTER),
  'mono-35k7-71': progressive('mono-35k7-71', [501, 71.2, 35.7], COMPUTER),
}

/** Fields a second as a person says it: 50, 60 or 70. */
export const nominalFieldHz = (id: ScanId): number => Math.round(SCANS[id].fieldHz)

/** What a tube or panel follows: intervals of line rate in kHz, and of field rate in Hz. */
export interface Deflection {
  readonly lineKhz: readonly (readonly [number, number])[]
  readonly fieldHz: readonly (readonly [number, number])[]
  /** A fixed-rate deflection may be harmed by a wrong line rate. */
  readonly fixed: boolean
}

/** Half the difference between the two 15 kHz television rates is tolerated by every set (common practice, no source). */
const LINE_PULL_KHZ = 0.02
const FIELD_PULL_HZ = 1

const within = (
  value: number,
  spans: readonly (readonly [number, number])[],
  slack: number,
): boolean => spans.some(([low, high]) => value >= low - slack && value <= high + slack)

export const followsLine = (d: Deflection, id: ScanId): boolean =>
  within(SCANS[id].lineKhz, d.lineKhz, LINE_PULL_KHZ)

export const followsField = (d: Deflection, id: ScanId): boolean =>
  within(SCANS[id].fieldHz, d.fieldHz, FIELD_PULL_HZ)
