import type {
  Circuit,
  Colour,
  Connector,
  Deflection,
  DigitalSystem,
  Direction,
  Form,
  PlanPart,
  RfSystemId,
  ScanId,
  SoundLevel,
  SwitchVolt,
} from '@coaxwain/signal'

/** Keys are made once within a model and never reused: ports, jacks, controls and functions are named by them. */
export type Key = string

export const DEVICE_KINDS = [
  'television',
  'monitor',
  'recorder',
  'disc-player',
  'console',
  'computer',
  'camera',
  'streamer',
  'converter-box',
  'tuner',
  'modulator',
  'selector',
  'rf-switch',
  'scan-converter',
  'standards-converter',
  'transcoder',
  'splitter',
  'combiner',
  'diplexer',
  'amplifier',
  'distribution-amplifier',
  'aerial',
  'loudspeakers',
  'sound-box',
  'other',
] as const

export type DeviceKind = (typeof DEVICE_KINDS)[number]

export const PIECE_KINDS = ['lead', 'adapter', 'terminator'] as const
export type PieceKind = (typeof PIECE_KINDS)[number]

/** Which market a variant was made for; variants of one type name are different models. */
export const MARKETS = [
  '525-m',
  '525-japan',
  '525-pal-m',
  '625-bg',
  '625-i',
  '625-dk',
  '625-l',
  '625-australia',
  '625-pal-n',
  '405-a',
  'any',
] as const

export type Market = (typeof MARKETS)[number]

/** A conjunction: every control named stands at one of its listed positions. Nothing richer. */
export type Condition = readonly ControlStands[]

export interface ControlStands {
  readonly control: Key
  readonly in: readonly string[]
}

// ---------------------------------------------------------------- ports

export const KNOWLEDGE = ['yes', 'no', 'unknown'] as const
export type Knowledge = (typeof KNOWLEDGE)[number]

export interface PortCircuit {
  readonly circuit: Circuit
  readonly dir: Direction
  /** For sound circuits; line unless stated. */
  readonly level?: SoundLevel | undefined
}

/** How a video or RF input ends its line. `ends-itself` lifts its load when the loop socket is used. */
export type Load =
  | { readonly kind: '75' | 'high' | 'ends-itself' | 'unknown' }
  | { readonly kind: 'switch'; readonly control: Key; readonly position75: string }

export const PORT_FACES = ['back', 'front', 'side', 'lead'] as const
export type PortFace = (typeof PORT_FACES)[number]

export interface Port {
  readonly key: Key
  /** As printed on the panel, capitals kept. */
  readonly label: string
  readonly connector: Connector
  /** `lead` when it sits on a captive lead or a plug-in block. */
  readonly mount: 'chassis' | 'lead'
  readonly circuits: readonly PortCircuit[]
  /** Key of the bracketed heading that it stands under. */
  readonly group?: Key | undefined
  readonly impedanceOhm?: number | undefined
  readonly load?: Load | undefined
  /** The socket by which a line that ends here could go on instead. */
  readonly loopsTo?: Key | undefined
  /** Colour of the ring where it is not the usual one for what it carries. */
  readonly ring?: PlugColour | undefined
  readonly origin: 'factory' | 'added'
  /** Whether touching it is safe on a live chassis; sockets of an isolated chassis are `yes`. */
  readonly isolated: Knowledge
  /** Volts that it puts on its cable; absent means none. */
  readonly suppliesDcVolts?: number | undefined
  /** Volts that it needs from its cable. */
  readonly needsDcVolts?: number | undefined
  /** Whether it stands a voltage coming up its cable. */
  readonly standsDc?: Knowledge | undefined
  /** Where it sits: face, then row from the top, then column from the left. */
  readonly at: { readonly face: PortFace; readonly row: number; readonly column: number }
  readonly note?: string | undefined
  /** No longer offered to new hookups; never deleted while something names it. */
  readonly retired?: boolean | undefined
}

export const PLUG_COLOURS = [
  'yellow',
  'white',
  'red',
  'green',
  'blue',
  'black',
  'orange',
  'grey',
] as const
export type PlugColour = (typeof PLUG_COLOURS)[number]

export interface PortGroup {
  readonly key: Key
  readonly label: string
}

