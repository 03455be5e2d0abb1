import type { TestState } from '@coaxwain/shelf'

/** Marks of the four states on a grid of 16; the outline alone tells them apart. */
export type StateShape =
  | {
      readonly tag: 'circle'
      readonly r: number
      readonly kind: 'solid' | 'ring'
      readonly dash?: string
      readonly line?: number
    }
  | {
      readonly tag: 'path'
      readonly d: string
      readonly kind: 'solid' | 'line' | 'hole'
      readonly line?: number
    }

export const STATE_SHAPES: Readonly<Record<TestState, readonly StateShape[]>> = {
  works: [
    { tag: 'circle', r: 7, kind: 'solid' },
    { tag: 'path', d: 'M4.8 8.3L7.1 10.6L11.3 5.8', kind: 'hole', line: 1.9 },
  ],
  untested: [{ tag: 'circle', r: 6, kind: 'ring', dash: '2.5 2.21', line: 1.75 }],
  intermittent: [
    { tag: 'circle', r: 6.2, kind: 'ring', line: 1.6 },
    { tag: 'path', d: 'M8 1.8A6.2 6.2 0 0 0 8 14.2Z', kind: 'solid' },
  ],
  dead: [{ tag: 'path', d: 'M2.8 2.8L13.2 13.2M13.2 2.8L2.8 13.2', kind: 'line', line: 2.75 }],
}
