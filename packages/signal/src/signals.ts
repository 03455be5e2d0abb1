import type { Colour } from './colour'
import type { PictureForm, Quality } from './forms'
import type { PlanPart } from './plans/index'
import type { ScanId } from './scan'
import type { DigitalSystem, RfSystemId } from './systems'

export const PROTECTIONS = ['none', 'agc-pulses', 'hdcp'] as const
/** Copy protection that travels with a picture: pulses in the blanking lines, or the digital handshake. */
export type Protection = (typeof PROTECTIONS)[number]

/** What sound is there at a point. `half` is one channel of two: worse than mono, for the other is lost. */
export const SOUNDS = ['none', 'half', 'mono', 'stereo'] as const
export type Sound = (typeof SOUNDS)[number]

/** From worst to best. */
export const SOUND_RANK: Readonly<Record<Sound, number>> = { none: 0, half: 1, mono: 2, stereo: 3 }

/** A modulated carrier. */
export interface Carrier {
  readonly part: PlanPart
  readonly visionMhz: number
  /** Name in its own plan, as the box that makes it says it. */
  readonly channel: string
  readonly system: RfSystemId
  readonly digital: DigitalSystem | null
  readonly sideband: 'vestigial' | 'double'
  readonly levelDbmv: number
  readonly sound: Sound
}

/** A picture at one point of a hookup. */
export interface PictureSignal {
  readonly form: PictureForm
  readonly scan: ScanId
  readonly colour: Colour
  /** The poorest encoding passed so far, and the least luma bandwidth in MHz. */
  readonly poorest: Quality
  readonly lumaMhz: number
  readonly protection: Protection
  readonly shape: '4:3' | 'squeezed' | 'letterbox' | 'cropped'
  /** No field store or scan conversion so far. */
  readonly direct: boolean
  readonly delayMs: number
  readonly carrier: Carrier | null
}
