import type { Result } from '@coaxwain/result'
import * as fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  addCarrierToNoise,
  carrierToNoise,
  cascade,
  digitalThreshold,
  levelFor,
  passiveStage,
  thermalFloor,
  type Stage,
} from './noise'
import { db, dbmv, hz } from './units'

const value = <T>(result: Result<T>): T => {
  if (!result.ok) throw new Error(result.problem.code)
  return result.value
}

const stage = (gain: number, noiseFigure: number): Stage => ({
  gain: db(gain),
  noiseFigure: db(noiseFigure),
})

const stages = fc.array(
  fc
    .record({
      gain: fc.double({ min: -20, max: 30, noNaN: true }),
      noiseFigure: fc.double({ min: 0, max: 15, noNaN: true }),
    })
    .map((s) => stage(s.gain, s.noiseFigure)),
  { minLength: 1, maxLength: 5 },
)

const IN_4_MHZ = { bandwidth: hz(4e6), noiseFigure: db(10) }

describe('noise', () => {
  // 10 log (1.380649e-23 x 290 x 4e6 x 1000) dBm.
  it('of 4 MHz at room temperature is -59.2 dBmV', () => {
    const floor = value(thermalFloor({ bandwidth: hz(4e6) }))
    expect(floor.level).toBeCloseTo(-59.204, 3)
    expect(floor.power).toBeCloseTo(-107.955, 3)
  })

  it('rises 3 dB with twice the bandwidth', () => {
    const [one, two] = [4e6, 8e6].map((b) => value(thermalFloor({ bandwidth: hz(b) })).level)
    expect(two! - one!).toBeCloseTo(3.0103, 4)
  })

  it('needs a bandwidth', () => {
    expect(thermalFloor({ bandwidth: hz(0) })).toMatchObject({ problem: { code: 'not-positive' } })
    expect(carrierToNoise(dbmv(0), { bandwidth: hz(0), noiseFigure: db(3) }).ok).toBe(false)
  })

  it('leaves a carrier where the wanted level puts it', () => {
    fc.assert(
      fc.property(fc.double({ min: 10, max: 70, noNaN: true }), (wanted) => {
        const level = value(levelFor(db(wanted), IN_4_MHZ))
        expect(value(carrierToNoise(level, IN_4_MHZ))).toBeCloseTo(wanted, 9)
      }),
    )
  })

  // -106.194 dBm + 7 + 15.19.
  it('drowns a digital carrier at -84 dBm', () => {
    const edge = value(digitalThreshold(db(15.19), { bandwidth: hz(6e6), noiseFigure: db(7) }))
    expect(edge.power).toBeCloseTo(-84, 1)
    expect(edge.level).toBeCloseTo(-35.25, 1)
  })
})

describe('a row of stages', () => {
  // F1 + (F2 - 1) / G1: 4 dB of cable in front adds its 4 dB.
  it('is as noisy as its amplifier and the cable before it', () => {
    const row = value(cascade([value(passiveStage(db(4))), stage(20, 5)]))
    expect(row.noiseFigure).toBeCloseTo(9, 9)
    expect(row.gain).toBe(16)
  })

  it('is quieter with the amplifier at the aerial', () => {
    const cable = value(passiveStage(db(4)))
    const [amplifier, set] = [stage(20, 5), stage(0, 10)]
    const first = value(cascade([amplifier, cable, set]))
    expect(first.noiseFigure).toBeCloseTo(5.319, 3)
    expect(first.noiseFigure).toBeLessThan(value(cascade([cable, amplifier, set])).noiseFigure)
  })

  it('may be put together in parts', () => {
    fc.assert(
      fc.property(stages, stages, (a, b) => {
        const whole = value(cascade([...a, ...b]))
        const parts = value(cascade([value(cascade(a)), value(cascade(b))]))
        expect(parts.noiseFigure).toBeCloseTo(whole.noiseFigure, 6)
        expect(parts.gain).toBeCloseTo(whole.gain, 6)
      }),
    )
  })

  it('is never quieter than its first stage', () => {
    fc.assert(
      fc.property(stages, (row) => {
        expect(value(cascade(row)).noiseFigure).toBeGreaterThanOrEqual(row[0]!.noiseFigure - 1e-9)
      }),
    )
  })

  it('of nothing passes everything', () => {
    expect(cascade([])).toEqual({ ok: true, value: stage(0, 0) })
  })

  it('takes noise out of nothing', () => {
    expect(cascade([stage(3, -1)])).toMatchObject({ problem: { code: 'negative' } })
    expect(passiveStage(db(-1))).toMatchObject({ problem: { code: 'negative' } })
  })
})

describe('ratios to noise', () => {
  it('of 50 and 50 dB come to 46.99', () => {
    expect(value(addCarrierToNoise([db(50), db(50)]))).toBeCloseTo(46.99, 2)
  })

  it('never come to more than the poorest', () => {
    const ratio = fc.double({ min: 0, max: 80, noNaN: true })
    fc.assert(
      fc.property(fc.array(ratio, { minLength: 1, maxLength: 6 }), (all) => {
        expect(value(addCarrierToNoise(all.map(db)))).toBeLessThanOrEqual(Math.min(...all) + 1e-9)
      }),
    )
  })

  it('come from something', () => {
    expect(addCarrierToNoise([])).toMatchObject({ problem: { code: 'too-few' } })
  })
})
