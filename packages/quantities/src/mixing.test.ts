import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { foldedLevel, foldedOneSide } from './mixing'
import { ohm } from './units'

const fold = (source: number, series: number, load: number) => ({
  source: ohm(source),
  series: ohm(series),
  load: ohm(load),
})

describe('two channels folded by resistors', () => {
  // 20 log (47000 / 48000).
  it('lose 0.18 dB into an ordinary input', () => {
    const found = foldedLevel(fold(1000, 1000, 47_000))
    expect(found.ok && found.value).toBeCloseTo(-0.183, 3)
  })

  it('are never louder than one alone, and half of it when one is silent', () => {
    const resistance = fc.double({ min: 10, max: 100_000, noNaN: true })
    fc.assert(
      fc.property(resistance, resistance, resistance, (source, series, load) => {
        const both = foldedLevel(fold(source, series, load))
        const one = foldedOneSide(fold(source, series, load))
        if (!both.ok || !one.ok) throw new Error('refused')
        expect(both.value).toBeLessThan(0)
        expect(both.value - one.value).toBeCloseTo(6.0206, 4)
      }),
    )
  })

  it('are never joined without the resistors', () => {
    expect(foldedLevel(fold(1000, 0, 47_000))).toMatchObject({
      problem: { code: 'not-positive', details: { what: 'series' } },
    })
    expect(foldedOneSide(fold(1000, 0, 47_000)).ok).toBe(false)
  })
})