/** A form over one port or one group of ports, in one direction. */
export interface Jack {
  readonly key: Key
  readonly form: Form
  readonly dir: 'in' | 'out'
  readonly contacts: readonly JackContact[]
  /** Told apart on screen where a port gives one form in two ways. */
  readonly label?: string | undefined
}

export interface JackContact {
  readonly circuit: Circuit
  readonly port: Key
}

// ---------------------------------------------------------------- controls

export const ACCESSES = ['front', 'back', 'menu', 'remote', 'service'] as const
export type Access = (typeof ACCESSES)[number]

/** What a switch with named positions chooses; sentences and order of setting depend on it. */
export const CONTROL_ROLES = [
  'input',
  'standard',
  'scan',
  'direction',
  'mode',
  'shape',
  'termination',
  'tuner-plan',
  'power',
  'other',
] as const
export type ControlRole = (typeof CONTROL_ROLES)[number]

export const CONTROL_LOOKS = ['slide', 'knob', 'push', 'menu', 'screw'] as const
export type ControlLook = (typeof CONTROL_LOOKS)[number]

export interface Position {
  readonly key: string
  readonly label: string
}

interface ControlBase {
  readonly key: Key
  readonly label: string
  readonly access: Access
  readonly look: ControlLook
  /** Loses its position when the mains is off. */
  readonly forgets?: boolean | undefined
}

export interface PositionsControl extends ControlBase {
  readonly kind: 'positions'
  readonly role: ControlRole
  readonly positions: readonly Position[]
  /** Where it stands after a reset. */
  readonly reset?: string | undefined
}

/** Vision carriers offered: channels of a plan, or a span of frequencies with a step or none. */
export type Carriers =
  | { readonly kind: 'channels'; readonly part: PlanPart }
  | {
      readonly kind: 'span'
      readonly lowMhz: number
      readonly highMhz: number
      readonly stepMhz: number | null
      /** The plan by which the span is named on screen. */
      readonly part: PlanPart
    }

export interface ChannelControl extends ControlBase {
  readonly kind: 'channel'
  readonly carriers: Carriers
  /** How far the real carrier may lie off. */
  readonly toleranceMhz: number
}

export const TUNING_WAYS = ['numbers', 'presets', 'knob', 'turret', 'search'] as const
export type TuningWay = (typeof TUNING_WAYS)[number]

export interface TunedControl extends ControlBase {
  readonly kind: 'tuned-to'
  readonly way: TuningWay
  /** Bands reached, each perhaps only in one position of an AIR/CABLE or band switch. */
  readonly reaches: readonly { readonly part: PlanPart; readonly while?: Condition | undefined }[]
  /** How far off a carrier may lie and still be caught. */
  readonly pullInMhz: number
}

export const TRIM_QUANTITIES = [
  'fine-tuning',
  'video-level',
  'sound-level',
  'vertical-hold',
  'horizontal-hold',
  'picture',
  'volume',
  'other',
] as const
export type TrimQuantity = (typeof TRIM_QUANTITIES)[number]

/** Turned by eye or ear: it has an aim instead of a value. */
export interface TrimControl extends ControlBase {
  readonly kind: 'trim'
  readonly quantity: TrimQuantity
  /** How it stands and how it should, where that is known; one number of the same sort each. */
  readonly stands?: number | undefined
  readonly aim?: number | undefined
}

export type AutoCause =
  | { readonly kind: 'signal-at' | 'voltage-at' | 'plug-in'; readonly port: Key }
  | { readonly kind: 'powered' }
  | { readonly kind: 'otherwise' }

/** Moved by the device itself: an answer must supply the cause or keep it away. */
export interface AutoControl extends ControlBase {
  readonly kind: 'auto'
  readonly positions: readonly (Position & { readonly cause: AutoCause })[]
}

export type Control = PositionsControl | ChannelControl | TunedControl | TrimControl | AutoControl
export type ControlKind = Control['kind'] | 'power'

/** The implicit control of every unit that needs power. */
export const POWER_KEY = 'power'
export const POWER_STATES = ['on', 'standby', 'unplugged'] as const
export type PowerState = (typeof POWER_STATES)[number]

