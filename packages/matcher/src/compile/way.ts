import {
  allTogether,
  inputsOf,
  POWER_KEY,
  jackOf,
  together,
  type AutoCause,
  type Condition,
  type DeviceModel,
  type Give,
  type Jack,
  type Key,
  type ModelFunction,
  type Port,
} from '@coaxwain/models'
import { formState } from '@coaxwain/shelf'
import type { Unit } from '@coaxwain/shelf'
import { isPictureForm, type Circuit, type PictureForm } from '@coaxwain/signal'
import type { FaceTable, Placed } from './face'
import { embedsSound } from './sig'
import { unitDoubt, type Leans, type Variant } from './variant'

/** A sound jack, or a part of one: both channels, one of them, or the mono wire. */
export interface SoundEnd {
  readonly jack: Key
  readonly circuits: readonly Circuit[]
}

/** Where sound comes from and goes to inside a unit: inside the picture signal, by a jack, or not at all. */
export type SoundPlace = 'picture' | SoundEnd | null

/** One way through a unit: a picture in and out, and what it does with the sound meanwhile. */
export interface Way {
  readonly id: number
  /** The same for ways that take a picture by the same input of the same function. */
  readonly takeId: number
  readonly variant: Variant
  readonly fn: ModelFunction
  readonly in: Key | null
  readonly out: Give | null
  readonly soundFrom: SoundPlace
  readonly soundTo: SoundPlace
  /** Sound added up to one channel inside, whatever comes in. */
  readonly soundMono: boolean
  readonly functions: readonly Key[]
  readonly stand: Condition
  readonly into: Placed | null
  readonly from: Placed | null
  /** The socket by which this way would harm somebody. */
  readonly harm: Port | null
  /** The socket that is recorded as dead, so that no unit offers this way. */
  readonly dead: Port | null
  /** Least doubt first; units in which something needed is dead are left out. */
  readonly offers: readonly Offer[]
}

export interface Offer {
  readonly unit: Unit
  readonly doubt: number
}

export interface WaySet {
  /** Ways of the source: nothing comes in. */
  readonly starts: readonly Way[]
  /** Ways through boxes. */
  readonly boxes: readonly Way[]
  /** Ways through boxes that handle sound alone. */
  readonly soundBoxes: readonly Way[]
  /** Loudspeakers. */
  readonly speakers: readonly Way[]
  /** Ways into the display. */
  readonly ends: readonly Way[]
}

/** The parts of a sound jack that may be used: both channels, each alone, mono. */
export function soundEnds(jack: Jack): SoundEnd[] {
  const has = (c: Circuit): boolean => jack.contacts.some((k) => k.circuit === c)
  const ends: Circuit[][] = []
  if (has('audio-l') && has('audio-r')) ends.push(['audio-l', 'audio-r'])
  for (const one of ['audio-l', 'audio-r', 'audio-mono'] as const) if (has(one)) ends.push([one])
  return ends.map((circuits) => ({ jack: jack.key, circuits }))
}

const endsOf = (device: DeviceModel, key: Key): SoundEnd[] => {
  const jack = jackOf(device, key)
  return jack.form === 'sound' ? soundEnds(jack) : []
}

interface Draft {
  readonly fn: ModelFunction
  readonly in: Key | null
  readonly out: Give | null
  readonly soundFrom: SoundPlace
  readonly soundTo: SoundPlace
  readonly soundMono: boolean
  readonly functions: readonly Key[]
  readonly stand: Condition
}

const isPictureJack = (device: DeviceModel, key: Key): boolean =>
  isPictureForm(jackOf(device, key).form)

/** Sound inputs that a function takes beside its picture, with the positions under which it does. */
function soundInputs(
  device: DeviceModel,
  fn: ModelFunction,
): { end: SoundEnd; stand: Condition }[] {
  const optional = (fn.optional ?? []).map((o) => ({ jack: o.jack, stand: o.while ?? [] }))
  const needed = [...fn.needs, ...(fn.oneOf ?? [])].map((jack) => ({ jack, stand: [] }))
  return [...optional, ...needed].flatMap(({ jack, stand }) =>
    endsOf(device, jack).map((end) => ({ end, stand })),
  )
}

const isSoundOnly = (device: DeviceModel, fn: ModelFunction): boolean =>
  inputsOf(fn).length > 0 && inputsOf(fn).every((k) => !isPictureJack(device, k))

interface SoundPart {
  readonly from: SoundPlace
  readonly to: SoundPlace
  readonly mono: boolean
  readonly fn: ModelFunction
  readonly stand: Condition
}

