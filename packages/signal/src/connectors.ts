import type { Circuit } from './circuits'

/**
 * Families of connectors. A family has a socket and a plug, except the loose ends: screws take spade lugs
 * or bare wire, a clamp takes the stripped end of coaxial cable, and a whip takes nothing.
 */
export const CONNECTOR_FAMILIES = [
  'phono',
  'f',
  'iec',
  'bnc',
  'svideo4',
  'minidin7',
  'scart',
  'jp21',
  'dterm',
  'hd15',
  'hdmi',
  'dvi',
  'de9',
  'db23',
  'din5',
  'din6',
  'din8',
  'jack35',
  'multi',
  'optical',
  'dc',
] as const

export type ConnectorFamily = (typeof CONNECTOR_FAMILIES)[number]

export const LOOSE_CONNECTORS = ['screws', 'spades', 'bare', 'clamp', 'stripped', 'whip'] as const
export type LooseConnector = (typeof LOOSE_CONNECTORS)[number]

export type Connector = `${ConnectorFamily}-socket` | `${ConnectorFamily}-plug` | LooseConnector

export const CONNECTORS: readonly Connector[] = [
  ...CONNECTOR_FAMILIES.flatMap((f) => [`${f}-socket`, `${f}-plug`] as const),
  ...LOOSE_CONNECTORS,
]

export interface ConnectorFact {
  readonly family: ConnectorFamily
  /** One contact and its return: the plug carries a single circuit. */
  readonly single: boolean
  readonly impedanceOhm: 75 | 50 | 100 | 300 | null
  readonly standard: string
  readonly source: string
}

const fact =
  (single: boolean) =>
  (
    family: ConnectorFamily,
    impedanceOhm: ConnectorFact['impedanceOhm'],
    standard: string,
    source: string,
  ): ConnectorFact => ({ family, single, impedanceOhm, standard, source })

const single = fact(true)
const multi = fact(false)

const PRACTICE = 'common practice, no source'

export const CONNECTOR_FACTS: Readonly<Record<ConnectorFamily, ConnectorFact>> = {
  phono: single('phono', 75, 'IEC 60603-14', 'IEC 60603-14; common practice'),
  f: single('f', 75, 'IEC 61169-24', 'IEC 61169-24; common practice'),
  iec: single('iec', 75, 'IEC 61169-2', 'IEC 61169-2; common practice'),
  bnc: single('bnc', 75, 'IEC 61169-8', 'IEC 61169-8; common practice'),
  svideo4: multi('svideo4', 75, 'IEC 60933-5', 'pin list in three public sources'),
  minidin7: multi('minidin7', 75, 'none', 'public adapter pages'),
  scart: multi('scart', 75, 'IEC 60933-1', 'two published pin tables'),
  jp21: multi('jp21', 75, 'EIAJ TTC-0003', 'from memory'),
  dterm: multi('dterm', 75, 'EIAJ CP-4120', 'from memory'),
  hd15: multi('hd15', 75, 'none', PRACTICE),
  hdmi: multi('hdmi', 100, 'HDMI', PRACTICE),
  dvi: multi('dvi', 100, 'DVI 1.0', 'from memory'),
  de9: multi('de9', null, 'none', PRACTICE),
  db23: multi('db23', 75, 'none', PRACTICE),
  din5: multi('din5', null, 'IEC 60130-9', 'from memory'),
  din6: multi('din6', 75, 'DIN 45482', 'from memory'),
  din8: multi('din8', null, 'IEC 60130-9', 'from memory'),
  jack35: multi('jack35', null, 'IEC 60603-11', PRACTICE),
  multi: multi('multi', null, 'none', 'public connector library; common practice'),
  optical: single('optical', null, 'IEC 61754; JIS C 5974', 'from memory'),
  dc: single('dc', null, 'none', PRACTICE),
}

const isLoose = (c: Connector): c is LooseConnector =>
  (LOOSE_CONNECTORS as readonly string[]).includes(c)

