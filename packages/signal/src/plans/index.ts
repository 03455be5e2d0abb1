import * as asiaPacific from './asia-pacific'
import * as europe from './europe'
import * as northAmerica from './north-america'
import type { Channel, PlanId, PlanRuns } from './run'
import { expandNames } from './run'
import { UK_405 } from './uk-405'

export type { Channel, Confidence, PlanId } from './run'
export { expandNames, PLAN_IDS } from './run'

const PLANS: Readonly<Record<PlanId, readonly Channel[]>> = Object.fromEntries(
  [
    ...Object.values(northAmerica),
    ...Object.values(europe),
    ...Object.values(asiaPacific),
    UK_405,
  ].map((p: PlanRuns) => [p.plan, p.channels]),
) as Record<PlanId, readonly Channel[]>

/** Every channel of a plan, in the order of the published table. */
export const channelsOf = (plan: PlanId): readonly Channel[] => PLANS[plan]

/** The channel of that name, or null. */
export const findChannel = (plan: PlanId, name: string): Channel | null =>
  PLANS[plan].find((c) => c.name === name) ?? null

/** A part of a plan: all of it, or the names of one span such as `2..13`. */
export interface PlanPart {
  readonly plan: PlanId
  readonly names?: string | undefined
}

const parts = new Map<string, readonly Channel[]>()

/** The channels of a part of a plan, in the order of the table; unknown names are left out. */
export function channelsIn(part: PlanPart): readonly Channel[] {
  if (part.names === undefined) return PLANS[part.plan]
  const key = `${part.plan} ${part.names}`
  const known = parts.get(key)
  if (known) return known
  const wanted = new Set(part.names.split(',').flatMap((n) => expandNames(n)))
  const made = PLANS[part.plan].filter((c) => wanted.has(c.name))
  parts.set(key, made)
  return made
}

/**
 * The channel whose vision carrier lies nearest to a frequency, with the distance in MHz.
 * Null when the part has no carrier at all.
 */
export function nearestChannel(
  part: PlanPart,
  visionMhz: number,
): { channel: Channel; offMhz: number } | null {
  let best: { channel: Channel; offMhz: number } | null = null
  for (const channel of channelsIn(part)) {
    if (channel.visionMhz === null) continue
    const offMhz = Math.abs(channel.visionMhz - visionMhz)
    if (best === null || offMhz < best.offMhz) best = { channel, offMhz }
  }
  return best
}

/** Two channels touch when one begins where the other ends; numbers say nothing about it. */
export const touches = (a: Channel, b: Channel): boolean =>
  Math.abs(a.upperMhz - b.lowerMhz) < 0.05 || Math.abs(b.upperMhz - a.lowerMhz) < 0.05

/** Two channels overlap when they share spectrum, for example Japan's 7 and 8. */
export const channelsOverlap = (a: Channel, b: Channel): boolean =>
  a.lowerMhz < b.upperMhz - 0.05 && b.lowerMhz < a.upperMhz - 0.05
