import { describe, expect, it } from 'vitest'
import {
  channelsIn,
  channelsOf,
  channelsOverlap,
  expandNames,
  findChannel,
  nearestChannel,
  touches,
} from './index'

const channel = (
  plan: 'us-broadcast' | 'us-cable-std' | 'japan-broadcast' | 'uk-405',
  name: string,
) => {
  const found = findChannel(plan, name)
  if (!found) throw new Error(`no ${name}`)
  return found
}

describe('names of channels', () => {
  it('expands a span with one prefix', () => {
    expect(expandNames('E2..E4')).toEqual(['E2', 'E3', 'E4'])
  })

  it('keeps leading zeros', () => {
    expect(expandNames('S01..S03')).toEqual(['S01', 'S02', 'S03'])
  })

  it('takes a list as it is', () => {
    expect(expandNames('5,5A,6')).toEqual(['5', '5A', '6'])
  })

  it('picks a part of a plan by a list of spans', () => {
    expect(channelsIn({ plan: 'us-broadcast', names: '2..4,14' }).map((c) => c.name)).toEqual([
      '2',
      '3',
      '4',
      '14',
    ])
  })
})

describe('neighbours', () => {
  // 47 CFR 73.623(c)(4): 4 and 5, 6 and 7, 13 and 14 are not adjacent.
  it.each([
    ['4', '5'],
    ['6', '7'],
    ['13', '14'],
  ])('US broadcast %s and %s do not touch', (a, b) => {
    expect(touches(channel('us-broadcast', a), channel('us-broadcast', b))).toBe(false)
  })

  it('US broadcast 3 and 4 touch', () => {
    expect(touches(channel('us-broadcast', '3'), channel('us-broadcast', '4'))).toBe(true)
  })

  // Reference table: 188-194 and 192-198 MHz.
  it('Japanese 7 and 8 overlap', () => {
    expect(channelsOverlap(channel('japan-broadcast', '7'), channel('japan-broadcast', '8'))).toBe(
      true,
    )
  })
})

describe('finding a channel by its carrier', () => {
  // Japanese channel 1 has its vision at 91.25 MHz, where the cable plan has 95 (reference tables).
  it('names the cable channel on which a Japanese modulator comes up', () => {
    const found = nearestChannel(
      { plan: 'us-cable-std' },
      channel('japan-broadcast', '1').visionMhz ?? 0,
    )
    expect(found?.channel.name).toBe('95')
    expect(found?.offMhz).toBe(0)
  })

  // From memory: British channel B1 has sound 41.5 and vision 45 MHz.
  it('puts sound below vision in the 405-line plan', () => {
    expect(channel('uk-405', 'B1')).toMatchObject({ visionMhz: 45, soundMhz: 41.5 })
  })

  it('has carriers for no digital channel', () => {
    expect(channelsOf('australia-digital').every((c) => c.visionMhz === null)).toBe(true)
  })
})
