import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { convertLevel, LEVEL_UNITS, type LevelUnit } from './level-units'
import { ohm } from './units'

const converted = (value: number, from: LevelUnit, to: LevelUnit, across = 75): number => {
  const result = convertLevel({ value, unit: from }, to, ohm(across))
  if (!result.ok) throw new Error(result.problem.code)
  return result.value
}

// By hand from P = V^2 / Z.
describe('converting levels', () => {
  it.each([
    [0, 'dBmV', 'dBuV', 75, 60],
    [0, 'dBmV', 'dBm', 75, -48.7506],
    [0, 'dBmV', 'dBm', 300, -54.7712],
    [3000, 'uV', 'dBmV', 75, 9.5424],
    [-50, 'dBm', 'dBuV', 75, 58.7506],
    [1, 'V', 'mW', 50, 20],
    [0, 'dBW', 'dBm', 75, 30],
    [0, 'dBV', 'dBmV', 75, 60],
  ] as const)('%d %s in %s across %d ohm', (...[value, from, to, across, expected]) => {
    expect(converted(value, from, to, across)).toBeCloseTo(expected, 3)
  })

  it('comes back from every unit', () => {
    const unit = fc.constantFrom(...LEVEL_UNITS)
    const level = fc.double({ min: 0.001, max: 100, noNaN: true })
    const impedance = fc.constantFrom(50, 75, 300)
    fc.assert(
      fc.property(level, unit, unit, impedance, (value, from, to, across) => {
        const back = converted(converted(value, from, to, across), to, from, across)
        expect(Math.abs(back - value)).toBeLessThan(1e-6 * Math.max(1, value))
      }),
    )
  })

  it('finds no level in silence, nor across nothing', () => {
    expect(convertLevel({ value: 0, unit: 'uV' }, 'dBmV', ohm(75))).toMatchObject({
      problem: { code: 'not-positive', details: { what: 'level', value: 0 } },
    })
    expect(convertLevel({ value: 0, unit: 'dBmV' }, 'dBm', ohm(0))).toMatchObject({
      problem: { code: 'not-positive', details: { what: 'impedance' } },
    })
  })
})
