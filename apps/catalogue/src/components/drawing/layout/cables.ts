import { familyOf, isSingle, type Circuit, type Connector } from '@coaxwain/signal'

/** What a cable carries, as far as its look is concerned. */
export const CABLE_KINDS = [
  'v',
  'l',
  'r',
  's',
  'y',
  'pb',
  'pr',
  '21',
  'h',
  'd',
  '75',
  '300',
  'dc',
  'red',
  'green',
  'blue',
  'sync',
  'many',
] as const

export type CableKind = (typeof CABLE_KINDS)[number]

export interface CableLook {
  /** Letters of the tag. */
  readonly tag: string
  /** The token of the band in the plug's colour. */
  readonly band: string
  /** Width of the line, or of each of several lines. */
  readonly line: number
  readonly dash?: string
  readonly lines: 1 | 2 | 3
  readonly rungs: boolean
}

const look = (
  tag: string,
  band: string,
  line: number,
  rest: Partial<Omit<CableLook, 'tag' | 'band' | 'line'>> = {},
): CableLook => ({ tag, band, line, lines: 1, rungs: false, ...rest })

export const CABLE_LOOKS: Readonly<Record<CableKind, CableLook>> = {
  v: look('V', 'v', 2),
  l: look('L', 'l', 2, { dash: '12 6' }),
  r: look('R', 'r', 2, { dash: '4.5 4' }),
  s: look('S', 's', 1.5, { lines: 2 }),
  y: look('Y', 'y', 2, { dash: '12 4 2 4' }),
  pb: look('Pb', 'pb', 2, { dash: '12 4 2 4 2 4' }),
  pr: look('Pr', 'pr', 2, { dash: '2.5 3.5 2.5 8' }),
  '21': look('21', '21', 3.5, { dash: '16 5' }),
  h: look('H', 'h', 1.25, { lines: 3 }),
  d: look('D', 'd', 2, { dash: '2 3.5' }),
  '75': look('75', '75', 3.5),
  '300': look('300', '300', 1.5, { lines: 2, rungs: true }),
  dc: look('DC', 'dc', 1.5, { dash: '9 3 2 3' }),
  red: look('Rd', 'pr', 2, { dash: '8 3 8 3 2 3' }),
  green: look('Gr', 'y', 2, { dash: '8 3 2 3 2 3 2 3' }),
  blue: look('Bl', 'pb', 2, { dash: '8 3' }),
  sync: look('Sy', 's', 1.5, { dash: '6 3 2 3' }),
  many: look('MW', 's', 3.5, { dash: '10 4' }),
}

const SINGLE: Partial<Record<Circuit, CableKind>> = {
  cvbs: 'v',
  'audio-l': 'l',
  'audio-r': 'r',
  'audio-mono': 'l',
  y: 'y',
  c: 's',
  pb: 'pb',
  pr: 'pr',
  r: 'red',
  g: 'green',
  b: 'blue',
  csync: 'sync',
  hsync: 'sync',
  vsync: 'sync',
  tmds: 'h',
  spdif: 'd',
  'ac3-rf': 'd',
  dc: 'dc',
}

const MULTI: Partial<Record<string, CableKind>> = {
  svideo4: 's',
  minidin7: 's',
  scart: '21',
  jp21: '21',
  hdmi: 'h',
  dvi: 'h',
}

const TWIN: readonly Connector[] = ['screws', 'spades', 'bare']

/** The look of a run of cable from what it carries and what its two ends are. */
export function cableKind(
  circuits: readonly Circuit[],
  ends: readonly [Connector, Connector],
): CableKind {
  if (circuits.includes('rf')) return ends.some((e) => TWIN.includes(e)) ? '300' : '75'
  const multi = ends.find((e) => !isSingle(e) && familyOf(e) !== 'jack35')
  if (multi && circuits.length !== 1) return MULTI[familyOf(multi)] ?? 'many'
  if (multi && ends.every((e) => !isSingle(e))) return MULTI[familyOf(multi)] ?? 'many'
  const first = circuits[0]
  return (first && SINGLE[first]) ?? 'many'
}

/** The letters of a tag; mono sound shares the look of left and says so by its letter. */
export const tagOf = (kind: CableKind, circuits: readonly Circuit[]): string =>
  kind === 'l' && circuits[0] === 'audio-mono'
    ? 'M'
    : kind === 's' && circuits.length === 1 && circuits[0] === 'c'
      ? 'C'
      : CABLE_LOOKS[kind].tag