// ---------------------------------------------------------------- functions

export const FUNCTION_KINDS = [
  'plays',
  'shows',
  'receives',
  'loop-through',
  'selects',
  'modulates',
  'tunes',
  'remodulates',
  'converts-form',
  'converts-scan',
  'converts-colour',
  'combines',
  'splits',
  'amplifies',
  'attenuates',
  'filters',
  'transforms-impedance',
  'mixes-sound',
  'makes-sound',
] as const

export type FunctionKind = (typeof FUNCTION_KINDS)[number]

/** What becomes of a signal that a row matches. */
export const OUTCOMES = ['fine', 'monochrome', 'reduced-height', 'silent'] as const
export type Outcome = (typeof OUTCOMES)[number]

/** The first row that matches decides; no row means: not shown, not taken. */
export interface AcceptRow {
  /** Which of the function's inputs; all of them when absent. */
  readonly jacks?: readonly Key[] | undefined
  readonly scans: readonly ScanId[] | 'any'
  readonly colours: readonly Colour[] | 'any'
  /** For RF inputs: systems whose sound is heard. */
  readonly systems?: readonly RfSystemId[] | undefined
  /** For RF inputs: digital carriers that are decoded. */
  readonly digital?: readonly DigitalSystem[] | undefined
  readonly while?: Condition | undefined
  /** Voltages that must arrive on the switching pins. */
  readonly volts?: readonly SwitchVolt[] | undefined
  readonly outcome?: Outcome | undefined
}

/** One way in which an output may look; rows under other positions are alternatives. */
export interface PictureGive {
  readonly scan: ScanId | 'same'
  readonly colour: Colour | 'same'
  readonly while?: Condition | undefined
  /** Made anew whatever the recording is. */
  readonly converts?: boolean | undefined
  readonly shape?: Shape | undefined
}

export const SHAPES = ['4:3', 'squeezed', 'letterbox', 'cropped'] as const
/** How wide material is laid out: squeezed needs a wide screen. */
export type Shape = (typeof SHAPES)[number]

export const SOUND_GIVES = ['same', 'mono', 'stereo'] as const
export type SoundGive = (typeof SOUND_GIVES)[number]

/** A carrier put out. Variants under other positions follow as further rows. */
export interface RfGive {
  /** The control that chooses the channel, or the one channel there is. */
  readonly channel: { readonly control: Key } | { readonly part: PlanPart }
  readonly system: RfSystemId
  readonly colours: readonly Colour[]
  readonly sideband: 'vestigial' | 'double'
  /** Vision carrier across 75 ohm. */
  readonly levelDbmv: number
  readonly sound: 'none' | 'mono' | 'stereo'
  /** The carrier is on whenever the unit is, whether or not the function is used. */
  readonly always?: boolean | undefined
  readonly while?: Condition | undefined
}

export interface Give {
  readonly jack: Key
  readonly while?: Condition | undefined
  readonly picture?: readonly PictureGive[] | undefined
  readonly sound?: SoundGive | undefined
  readonly rf?: readonly RfGive[] | undefined
  readonly volts?: readonly SwitchVolt[] | undefined
}

export interface OptionalInput {
  readonly jack: Key
  readonly ifAbsent: 'silent' | 'left-on-both' | 'free-running'
  readonly while?: Condition | undefined
}

export interface ModelFunction {
  readonly key: Key
  readonly kind: FunctionKind
  readonly label?: string | undefined
  /** Acts only while this holds. */
  readonly while?: Condition | undefined
  /** Every one must be fed. */
  readonly needs: readonly Key[]
  /** One of these must be fed. */
  readonly oneOf?: readonly Key[] | undefined
  readonly optional?: readonly OptionalInput[] | undefined
  readonly accepts: readonly AcceptRow[]
  readonly gives: readonly Give[]
  /** The control that tunes it, for a function with an RF input. */
  readonly tunedBy?: Key | undefined
  /** Power it needs; a passive function needs none. */
  readonly power: 'on' | 'standby' | 'none'
  /** Luma bandwidth that it lets through. */
  readonly bandwidthMhz?: number | undefined
  /** RF gain (positive) or loss (negative). */
  readonly gainDb?: number | undefined
  readonly delayMs?: number | undefined
  /** A recorder's level control sits in the way and is upset by protection pulses. */
  readonly inputAgc?: boolean | undefined
  /** Whether it completes the handshake of digital content protection. */
  readonly hdcp?: boolean | undefined
  /** A field store or a scan converter sits in the way. */
  readonly storesFields?: boolean | undefined
  /** Decodes and re-encodes digital signals, adds or separates luma and chroma, and how well. */
  readonly separator?: 'comb' | 'notch' | 'capacitor' | undefined
}

