import type { Condition, Control, DeviceModel, Key } from '@coaxwain/models'
import { doubtOf, fitted, formState, functionState, mayLend } from '@coaxwain/shelf'
import type { Snapshot, Uid, Unit } from '@coaxwain/shelf'
import { byContent, contentOf } from './content'

/**
 * Units that a search cannot tell apart by what they can do: one model with the same things done to it.
 * Their faults and histories differ, and so does the doubt that each brings.
 */
export interface Variant {
  readonly id: string
  readonly model: Uid
  readonly device: DeviceModel
  readonly units: readonly Unit[]
  readonly powered: boolean
  /** Not on the shelf: one to be bought. */
  readonly bought: boolean
}

/** Only the remote reaches this control, and the unit has none. */
export const outOfReach = (device: DeviceModel, control: Control, unit: Unit): boolean =>
  !unit.remotePresent &&
  device.remote === 'needed' &&
  (control.access === 'remote' || control.access === 'menu')

/** Where controls out of reach were left; an empty position when nobody has noted it. */
const stuckControls = (device: DeviceModel, unit: Unit): Readonly<Record<Key, string>> =>
  Object.fromEntries(
    device.controls
      .filter((c) => outOfReach(device, c, unit))
      .map((c) => [c.key, unit.stands[c.key] ?? '']),
  )

/**
 * A control out of reach keeps the one position in which it stands, none when that is not known; and what a
 * function does in other positions it does not do.
 */
function withStuck(device: DeviceModel, stuck: Readonly<Record<Key, string>>): DeviceModel {
  if (Object.keys(stuck).length === 0) return device
  const canBe = (row: { readonly while?: Condition | undefined }): boolean =>
    (row.while ?? []).every(({ control, in: wanted }) => {
      const at = stuck[control]
      return at === undefined || wanted.includes(at)
    })
  return {
    ...device,
    functions: device.functions
      .filter((fn) => canBe(fn) && (fn.accepts.length === 0 || fn.accepts.some(canBe)))
      .map((fn) => ({
        ...fn,
        accepts: fn.accepts.filter(canBe),
        gives: fn.gives.filter(canBe).map((give) => ({
          ...give,
          ...(give.picture ? { picture: give.picture.filter(canBe) } : {}),
          ...(give.rf ? { rf: give.rf.filter(canBe) } : {}),
        })),
      })),
    controls: device.controls.map((c) =>
      c.key in stuck && (c.kind === 'positions' || c.kind === 'auto')
        ? { ...c, positions: c.positions.filter((p) => p.key === stuck[c.key]) }
        : c,
    ) as DeviceModel['controls'],
  }
}

const needsPower = (device: DeviceModel): boolean =>
  device.mains !== undefined ||
  device.pack !== undefined ||
  device.functions.some((f) => f.power !== 'none')

/** Without prices a box with power counts as so many leads (common practice, no source). */
const BOX_IN_LEADS = 4

/** What a variant adds to a purchase; nothing when it is on the shelf. */
export function priceOf(variant: Variant): number {
  if (!variant.bought) return 0
  return variant.powered ? BOX_IN_LEADS : 1
}

/** The variant of one unit alone, for a source or a display. Throws when the unit is a lead. */
export function variantOf(snapshot: Snapshot, unit: Unit, bought = false): Variant {
  const model = snapshot.models[unit.model]
  if (model?.type !== 'device') throw new Error(`unit ${unit.uid} is not a device`)
  const device = withStuck(fitted(model, unit.modifications), stuckControls(model, unit))
  return {
    id: `unit:${unit.uid}`,
    model: unit.model,
    device,
    units: [unit],
    powered: needsPower(device),
    bought,
  }
}

/** The same for units that can do the same. */
export const variantKey = (device: DeviceModel, unit: Unit): string => {
  const stuck = stuckControls(device, unit)
  return unit.modifications.length === 0 && Object.keys(stuck).length === 0
    ? unit.model
    : contentOf([unit.model, unit.modifications, stuck])
}

/** What is noted of a unit, but for its name and place; what works is before what nobody has tried. */
const saidOfUnit = ({ working, forms, functions, modifications, stands, remotePresent }: Unit) =>
  contentOf([ORDER.indexOf(working), forms, functions, modifications, stands, remotePresent])

const ORDER: readonly Unit['working'][] = ['works', 'untested', 'faulty', 'parts-only']

const saidOfModel = ({ device }: Variant): string =>
  contentOf({ ...device, maker: '', name: '', aliases: [] })

/** All units that may be lent, put together by what they can do. */
export function compileVariants(snapshot: Snapshot, bought: ReadonlySet<Uid>): Variant[] {
  const groups = new Map<string, Unit[]>()
  for (const unit of snapshot.units) {
    const model = snapshot.models[unit.model]
    if (model?.type !== 'device' || !mayLend(unit)) continue
    const key = variantKey(model, unit)
    const group = groups.get(key)
    if (group) group.push(unit)
    else groups.set(key, [unit])
  }
  const variants = [...groups].map(([id, units]) => ({
    ...variantOf(snapshot, units[0] as Unit, bought.has(units[0]!.uid)),
    id,
    units: byContent(units, saidOfUnit),
  }))
  return byContent(variants, saidOfModel)
}

/** What one way through a unit leans on: forms on ports, and functions. */
export interface Leans {
  readonly contacts: readonly { readonly jack: Key; readonly port: Key }[]
  readonly functions: readonly Key[]
}

/** Doubt that one unit brings when it is used so; null when something in it is dead. */
export function unitDoubt(unit: Unit, leans: Leans, toBeChecked: number): number | null {
  const states = [
    ...leans.contacts.map(({ jack, port }) => formState(unit, jack, port)),
    ...leans.functions.map((key) => functionState(unit, key)),
  ]
  let sum = toBeChecked
  for (const state of states) {
    const doubt = doubtOf(unit, state)
    if (doubt === null) return null
    sum += doubt
  }
  return sum
}
