import type {
  Access,
  AutoCause,
  AutoControl,
  ChannelControl,
  ControlLook,
  ControlRole,
  Key,
  Position,
  PositionsControl,
  TrimControl,
  TrimQuantity,
  TunedControl,
  TuningWay,
} from '../model'
import type { PlanPart } from '@coaxwain/signal'
import { at } from './conditions'

/** Positions with their printed labels, or the keys alone where both are the same. */
type Written = readonly string[] | Readonly<Record<string, string>>

const positionsOf = (written: Written): readonly Position[] =>
  Array.isArray(written)
    ? written.map((key: string) => ({ key, label: key }))
    : Object.entries(written).map(([key, label]) => ({ key, label }))

interface Where {
  readonly access: Access
  readonly look?: ControlLook | undefined
  readonly reset?: string | undefined
  readonly forgets?: boolean | undefined
}

const usualLook = (access: Access): ControlLook =>
  access === 'menu' || access === 'remote' ? 'menu' : access === 'front' ? 'push' : 'slide'

/** A switch, selector or menu entry with named positions. */
export const choice = (
  key: Key,
  label: string,
  role: ControlRole,
  where: Where & { readonly positions: Written },
): PositionsControl => ({
  kind: 'positions',
  key,
  label,
  role,
  positions: positionsOf(where.positions),
  access: where.access,
  look: where.look ?? usualLook(where.access),
  reset: where.reset,
  forgets: where.forgets,
})

/** Which of its inputs a unit takes. */
export const inputChoice = (
  positions: Written,
  where: Where = { access: 'front' },
  label = 'INPUT',
): PositionsControl => choice('input', label, 'input', { positions, ...where })

interface Channels {
  readonly label?: string | undefined
  readonly where?: Where | undefined
  readonly toleranceMhz?: number | undefined
}

/** Which channel a box puts out. */
export const channelSwitch = (part: PlanPart, given: Channels = {}): ChannelControl => ({
  kind: 'channel',
  key: 'channel',
  label: given.label ?? 'CH',
  carriers: { kind: 'channels', part },
  toleranceMhz: given.toleranceMhz ?? 0.1,
  access: given.where?.access ?? 'back',
  look: given.where?.look ?? 'slide',
})

/** A screw that moves the carrier anywhere between two vision frequencies. */
export const channelScrew = (
  part: PlanPart,
  lowMhz: number,
  highMhz: number,
  label = 'CH',
): ChannelControl => ({
  kind: 'channel',
  key: 'channel',
  label,
  carriers: { kind: 'span', lowMhz, highMhz, stepMhz: null, part },
  toleranceMhz: 0.5,
  access: 'back',
  look: 'screw',
})

/** How far off a carrier may lie, by the way of tuning (common practice, no source). */
const PULL_IN_MHZ: Readonly<Record<TuningWay, number>> = {
  numbers: 0.5,
  presets: 1.5,
  knob: 3,
  turret: 1,
  search: 1.5,
}

const TUNER_LOOK: Readonly<Record<TuningWay, ControlLook>> = {
  numbers: 'push',
  presets: 'push',
  knob: 'knob',
  turret: 'knob',
  search: 'menu',
}

/** A tuner that reaches the same bands whatever else is set. */
export const tuner = (
  key: Key,
  label: string,
  way: TuningWay,
  given: { readonly reaches: readonly PlanPart[]; readonly access?: Access | undefined },
): TunedControl => ({
  kind: 'tuned-to',
  key,
  label,
  way,
  reaches: given.reaches.map((part) => ({ part })),
  pullInMhz: PULL_IN_MHZ[way],
  access: given.access ?? 'front',
  look: TUNER_LOOK[way],
})

/** What small 525-line boxes put out (common practice, no source). */
export const THREE_FOUR: PlanPart = { plan: 'us-broadcast', names: '3,4' }

/** Off-air channels by AIR, cable channels of the standard raster by CABLE (47 CFR 73.603, CTA-542 through open tables). */
export const AIR_525: PlanPart = { plan: 'us-broadcast', names: '2..69' }
export const CABLE_525: PlanPart = { plan: 'us-cable-std', names: '2..99' }

/** The switch by which a set counts channels as off-air or as cable ones. */
export const airCable = (where: Where = { access: 'menu' }): PositionsControl =>
  choice('tuner-plan', 'AIR/CABLE', 'tuner-plan', {
    positions: { air: 'AIR', cable: 'CABLE' },
    ...where,
  })

/** A tuner for both, to stand beside {@link airCable}. */
export const airCableTuner = (
  key: Key,
  label = 'CHANNEL',
  access: Access = 'front',
): TunedControl => ({
  ...tuner(key, label, 'numbers', { reaches: [], access }),
  reaches: [
    { part: AIR_525, while: at('tuner-plan', 'air') },
    { part: CABLE_525, while: at('tuner-plan', 'cable') },
  ],
})

export const trim = (
  key: Key,
  label: string,
  quantity: TrimQuantity,
  access: Access = 'front',
): TrimControl => ({
  kind: 'trim',
  key,
  label,
  quantity,
  access,
  look: access === 'service' ? 'screw' : 'knob',
})

/** A switch that the box moves by itself. */
export const automatic = (
  key: Key,
  label: string,
  positions: readonly (readonly [key: string, label: string, cause: AutoCause])[],
): AutoControl => ({
  kind: 'auto',
  key,
  label,
  positions: positions.map(([position, text, cause]) => ({ key: position, label: text, cause })),
  access: 'back',
  look: 'slide',
})

export const signalAt = (port: Key): AutoCause => ({ kind: 'signal-at', port })
export const voltageAt = (port: Key): AutoCause => ({ kind: 'voltage-at', port })
export const pluggedInto = (port: Key): AutoCause => ({ kind: 'plug-in', port })
export const OTHERWISE: AutoCause = { kind: 'otherwise' }
