import type { Shape } from '@coaxwain/models'
import {
  poorer,
  SOUND_RANK,
  type Colour,
  type DigitalSystem,
  type PictureForm,
  type PlanPart,
  type Protection,
  type Quality,
  type RfSystemId,
  type ScanId,
  type Sound,
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

/** What of a picture decides who takes it. */
export interface Core {
  readonly id: number
  /** The same for cores that differ in nothing but the choice of channels. */
  readonly kind: number
  readonly form: PictureForm
  readonly scan: ScanId
  readonly colour: Colour
  readonly protection: Protection
  readonly carrier: CarrierSet | null
}

/** A picture at one point of a chain: what it is, what it has been through, and the sound that rides in it. */
export interface Sig {
  readonly core: Core
  readonly poorest: Quality
  readonly lumaMhz: number
  readonly shape: Shape
  /** Neither stored nor redrawn. */
  readonly direct: boolean
  readonly delayMs: number
  /** Sound inside the picture signal: RF and HDMI. */
  readonly sound: Sound
}

/** What a way through a box does to a picture. */
export interface Passing {
  readonly core: Core
  /** The poorest form that the picture takes there. */
  readonly poorest: Quality
  readonly lumaMhz: number
  /** Null where the shape stays what it was. */
  readonly shape: Shape | null
  readonly direct: boolean
  readonly delayMs: number
  /** The most that rides along of a sound. */
  readonly sound: Sound
}

export const lesserSound = (a: Sound, b: Sound): Sound => (SOUND_RANK[a] <= SOUND_RANK[b] ? a : b)

/** The picture after a box, with the sound that is put into it there. */
export const pass = (sig: Sig, passing: Passing, sound: Sound): Sig => ({
  core: passing.core,
  poorest: poorer(sig.poorest, passing.poorest),
  lumaMhz: Math.min(sig.lumaMhz, passing.lumaMhz),
  shape: passing.shape ?? sig.shape,
  direct: sig.direct && passing.direct,
  delayMs: sig.delayMs + passing.delayMs,
  sound: lesserSound(sound, passing.sound),
})

/** Equal cores share one id, so that they can be compared by it. */
export class CoreTable {
  private readonly known = new Map<string, Core>()
  private readonly kinds = new Map<string, number>()

  intern(core: Omit<Core, 'id' | 'kind'>): Core {
    const { carrier } = core
    const base = `${core.form} ${core.scan} ${core.colour} ${core.protection}`
    const kindKey = carrier
      ? `${base} ${carrier.part.plan} ${carrier.system} ${carrier.digital ?? ''} ${carrier.sideband}`
      : base
    const key = carrier ? `${kindKey} ${carrier.names.join()}` : kindKey
    const found = this.known.get(key)
    if (found) return found
    const kind = this.kinds.get(kindKey) ?? this.kinds.size
    this.kinds.set(kindKey, kind)
    const made: Core = { ...core, id: this.known.size, kind }
    this.known.set(key, made)
    return made
  }
}

/** Forms in which sound travels along inside. */
export const embedsSound = (form: PictureForm): boolean => form === 'rf' || form === 'hdmi'
