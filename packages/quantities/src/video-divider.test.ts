import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { ohm, voltPp } from './units'
import { loadVideo, type LoadedVideo } from './video-divider'

const OUTPUT = { emf: voltPp(2), impedance: ohm(75), nominal: voltPp(1) }

const on = (...loads: number[]): LoadedVideo => {
  const result = loadVideo(OUTPUT, loads.map(ohm))
  if (!result.ok) throw new Error(result.problem.code)
  return result.value
}

// By hand from E RL / (RL + 75).
describe('a video output', () => {
  it.each([
    [[75], 1, 0],
    [[1000], 1.8605, 5.392],
    [[75, 75], 0.6667, -3.522],
    [[75, 75, 75], 0.5, -6.021],
    [[75, 10_000], 0.9963, -0.033],
    [[], 2, 6.021],
  ])('on %j ohm', (loads, level, error) => {
    expect(on(...loads).level).toBeCloseTo(level, 3)
    expect(on(...loads).error).toBeCloseTo(error, 3)
  })

  it('falls with every load more, and never to nothing', () => {
    const load = fc.double({ min: 1, max: 100_000, noNaN: true })
    fc.assert(
      fc.property(fc.array(load, { maxLength: 5 }), load, (loads, more) => {
        const level = on(...loads, more).level
        expect(level).toBeLessThan(on(...loads).level)
        expect(level).toBeGreaterThan(0)
      }),
    )
  })

  it('drives no short', () => {
    expect(loadVideo(OUTPUT, [ohm(75), ohm(0)])).toMatchObject({
      problem: { code: 'not-positive', details: { what: 'load 1' } },
    })
  })
})
