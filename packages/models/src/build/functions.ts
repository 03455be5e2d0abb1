import type {
  AcceptRow,
  Condition,
  FunctionKind,
  Give,
  Key,
  ModelFunction,
  OptionalInput,
  PictureGive,
  RfGive,
  Shape,
  SoundGive,
} from '../model'
import { POWER_KEY } from '../model'
import type { Colour, PlanPart, RfSystemId, ScanId, SwitchVolt } from '@coaxwain/signal'
import { at } from './conditions'
import { ANYTHING } from './standards'

export const SAME: readonly PictureGive[] = [{ scan: 'same', colour: 'same' }]

export const picture = (scan: ScanId, colour: Colour, condition?: Condition): PictureGive => ({
  scan,
  colour,
  while: condition,
})

/** Wide discs on the three settings of a player's screen-shape menu, under one control. */
export function shaped(scan: ScanId, colour: Colour, control: Key = 'tv-shape'): PictureGive[] {
  const shapes: readonly (readonly [string, Shape])[] = [
    ['wide', 'squeezed'],
    ['letterbox', 'letterbox'],
    ['pan-scan', 'cropped'],
  ]
  return shapes.map(([position, shape]) => ({ scan, colour, while: at(control, position), shape }))
}

interface GiveOptions {
  readonly sound?: SoundGive | undefined
  readonly while?: Condition | undefined
  readonly rf?: readonly RfGive[] | undefined
  readonly volts?: readonly SwitchVolt[] | undefined
}

/** A picture output. */
export const gives = (
  jack: Key,
  rows: readonly PictureGive[],
  options: GiveOptions = {},
): Give => ({
  jack,
  while: options.while,
  picture: rows,
  sound: options.sound,
  rf: options.rf,
  volts: options.volts,
})

/** A sound output. */
export const sounds = (jack: Key, sound: SoundGive, condition?: Condition): Give => ({
  jack,
  sound,
  while: condition,
})

interface CarrierOptions {
  /** The one channel there is, instead of the control `channel`. */
  readonly fixed?: PlanPart | undefined
  readonly levelDbmv: number
  readonly sound?: RfGive['sound'] | undefined
  readonly sideband?: RfGive['sideband'] | undefined
  readonly always?: boolean | undefined
  readonly while?: Condition | undefined
}

const SYSTEM_COLOURS: Partial<Record<RfSystemId, readonly Colour[]>> = {
  M: ['ntsc-m', 'ntsc-j', 'mono'],
}
const COLOURS_625: readonly Colour[] = ['pal', 'secam', 'pal-60', 'ntsc-443', 'mono']

/**
 * One carrier of the kind that small boxes make: both sidebands, mono sound. A modulator passes whatever
 * subcarrier fits under its sound carrier.
 */
export const carrier = (system: RfSystemId, options: CarrierOptions): RfGive => ({
  channel: options.fixed ? { part: options.fixed } : { control: 'channel' },
  system,
  colours: SYSTEM_COLOURS[system] ?? COLOURS_625,
  sideband: options.sideband ?? 'double',
  levelDbmv: options.levelDbmv,
  sound: options.sound ?? 'mono',
  always: options.always,
  while: options.while,
})

/** What a function takes and gives; the kinds below fill in the usual rest. */
export interface FunctionParts {
  readonly label?: string | undefined
  readonly while?: Condition | undefined
  readonly gives?: readonly Give[] | undefined
  /** The sound that goes with the picture, and what happens without it: silence unless stated. */
  readonly sound?: Key | undefined
  readonly soundAbsent?: OptionalInput['ifAbsent'] | undefined
  readonly accepts?: readonly AcceptRow[] | undefined
  readonly power?: ModelFunction['power'] | undefined
  readonly tunedBy?: Key | undefined
  readonly bandwidthMhz?: number | undefined
  readonly gainDb?: number | undefined
  readonly delayMs?: number | undefined
  readonly inputAgc?: boolean | undefined
  readonly hdcp?: boolean | undefined
  readonly storesFields?: boolean | undefined
  readonly separator?: ModelFunction['separator'] | undefined
}

function build(
  key: Key,
  kind: FunctionKind,
  needs: readonly Key[],
  parts: FunctionParts,
): ModelFunction {
  const { sound, soundAbsent = 'silent', gives: outputs = [], ...rest } = parts
  return {
    ...rest,
    key,
    kind,
    needs,
    optional: sound === undefined ? undefined : [{ jack: sound, ifAbsent: soundAbsent }],
    accepts: parts.accepts ?? ANYTHING,
    gives: outputs,
    power: parts.power ?? 'on',
  }
}

/** A source: it needs nothing. */
export const plays = (
  key: Key,
  label: string,
  outputs: readonly Give[],
  parts: FunctionParts = {},
): ModelFunction => build(key, 'plays', [], { accepts: [], ...parts, label, gives: outputs })

/** A display's picture input. */
export const shows = (key: Key, label: string, input: Key, parts: FunctionParts): ModelFunction =>
  build(key, 'shows', [input], { ...parts, label })

/** An aerial. */
export const receives = (key: Key, output: Key): ModelFunction =>
  build(key, 'receives', [], { gives: [{ jack: output }], accepts: [], power: 'none' })

/** From one input to outputs (or to loudspeakers): modulates, tunes, converts, amplifies, makes sound. */
export const turns = (
  key: Key,
  kind: FunctionKind,
  input: Key,
  parts: FunctionParts,
): ModelFunction => build(key, kind, [input], parts)

/** An aerial signal from an input to outputs, with nothing added and no power used. */
export const passes = (
  key: Key,
  kind: FunctionKind,
  input: Key,
  parts: FunctionParts & { readonly to: readonly Key[] },
): ModelFunction => {
  const { to, ...rest } = parts
  return build(key, kind, [input], {
    power: 'none',
    ...rest,
    gives: to.map((jack) => gives(jack, SAME, { sound: 'same' })),
  })
}

/** A box without mains joins its aerial straight through to the set. */
export const whenOff = (): Condition => at(POWER_KEY, 'standby', 'unplugged')
