import type { Access, ControlRole, Key, Shape } from '@coaxwain/models'
import type {
  Circuit,
  Colour,
  PictureSignal,
  PlanId,
  Protection,
  Quality,
  ScanId,
  Sound,
} from '@coaxwain/signal'
import type { Uid } from './unit'

// ---------------------------------------------------------------- question

export const AIMS = ['watch', 'light-gun', 'low-delay', 'prove'] as const
export type Aim = (typeof AIMS)[number]

/** What is played. Absent facts are the ordinary ones of the source. */
export interface Material {
  readonly scan?: ScanId | undefined
  readonly colour?: Colour | undefined
  readonly shape?: Shape | undefined
  readonly protection: Protection
  readonly sound?: Sound | undefined
  /** The two sound tracks are two programmes, of which one is wanted. */
  readonly twoProgrammes?: boolean | undefined
}

export interface Demands {
  readonly colour?: boolean | undefined
  readonly stereo?: boolean | undefined
  readonly keepAerial?: boolean | undefined
  readonly aim?: Aim | undefined
}

/** A station received off air, by its RF channel and never by the number on the screen. */
export interface OffAir {
  readonly plan: PlanId
  readonly channel: string
  readonly kind: 'analogue' | 'digital'
  readonly levelDbmv?: number | undefined
}

export interface Question {
  readonly format: 1
  readonly source: { readonly unit: Uid; readonly playing: Key }
  readonly material: Material
  /** `input`: the function by which it is to show the picture. */
  readonly display: { readonly unit: Uid; readonly input?: Key | undefined }
  readonly demands: Demands
  /** Units that must not be used. */
  readonly avoid: readonly Uid[]
  readonly offAir: readonly OffAir[]
  /** Models of leads taken as being in the drawer in any number. */
  readonly assumedLeads: readonly Uid[]
}

// ---------------------------------------------------------------- answer

export interface PortRef {
  readonly unit: Uid
  readonly port: Key
}

/** One lead or adapter in a link, and which of its plugs are used. */
export interface PieceUse {
  readonly model: Uid
  /** Tells two pieces of one model apart; wires of one piece share its copy. */
  readonly copy: number
  readonly wayRound: 'forward' | 'reverse'
  readonly inPlug: number
  readonly outPlug: number
}

export interface CarriedCircuit {
  /** As it leaves, and as the far port takes it. */
  readonly from: Circuit
  readonly to: Circuit
}

/** One connection: a port, pieces in order, a port. No pieces: a captive plug goes straight in. */
export interface Link {
  readonly from: PortRef
  readonly pieces: readonly PieceUse[]
  readonly to: PortRef
  readonly circuits: readonly CarriedCircuit[]
}

/** One unit on the way, and what it does there. */
export interface Stop {
  readonly unit: Uid
  readonly function: Key
  readonly in: Key | null
  readonly out: Key | null
  /** What leaves here (or, at the last stop, what arrives). */
  readonly picture: PictureSignal | null
  readonly sound: Sound
}

export const LEG_PURPOSES = ['picture', 'sound', 'aerial'] as const
export type LegPurpose = (typeof LEG_PURPOSES)[number]

export interface Leg {
  readonly purpose: LegPurpose
  readonly stops: readonly Stop[]
  /** Indices into the links of the hookup. */
  readonly links: readonly number[]
}

export const SETTING_REASONS = [
  'opens-way',
  'picks-input',
  'picks-channel',
  'picks-plan',
  'tunes-to',
  'fits-standard',
  'fits-scan',
  'fits-shape',
  'ends-line',
  'trims',
  'powers',
  'moves-itself',
] as const
export type SettingReason = (typeof SETTING_REASONS)[number]

/** What a switch is set for, by what it does. */
export const REASON_OF_ROLE: Readonly<Record<ControlRole, SettingReason>> = {
  input: 'picks-input',
  standard: 'fits-standard',
  scan: 'fits-scan',
  direction: 'opens-way',
  mode: 'opens-way',
  shape: 'fits-shape',
  termination: 'ends-line',
  'tuner-plan': 'picks-plan',
  power: 'powers',
  other: 'opens-way',
}

export interface Setting {
  readonly unit: Uid
  readonly control: Key
  /** A position's key, a channel's name, or `up`, `down`, `by-eye` for a trimmer. */
  readonly position: string
  /** Other positions that do as well. */
  readonly orElse: readonly string[]
  /** For channels and tuning: the plan that the name counts in. */
  readonly plan?: PlanId | undefined
  readonly visionMhz?: number | undefined
  readonly access: Access
  readonly why: SettingReason
  /** Some other position spoils what is seen or heard. */
  readonly must: boolean
}

export interface Caution {
  readonly code: string
  readonly details: Readonly<Record<string, string | number>>
}

/** Small integers by which hookups are compared; every axis but picture and sound is better when small. */
export interface Axes {
  /** Tier of the ladder times 100, plus ten times the luma bandwidth in MHz, less degradations. */
  readonly picture: number
  readonly sound: number
  readonly boxes: number
  readonly pieces: number
  readonly doubt: number
  readonly disturbance: number
}

export const DEGRADATIONS = ['monochrome', 'luma-only', 'reduced-height', 'squeezed'] as const
export type Degradation = (typeof DEGRADATIONS)[number]

export interface SeenPicture {
  readonly colour: boolean
  readonly quality: Quality
  readonly lumaMhz: number
  readonly degradations: readonly Degradation[]
}

export interface HeardSound {
  readonly sound: Sound
  /** The unit whose loudspeakers speak; null in silence. */
  readonly from: Uid | null
}

/** A terminator on the loop socket of an input that does not end its line itself. */
export interface LineEnd extends PortRef {
  readonly model: Uid
  readonly copy: number
}

export interface Hookup {
  readonly legs: readonly Leg[]
  readonly links: readonly Link[]
  readonly ends?: readonly LineEnd[] | undefined
  readonly settings: readonly Setting[]
  readonly picture: SeenPicture
  readonly sound: HeardSound
  readonly worksFully: boolean
  readonly cautions: readonly Caution[]
  readonly axes: Axes
}

/** Why the shelf does not do it: the rule that stands in the way and the two facts that clash. */
export interface Obstacle {
  readonly code: string
  readonly details: Readonly<Record<string, string | number>>
  /** The obvious wiring would harm; such obstacles are shown first. */
  readonly harmful: boolean
  /** It looks right and is not. */
  readonly lookalike: boolean
}

export interface Purchase {
  /** Keys of ordinary parts. */
  readonly parts: readonly string[]
  readonly hookup: Hookup
  readonly brings: readonly Caution[]
  readonly doesNot: readonly Caution[]
}

export interface Answer {
  readonly format: 1
  readonly verdict: 'yes' | 'none'
  /** False when a budget or a cap cut something that might have mattered. */
  readonly complete: boolean
  /** Label expansions spent. */
  readonly work: number
  readonly hookups: readonly Hookup[]
  readonly moreCount: number
  readonly obstacles: readonly Obstacle[]
  readonly purchases: readonly Purchase[]
}
