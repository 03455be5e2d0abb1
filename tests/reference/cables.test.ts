import { foot, metre, metreToFoot, mhz } from '@coaxwain/quantities'
import { CABLES, tabledLoss, type CableId } from '@coaxwain/signal'
import { describe, expect, it } from 'vitest'
import { numbersIn, readTable, type CsvRow } from './csv'
import { got } from './inputs'

/** Published points, each with its source in the last columns but one. */
const points = readTable('coax-attenuation')
const fits = readTable('coax-fit')

/** dB by which a column of two decimals differs from the figure that it was made of. */
const ONE_ROUNDED = 0.0051
/** Where neither column is the original, the rounding of the other counts 3.28 times (metres to feet) as well. */
const BOTH_ROUNDED = ONE_ROUNDED * (1 + 3.28084)

const NAMES: Readonly<Record<string, CableId>> = {
  'RG-59 (series, foam dielectric)': 'RG-59',
  'RG-6 (series, foam dielectric)': 'RG-6',
  'RG-11 (series, foam dielectric)': 'RG-11',
  'RG-59 older (solid polyethylene)': 'RG-59 solid',
  'twin lead flat, 22 AWG, dry and clear of metal': 'twin lead 22 AWG',
  'twin lead flat, 20 AWG, dry and clear of metal': 'twin lead 20 AWG',
  'twin lead 22 AWG dry': 'twin lead 22 AWG',
}

const idOf = (row: CsvRow): CableId => {
  const cable = row['cable'] ?? ''
  const id = NAMES[cable] ?? (cable in CABLES ? (cable as CableId) : undefined)
  if (!id) throw new Error(`no cable ${cable}`)
  return id
}

describe.each(points.map((r) => [r['cable'] ?? '', Number(r['f_mhz']), r] as const))(
  '%s at %d MHz',
  (_cable, at, row) => {
    it('loses what the table says, by the foot and by the metre', () => {
      const id = idOf(row)
      expect(got(tabledLoss(id, mhz(at), foot(100)))).toBe(Number(row['db_per_100ft']))
      const perMetre = got(tabledLoss(id, mhz(at), metreToFoot(metre(100))))
      expect(Math.abs(perMetre - Number(row['db_per_100m']))).toBeLessThan(
        row['confidence'] === 'derived' ? BOTH_ROUNDED : ONE_ROUNDED,
      )
    })

    it('has the impedance and the speed of the table', () => {
      const { impedanceOhm, velocityFactor } = CABLES[idOf(row)]
      expect(impedanceOhm).toBe(Number(row['z0_ohm']))
      expect(velocityFactor).toBe(Number(row['velocity_factor']))
    })
  },
)

it('no point stands in the facts that is not in the table', () => {
  const ours = Object.values(CABLES).reduce((sum, c) => sum + c.points.length, 0)
  expect(ours).toBe(points.length)
})

it.each(fits.map((r) => [r['cable'] ?? '', r] as const))('%s is fitted as published', (_, row) => {
  const { fit } = CABLES[idOf(row)]
  expect(fit?.a).toBe(Number(row['a_db_per_100ft_per_sqrt_mhz']))
  expect(fit?.b).toBe(Number(row['b_db_per_100ft_per_mhz']))
  expect([...(fit?.mhz ?? [])]).toEqual(numbersIn((row['valid_mhz'] ?? '').replace('-', ' ')))
})
