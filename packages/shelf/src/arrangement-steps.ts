import type { Arrangement, Use } from './arrangement'
import type { Hookup, Link } from './hookup'
import { stepsOf, type HookupStep } from './steps'
import type { Snapshot } from './unit'

/** What an arrangement asks a person to do: once for the wiring, and for every use what is set. */
export interface ArrangementSteps {
  /** All that is plugged and nothing that is set, in the form of a hookup. */
  readonly wiring: Hookup
  /** Check, fetch and plug, numbered from one; their segments run in the links of the wiring. */
  readonly plug: readonly HookupStep[]
  /**
   * For every use the steps that plug its own links, under the same numbers, then those that set it,
   * numbered on from the last plug. Their segments run in the links of the use's hookup.
   */
  readonly uses: readonly (readonly HookupStep[])[]
}

export function stepsOfArrangement(
  arrangement: Arrangement,
  snapshot: Snapshot,
): ArrangementSteps | null {
  const [first] = arrangement.uses
  if (!first) return null
  const hookups = arrangement.uses.map((u) => u.hookup)
  const wiring: Hookup = {
    ...first.hookup,
    legs: hookups.flatMap((h) => h.legs),
    links: linksOnce(arrangement.links),
    ends: once(hookups.flatMap((h) => h.ends ?? [])),
    settings: [],
    cautions: once(hookups.flatMap((h) => h.cautions)),
  }
  const plug = stepsOf(wiring, snapshot)
  return {
    wiring,
    plug,
    uses: arrangement.uses.map((use) => [
      ...plug.flatMap((step) => ofUse(step, wiring, use)),
      ...settingSteps(use, plug.length, snapshot),
    ]),
  }
}

/** Two uses may send different circuits through one lead. */
function linksOnce(links: readonly Link[]): Link[] {
  const known = new Map<string, Link>()
  for (const link of links) {
    const before = known.get(lying(link))
    const circuits = once([...(before?.circuits ?? []), ...link.circuits])
    known.set(lying(link), { ...link, circuits })
  }
  return [...known.values()]
}

/** What tells a lead that lies there from any other, whatever it carries. */
const lying = ({ from, pieces, to }: Link): string => JSON.stringify([from, pieces, to])

function once<T>(items: readonly T[]): T[] {
  const known = new Map(items.map((item) => [JSON.stringify(item), item]))
  return [...known.values()]
}

/** A plugging step as far as it is about the links of one use. */
function ofUse(step: HookupStep, wiring: Hookup, { hookup }: Use): HookupStep[] {
  const segments = step.segments.flatMap(({ link, index }) => {
    const plugged = wiring.links[link]
    const own = plugged ? hookup.links.findIndex((l) => lying(l) === lying(plugged)) : -1
    return own < 0 ? [] : [{ link: own, index }]
  })
  return segments.length > 0 ? [{ ...step, segments }] : []
}

const settingSteps = ({ hookup }: Use, after: number, snapshot: Snapshot): HookupStep[] =>
  stepsOf(hookup, snapshot)
    .filter((s) => s.kind === 'set')
    .map((step, i) => ({ ...step, number: after + i + 1 }))
