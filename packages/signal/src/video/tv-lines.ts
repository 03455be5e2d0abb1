import {
  whenPositive,
  type Mhz,
  type Microsecond,
  type QuantityProblem,
} from '@coaxwain/quantities'
import { microsecond } from '@coaxwain/quantities'
import type { Result } from '@coaxwain/result'

/** Visible part of a line by raster. Sources: 47 CFR 73.682 for 525 lines; ITU-R BT.470 for 625. */
export const ACTIVE_LINE: Readonly<Record<525 | 625, Microsecond>> = {
  525: microsecond(52.66),
  625: microsecond(52),
}

/** Width over height of the usual tube. */
export const FOUR_BY_THREE = 4 / 3

/**
 * Detail that a luma bandwidth can show, in TV lines per picture height: two lines to a cycle, over the part of
 * the line that is as wide as the picture is high, 2 B t / aspect. About 79 lines per MHz in 525 lines.
 * Source: definition.
 */
export const horizontalTvLines = (
  bandwidth: Mhz,
  activeLine: Microsecond,
  aspect: number = FOUR_BY_THREE,
): Result<number, QuantityProblem> =>
  whenPositive({ bandwidth, activeLine, aspect }, () => (2 * bandwidth * activeLine) / aspect)
