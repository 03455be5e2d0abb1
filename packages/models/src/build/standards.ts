import type { AcceptRow, DisplayFacts } from '../model'
import type { Colour, Deflection, DigitalSystem, RfSystemId, ScanId } from '@coaxwain/signal'

/** Television of each raster, with the non-interlaced pictures of consoles and home computers. */
export const LINES_525: readonly ScanId[] = ['525i60', '262p60']
export const LINES_625: readonly ScanId[] = ['625i50', '312p50']
export const LINES_15K: readonly ScanId[] = [...LINES_525, ...LINES_625]

export const NTSC: readonly Colour[] = ['ntsc-m', 'ntsc-j']
/** 60 Hz pictures with a 4.43 MHz subcarrier, as players make them for 625-line sets. */
export const SIXTY_443: readonly Colour[] = ['pal-60', 'ntsc-443']

/** Whatever comes goes through. */
export const ANYTHING: readonly AcceptRow[] = [{ scans: 'any', colours: 'any' }]

/** A signal whose subcarrier is not decoded stays grey and steady (ITU-R BT.470; common practice, no source). */
const grey = (scans: readonly ScanId[]): AcceptRow => ({
  scans,
  colours: 'any',
  outcome: 'monochrome',
})

/** Composite video as a 525-line or a 625-line box takes it; the colour is left as it is. */
export const NTSC_LINE: readonly AcceptRow[] = [{ scans: LINES_525, colours: [...NTSC, 'mono'] }]
export const PAL_LINE: readonly AcceptRow[] = [{ scans: LINES_625, colours: ['pal', 'mono'] }]

/** An encoded input of a 525-line colour set. */
export const NTSC_SET: readonly AcceptRow[] = [
  { scans: LINES_525, colours: [...NTSC, 'mono'] },
  grey(LINES_525),
]

/** An encoded input of a 625-line colour set that follows 50 Hz only. */
export const PAL_SET: readonly AcceptRow[] = [
  { scans: LINES_625, colours: ['pal', 'mono'] },
  grey(LINES_625),
]

/** An encoded input of a later 625-line set that also follows 60 Hz. */
export const PAL_60_SET: readonly AcceptRow[] = [
  { scans: LINES_625, colours: ['pal', 'mono'] },
  { scans: LINES_525, colours: [...SIXTY_443, 'mono'] },
  grey(LINES_15K),
]

/** An encoded input of a tube without colour. */
export const MONO_SET = (scans: readonly ScanId[]): readonly AcceptRow[] => [grey(scans)]

/** An input whose colour needs no decoder: component or RGB. */
export const plainColour = (
  colour: 'ypbpr' | 'rgb' | 'rgbi' | 'digital',
  scans: readonly ScanId[],
): readonly AcceptRow[] => [{ scans, colours: [colour] }]

/**
 * An aerial input: the picture rows of a set with the systems whose sound it hears, and after them the same
 * rows for systems of the same raster with another sound spacing: seen, not heard (ITU-R BT.470).
 */
export function heardOn(
  rows: readonly AcceptRow[],
  heard: readonly RfSystemId[],
  silent: readonly RfSystemId[] = [],
): readonly AcceptRow[] {
  const within = rows.map((row): AcceptRow => ({ ...row, systems: heard }))
  const seen = silent.length > 0 ? rows.filter((row) => row.outcome === undefined) : []
  return [
    ...within,
    ...seen.map((row): AcceptRow => ({ ...row, systems: silent, outcome: 'silent' })),
  ]
}

/** A tuner that decodes digital carriers and no others. */
export const digitalOnly = (digital: readonly DigitalSystem[]): readonly AcceptRow[] => [
  { scans: 'any', colours: 'any', systems: [], digital },
]

// ---------------------------------------------------------------- tubes and panels

/** Every television tube follows both television line rates; the field rate sorts the markets (common practice, no source). */
const TELEVISION_KHZ = [[15.625, 15.734]] as const

const SIXTY = [[59, 61]] as const
/** A hold control or a later sync circuit reaches from 50 to 60 Hz. */
const FIFTY = [[49, 51]] as const
const FIFTY_SIXTY = [[49, 61]] as const

const deflection = (fieldHz: Deflection['fieldHz']): Deflection => ({
  lineKhz: TELEVISION_KHZ,
  fieldHz,
  fixed: false,
})

export const DEFLECTION_60 = deflection(SIXTY)
export const DEFLECTION_50 = deflection(FIFTY)
export const DEFLECTION_50_60 = deflection(FIFTY_SIXTY)

/** A direct-view tube of the usual shape that is driven straight from what arrives. */
export const tube = (
  deflectionFacts: Deflection,
  loudspeakers: DisplayFacts['loudspeakers'],
  screen: DisplayFacts['screen'] = 'tube-colour',
): DisplayFacts => ({
  screen,
  deflection: deflectionFacts,
  shape: '4:3',
  loudspeakers,
  storesFields: false,
  convertsScan: false,
  directView: true,
})