/** Everything that a unit may do with sound while one picture way is in use. */
function soundParts(
  device: DeviceModel,
  fn: ModelFunction,
  input: Key | null,
  out: Give | null,
): SoundPart[] {
  const nothing: SoundPart = { from: null, to: null, mono: false, fn, stand: [] }
  const inForm = input === null ? null : (jackOf(device, input).form as PictureForm)
  const outForm = out === null ? null : (jackOf(device, out.jack).form as PictureForm)
  const inside: SoundPlace = input === null || (inForm && embedsSound(inForm)) ? 'picture' : null
  const parts: SoundPart[] = []
  const outputs = fn.gives.flatMap((give) =>
    give.sound ? endsOf(device, give.jack).map((end) => ({ end, give })) : [],
  )
  const inputs = soundInputs(device, fn)
  if (outForm && embedsSound(outForm)) {
    if (inside) parts.push({ ...nothing, from: 'picture', to: 'picture' })
    for (const { end, stand } of inputs) parts.push({ ...nothing, from: end, to: 'picture', stand })
  }
  if (out === null) {
    if (inside) parts.push({ ...nothing, from: 'picture', to: null })
    for (const { end, stand } of inputs) parts.push({ ...nothing, from: end, to: null, stand })
  }
  for (const { end: to, give } of outputs) {
    const mono = give.sound === 'mono'
    if (inside) parts.push({ ...nothing, from: 'picture', to, mono, stand: give.while ?? [] })
    for (const { end: from, stand } of inputs) {
      const both = together(stand, give.while)
      if (both) parts.push({ ...nothing, from, to, mono, stand: both })
    }
  }
  const separate = device.functions.filter((g) => g !== fn && isSoundOnly(device, g))
  for (const g of separate) parts.push(...soundOnlyParts(device, g))
  return [nothing, ...parts]
}

function soundOnlyParts(device: DeviceModel, fn: ModelFunction): SoundPart[] {
  return soundInputs(device, fn).flatMap(({ end: from, stand }) =>
    fn.gives.flatMap((give) =>
      endsOf(device, give.jack).flatMap((to): SoundPart[] => {
        const both = together(stand, give.while)
        return both ? [{ from, to, mono: give.sound === 'mono', fn, stand: both }] : []
      }),
    ),
  )
}

/** The power states in which a function acts. */
function powerFor(fn: ModelFunction): Condition {
  if (fn.power === 'none') return []
  return [{ control: POWER_KEY, in: fn.power === 'on' ? ['on'] : ['on', 'standby'] }]
}

function draftsOf(device: DeviceModel, fn: ModelFunction): Draft[] {
  const inputs = [...fn.needs, ...(fn.oneOf ?? [])].filter((k) => isPictureJack(device, k))
  const outputs = fn.gives.filter((g) => isPictureJack(device, g.jack))
  const ins: readonly (Key | null)[] = inputs.length > 0 ? inputs : [null]
  const outs: readonly (Give | null)[] = outputs.length > 0 ? outputs : [null]
  return ins.flatMap((input) =>
    outs.flatMap((out) =>
      soundParts(device, fn, input, out).flatMap((part): Draft[] => {
        const own = allTogether(fn.while, out?.while, powerFor(fn))
        const other = part.fn === fn ? part.stand : together(part.fn.while, part.stand)
        const stand = own && other ? together(own, other) : null
        if (!stand) return []
        return [
          {
            fn,
            in: input,
            out,
            soundFrom: part.from,
            soundTo: part.to,
            soundMono: part.mono,
            functions: part.fn === fn ? [fn.key] : [fn.key, part.fn.key],
            stand,
          },
        ]
      }),
    ),
  )
}

const soundEnd = (place: SoundPlace): SoundEnd | null =>
  place !== null && place !== 'picture' ? place : null

