import { dbmv } from '@coaxwain/quantities'
import { describe, expect, it } from 'vitest'
import { LEVEL_WINDOWS, placeInWindow, type LevelWindowId } from './window'

const place = (level: number, id: LevelWindowId) => placeInWindow(dbmv(level), LEVEL_WINDOWS[id])

describe('a level in its window', () => {
  // 47 CFR 76.605(a)(3): at least 0 dBmV at the set, 3 dBmV at the end of the drop.
  it.each([
    ['fcc-terminal', -0.1, 'low'],
    ['fcc-terminal', 0, 'ok'],
    ['fcc-terminal', 40, 'ok'],
    ['fcc-drop-end', 2.9, 'low'],
    ['fcc-drop-end', 3, 'ok'],
    // 60 to 77 dBuV.
    ['iec-outlet-am', -0.1, 'low'],
    ['iec-outlet-am', 17, 'ok'],
    ['iec-outlet-am', 17.1, 'high'],
    // 47 to 67 dBuV.
    ['iec-outlet-dvb-c-64qam', -13.1, 'low'],
    ['iec-outlet-dvb-c-64qam', 7.1, 'high'],
    ['working-target', 2.9, 'low'],
    ['working-target', 15.1, 'high'],
  ] as const)('%s: %d dBmV is %s', (id, level, expected) => {
    expect(place(level, id)).toBe(expected)
  })

  it('stands beside its source', () => {
    expect(Object.values(LEVEL_WINDOWS).filter((w) => w.source === '')).toEqual([])
  })
})
