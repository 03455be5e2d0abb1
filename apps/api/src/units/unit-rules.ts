import type { ModificationChange, StateChange } from '@coaxwain/contract'
import { checkModel, POWER_KEY, POWER_STATES, type DeviceModel } from '@coaxwain/models'
import { fitted, type Modification } from '@coaxwain/shelf'
import { AppError, type FieldTrouble } from '../app-error'
import type { Overlays } from './unit-rows'

const fault = (path: string, code: string, name = ''): FieldTrouble => ({
  path,
  code,
  details: name === '' ? {} : { name },
})

const refuse = (errors: readonly FieldTrouble[]): void => {
  if (errors.length > 0) throw new AppError('unit-unsound', { errors })
}

/** Of a device there is one; leads and adapters are counted. */
export const mustBeCountable = (type: 'device' | 'piece', quantity: number | undefined): void =>
  refuse(
    type === 'device' && (quantity ?? 1) !== 1 ? [fault('quantity', 'quantity-of-device')] : [],
  )

const repeated = (words: readonly string[], path: string): FieldTrouble[] =>
  words.flatMap((w, i) => (words.indexOf(w) < i ? [fault(`${path}.${i}`, 'given-twice')] : []))

/** One request has one wish for each unit. */
export const mustNameEachOnce = (uids: readonly string[]): void =>
  refuse(repeated(uids, 'units').map((f) => ({ ...f, path: `${f.path}.unit` })))

/** States may be noted only of jacks, ports and functions that the unit has; paths begin with `path`. */
export function statesMustFit(device: DeviceModel, change: StateChange, path = ''): void {
  const forms = change.forms ?? []
  const functions = change.functions ?? []
  const faults = [
    ...repeated(
      forms.map((f) => `${f.jack} ${f.port}`),
      'forms',
    ),
    ...repeated(
      functions.map((f) => f.function),
      'functions',
    ),
    ...forms.flatMap((f, i) => {
      const jack = device.jacks.find((j) => j.key === f.jack)
      if (!jack) return [fault(`forms.${i}.jack`, 'unknown-jack', f.jack)]
      return jack.contacts.some((c) => c.port === f.port)
        ? []
        : [fault(`forms.${i}.port`, 'unknown-port', f.port)]
    }),
    ...functions.flatMap((f, i) =>
      device.functions.some((g) => g.key === f.function)
        ? []
        : [fault(`functions.${i}.function`, 'unknown-function', f.function)],
    ),
  ]
  refuse(faults.map((f) => ({ ...f, path: path + f.path })))
}

/** The device with what was added, and with what was bypassed still there. */
export const withAdditions = (
  device: DeviceModel,
  modifications: readonly Modification[],
): DeviceModel =>
  fitted(
    device,
    modifications.filter((m) => m.kind === 'added'),
  )

const LISTS = ['ports', 'jacks', 'functions'] as const

/** Where in the request the n-th part of the fitted device came from. */
function origins(modifications: readonly Modification[], list: (typeof LISTS)[number]): string[] {
  return modifications.flatMap((m, i) =>
    m.kind === 'added' ? m[list].map((_, j) => `modifications.${i}.${list}.${j}`) : [],
  )
}

/** The path of a fault in the fitted device, as a path in the request. */
function inRequest(
  path: string,
  device: DeviceModel,
  modifications: readonly Modification[],
): string {
  const [list = '', index = '', ...rest] = path.split('.')
  const known = LISTS.find((l) => l === list)
  if (!known) return `modifications.${path}`
  const origin = origins(modifications, known)[Number(index) - device[known].length]
  return origin === undefined ? `modifications.${path}` : [origin, ...rest].join('.')
}

/** What was added must make a whole with what is there, and only what exists can be bypassed. */
export function modificationsMustFit(
  device: DeviceModel,
  { modifications }: ModificationChange,
): void {
  const whole = withAdditions(device, modifications)
  refuse([
    ...modifications.flatMap((m, i) =>
      m.kind === 'bypassed' && !whole.functions.some((f) => f.key === m.function)
        ? [fault(`modifications.${i}.function`, 'unknown-function', m.function)]
        : [],
    ),
    ...checkModel(whole).map(({ code, details }) =>
      fault(inRequest(details.path, device, modifications), code, details.name),
    ),
  ])
}

/** What states or saved hookups name may not vanish with a modification. */
export function mustKeepAddedParts(
  whole: DeviceModel,
  overlays: Overlays,
  inHookups: readonly string[],
): void {
  const has = new Set(
    [whole.ports, whole.jacks, whole.controls, whole.functions].flat().map((p) => p.key),
  )
  has.add(POWER_KEY)
  const used = [
    ...overlays.forms.flatMap((f) => [f.jack, f.port]),
    ...overlays.functions.map((f) => f.function),
    ...inHookups,
  ]
  const lost = [...new Set(used.filter((key) => !has.has(key)))]
  if (lost.length > 0) {
    throw new AppError('part-in-use', {
      errors: lost.map((key) => fault('modifications', 'in-use', key)),
    })
  }
}

function standFault(device: DeviceModel, control: string, position: string): string | null {
  if (control === POWER_KEY) {
    return (POWER_STATES as readonly string[]).includes(position) ? null : 'unknown-position'
  }
  const found = device.controls.find((c) => c.key === control)
  if (!found) return 'unknown-control'
  const named = found.kind === 'positions' || found.kind === 'auto'
  return !named || found.positions.some((p) => p.key === position) ? null : 'unknown-position'
}

export const standsMustFit = (
  device: DeviceModel,
  stands: Readonly<Record<string, string>>,
): void =>
  refuse(
    Object.entries(stands).flatMap(([control, position]) => {
      const code = standFault(device, control, position)
      const name = code === 'unknown-control' ? control : position
      return code === null ? [] : [fault(`stands.${control}`, code, name)]
    }),
  )

export const onlyDevices = (path: string): AppError =>
  new AppError('unit-unsound', { errors: [fault(path, 'devices-only')] })
