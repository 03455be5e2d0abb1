import type { Why } from './why'

/** What is seen. */
export const PICTURES_SHOWN = [
  'steady',
  /** Black lies wrong; a brightness control puts it right. */
  'black-off',
  /** Steady, with the subcarrier as crawling dots. */
  'dots',
  /** Too bright, and the highlights are lost. */
  'clipped',
  /** Taken, refused or flickering, by how the input counts lines. */
  'may-be-refused',
  /** The tuner catches it by an edge. */
  'edge-of-lock',
  'rolls',
  'torn',
  'negative',
  /** Greys are green or magenta. */
  'tinted',
  'pumps',
  'noise',
  'nothing',
] as const

export type PictureShown = (typeof PICTURES_SHOWN)[number]

export type ColourShown = 'right' | 'none' | 'wrong' | 'few' | 'may-drop'

/** `apart`: on wires of its own, which have nothing to do with the picture. */
export type SoundHeard =
  'heard' | 'mono' | 'apart' | 'none' | 'hiss' | 'buzz' | 'may-buzz' | 'loud-noise' | 'distorted'

/** What a set shows and lets hear of what it is fed, and why. */
export interface Shown {
  readonly picture: PictureShown
  readonly colour: ColourShown
  readonly sound: SoundHeard
  /** The tube or its deflection may be harmed. */
  readonly harms: boolean
  readonly why: readonly Why[]
}

export const SEVERITIES = [
  'fine',
  'usable',
  'no stereo',
  'no sound',
  'no colour',
  'no colour, no sound',
  'degraded',
  'rolls',
  'unusable',
] as const

export type Severity = (typeof SEVERITIES)[number]

const HOPELESS: ReadonlySet<PictureShown> = new Set([
  'torn',
  'negative',
  'tinted',
  'pumps',
  'noise',
  'nothing',
])

const UNCERTAIN: ReadonlySet<PictureShown> = new Set(['clipped', 'may-be-refused', 'edge-of-lock'])

const SPOILT_SOUND: ReadonlySet<SoundHeard> = new Set(['loud-noise', 'distorted'])

/** How bad it is, in one word or two. Rolling without sound leaves nothing. */
export function severityOf({ picture, colour, sound }: Omit<Shown, 'why' | 'harms'>): Severity {
  const silent = sound === 'none' || sound === 'hiss'
  if (HOPELESS.has(picture) || SPOILT_SOUND.has(sound)) return 'unusable'
  if (picture === 'rolls') return silent ? 'unusable' : 'rolls'
  if (UNCERTAIN.has(picture)) return 'degraded'
  if (colour === 'none') return silent ? 'no colour, no sound' : 'no colour'
  if (silent) return 'no sound'
  if (picture === 'black-off') return 'usable'
  return sound === 'mono' ? 'no stereo' : 'fine'
}
