import type { DeviceModel, Key } from '@coaxwain/models'
import type { TestState, Unit } from './unit'

/** From best to worst of what was tried; untested was not tried. */
const WORSE: Readonly<Record<TestState, number>> = {
  untested: 0,
  works: 1,
  intermittent: 2,
  dead: 3,
}

export const worst = (states: readonly TestState[]): TestState =>
  states.reduce<TestState>((w, s) => (WORSE[s] > WORSE[w] ? s : w), 'untested')

/** State of one form on one port. A unit marked dead or untested as a whole says nothing here. */
export const formState = (unit: Unit, jack: Key, port: Key): TestState =>
  unit.forms.find((f) => f.jack === jack && f.port === port)?.state ?? 'untested'

export const functionState = (unit: Unit, fn: Key): TestState =>
  unit.functions.find((f) => f.function === fn)?.state ?? 'untested'

/** The badge of a port: the worst of what was tried there, and how much of it was tried. */
export interface PortBadge {
  readonly port: Key
  readonly state: TestState
  readonly tried: number
  readonly of: number
}

export function portBadges(unit: Unit, model: DeviceModel): PortBadge[] {
  return model.ports.map((port) => {
    const states = model.jacks
      .filter((j) => j.contacts.some((c) => c.port === port.key))
      .map((j) => formState(unit, j.key, port.key))
    return {
      port: port.key,
      state: worst(states),
      tried: states.filter((s) => s !== 'untested').length,
      of: states.length,
    }
  })
}

/** The badge of a whole unit, for lists: ports tried, and how many are in the worst state. */
export interface UnitBadge {
  readonly state: TestState
  readonly inThatState: number
  readonly tried: number
  readonly of: number
}

export function unitBadge(badges: readonly PortBadge[]): UnitBadge {
  const counted = badges.filter((b) => b.of > 0)
  const state = worst(counted.map((b) => b.state))
  return {
    state,
    inThatState: counted.filter((b) => b.state === state).length,
    tried: counted.filter((b) => b.tried > 0).length,
    of: counted.length,
  }
}

/**
 * May a hookup use it? Parts only is ignored, sold and gone are not here;
 * a faulty unit lends only what is marked works.
 */
export const mayLend = (unit: Unit): boolean =>
  unit.working !== 'parts-only' && unit.holding !== 'sold' && unit.holding !== 'gone'

/** Doubt that a state brings to an answer; null when the thing must not be used. */
export function doubtOf(unit: Unit, state: TestState): number | null {
  if (state === 'dead') return null
  if (unit.working === 'faulty') return state === 'works' ? 0 : null
  return state === 'works' ? 0 : state === 'untested' ? 1 : 2
}
