import type { Hookup, Uid } from '@coaxwain/shelf'
import type { Lookup } from './lookup'

/** What a hookup uses of one unit: forms on plugged ports, and functions. */
export interface UsedParts {
  readonly unit: Uid
  readonly forms: readonly { readonly jack: string; readonly port: string }[]
  readonly functions: readonly string[]
}

interface Collected {
  readonly forms: Map<string, { jack: string; port: string }>
  readonly functions: Set<string>
}

/** Everything that must work for a hookup to work, each thing once. */
export function usedParts(hookup: Hookup, lookup: Lookup): UsedParts[] {
  const plugged = new Set(
    hookup.links.flatMap((l) => [`${l.from.unit} ${l.from.port}`, `${l.to.unit} ${l.to.port}`]),
  )
  const units = new Map<Uid, Collected>()
  for (const stop of hookup.legs.flatMap((l) => l.stops)) {
    const device = lookup.device(stop.unit)
    if (!device) continue
    const parts: Collected = units.get(stop.unit) ?? { forms: new Map(), functions: new Set() }
    units.set(stop.unit, parts)
    parts.functions.add(stop.function)
    const jacks = device.jacks.filter((j) => j.key === stop.in || j.key === stop.out)
    for (const { jack, port } of jacks.flatMap((j) =>
      j.contacts.map((c) => ({ jack: j.key, port: c.port })),
    )) {
      if (plugged.has(`${stop.unit} ${port}`)) parts.forms.set(`${jack} ${port}`, { jack, port })
    }
  }
  return [...units].map(([unit, { forms, functions }]) => ({
    unit,
    forms: [...forms.values()],
    functions: [...functions],
  }))
}
