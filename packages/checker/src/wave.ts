import type { Shape } from '@coaxwain/models'
import type {
  Colour,
  PictureForm,
  PictureSignal,
  Protection,
  Quality,
  RfSystemId,
  ScanId,
  Sound,
  SwitchVolt,
} from '@coaxwain/signal'

/** A picture on its way through a bench rig, as worked out by the checker. */
export interface Wave {
  readonly form: PictureForm
  readonly scan: ScanId
  readonly colour: Colour
  readonly poorest: Quality
  readonly lumaMhz: number
  readonly protection: Protection
  readonly shape: Shape
  readonly direct: boolean
  /** Sound inside the picture signal. */
  readonly riding: Sound
  readonly volts: readonly SwitchVolt[]
  readonly system: RfSystemId | null
  readonly visionMhz: number | null
}

/** What a hookup claims of a signal, in the checker's own terms. */
export const claimedWave = (p: PictureSignal): Wave => ({
  form: p.form,
  scan: p.scan,
  colour: p.colour,
  poorest: p.poorest,
  lumaMhz: p.lumaMhz,
  protection: p.protection,
  shape: p.shape,
  direct: p.direct,
  riding: p.carrier?.sound ?? 'none',
  volts: [],
  system: p.carrier?.system ?? null,
  visionMhz: p.carrier?.visionMhz ?? null,
})
