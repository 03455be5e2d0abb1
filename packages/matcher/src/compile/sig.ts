import type { Shape } from '@coaxwain/models'
import type {
  Colour,
  DigitalSystem,
  PictureForm,
  PlanPart,
  Protection,
  Quality,
  RfSystemId,
  ScanId,
  Sound,
} from '@coaxwain/signal'

/** Carriers that a box may be set to put out; narrowed by every tuner on the way, chosen at the end. */
export interface CarrierSet {
  readonly part: PlanPart
  readonly names: readonly string[]
  readonly visionMhz: readonly number[]
  readonly system: RfSystemId
  readonly digital: DigitalSystem | null
  readonly sideband: 'vestigial' | 'double'
}

/** A picture at one point of the search, with the sound that rides in it. */
export interface Sig {
  readonly id: number
  readonly form: PictureForm
  readonly scan: ScanId
  readonly colour: Colour
  readonly poorest: Quality
  readonly lumaMhz: number
  readonly protection: Protection
  readonly shape: Shape
  readonly direct: boolean
  readonly delayMs: number
  readonly carrier: CarrierSet | null
  /** Sound inside the picture signal: RF and HDMI. */
  readonly sound: Sound
}

/** Equal signals share one id, so that labels can be compared by it. */
export class SigTable {
  private readonly known = new Map<string, Sig>()

  intern(sig: Omit<Sig, 'id'>): Sig {
    const key = JSON.stringify([
      sig.form,
      sig.scan,
      sig.colour,
      sig.poorest,
      sig.lumaMhz,
      sig.protection,
      sig.shape,
      sig.direct,
      sig.delayMs,
      sig.carrier,
      sig.sound,
    ])
    const found = this.known.get(key)
    if (found) return found
    const made: Sig = { ...sig, id: this.known.size }
    this.known.set(key, made)
    return made
  }
}

/** Forms in which sound travels along inside. */
export const embedsSound = (form: PictureForm): boolean => form === 'rf' || form === 'hdmi'