export const familyOf = (c: Connector): ConnectorFamily | LooseConnector =>
  isLoose(c) ? c : (c.slice(0, c.lastIndexOf('-')) as ConnectorFamily)

const isPlug = (c: Connector): boolean => c.endsWith('-plug')

/** Carries one circuit only: every single-contact family, and screw terminals. */
export function isSingle(c: Connector): boolean {
  const family = familyOf(c)
  return family in CONNECTOR_FACTS ? CONNECTOR_FACTS[family as ConnectorFamily].single : true
}

/**
 * Plugs whose body goes into a socket of another family. The Japanese 21-pin plug has the SCART body
 * with other pins (EIAJ TTC-0003, from memory); a 4-pin S-Video plug goes into a 7-pin socket
 * (public adapter pages).
 */
const FOREIGN_FITS: readonly (readonly [ConnectorFamily, ConnectorFamily])[] = [
  ['jp21', 'scart'],
  ['scart', 'jp21'],
  ['svideo4', 'minidin7'],
]

/** Wired alike as well as fitting; the rest of FOREIGN_FITS goes in and is wrong inside. */
const FOREIGN_MATES: readonly (readonly [ConnectorFamily, ConnectorFamily])[] = [
  ['svideo4', 'minidin7'],
]

const paired = (
  table: readonly (readonly [ConnectorFamily, ConnectorFamily])[],
  plug: string,
  socket: string,
): boolean => table.some(([p, s]) => p === plug && s === socket)

function joinable(
  a: Connector,
  b: Connector,
  foreign: readonly (readonly [ConnectorFamily, ConnectorFamily])[],
): boolean {
  if (isLoose(a) || isLoose(b)) {
    const pair = [a, b]
    return (
      (pair.includes('screws') && (pair.includes('spades') || pair.includes('bare'))) ||
      (pair.includes('clamp') && pair.includes('stripped'))
    )
  }
  if (isPlug(a) === isPlug(b)) return false
  const plug = familyOf(isPlug(a) ? a : b)
  const socket = familyOf(isPlug(a) ? b : a)
  return plug === socket || paired(foreign, plug, socket)
}

/** Goes in mechanically, whatever the wires then do. Symmetrical. */
export const fits = (a: Connector, b: Connector): boolean => joinable(a, b, FOREIGN_FITS)

/** Goes in and is wired alike. Symmetrical. */
export const mates = (a: Connector, b: Connector): boolean => joinable(a, b, FOREIGN_MATES)

/**
 * Circuits that share one contact of a multi-way connector, so that one arrives where another is expected.
 * SCART: composite, luma and sync on pins 19 and 20; red and chroma on pin 15 (two published pin tables).
 * S-Video: composite fed to the luma pin (common practice, no source). HD15: composite sync on the line-sync pin
 * (common practice, no source). 3.5 mm: mono sound and aerial signals on the tip (common practice, no source).
 */
const SHARED: Partial<Record<ConnectorFamily, Partial<Record<Circuit, string>>>> = {
  scart: { cvbs: 'video', y: 'video', csync: 'video', r: 'red', c: 'red', 'audio-mono': 'audio-l' },
  jp21: { cvbs: 'video', y: 'video', csync: 'video' },
  svideo4: { y: 'y', cvbs: 'y' },
  minidin7: { y: 'y' },
  hd15: { hsync: 'hsync', csync: 'hsync' },
  jack35: { 'audio-l': 'tip', 'audio-mono': 'tip', rf: 'tip', 'audio-r': 'ring' },
  din5: { 'audio-l': 'audio-l', 'audio-mono': 'audio-l' },
  din6: { 'audio-l': 'audio-l', 'audio-mono': 'audio-l' },
}

/** The contact of a connector that a circuit uses. A single-contact connector has only one, whatever it carries. */
export function contactOf(c: Connector, circuit: Circuit): string {
  if (isSingle(c)) return 'pin'
  return SHARED[familyOf(c) as ConnectorFamily]?.[circuit] ?? circuit
}
