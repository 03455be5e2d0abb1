import { mhz, whenAtLeast, type Mhz, type QuantityProblem } from '@coaxwain/quantities'
import type { Result } from '@coaxwain/result'
import type { IntermodulationOrder } from '../levels/derating'

/** Products closer than the precision of the channel tables, 0.1 kHz, are one. */
const sortedOnce = (products: readonly number[]): Mhz[] =>
  [...new Set(products.map((f) => Math.round(f * 10_000) / 10_000))]
    .filter((f) => f > 0)
    .sort((a, b) => a - b)
    .map(mhz)

/** f1 + f2 and f1 - f2 of every two. */
const secondOrder = (f: readonly number[]): number[] =>
  f.flatMap((a, i) => f.slice(i + 1).flatMap((b) => [a + b, Math.abs(a - b)]))

/** 2a - b and 2a + b of every two, a + b - c of every three. */
function thirdOrder(f: readonly number[]): number[] {
  const ofTwo = f.flatMap((a, i) => f.flatMap((b, j) => (i === j ? [] : [2 * a - b, 2 * a + b])))
  const ofThree = f.flatMap((a, i) =>
    f.flatMap((b, j) =>
      j <= i ? [] : f.flatMap((c, k) => (k === i || k === j ? [] : [a + b - c])),
    ),
  )
  return [...ofTwo, ...ofThree]
}

/**
 * Frequencies that an overdriven amplifier or modulator makes of its carriers, rising, each once, none at or
 * below zero. Source: power series.
 */
export const intermodulation = (
  carriers: readonly Mhz[],
  order: IntermodulationOrder,
): Result<Mhz[], QuantityProblem> =>
  whenAtLeast(2, 'carriers', carriers.length, () =>
    sortedOnce(order === 2 ? secondOrder(carriers) : thirdOrder(carriers)),
  )

/** An integer multiple of a carrier. A cheap modulator's second harmonic may be only 6 dB down. Source: definition. */
export const harmonicOf = (carrier: Mhz, multiple: number): Result<Mhz, QuantityProblem> =>
  whenAtLeast(2, 'multiple', multiple, () => mhz(carrier * multiple))

/**
 * Where vision, sound and colour of one channel beat: sound less colour, 0.920 MHz in M. The first thing that
 * an overdriven modulator shows. Source: third-order product within one channel.
 */
export const soundColourBeat = (soundOffset: Mhz, colourSubcarrier: Mhz): Mhz =>
  mhz(Math.abs(Math.abs(soundOffset) - colourSubcarrier))
