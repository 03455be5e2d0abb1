import {
  POWER_KEY,
  together,
  type Condition,
  type ControlStands,
  type Control,
  type DeviceModel,
  type Key,
  type PictureGive,
  type RfGive,
  type TunedControl,
} from '@coaxwain/models'
import {
  REASON_OF_ROLE,
  type ChainSetting,
  type Setting,
  type SettingReason,
  type Uid,
} from '@coaxwain/shelf'
import { channelsIn, type PlanId } from '@coaxwain/signal'
import { offeredBy } from '../giving'
import type { ShelfView } from '../shelf-view'
import type { Halt, Path } from './paths'

const WHY: Readonly<Record<Exclude<Control['kind'], 'positions'>, SettingReason>> = {
  channel: 'picks-channel',
  'tuned-to': 'tunes-to',
  trim: 'trims',
  auto: 'moves-itself',
}

/** What a control is to be set for, and how it is reached. */
export function settingOf(
  device: DeviceModel | null,
  { unit, control: key, position, plan }: ChainSetting,
): Setting {
  const control = device?.controls.find((c) => c.key === key)
  const why = control
    ? control.kind === 'positions'
      ? REASON_OF_ROLE[control.role]
      : WHY[control.kind]
    : 'powers'
  const meant = plan ?? (control && planOf(control, position))
  return {
    unit,
    control: key,
    position,
    orElse: [],
    ...(meant === undefined ? {} : { plan: meant }),
    access: control?.access ?? 'front',
    why,
    must: true,
  }
}

/** The first plan of a control in which a channel of that name is. */
function planOf(control: Control, name: string): PlanId | undefined {
  if (control.kind === 'channel') return control.carriers.part.plan
  if (control.kind !== 'tuned-to') return undefined
  return control.reaches.find((r) => channelsIn(r.part).some((c) => c.name === name))?.part.plan
}

/** What the functions on a path want of each control of each unit. */
export function wantedOn(
  path: Path,
  row: PictureGive | null,
  named: readonly Setting[],
): Map<Uid, Condition> {
  return new Map(
    [...path.halts, ...path.beside].map((halt, i) => {
      const give = halt.fn.gives.find((g) => g.jack === halt.out?.key)
      const conditions = [
        halt.fn.while,
        give?.while,
        i === 0 ? row?.while : undefined,
        rfOf(halt, named)?.while,
      ]
      const all = conditions.reduce<Condition>((sum, next) => together(sum, next) ?? sum, [])
      return [halt.unit, all] as const
    }),
  )
}

/** Settings that open the way, as far as the person has not named them. */
export function fillStands(
  path: Path,
  row: PictureGive | null,
  named: readonly Setting[],
  view: ShelfView,
): Setting[] {
  const isNamed = (unit: Uid, control: Key): boolean =>
    named.some((s) => s.unit === unit && s.control === control)
  const switches = [...wantedOn(path, row, named)].flatMap(([unit, wanted]) =>
    wanted.flatMap(({ control, in: positions }): Setting[] => {
      const [first] = positions
      if (control === POWER_KEY || first === undefined || isNamed(unit, control)) return []
      const stands = view.unit(unit)?.stands[control]
      const position = stands !== undefined && positions.includes(stands) ? stands : first
      return [settingOf(view.device(unit), { unit, control, position })]
    }),
  )
  return [...switches, ...fillChannels(path, [...named, ...switches])]
}

// ---------------------------------------------------------------- channels

/** A channel that a modulator offers and the tuner after it reaches. */
function fillChannels(path: Path, known: readonly Setting[]): Setting[] {
  const filled: Setting[] = []
  path.halts.forEach((halt, i) => {
    const all = [...known, ...filled]
    const control = channelControl(halt, all)
    const tuner = tunerAfter(path.halts.slice(i + 1))
    if (!rfOf(halt, all)) return
    const open = control && !all.some((s) => s.unit === halt.unit && s.control === control.key)
    const offered = offers(halt, all)
    const chosen = meeting(offered, tuner, all) ?? (offered[0] ? { sent: offered[0] } : null)
    if (!chosen) return
    if (control && open) {
      const wish = { unit: halt.unit, control: control.key, position: chosen.sent.name }
      filled.push({ ...settingOf(halt.device, wish), visionMhz: chosen.sent.visionMhz })
    }
    if (tuner && 'tuned' in chosen && chosen.tuned && !isSet(all, tuner)) {
      const { name, plan, wanted } = chosen.tuned
      const wish = { unit: tuner.halt.unit, control: tuner.control.key, position: name, plan }
      filled.push({ ...settingOf(tuner.halt.device, wish), visionMhz: chosen.sent.visionMhz })
      filled.push(...bandSwitches(tuner, wanted, all))
    }
  })
  return filled
}

interface Tuner {
  readonly halt: Halt
  readonly control: TunedControl
}

