import { mhz } from '@coaxwain/quantities'
import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { harmonicOf, intermodulation, soundColourBeat } from './intermodulation'

const products = (order: 2 | 3, ...carriers: number[]) => {
  const found = intermodulation(carriers.map(mhz), order)
  if (!found.ok) throw new Error(found.problem.code)
  return found.value
}

describe('products of carriers', () => {
  // 2 x 61.25 - 67.25 = 55.25 and so on, by hand.
  it('of channels 3 and 4 stand on the vision carrier of channel 2', () => {
    expect(products(3, 61.25, 67.25)).toEqual([55.25, 73.25, 189.75, 195.75])
    expect(products(2, 61.25, 67.25)).toEqual([6, 128.5])
  })

  it('of three take in every a + b - c', () => {
    expect(products(3, 61.25, 67.25, 77.25)).toEqual(expect.arrayContaining([51.25, 71.25, 83.25]))
  })

  it('do not depend on the order of the carriers, rise, and come once each', () => {
    const carriers = fc.uniqueArray(fc.integer({ min: 50, max: 800 }), {
      minLength: 2,
      maxLength: 5,
    })
    fc.assert(
      fc.property(carriers, fc.constantFrom(2 as const, 3 as const), (some, order) => {
        const found = products(order, ...some)
        expect(products(order, ...[...some].reverse())).toEqual(found)
        expect(found).toEqual([...new Set(found)].sort((a, b) => a - b))
        expect(found.every((f) => f > 0)).toBe(true)
      }),
    )
  })

  it('are made of two at least', () => {
    expect(intermodulation([mhz(61.25)], 3)).toMatchObject({ problem: { code: 'too-few' } })
  })
})

describe('other unwanted tones', () => {
  it('are multiples, from the second on', () => {
    expect(harmonicOf(mhz(67.25), 2)).toEqual({ ok: true, value: 134.5 })
    expect(harmonicOf(mhz(67.25), 1).ok).toBe(false)
  })

  // Sound less colour: M, B/G, I.
  it.each([
    [4.5, 3.579545, 0.9205],
    [5.5, 4.43361875, 1.0664],
    [-6.5, 4.43361875, 2.0664],
  ])('are beats of sound at %d MHz with colour at %d MHz', (sound, colour, beat) => {
    expect(soundColourBeat(mhz(sound), mhz(colour))).toBeCloseTo(beat, 4)
  })
})
