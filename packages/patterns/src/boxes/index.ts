import type { DeviceModel } from '@coaxwain/models'
import { BLOCKS } from './blocks'
import { RF_BOXES } from './channels'
import { DIGITAL_BOXES } from './digital'
import { SCAN_BOXES } from './scans'
import { SOUND_BOXES } from './sound'
import { STANDARD_BOXES } from './standards'

/** Boxes that any shop of the trade has, or that turn up second-hand. */
export const BOXES = {
  ...STANDARD_BOXES,
  ...SCAN_BOXES,
  ...DIGITAL_BOXES,
  ...RF_BOXES,
  ...BLOCKS,
  ...SOUND_BOXES,
} satisfies Record<string, DeviceModel>
