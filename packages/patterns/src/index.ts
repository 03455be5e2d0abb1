import type { DeviceModel, Model } from '@coaxwain/models'
import { channelsIn, type PlanPart } from '@coaxwain/signal'
import { BOXES } from './boxes/index'
import { PIECES } from './pieces'

/**
 * Ordinary parts that can be bought, by key. Never a device to defeat protection, never a bare cable where
 * electronics are needed.
 */
export const ORDINARY_PARTS: Readonly<Record<string, Model>> = { ...PIECES, ...BOXES }

const visionOf = (part: PlanPart): number[] => channelsIn(part).flatMap((c) => c.visionMhz ?? [])

/** Channels off air that a set can be tuned to; a cable plan is no reason to buy for another country. */
function receivedOffAir({ controls }: DeviceModel): number[] {
  return controls.flatMap((c) =>
    c.kind === 'tuned-to'
      ? c.reaches
          .filter(({ part }) => !part.plan.includes('cable'))
          .flatMap(({ part }) => visionOf(part))
      : [],
  )
}

/** Modulators sold where this set was: their channels are among those that it receives off air. */
function isSoldFor(part: Model, received: readonly number[]): boolean {
  if (part.type !== 'device' || part.kind !== 'modulator') return true
  const sent = part.controls.flatMap((c) =>
    c.kind === 'channel' && 'part' in c.carriers ? visionOf(c.carriers.part) : [],
  )
  return sent.some((mhz) => received.some((other) => Math.abs(other - mhz) < 0.3))
}

/** What can be bought beside a set: everything, but no modulator of another country where there are others. */
export function partsFor(set: Model | undefined): Readonly<Record<string, Model>> {
  const received = set?.type === 'device' ? receivedOffAir(set) : []
  return received.length === 0
    ? ORDINARY_PARTS
    : Object.fromEntries(
        Object.entries(ORDINARY_PARTS).filter(([, part]) => isSoldFor(part, received)),
      )
}