function leansOf(device: DeviceModel, draft: Draft): Leans {
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
function socketsClash(device: DeviceModel, draft: Draft): boolean {
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

const portsLeantOn = (device: DeviceModel, draft: Draft) =>
  leansOf(device, draft).contacts.flatMap(({ port: key }) =>
    device.ports.filter((p) => p.key === key),
  )

/** A socket that would put the mains on a lead: such ways are reasons, and never part of an answer. */
const harmOf = (device: DeviceModel, draft: Draft): Port | null =>
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
function deadPort(variant: Variant, leans: Leans): Port | null {
  const dead = leans.contacts.find(({ jack, port }) =>
    variant.units.every((u) => formState(u, jack, port) === 'dead'),
  )
  return variant.device.ports.find((p) => p.key === dead?.port) ?? null
}

/** May be part of an answer: harms nobody, and some unit offers it. */
export const isUsable = (way: Way): boolean => way.harm === null && way.dead === null

/** What moves an automatic control while this way is in use, or null when nothing moves it there. */
function causes(device: DeviceModel, draft: Draft): { dcAt: Key[] } | null {
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
function reachable(device: DeviceModel, stand: Condition): boolean {
  return stand.every(({ control: key, in: wanted }) => {
    const control = device.controls.find((c) => c.key === key)
    return control?.kind === 'positions' || control?.kind === 'auto'
      ? control.positions.some((p) => wanted.includes(p.key))
      : true
  })
}

/** Makes and numbers ways; one for the whole search. */
export class WayMaker {
  private made = 0
  private readonly takes = new Map<string, number>()

  constructor(private readonly faces: FaceTable) {}

  /** Every way through a variant that its functions allow. */
  waysOf(variant: Variant): Way[] {
    const ways = variant.device.functions.flatMap((fn) =>
      draftsOf(variant.device, fn).flatMap((draft) => this.make(variant, draft)),
    )
    return ways.filter((way) => !rightInVain(way, ways))
  }

  /** Sound-only ways of a variant: mixers, sound selectors, loudspeakers. */
  soundWaysOf(variant: Variant): Way[] {
    const { device } = variant
    return device.functions
      .filter((fn) => isSoundOnly(device, fn))
      .flatMap((fn) => {
        const through = soundOnlyParts(device, fn)
        const into =
          fn.kind === 'makes-sound'
            ? soundInputs(device, fn).map(({ end, stand }): SoundPart => ({
                from: end,
                to: null,
                mono: false,
                fn,
                stand,
              }))
            : []
        return [...through, ...into].flatMap((part) => {
          const stand = allTogether(fn.while, part.stand, powerFor(fn))
          if (!stand) return []
          return this.make(variant, {
            fn,
            in: null,
            out: null,
            soundFrom: part.from,
            soundTo: part.to,
            soundMono: part.mono,
            functions: [fn.key],
            stand,
          })
        })
      })
  }

  private make(variant: Variant, draft: Draft): Way[] {
    const { device } = variant
    if (socketsClash(device, draft)) return []
    if (portsLeantOn(device, draft).some((p) => p.retired === true)) return []
    if (!reachable(device, draft.stand)) return []
    const moved = causes(device, draft)
    if (!moved) return []
    const leans = leansOf(device, draft)
    const offers = variant.units
      .map((unit) => ({ unit, doubt: unitDoubt(unit, leans, toBeChecked(device, leans)) }))
      .filter((o): o is Offer => o.doubt !== null)
      .sort((a, b) => a.doubt - b.doubt)
    const dead = offers.length === 0 ? deadPort(variant, leans) : null
    if (offers.length === 0 && dead === null) return []
    const wired = withDc(device, moved.dcAt)
    return [
      {
        ...draft,
        id: this.made++,
        takeId: this.take(`${variant.id} ${draft.fn.key} ${draft.in ?? ''}`),
        variant,
        into: this.face(wired, draft.in, draft.soundFrom, []),
        from: this.face(wired, draft.out?.jack ?? null, draft.soundTo, draft.out?.volts ?? []),
        offers,
        harm: harmOf(device, draft),
        dead,
      },
    ]
  }

  private take(key: string): number {
    const known = this.takes.get(key) ?? this.takes.size
    this.takes.set(key, known)
    return known
  }

  private face(
    device: DeviceModel,
    picture: Key | null,
    sound: SoundPlace,
    volts: Give['volts'],
  ): Placed | null {
    const end = soundEnd(sound)
    if (picture === null && end === null) return null
    return this.faces.place(device, {
      picture: picture === null ? null : jackOf(device, picture),
      sound: end ? { jack: jackOf(device, end.jack), circuits: end.circuits } : null,
      volts: volts ?? [],
    })
  }
}

const isRight = (place: SoundPlace): boolean => {
  const end = soundEnd(place)
  return end?.circuits.length === 1 && end.circuits[0] === 'audio-r'
}

const asLeft = (place: SoundPlace): string => {
  const end = soundEnd(place)
  if (!end) return String(place)
  return `${end.jack} ${end.circuits.join()}`.replace(
    /audio-r$/,
    end.circuits.length === 1 ? 'audio-l' : 'audio-r',
  )
}

const plugsOf = (placed: Placed | null): string =>
  (placed?.face.ports ?? []).map((p) => `${p.connector} ${p.mount}`).join()

/** The right channel alone is worth trying only where the left is worse off. */
function rightInVain(way: Way, ways: readonly Way[]): boolean {
  if (!isRight(way.soundFrom) && !isRight(way.soundTo)) return false
  return ways.some(
    (other) =>
      other !== way &&
      other.fn === way.fn &&
      other.in === way.in &&
      other.out === way.out &&
      !isRight(other.soundFrom) &&
      !isRight(other.soundTo) &&
      asLeft(other.soundFrom) === asLeft(way.soundFrom) &&
      asLeft(other.soundTo) === asLeft(way.soundTo) &&
      plugsOf(other.into) === plugsOf(way.into) &&
      plugsOf(other.from) === plugsOf(way.from) &&
      (other.offers[0]?.doubt ?? Infinity) <= (way.offers[0]?.doubt ?? Infinity),
  )
}

/** Ports whose automatic switch waits for a voltage need it from their cable. */
function withDc(device: DeviceModel, ports: readonly Key[]): DeviceModel {
  if (ports.length === 0) return device
  return {
    ...device,
    ports: device.ports.map((p) => (ports.includes(p.key) ? { ...p, needsDcVolts: 5 } : p)),
  }
}
