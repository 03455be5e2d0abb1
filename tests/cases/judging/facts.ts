import { SCANS, type ScanId } from '@coaxwain/signal'
import type { CasePort } from '../form'

/** Forms of a picture in the words of the case form. */
export type WordForm =
  'none' | 'luma-only' | 'rf' | 'composite' | 's-video' | 'component' | 'rgb' | 'rgbi' | 'digital'

/** From worst to best; component, RGB and digital TTL colour are alike. */
export function rankOf(form: string): number {
  const order = ['none', 'luma-only', 'rf', 'composite', 's-video']
  const at = order.indexOf(form)
  if (at >= 0) return at
  return form === 'digital' ? 6 : 5
}

const FORM_OF: Readonly<Record<string, WordForm>> = {
  composite: 'composite',
  's-video': 's-video',
  luma: 's-video',
  chroma: 's-video',
  'ypbpr-y': 'component',
  'ypbpr-pb': 'component',
  'ypbpr-pr': 'component',
  'rgb-r': 'rgb',
  'rgb-g': 'rgb',
  'rgb-b': 'rgb',
  'rgb-cs': 'rgb',
  'rgb-hv': 'rgb',
  'rgb-sog': 'rgb',
  rgbi: 'rgbi',
  'mono-ttl': 'rgbi',
  hdmi: 'digital',
  dvi: 'digital',
  rf: 'rf',
}

/** The form that a signal of the case form belongs to; undefined for sound, sync and supplies. */
export const formOfSignal = (signal: string): WordForm | undefined => FORM_OF[signal]

export const isSound = (signal: string): boolean => signal.startsWith('audio-')

const MULTIWAY = [
  'scart',
  'svideo4',
  'hd15',
  'dterm',
  'de9',
  'db23',
  'din5',
  'din6',
  'din8',
  'hdmi',
  'dvi',
  'multi',
  'jp21',
  'jack35',
]

export const isMultiway = ({ connector }: CasePort): boolean =>
  MULTIWAY.some((family) => connector.startsWith(`${family}-`))

export const lineKhz = (scan: string): number => SCANS[scan as ScanId].lineKhz

export const fieldHz = (scan: string): number => SCANS[scan as ScanId].fieldHz

/** Lines that a television system carries. */
export function scansOfSystem(system: string): readonly string[] {
  if (system === 'M') return ['525i60', '262p60']
  return system === 'A' ? ['405i50'] : ['625i50', '312p50']
}

/** Sound carrier above vision in MHz, by television system. */
const SOUND_MHZ: Readonly<Record<string, number>> = {
  M: 4.5,
  N: 4.5,
  B: 5.5,
  G: 5.5,
  I: 6,
  D: 6.5,
  K: 6.5,
  L: 6.5,
  A: -3.5,
}

export const sameSound = (a: string, b: string): boolean => SOUND_MHZ[a] === SOUND_MHZ[b]

/** L and A are understood by themselves only; all others pass a picture to each other. */
export const passesPicture = (listed: string, sent: string): boolean =>
  listed === sent || !['L', 'A'].some((s) => s === listed || s === sent)
