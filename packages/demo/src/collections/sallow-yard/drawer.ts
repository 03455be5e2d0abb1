import type { DemoUnit } from '../../demo-data'
import { lead } from './maker'

/** A shop's drawer: plenty of what sells, one of what does not; no terminator, no mixing adapter and no IN block. */
export const DRAWER: readonly DemoUnit[] = [
  lead(201, 'phono-1', 12),
  lead(202, 'phono-2', 9),
  lead(203, 'phono-3', 14),
  lead(204, 'phono-5', 1),
  lead(205, 'aerial-fly', 20),
  lead(206, 'aerial-plugs', 3),
  lead(207, 'phono-aerial', 4),
  lead(208, 'f-lead', 2),
  lead(209, 'phono-to-f', 1),
  lead(210, 'aerial-to-f', 2),
  lead(211, 'f-to-aerial', 2),
  lead(212, 'pin21-full', 8),
  lead(213, 'pin21-composite', 11),
  lead(215, 'pin21-out', 2),
  lead(216, 'pin21-bnc', 1),
  lead(217, 'bnc-lead', 3),
  lead(218, 'phono-to-bnc', 5),
  lead(219, 's-video', 4),
  lead(220, 'hdmi-lead', 6),
  lead(221, 'hd15-lead', 3),
  lead(222, 'jack-av', 1, 'Belongs to the HC-20 cameras and to nothing else.'),
  lead(223, 'jack-phono', 2),
  lead(224, 'din6-pin21', 1, 'The last one.'),
  lead(225, 'phono-joiner', 2),
]
