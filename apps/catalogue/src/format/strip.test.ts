import { describe, expect, it } from 'vitest'
import { unit } from '../fixtures/builders'
import { DISC_PLAYER, HOOKUP, MODULATOR, SNAPSHOT } from '../fixtures/disc-to-set'
import { doubtsOf } from './doubts'
import { createLookup } from './lookup'
import { deviceStrip } from './strip'

describe('face of a unit in a list', () => {
  const tested = unit('disc', 'm-disc', {
    forms: [
      { jack: 'composite', port: 'video', state: 'works' },
      { jack: 'optical', port: 'optical', state: 'intermittent' },
      { jack: 'sound', port: 'r', state: 'dead' },
    ],
  })
  const marks = new Map(deviceStrip(DISC_PLAYER, tested).map((m) => [m.key, m]))

  it('says nothing where a socket works, and keeps its colour', () => {
    expect(marks.get('video')).toMatchObject({ badge: null, untested: false, band: 'v' })
  })

  it('breaks the line where nobody has tried, and takes the colour away', () => {
    expect(marks.get('sv')).toMatchObject({ untested: true, band: null })
  })

  it('marks what is dead or intermittent', () => {
    expect([marks.get('r')?.badge, marks.get('optical')?.badge]).toEqual(['dead', 'intermittent'])
  })

  it('leaves a gap between groups and between rows', () => {
    const gaps = deviceStrip(DISC_PLAYER, null).flatMap((m) => (m.gap ? [m.key] : []))
    expect(gaps).toEqual(['y', 'l', 'video'])
  })

  it('never calls a power socket untested: no form is tried on it', () => {
    const power = deviceStrip(MODULATOR, unit('mod', 'm-mod')).find((m) => m.key === 'dc')
    expect(power?.untested).toBe(false)
  })
})

describe('doubts of a hookup', () => {
  it('count every form and function that it uses once', () => {
    expect(doubtsOf(HOOKUP, createLookup(SNAPSHOT))).toEqual({ untested: 11, intermittent: 0 })
  })

  it('fall as things are tested', () => {
    const units = SNAPSHOT.units.map((u) =>
      u.uid === SNAPSHOT.units[0]?.uid
        ? {
            ...u,
            functions: [{ function: 'plays', state: 'works' as const }],
            forms: [{ jack: 'composite', port: 'video', state: 'intermittent' as const }],
          }
        : u,
    )
    expect(doubtsOf(HOOKUP, createLookup({ ...SNAPSHOT, units }))).toEqual({
      untested: 9,
      intermittent: 1,
    })
  })
})
