import type { Snapshot } from '@coaxwain/shelf'
import type { DemoCollection, DemoData, DemoKey } from './demo-data'

/** Names from the outermost place inwards. */
export function placePath(collection: DemoCollection, key: DemoKey | null): readonly string[] {
  if (key === null) return []
  const place = collection.places.find((p) => p.key === key)
  if (!place) throw new Error(`${collection.key} has no place ${key}`)
  return [...placePath(collection, place.parent), place.name]
}

/**
 * One collection as the matcher takes it, with the whole shared catalogue beside it. Places become the path
 * of their names. Throws for an unknown key.
 */
export function snapshotOf(data: DemoData, collection: DemoKey): Snapshot {
  const found = data.collections.find((c) => c.key === collection)
  if (!found) throw new Error(`no collection ${collection}`)
  return {
    shelfVersion: 1,
    catalogueVersion: 1,
    models: data.models,
    units: found.units.map((unit) => ({
      uid: unit.uid,
      model: unit.model,
      quantity: unit.quantity,
      working: unit.working,
      holding: unit.holding,
      place: unit.place === null ? null : placePath(found, unit.place).join(', '),
      forms: unit.forms,
      functions: unit.functions,
      modifications: unit.modifications,
      stands: unit.stands,
      remotePresent: unit.remotePresent,
    })),
  }
}
