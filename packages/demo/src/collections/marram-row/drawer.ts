import type { DemoUnit } from '../../demo-data'
import { lead } from './maker'

export const DRAWER: readonly DemoUnit[] = [
  lead(51, 'phono-2', 2),
  lead(52, 'phono-3', 3),
  lead(53, 'aerial-fly', 4),
  lead(54, 'phono-aerial', 2),
  lead(55, 'pin21-full', 3),
  lead(56, 'pin21-composite', 2),
  lead(57, 'pin21-in', 1),
  lead(58, 'pin21-out', 1),
  lead(59, 'din6-pin21', 1),
  lead(60, 'hd15-lead', 1),
  lead(61, 'hdmi-lead', 2),
  lead(62, 's-video', 1),
  lead(63, 'jack-phono', 1),
  lead(64, 'y-mixer', 1),
  lead(65, 'phono-1', 2),
  lead(66, 'phono-joiner', 1),
]
