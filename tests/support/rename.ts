import {
  POWER_KEY,
  type AcceptRow,
  type AutoCause,
  type Condition,
  type Control,
  type DeviceModel,
  type Give,
  type Jack,
  type Key,
  type ModelFunction,
  type Port,
} from '@coaxwain/models'
import type { Modification, Unit } from '@coaxwain/shelf'

/** What everything inside a device is to be called; positions and groups, ports and the rest each by themselves. */
export interface Names {
  readonly group: (key: Key) => Key
  readonly port: (key: Key) => Key
  readonly jack: (key: Key) => Key
  readonly control: (key: Key) => Key
  readonly position: (key: Key) => Key
  readonly fn: (key: Key) => Key
  readonly label: (text: string) => string
}

/** The same device with every key called otherwise. The power keeps its name: it is the same everywhere. */
export function renamedDevice(device: DeviceModel, names: Names): DeviceModel {
  const { port } = names
  return {
    ...device,
    groups: device.groups.map((g) => ({ key: names.group(g.key), label: names.label(g.label) })),
    ports: device.ports.map((p) => renamedPort(p, names)),
    jacks: device.jacks.map((j) => renamedJack(j, names)),
    controls: device.controls.map((c) => renamedControl(c, names)),
    functions: device.functions.map((f) => renamedFunction(f, names)),
    leaks: device.leaks.map((l) => ({ ...l, from: port(l.from), to: port(l.to) })),
  }
}

const maybe = <T, U>(value: T | undefined, rename: (value: T) => U): U | undefined =>
  value === undefined ? undefined : rename(value)

function renamedPort(p: Port, names: Names): Port {
  return {
    ...p,
    key: names.port(p.key),
    label: names.label(p.label),
    group: maybe(p.group, names.group),
    loopsTo: maybe(p.loopsTo, names.port),
    load:
      p.load?.kind === 'switch'
        ? {
            ...p.load,
            control: names.control(p.load.control),
            position75: names.position(p.load.position75),
          }
        : p.load,
  }
}

const renamedJack = (j: Jack, names: Names): Jack => ({
  ...j,
  key: names.jack(j.key),
  contacts: j.contacts.map((c) => ({ ...c, port: names.port(c.port) })),
})

const renamedCondition = (condition: Condition, names: Names): Condition =>
  condition.map(({ control, in: positions }) =>
    control === POWER_KEY
      ? { control, in: positions }
      : { control: names.control(control), in: positions.map(names.position) },
  )

const renamedCause = (cause: AutoCause, names: Names): AutoCause =>
  'port' in cause ? { ...cause, port: names.port(cause.port) } : cause

function renamedControl(control: Control, names: Names): Control {
  const base = { key: names.control(control.key), label: names.label(control.label) }
  switch (control.kind) {
    case 'positions':
      return {
        ...control,
        ...base,
        positions: control.positions.map((p) => ({
          key: names.position(p.key),
          label: names.label(p.label),
        })),
        reset: maybe(control.reset, names.position),
      }
    case 'auto':
      return {
        ...control,
        ...base,
        positions: control.positions.map((p) => ({
          key: names.position(p.key),
          label: names.label(p.label),
          cause: renamedCause(p.cause, names),
        })),
      }
    case 'tuned-to':
      return {
        ...control,
        ...base,
        reaches: control.reaches.map((r) => ({ ...r, while: whileOf(r, names) })),
      }
    default:
      return { ...control, ...base }
  }
}

const whileOf = (row: { readonly while?: Condition | undefined }, names: Names) =>
  maybe(row.while, (c) => renamedCondition(c, names))

const renamedRow = (row: AcceptRow, names: Names): AcceptRow => ({
  ...row,
  jacks: maybe(row.jacks, (jacks) => jacks.map(names.jack)),
  while: whileOf(row, names),
})

const renamedGive = (give: Give, names: Names): Give => ({
  ...give,
  jack: names.jack(give.jack),
  while: whileOf(give, names),
  picture: give.picture?.map((row) => ({ ...row, while: whileOf(row, names) })),
  rf: give.rf?.map((rf) => ({
    ...rf,
    channel: 'control' in rf.channel ? { control: names.control(rf.channel.control) } : rf.channel,
    while: whileOf(rf, names),
  })),
})

export const renamedFunction = (f: ModelFunction, names: Names): ModelFunction => ({
  ...f,
  key: names.fn(f.key),
  label: maybe(f.label, names.label),
  while: whileOf(f, names),
  needs: f.needs.map(names.jack),
  oneOf: f.oneOf?.map(names.jack),
  optional: f.optional?.map((o) => ({ ...o, jack: names.jack(o.jack), while: whileOf(o, names) })),
  accepts: f.accepts.map((row) => renamedRow(row, names)),
  gives: f.gives.map((give) => renamedGive(give, names)),
  tunedBy: maybe(f.tunedBy, names.control),
})

const renamedModification = (m: Modification, names: Names): Modification => {
  switch (m.kind) {
    case 'added':
      return {
        ...m,
        ports: m.ports.map((p) => renamedPort(p, names)),
        jacks: m.jacks.map((j) => renamedJack(j, names)),
        functions: m.functions.map((f) => renamedFunction(f, names)),
      }
    case 'bypassed':
      return { ...m, function: names.fn(m.function) }
    default:
      return m
  }
}

/** What is noted of a unit, by the new names of its model. */
export const renamedUnit = (unit: Unit, names: Names): Unit => ({
  ...unit,
  forms: unit.forms.map((f) => ({ ...f, jack: names.jack(f.jack), port: names.port(f.port) })),
  functions: unit.functions.map((f) => ({ ...f, function: names.fn(f.function) })),
  modifications: unit.modifications.map((m) => renamedModification(m, names)),
  stands: Object.fromEntries(
    Object.entries(unit.stands).map(([key, at]) => [names.control(key), names.position(at)]),
  ),
})

/** Every key with something before it; labels as they are. */
export function prefixed(prefix: string): Names {
  const add = (key: string): string => `${prefix}${key}`
  return {
    group: add,
    port: add,
    jack: add,
    control: add,
    position: add,
    fn: add,
    label: (text) => text,
  }
}
