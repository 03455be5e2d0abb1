import type { Circuit } from '@coaxwain/signal'
import type { Condition, Control, DeviceModel, Jack, Key, ModelFunction, Port } from './model'

const find = <T extends { key: Key }>(items: readonly T[], key: Key, what: string): T => {
  const item = items.find((i) => i.key === key)
  if (!item) throw new Error(`no ${what} ${key}`)
  return item
}

/** Throws when the key is not in the model: {@link checkModel} comes first. */
export const portOf = (m: DeviceModel, key: Key): Port => find(m.ports, key, 'port')
export const jackOf = (m: DeviceModel, key: Key): Jack => find(m.jacks, key, 'jack')
export const controlOf = (m: DeviceModel, key: Key): Control => find(m.controls, key, 'control')
export const functionOf = (m: DeviceModel, key: Key): ModelFunction =>
  find(m.functions, key, 'function')

/** The port that carries one circuit of a jack, or null. */
export const portFor = (jack: Jack, circuit: Circuit): Key | null =>
  jack.contacts.find((c) => c.circuit === circuit)?.port ?? null

/** Every input of a function, in the order needs, one-of, optional. */
export const inputsOf = (fn: ModelFunction): readonly Key[] => [
  ...fn.needs,
  ...(fn.oneOf ?? []),
  ...(fn.optional ?? []).map((o) => o.jack),
]

/** Positions of controls, as far as settled. */
export type Stand = ReadonlyMap<Key, string>

/** A condition holds when every control that it names stands on one of its positions. */
export const holds = (condition: Condition | undefined, stand: Stand): boolean =>
  (condition ?? []).every((c) => {
    const at = stand.get(c.control)
    return at !== undefined && c.in.includes(at)
  })

/**
 * Both conditions at once: per control the positions that either allows, or null when one has none left.
 */
export function together(a: Condition | undefined, b: Condition | undefined): Condition | null {
  if (!b || b.length === 0) return possible(a ?? [])
  if (!a || a.length === 0) return possible(b)
  return merge([...a, ...b])
}

function merge(conditions: Condition): Condition | null {
  const merged = new Map<Key, readonly string[]>()
  for (const { control, in: positions } of conditions) {
    const before = merged.get(control)
    const left = before ? before.filter((p) => positions.includes(p)) : positions
    if (left.length === 0) return null
    merged.set(control, left)
  }
  return [...merged].map(([control, positions]) => ({ control, in: positions }))
}

/** One condition alone, its controls named once each. */
function possible(condition: Condition): Condition | null {
  const controls = new Set(condition.map((c) => c.control))
  if (controls.size < condition.length) return merge(condition)
  return condition.every((c) => c.in.length > 0) ? condition : null
}

/** All conditions at once, or null when they cannot be. */
export const allTogether = (...all: readonly (Condition | undefined)[]): Condition | null =>
  all.reduce<Condition | null>((sum, next) => sum && together(sum, next), [])
