import { channelsIn, type Channel, type PlanPart } from './index'

/** A frequency within a channel, and how far above its vision carrier; null in a digital channel. */
export interface Landing {
  readonly channel: Channel
  readonly mhz: number
  readonly aboveVisionMhz: number | null
}

/**
 * The channels of a part of a plan in which a frequency lies, more than one where channels overlap. Where one
 * ends and the next begins it counts as the next.
 */
export const channelsAt = (part: PlanPart, mhz: number): Landing[] =>
  channelsIn(part)
    .filter((c) => mhz >= c.lowerMhz && mhz < c.upperMhz)
    .map((channel) => ({
      channel,
      mhz,
      aboveVisionMhz: channel.visionMhz === null ? null : mhz - channel.visionMhz,
    }))
