import type { Hookup, HookupStep } from '@coaxwain/shelf'
import type { Lookup } from '../../format/lookup'
import { CABLE_LOOKS, cableKind, tagOf, type CableKind } from '../drawing/layout/cables'
import { symbolOf, type SymbolKey } from '../drawing/layout/symbols'
import { circuitsOf, linkParts } from './link-parts'
import { runNumbers } from './step-plan'

/** One cable of a step: its two ends and what it carries. */
export interface StepEnd {
  readonly key: string
  readonly ends: readonly [SymbolKey, SymbolKey]
  readonly look: CableKind
  readonly tag: string
  /** Colour of a phono's ring. */
  readonly band: string
}

/** The cables that a step plugs, for its line of marks. */
export function stepEnds(
  step: HookupStep,
  steps: readonly HookupStep[],
  hookup: Hookup,
  lookup: Lookup,
): StepEnd[] {
  const links = [...new Set(step.segments.map((s) => s.link))]
  return links.flatMap((index): StepEnd[] => {
    const link = hookup.links[index]
    if (!link) return []
    const parts = linkParts(link, lookup)
    const numbers = runNumbers(steps, index, parts)
    const circuits = circuitsOf(link)
    let run = 0
    return parts.flatMap((part): StepEnd[] => {
      if (part.kind === 'piece') return []
      const mine = numbers[run++]?.includes(step.number) ?? false
      if (!mine) return []
      const look = cableKind(circuits, part.ends)
      return [
        {
          key: `${index} ${run}`,
          ends: [symbolOf(part.ends[0]), symbolOf(part.ends[1])],
          look,
          tag: tagOf(look, circuits),
          band: CABLE_LOOKS[look].band,
        },
      ]
    })
  })
}
