import type { Model } from '@coaxwain/models'
import { BOXES } from './boxes/index'
import { PIECES } from './pieces'

/**
 * Ordinary parts that can be bought, by key. Never a device to defeat protection, never a bare cable where
 * electronics are needed.
 */
export const ORDINARY_PARTS: Readonly<Record<string, Model>> = { ...PIECES, ...BOXES }
