import { controlOf, POWER_KEY, type Condition, type Control, type Key } from '@coaxwain/models'
import { REASON_OF_ROLE, type Setting, type Unit } from '@coaxwain/shelf'
import { outOfReach, type Variant } from '../compile/variant'
import type { Way } from '../compile/way'
import { tunedAs, type ChosenChannel } from './channels'

/** One unit of a hookup with everything that decides where its controls stand. */
export interface Placing {
  readonly unit: Unit
  readonly variant: Variant
  readonly way: Way
  readonly stand: Condition
  /** The carrier it receives, and the one it puts out. */
  readonly receives: ChosenChannel | null
  readonly sends: { readonly channel: ChosenChannel; readonly control: Key | null } | null
  /** A 4:3 tube at the end, for sources that ask. */
  readonly narrowScreen: boolean
}

/** Every setting of one unit of a hookup: switches, channel, tuning, line ends, trimmers. */
export function settingsOf(placing: Placing): Setting[] {
  const wanted = new Map(placing.stand.map((c) => [c.control, c.in]))
  return [
    ...power(placing, wanted),
    ...switches(placing, wanted),
    ...sending(placing),
    ...tuning(placing, wanted),
    ...shape(placing, wanted),
    ...trimmers(placing),
  ]
}

const base = ({ unit }: Placing, control: Control) => ({
  unit: unit.uid,
  control: control.key,
  access: control.access,
})

/** A unit that must be off to pass its signal on; on is taken for granted. */
function power(placing: Placing, wanted: ReadonlyMap<Key, readonly string[]>): Setting[] {
  const states = wanted.get(POWER_KEY)
  const [first] = states ?? []
  if (!states || first === undefined || states.includes('on')) return []
  return [
    {
      unit: placing.unit.uid,
      control: POWER_KEY,
      position: first,
      orElse: states.slice(1),
      access: 'front',
      why: 'powers',
      must: true,
    },
  ]
}

function switches(placing: Placing, wanted: ReadonlyMap<Key, readonly string[]>): Setting[] {
  return [...wanted].flatMap(([key, positions]): Setting[] => {
    const control = placing.variant.device.controls.find((c) => c.key === key)
    if (control?.kind !== 'positions' && control?.kind !== 'auto') return []
    const all = control.positions.map((p) => p.key)
    const fine = all.filter((p) => positions.includes(p))
    const stuck = outOfReach(placing.variant.device, control, placing.unit)
    if (fine.length === all.length && !stuck) return []
    const stands = placing.unit.stands[key]
    const first = stands !== undefined && fine.includes(stands) ? stands : fine[0]
    if (first === undefined) return []
    const harmless = control.kind === 'positions' ? alsoTunes(placing, control.key, all) : []
    return [
      {
        ...base(placing, control),
        position: first,
        orElse: [...fine.filter((p) => p !== first), ...harmless.filter((p) => !fine.includes(p))],
        why: control.kind === 'auto' ? 'moves-itself' : REASON_OF_ROLE[control.role],
        must: harmless.length < all.length,
      },
    ]
  })
}

/** Positions of an AIR/CABLE switch in which the tuner catches the same carrier. */
function alsoTunes(
  { variant, way, receives }: Placing,
  key: Key,
  all: readonly string[],
): string[] {
  if (way.fn.tunedBy === undefined || !receives) return []
  const control = controlOf(variant.device, way.fn.tunedBy)
  if (control.kind !== 'tuned-to') return []
  if (!control.reaches.some((r) => r.while?.some((c) => c.control === key))) return []
  return all.filter(
    (p) => tunedAs(variant, control.key, receives.visionMhz, new Map([[key, [p]]])) !== null,
  )
}

function sending(placing: Placing): Setting[] {
  const { sends } = placing
  if (!sends || sends.control === null) return []
  const control = controlOf(placing.variant.device, sends.control)
  return [
    {
      ...base(placing, control),
      position: sends.channel.name,
      orElse: sends.channel.orElse,
      plan: sends.channel.plan,
      visionMhz: sends.channel.visionMhz,
      why: 'picks-channel',
      must: true,
    },
  ]
}

function tuning(placing: Placing, wanted: ReadonlyMap<Key, readonly string[]>): Setting[] {
  const { variant, way, receives } = placing
  if (way.fn.tunedBy === undefined || !receives) return []
  const tuned = tunedAs(variant, way.fn.tunedBy, receives.visionMhz, wanted)
  if (!tuned) return []
  const control = controlOf(variant.device, way.fn.tunedBy)
  return [
    {
      ...base(placing, control),
      position: tuned.channel.name,
      orElse: [],
      plan: tuned.plan,
      visionMhz: receives.visionMhz,
      why: 'tunes-to',
      must: true,
    },
  ]
}

/** Wide material on a narrow tube: the source can be told, where it has a control for it. */
function shape(placing: Placing, wanted: ReadonlyMap<Key, readonly string[]>): Setting[] {
  if (!placing.narrowScreen) return []
  return placing.variant.device.controls.flatMap((control): Setting[] => {
    if (control.kind !== 'positions' || control.role !== 'shape' || wanted.has(control.key))
      return []
    const narrow = control.positions.map((p) => p.key).filter((p) => p.startsWith('4:3'))
    const [first] = narrow
    if (first === undefined) return []
    return [
      {
        ...base(placing, control),
        position: first,
        orElse: narrow.slice(1),
        why: 'fits-shape',
        must: false,
      },
    ]
  })
}

/** Trimmers that are known to stand wrong, and the fine tuning of a tuner that has one. */
function trimmers(placing: Placing): Setting[] {
  return placing.variant.device.controls.flatMap((control): Setting[] => {
    if (control.kind !== 'trim') return []
    if (
      control.stands !== undefined &&
      control.aim !== undefined &&
      control.stands !== control.aim
    ) {
      const position = control.stands > control.aim ? 'down' : 'up'
      return [{ ...base(placing, control), position, orElse: [], why: 'trims', must: true }]
    }
    const byEye = control.quantity === 'fine-tuning' && placing.receives !== null
    return byEye
      ? [{ ...base(placing, control), position: 'by-eye', orElse: [], why: 'trims', must: false }]
      : []
  })
}