// ---------------------------------------------------------------- whole models

export const SCREENS = ['tube-colour', 'tube-mono', 'flat', 'projector'] as const

export interface DisplayFacts {
  readonly screen: (typeof SCREENS)[number]
  readonly deflection: Deflection
  readonly shape: '4:3' | '16:9'
  readonly loudspeakers: 'none' | 'mono' | 'stereo'
  readonly storesFields: boolean
  readonly convertsScan: boolean
  readonly directView: boolean
}

export interface PowerPack {
  readonly current: 'ac' | 'dc'
  readonly volts: number
  readonly milliamps: number
  readonly polarity?: 'centre-positive' | 'centre-negative' | undefined
  readonly plug?: string | undefined
}

export interface Mains {
  readonly volts: readonly [low: number, high: number]
  readonly hz: readonly number[]
  readonly watts?: number | undefined
}

export interface RecordingFacts {
  /** What it plays: scans of recordings it can read. */
  readonly media: readonly string[]
}

/** Where a fact came from. */
export const FACT_SOURCES = [
  'panel-photo',
  'manual',
  'measured',
  'guess',
  'starting-point',
] as const
export type FactSource = (typeof FACT_SOURCES)[number]

interface ModelBase {
  readonly format: 1
  readonly maker: string
  readonly name: string
  readonly market: Market
  readonly aliases: readonly string[]
  readonly year?: number | undefined
  readonly factSource: FactSource
}

export interface DeviceModel extends ModelBase {
  readonly type: 'device'
  readonly kind: DeviceKind
  readonly groups: readonly PortGroup[]
  readonly ports: readonly Port[]
  readonly jacks: readonly Jack[]
  readonly controls: readonly Control[]
  readonly functions: readonly ModelFunction[]
  /** Isolation on ways that are not meant: backwards, or from one input to another. */
  readonly leaks: readonly { readonly from: Key; readonly to: Key; readonly db: number }[]
  readonly chassis: 'isolated' | 'live' | 'unknown'
  readonly mains?: Mains | undefined
  readonly pack?: PowerPack | undefined
  /** Controls that only the remote reaches are lost without it. */
  readonly remote: 'none' | 'optional' | 'needed'
  readonly display?: DisplayFacts | undefined
  readonly weightGrams?: number | undefined
}

export interface Plug {
  readonly connector: Connector
  readonly colour?: PlugColour | undefined
}

/**
 * One wire of a lead: contact to contact. `any` on a single-contact plug carries whatever comes.
 * A wire that is not listed is missing, and its circuit does not pass.
 */
export interface Wire {
  readonly a: { readonly plug: number; readonly circuit: Circuit | 'any' }
  readonly b: { readonly plug: number; readonly circuit: Circuit | 'any' }
  readonly way: 'both' | 'a-to-b' | 'b-to-a'
}

export interface PieceModel extends ModelBase {
  readonly type: 'piece'
  readonly kind: PieceKind
  readonly a: readonly Plug[]
  readonly b: readonly Plug[]
  readonly wires: readonly Wire[]
  /** Circuits it is meant for; `any` wires carry nothing else when this is given. */
  readonly meantFor?: readonly Circuit[] | undefined
  readonly lossDb: number
  /** Transforms impedance: ohms at the two ends. */
  readonly impedanceOhm?: readonly [a: number, b: number] | undefined
  /** Adds the sounds of several wires through resistors. */
  readonly mixes: boolean
  /** Switching voltages that it supplies itself. */
  readonly suppliesVolts: readonly SwitchVolt[]
  readonly blocksDc: boolean
  readonly lengthMm?: number | undefined
}

export type Model = DeviceModel | PieceModel
