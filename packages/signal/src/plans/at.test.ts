import { describe, expect, it } from 'vitest'
import { channelsAt } from './at'

const names = (plan: 'us-broadcast' | 'japan-broadcast' | 'us-cable-std', mhz: number) =>
  channelsAt({ plan }, mhz).map((l) => l.channel.name)

describe('where a frequency lands', () => {
  // Second harmonic of channel 4: 2 x 67.25.
  it('is a channel and a distance from its vision carrier', () => {
    const [landing] = channelsAt({ plan: 'us-cable-std' }, 134.5)
    expect(landing?.channel.name).toBe('16')
    expect(landing?.aboveVisionMhz).toBeCloseTo(1.2375, 4)
  })

  it('is nothing in a gap', () => {
    expect(names('us-broadcast', 73.25)).toEqual([])
  })

  it('is the upper one of two at their common edge', () => {
    expect(names('us-broadcast', 60)).toEqual(['3'])
  })

  it('is both of two that overlap', () => {
    expect(names('japan-broadcast', 193)).toEqual(['7', '8'])
  })

  it('has no vision carrier in a digital channel', () => {
    expect(channelsAt({ plan: 'australia-digital' }, 177)[0]?.aboveVisionMhz).toBeNull()
  })
})
