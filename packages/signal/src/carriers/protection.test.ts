import { db, mhz } from '@coaxwain/quantities'
import { describe, expect, it } from 'vitest'
import { protection, protectionRatio, singleCarrierRatio, type Encounter } from './protection'
import { PROTECTION_ROWS } from './protection-rows'

const meeting = (rest: Partial<Encounter>): Encounter => ({
  wanted: 'M',
  unwanted: 'M',
  channels: 0,
  hearing: 'planning',
  ...rest,
})

// 47 CFR 74.705(d), 73.623(c)(2); ITU-R BT.655 and BT.1368 through a public coding.
describe('what a wanted carrier needs', () => {
  it.each([
    [{}, 45],
    [{ offset: '10-khz' }, 28],
    [{ channels: -1, band: 'VHF' }, -6],
    [{ channels: 1, band: 'UHF' }, -15],
    [{ channels: -1, medium: 'cable' }, -3],
    [{ wanted: 'atsc', channels: -1 }, -48],
    [{ wanted: 'G', unwanted: 'G', channels: -1 }, -9],
    [{ wanted: 'G', unwanted: 'G', channels: -1, hearing: 'continuous' }, 1],
    [{ wanted: 'I', unwanted: 'K', channels: -1 }, 13],
    [{ wanted: 'dvb-t', mode: '16-QAM 3/4', unwanted: 'G' }, 3],
  ] as const)('%j', (given, ratio) => {
    expect(protectionRatio(meeting(given))).toEqual({ ok: true, value: ratio })
  })

  it('is the stricter figure where the band is not known', () => {
    expect(protectionRatio(meeting({ channels: -1 }))).toEqual({ ok: true, value: -6 })
  })

  it('is the planning figure where nobody tabulated a continuous one', () => {
    const given = meeting({ channels: 14, hearing: 'continuous' })
    expect(protectionRatio(given)).toEqual({ ok: true, value: -23 })
  })

  it('is never less for interference that is always there', () => {
    const wrong = PROTECTION_ROWS.filter((r) => (r.continuousDb ?? Infinity) < r.planningDb)
    expect(wrong).toEqual([])
  })

  it('leaves a margin, or lacks one', () => {
    const given = meeting({ channels: 1, band: 'VHF' })
    expect(protection(given, db(-14))).toEqual({ ok: true, value: { required: -12, margin: -2 } })
  })

  it('is not known for channels that nobody tabulated', () => {
    expect(protectionRatio(meeting({ channels: 6 }))).toMatchObject({
      problem: { code: 'no-ratio' },
    })
    expect(protection(meeting({ channels: 6 }), db(0)).ok).toBe(false)
  })
})

describe('a single carrier in a PAL channel', () => {
  it.each([
    [0, 47],
    [0.25, 48.5],
    [2.5, 40],
    [6, 25],
  ])('%d MHz above vision needs %d dB', (offset, ratio) => {
    expect(singleCarrierRatio(mhz(offset), 'planning')).toEqual({ ok: true, value: ratio })
  })

  it('outside it needs nothing that is tabulated', () => {
    expect(singleCarrierRatio(mhz(-2), 'continuous').ok).toBe(false)
    expect(singleCarrierRatio(mhz(6.5), 'continuous').ok).toBe(false)
  })
})
