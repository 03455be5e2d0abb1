import { describe, expect, it } from 'vitest'
import { Chance } from '../support/chance'
import { isLong, tell } from '../support/long'
import { compare, isEqual, reportOn } from './compare'
import { drawShelf } from './shelves/recipes'
import { QUOTAS, traitsOf, type Trait } from './traits'

const SHELVES = isLong ? 2000 : 500
const SEED = 1

/** Far apart, so that no shelf of one seed is one of the next. */
const chanceOf = (shelf: number): Chance => new Chance(SEED * 1_000_000 + shelf)

const MOST_REPORTED = 1
const AN_HOUR = 3_600_000

const share = (count: number): string => `${((100 * count) / SHELVES).toFixed(1)} %`

describe(`${SHELVES} small shelves drawn from seed ${SEED}`, () => {
  const counts = new Map<Trait, number>()
  const reports: string[] = []
  let unequal = 0

  it(
    'have the same axes by the search and by trying everything, and pass the check',
    () => {
      for (let shelf = 0; shelf < SHELVES; shelf++) {
        const drawn = drawShelf(chanceOf(shelf))
        const compared = compare(drawn)
        for (const trait of traitsOf(drawn, compared.enumerated)) {
          counts.set(trait, (counts.get(trait) ?? 0) + 1)
        }
        if (isEqual(compared)) continue
        unequal++
        if (reports.length < MOST_REPORTED)
          reports.push(`shelf ${shelf}, ${drawn.recipe}:\n${reportOn(drawn)}`)
      }
      expect(reports.join('\n\n'), `${unequal} of ${SHELVES} shelves differ`).toBe('')
    },
    AN_HOUR,
  )

  it('are mixed: every quota is met', () => {
    const traits = Object.keys(QUOTAS) as Trait[]
    const told = traits.map((trait) => `${trait} ${share(counts.get(trait) ?? 0)}`)
    tell(`${SHELVES} small shelves from seed ${SEED}: ${told.join(', ')}`)
    const missed = traits.filter((trait) => (counts.get(trait) ?? 0) < QUOTAS[trait] * SHELVES)
    expect(missed, told.join(', ')).toEqual([])
  })
})