const isSet = (all: readonly Setting[], { halt, control }: Tuner): boolean =>
  all.some((s) => s.unit === halt.unit && s.control === control.key)

/** The carrier that is put out: the one that is tried, else the first that no named switch forbids. */
function rfOf(halt: Halt, named: readonly Setting[]): RfGive | undefined {
  const rows = halt.fn.gives.find((g) => g.jack === halt.out?.key)?.rf
  const isAllowed = ({ control, in: positions }: ControlStands): boolean => {
    const set = named.find((s) => s.unit === halt.unit && s.control === control)
    return !set || positions.includes(set.position)
  }
  return halt.rf ?? rows?.find((r) => (r.while ?? []).every(isAllowed)) ?? rows?.[0]
}

function channelControl(halt: Halt, all: readonly Setting[]) {
  const channel = rfOf(halt, all)?.channel
  if (!channel || !('control' in channel)) return null
  const control = halt.device.controls.find((c) => c.key === channel.control)
  return control?.kind === 'channel' ? control : null
}

function tunerAfter(halts: readonly Halt[]): Tuner | null {
  for (const halt of halts) {
    const control = halt.device.controls.find((c) => c.key === halt.fn.tunedBy)
    if (control?.kind === 'tuned-to') return { halt, control }
  }
  return null
}

interface Sent {
  readonly name: string
  readonly visionMhz: number
}

/** Carriers that may come out: the one that is set, or all that the control offers. */
function offers(halt: Halt, all: readonly Setting[]): Sent[] {
  const channel = rfOf(halt, all)?.channel
  const control = channelControl(halt, all)
  const set = control && all.find((s) => s.unit === halt.unit && s.control === control.key)
  const list = control
    ? offeredBy(control.carriers)
    : channel && 'part' in channel
      ? channelsIn(channel.part)
      : []
  return list.flatMap(({ name, visionMhz }) =>
    visionMhz !== null && (!set || set.position === name) ? [{ name, visionMhz }] : [],
  )
}

interface Tuned {
  readonly name: string
  readonly plan: PlanId
  readonly wanted: Condition
}

function meeting(
  offered: readonly Sent[],
  tuner: Tuner | null,
  all: readonly Setting[],
): { sent: Sent; tuned: Tuned | null } | null {
  if (!tuner) return null
  const set = all.find((s) => s.unit === tuner.halt.unit && s.control === tuner.control.key)
  for (const sent of offered) {
    for (const { part, while: wanted = [] } of tuner.control.reaches) {
      const near = channelsIn(part).find(
        (c) =>
          c.visionMhz !== null &&
          Math.abs(c.visionMhz - sent.visionMhz) <= tuner.control.pullInMhz &&
          (!set || (set.position === c.name && set.plan === part.plan)),
      )
      if (near && isOpen(tuner, wanted, all)) {
        return { sent, tuned: { name: near.name, plan: part.plan, wanted } }
      }
    }
  }
  return null
}

/** Nothing that is set already keeps the band from being reached. */
const isOpen = ({ halt }: Tuner, wanted: Condition, all: readonly Setting[]): boolean =>
  wanted.every((c) => {
    const set = all.find((s) => s.unit === halt.unit && s.control === c.control)
    return !set || c.in.includes(set.position)
  })

const bandSwitches = ({ halt }: Tuner, wanted: Condition, all: readonly Setting[]): Setting[] =>
  wanted.flatMap(({ control, in: [position] }) =>
    position === undefined || all.some((s) => s.unit === halt.unit && s.control === control)
      ? []
      : [settingOf(halt.device, { unit: halt.unit, control, position })],
  )

export interface OpenSwitch {
  readonly unit: Uid
  readonly device: DeviceModel
  readonly control: Key
  readonly positions: readonly string[]
}

/** Switches of a path that neither a person nor the way itself has set, and their positions. */
export function openSwitches(path: Path, set: readonly Setting[]): OpenSwitch[] {
  return path.halts.flatMap(({ unit, device, fn }) => {
    const loads = device.ports.flatMap((p) => (p.load?.kind === 'switch' ? [p.load.control] : []))
    const rows = [
      ...fn.accepts,
      ...fn.gives.flatMap((g) => [...(g.picture ?? []), ...(g.rf ?? [])]),
    ]
    const named = [
      ...rows.flatMap((r) => (r.while ?? []).map((c) => c.control)),
      ...(fn.optional ?? []).flatMap((o) => (o.while ?? []).map((c) => c.control)),
      ...loads,
    ]
    return [...new Set(named)].flatMap((key) => {
      const control = device.controls.find((c) => c.key === key)
      const isOpen = !set.some((s) => s.unit === unit && s.control === key)
      return isOpen && (control?.kind === 'positions' || control?.kind === 'auto')
        ? [{ unit, device, control: key, positions: control.positions.map((p) => p.key) }]
        : []
    })
  })
}
