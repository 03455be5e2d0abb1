import type { DeviceModel } from '@coaxwain/models'
import { channelsIn, type PlanPart } from '@coaxwain/signal'

/** Vision carriers that count as one channel differ by less, in MHz; common practice, no source. */
const SAME_MHZ = 0.3

const visionOf = (part: PlanPart): number[] => channelsIn(part).flatMap((c) => c.visionMhz ?? [])

/** Channels off air that a set can be tuned to; a cable plan is no reason to buy for another country. */
export function receivedOffAir({ controls }: DeviceModel): number[] {
  return controls.flatMap((c) =>
    c.kind === 'tuned-to'
      ? c.reaches
          .filter(({ part }) => !part.plan.includes('cable'))
          .flatMap(({ part }) => visionOf(part))
      : [],
  )
}

/**
 * Whether a part is sold where a set was: a modulator of which some channel is among those that the set
 * receives off air, and everything else anywhere.
 */
export function isSoldFor(part: DeviceModel, received: readonly number[]): boolean {
  if (part.kind !== 'modulator' || received.length === 0) return true
  const sent = part.controls.flatMap((c) =>
    c.kind === 'channel' && 'part' in c.carriers ? visionOf(c.carriers.part) : [],
  )
  return sent.some((mhz) => received.some((other) => Math.abs(other - mhz) < SAME_MHZ))
}
