import { jackOf, type DeviceModel, type Key } from '@coaxwain/models'
import { formState, functionState, nameOf, thingOf } from '@coaxwain/shelf'
import type { FormState, Signal, Snapshot, TestState, Unit } from '@coaxwain/shelf'
import type { Circuit } from '@coaxwain/signal'
import { CompiledShelf } from '../compile/shelf'
import { soundEnd, type Way } from '../compile/way'

/** A shelf made ready that lends nothing but what is known to work: sockets, functions and leads. */
export const compileTried = (snapshot: Snapshot): CompiledShelf =>
  new CompiledShelf({
    ...snapshot,
    units: snapshot.units.map((unit) => {
      const isPiece = snapshot.models[unit.model]?.type === 'piece'
      const fit = unit.working === 'parts-only' || (isPiece && unit.working === 'works')
      // What is faulty lends what is marked as working, and no lead at all.
      return fit ? unit : { ...unit, working: 'faulty' as const }
    }),
  })

/** The unit as it comes to the test: what comes and goes proves nothing, and one signal may be tried again. */
export function onTrial(unit: Unit, again: Signal | undefined): Unit {
  const isAgain = (signal: Signal): boolean =>
    again !== undefined && nameOf(signal) === nameOf(again)
  const steady = <T extends { readonly state: TestState }>(noted: T): T =>
    noted.state === 'intermittent' ? { ...noted, state: 'dead' } : noted
  return {
    ...unit,
    working: 'untested',
    forms: unit.forms.filter((f) => !isAgain(f)).map(steady),
    functions: unit.functions.filter((f) => !isAgain(f)).map(steady),
  }
}

/**
 * The unit as if its left sound sockets were dead wherever the right one is untried, since a way by the right
 * one alone is made only then; null where there is nothing of the kind.
 */
export function withoutLeft(device: DeviceModel, unit: Unit): Unit | null {
  const dead = device.jacks.flatMap(({ key: jack, contacts }): FormState[] => {
    const portOf = (circuit: Circuit) => contacts.find((c) => c.circuit === circuit)?.port
    const [left, right] = [portOf('audio-l'), portOf('audio-r')]
    if (left === undefined || right === undefined || left === right) return []
    return isUntried(unit, { jack, port: right }) ? [{ jack, port: left, state: 'dead' }] : []
  })
  const isDead = (form: FormState): boolean => dead.some((d) => nameOf(d) === nameOf(form))
  return dead.length === 0
    ? null
    : { ...unit, forms: [...unit.forms.filter((f) => !isDead(f)), ...dead] }
}

export const isByRightAlone = (way: Way): boolean =>
  [way.soundFrom, way.soundTo].some((place) => soundEnd(place)?.circuits.join() === 'audio-r')

const isUntried = (unit: Unit, signal: Signal): boolean =>
  ('function' in signal
    ? functionState(unit, signal.function)
    : formState(unit, signal.jack, signal.port)) === 'untested'

/** Everything of a unit that nobody has tried, each once. */
export function untriedOf(device: DeviceModel, unit: Unit): Signal[] {
  const inUse = new Set(device.ports.filter((p) => p.retired !== true).map((p) => p.key))
  const forms = device.jacks.flatMap((jack) =>
    [...new Set(jack.contacts.map((c) => c.port))]
      .filter((port) => inUse.has(port))
      .map((port) => ({ jack: jack.key, port })),
  )
  const functions = device.functions.map((f) => ({ function: f.key }))
  return [...forms, ...functions].filter((signal) => isUntried(unit, signal))
}

/** What one way through the unit tries, by how its verdict comes. */
export interface Trial {
  readonly seen: readonly Signal[]
  readonly heard: readonly Signal[]
}

/** Null for a way that tries nothing. */
export function trialOf(way: Way, unit: Unit): Trial | null {
  const { device } = way.variant
  const [first, ...others] = way.functions
  const isPicture = way.in !== null || way.out !== null
  const on = (jack: Key | undefined | null): Signal[] =>
    way.leans.contacts
      .filter((c) => c.jack === jack)
      .map(({ jack: key, port }) => ({ jack: jackOf(device, key).key, port }))
  const doing = (functions: readonly (Key | undefined)[]): Signal[] =>
    functions.flatMap((key) => (key === undefined ? [] : [{ function: key }]))
  const sound = [...on(soundEnd(way.soundFrom)?.jack), ...on(soundEnd(way.soundTo)?.jack)]
  const seen = isPicture ? [...on(way.in), ...on(way.out?.jack), ...doing([first])] : []
  const heard = [...sound, ...doing(isPicture ? others : [first])]
  const untried = (signals: readonly Signal[]): Signal[] =>
    signals.filter((signal) => isUntried(unit, signal))
  const trial = { seen: untried(seen), heard: untried(heard) }
  return trial.seen.length + trial.heard.length > 0 ? trial : null
}

/** Equal for trials of the same. */
export const keyOf = ({ seen, heard }: Trial): string =>
  [seen, heard].map((signals) => signals.map(nameOf).sort().join()).join(' | ')

/** How many things stand on trial at once on a leg beyond one, when some are known already. */
export const beyondOne = ({ seen, heard }: Trial, known: ReadonlySet<string>): number =>
  [seen, heard].reduce((sum, signals) => {
    const things = new Set(signals.filter((s) => !known.has(nameOf(s))).map(thingOf))
    return sum + Math.max(0, things.size - 1)
  }, 0)
