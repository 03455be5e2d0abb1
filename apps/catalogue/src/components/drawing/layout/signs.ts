import type { Sign } from './drawing-input'

/** Signs of what a piece does, about their centre: two windings, a zigzag, a meeting, a sum. */
export const SIGN_PATHS: Readonly<Record<Sign, string>> = {
  transformer:
    'M-1.4 -9V9M1.4 -9V9M-9 -8.4q5 0 5 2.1t-5 2.1M-9 -4.2q5 0 5 2.1t-5 2.1M-9 0q5 0 5 2.1t-5 2.1M-9 4.2q5 0 5 2.1t-5 2.1M9 -8.4q-5 0 -5 2.1t5 2.1M9 -4.2q-5 0 -5 2.1t5 2.1M9 0q-5 0 -5 2.1t5 2.1M9 4.2q-5 0 -5 2.1t5 2.1',
  pad: 'M-10 0H-7L-5 -5L-2 5L1 -5L4 5L6 0H10',
  joint: 'M-10 0H-3M10 0H3M-3 -5V5M3 -5V5',
  mix: 'M-10 -5H-4L2 0H10M-10 5H-4L2 0',
}
