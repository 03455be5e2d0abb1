import {
  jackOf,
  type AutoCause,
  type Condition,
  type DeviceModel,
  type Key,
  type Port,
} from '@coaxwain/models'
import { formState } from '@coaxwain/shelf'
import { unitDoubt, type Leans, type Variant } from './variant'
import { soundEnd, type Draft, type Offer } from './way'

export function leansOf(device: DeviceModel, draft: Draft): Leans {
  const whole = [draft.in, draft.out?.jack ?? null].flatMap((key) =>
    key === null ? [] : jackOf(device, key).contacts.map((c) => ({ jack: key, port: c.port })),
  )
  const sound = [soundEnd(draft.soundFrom), soundEnd(draft.soundTo)].flatMap((end) =>
    end
      ? jackOf(device, end.jack)
          .contacts.filter((c) => end.circuits.includes(c.circuit))
          .map((c) => ({ jack: end.jack, port: c.port }))
      : [],
  )
  const seen = new Set<string>()
  const contacts = [...whole, ...sound].filter(({ jack, port }) => {
    const key = `${jack} ${port}`
    return !seen.has(key) && seen.add(key)
  })
  return { contacts, functions: draft.functions }
}

function portsUsed(device: DeviceModel, key: Key | null): Key[] {
  return key === null ? [] : jackOf(device, key).contacts.map((c) => c.port)
}

/** A socket holds one plug: what comes in and what goes out must use different ones. */
export function socketsClash(device: DeviceModel, draft: Draft): boolean {
  const into = [
    ...portsUsed(device, draft.in),
    ...portsUsed(device, soundEnd(draft.soundFrom)?.jack ?? null),
  ]
  const from = [
    ...portsUsed(device, draft.out?.jack ?? null),
    ...portsUsed(device, soundEnd(draft.soundTo)?.jack ?? null),
  ]
  return into.some((p) => from.includes(p))
}

export const portsLeantOn = (device: DeviceModel, draft: Draft) =>
  leansOf(device, draft).contacts.flatMap(({ port: key }) =>
    device.ports.filter((p) => p.key === key),
  )

/** A socket that would put the mains on a lead: such ways are reasons, and never part of an answer. */
export const harmOf = (device: DeviceModel, draft: Draft): Port | null =>
  device.chassis === 'isolated'
    ? null
    : (portsLeantOn(device, draft).find(
        (p) => p.isolated === 'no' && (device.chassis === 'live' || p.origin === 'added'),
      ) ?? null)

/** Sockets of which nobody knows whether they are safe to touch: one more thing to check first. */
function toBeChecked(device: DeviceModel, leans: Leans): number {
  if (device.chassis === 'isolated') return 0
  return leans.contacts.some(
    ({ port: key }) => device.ports.find((p) => p.key === key)?.isolated === 'unknown',
  )
    ? 1
    : 0
}

/** The socket for which no unit of a variant offers a way. */
export function deadPort(variant: Variant, leans: Leans): Port | null {
  const dead = leans.contacts.find(({ jack, port }) =>
    variant.units.every((u) => formState(u, jack, port) === 'dead'),
  )
  return variant.device.ports.find((p) => p.key === dead?.port) ?? null
}

/** The units of a variant that can do what is leant on, least doubt first. */
export function offersOf(variant: Variant, leans: Leans): Offer[] {
  const unchecked = toBeChecked(variant.device, leans)
  return variant.units
    .map((unit) => ({ unit, doubt: unitDoubt(unit, leans, unchecked) }))
    .filter((o): o is Offer => o.doubt !== null)
    .sort((a, b) => a.doubt - b.doubt)
}

/** All that is leant on by either, each thing once. */
export const bothLeans = (a: Leans, b: Leans): Leans => ({
  contacts: [
    ...a.contacts,
    ...b.contacts.filter(({ jack, port }) =>
      a.contacts.every((c) => c.jack !== jack || c.port !== port),
    ),
  ],
  functions: [...new Set([...a.functions, ...b.functions])],
})

/** What moves an automatic control while this way is in use, or null when nothing moves it there. */
export function causes(device: DeviceModel, draft: Draft): { dcAt: Key[] } | null {
  const fed = new Set([
    ...portsUsed(device, draft.in),
    ...portsUsed(device, soundEnd(draft.soundFrom)?.jack ?? null),
  ])
  const used = new Set([...fed, ...portsUsed(device, draft.out?.jack ?? null)])
  const dcAt: Key[] = []
  const holds = (cause: AutoCause, others: readonly AutoCause[]): boolean => {
    switch (cause.kind) {
      case 'signal-at':
        return fed.has(cause.port)
      case 'voltage-at':
        if (fed.has(cause.port)) dcAt.push(cause.port)
        return fed.has(cause.port)
      case 'plug-in':
        return used.has(cause.port)
      case 'powered':
        return true
      case 'otherwise':
        return !others.some((o) => o.kind !== 'otherwise' && holds(o, []))
    }
  }
  for (const stands of draft.stand) {
    const control = device.controls.find((c) => c.key === stands.control)
    if (control?.kind !== 'auto') continue
    const wanted = control.positions.filter((p) => stands.in.includes(p.key))
    const others = control.positions.filter((p) => !wanted.includes(p)).map((p) => p.cause)
    if (!wanted.some((p) => holds(p.cause, others))) return null
  }
  return { dcAt }
}

/** Positions that a control really has; a condition on one that has been left none cannot be met. */
export function reachable(device: DeviceModel, stand: Condition): boolean {
  return stand.every(({ control: key, in: wanted }) => {
    const control = device.controls.find((c) => c.key === key)
    return control?.kind === 'positions' || control?.kind === 'auto'
      ? control.positions.some((p) => wanted.includes(p.key))
      : true
  })
}
