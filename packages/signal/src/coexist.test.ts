import { describe, expect, it } from 'vitest'
import { clashes, leastMargin, type Occupant } from './coexist'
import { findChannel } from './plans/index'

function on(
  name: string,
  levelDbmv: number,
  sideband: Occupant['sideband'] = 'vestigial',
): Occupant {
  const c = findChannel('us-broadcast', name)!
  return {
    lowerMhz: c.lowerMhz,
    upperMhz: c.upperMhz,
    visionMhz: c.visionMhz,
    system: 'M',
    sideband,
    levelDbmv,
  }
}

describe('two carriers on one cable', () => {
  // 47 CFR 74.705(d): 45 dB on one channel.
  it('spoil each other on one channel', () => {
    expect(clashes(on('3', 9), on('3', 3)).map((c) => c.how)).toEqual(['co-channel', 'co-channel'])
  })

  // 61.25 - 4.5 = 56.75 MHz lies 1.5 MHz above the vision carrier of channel 2 (arithmetic).
  it('foul the channel below an unfiltered modulator', () => {
    const found = clashes(on('2', 2), on('3', 9.5, 'double'))
    expect(found[0]).toMatchObject({ how: 'sideband', victim: 'first' })
    expect(found[0]!.marginDb).toBeLessThan(0)
  })

  it('leave the channel below alone where a gap lies between', () => {
    expect(leastMargin(on('4', 2), on('5', 9.5, 'double'))).toBe(Infinity)
  })

  // 47 CFR 74.705(d): the upper neighbour may be 12 dB stronger, the lower one 6 dB.
  it('bear a filtered neighbour of nearly the same level', () => {
    expect(leastMargin(on('7', 6), on('8', 6))).toBe(6)
  })

  it('do not meet when a channel lies between them', () => {
    expect(leastMargin(on('2', 2), on('4', 9.5, 'double'))).toBe(Infinity)
  })
})
