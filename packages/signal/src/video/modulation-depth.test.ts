import { percent } from '@coaxwain/quantities'
import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { RF_SYSTEM_IDS, RF_SYSTEMS, type RfSystemId } from '../systems'
import { modulationDepth, type ModulationDepth } from './modulation-depth'

const depth = (system: RfSystemId, videoGain: number, white?: number): ModulationDepth => {
  const found = modulationDepth({
    system,
    videoGain,
    white: white === undefined ? undefined : percent(white),
  })
  if (!found.ok) throw new Error(found.problem.code)
  return found.value
}

describe('the carrier at white', () => {
  // 100 - 87.5 g: 47 CFR 73.682(a)(13).
  it.each([
    [1, 12.5, false],
    [2, -75, true],
    [2 / 3, 41.667, false],
  ])('of M with video at %d of nominal', (gain, white, over) => {
    expect(depth('M', gain).white).toBeCloseTo(white, 3)
    expect(depth('M', gain).overmodulated).toBe(over)
  })

  it('of M reaches nothing 1.16 dB above nominal', () => {
    expect(depth('M', 1).gainLimit).toBeCloseTo(1.1429, 4)
    expect(depth('M', 1).gainLimitLevel).toBeCloseTo(1.16, 2)
  })

  // 100 - 80 x 1.25 = 0: ITU-R BT.470, white at 20 %.
  it('of I stands just at its limit with a quarter more video', () => {
    expect(depth('I', 1.25).white).toBeCloseTo(0, 9)
    expect(depth('I', 1.25).overmodulated).toBe(false)
    expect(depth('I', 1.26).overmodulated).toBe(true)
  })

  it('of L has white at the peak, so that any more is too much', () => {
    expect(depth('L', 1)).toMatchObject({ white: 100, overmodulated: false, gainLimit: 1 })
    expect(depth('L', 1.2)).toMatchObject({ white: 120, overmodulated: true })
  })

  it('is beyond its end exactly when the video is above its limit', () => {
    const gain = fc.double({ min: 0.1, max: 4, noNaN: true })
    fc.assert(
      fc.property(fc.constantFrom(...RF_SYSTEM_IDS), gain, (system, videoGain) => {
        const { white, overmodulated, gainLimit } = depth(system, videoGain)
        const end = RF_SYSTEMS[system].polarity === 'negative' ? 0 : 100
        fc.pre(Math.abs(white - end) > 1e-6)
        expect(overmodulated).toBe(end === 0 ? white < 0 : white > 100)
        expect(overmodulated).toBe(videoGain > gainLimit)
      }),
    )
  })

  it('needs video, and room between white and the peak', () => {
    expect(modulationDepth({ system: 'M', videoGain: 0 }).ok).toBe(false)
    expect(modulationDepth({ system: 'M', videoGain: 1, white: percent(100) })).toMatchObject({
      problem: { code: 'out-of-range' },
    })
  })
})
