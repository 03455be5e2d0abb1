import { checkArrangement } from '@coaxwain/checker'
import { DEMO, snapshotOf, type DemoKey } from '@coaxwain/demo'
import { compileShelf, createArrangementSearch } from '@coaxwain/matcher'
import {
  questionsOfUses,
  type Arrangement,
  type ArrangementQuestion,
  type Snapshot,
} from '@coaxwain/shelf'
import { describe, expect, it } from 'vitest'
import { Chance } from '../support/chance'

/** Arrangements are sought for so many questions of each sort in each collection. */
const QUESTIONS = 4
/** Little is enough to find the first; whether it is the best is not asked here. */
const BUDGET = 300
const SEED = 11

interface Found {
  readonly snapshot: Snapshot
  readonly question: ArrangementQuestion
  readonly arrangements: readonly Arrangement[]
}

function* drawn(snapshot: Snapshot, chance: Chance, sort: 'sources' | 'displays') {
  const devices = snapshot.units.flatMap((unit) => {
    const model = snapshot.models[unit.model]
    return model?.type === 'device' && unit.working === 'works' ? [{ unit, model }] : []
  })
  const sources = devices.flatMap(({ unit, model }) =>
    model.functions
      .filter((f) => f.kind === 'plays')
      .slice(0, 1)
      .map((f) => ({
        unit: unit.uid,
        playing: f.key,
        material: { protection: 'none' as const },
      })),
  )
  const displays = devices.filter((d) => d.model.display).map((d) => ({ unit: d.unit.uid }))
  for (;;) {
    const [a, b] = chance.shuffled(sources)
    const [c, d] = chance.shuffled(displays)
    yield {
      format: 1,
      sources: sort === 'sources' ? [a!, b!] : [a!],
      displays: sort === 'displays' ? [c!, d!] : [c!],
      demands: {},
      avoid: [],
      offAir: [],
      assumedLeads: [],
    } satisfies ArrangementQuestion
  }
}

function findIn(key: DemoKey, sort: 'sources' | 'displays'): Found[] {
  const snapshot = snapshotOf(DEMO, key)
  const shelf = compileShelf(snapshot)
  const found: Found[] = []
  let asked = 0
  for (const question of drawn(snapshot, new Chance(SEED), sort)) {
    const search = createArrangementSearch(shelf, question, BUDGET)
    while (!search.done) search.step(100)
    const { arrangements } = search.best()
    if (arrangements.length > 0) found.push({ snapshot, question, arrangements })
    if (found.length >= QUESTIONS || ++asked >= 10 * QUESTIONS) return found
  }
  return found
}

const check = ({ snapshot, question }: Found, arrangement: Arrangement) =>
  checkArrangement(
    snapshot,
    questionsOfUses(question),
    arrangement,
    question.displays.length > 1,
  ).findings.map((f) => f.code)

describe.each(['sources', 'displays'] as const)('what serves two %s', (sort) => {
  const found = DEMO.collections.flatMap(({ key }) => findIn(key, sort))

  it('is found on the shelves of the demonstration', () => {
    expect(found.length).toBeGreaterThanOrEqual(2 * QUESTIONS)
  })

  it('passes the check, every use with all that is plugged', () => {
    for (const one of found)
      for (const arrangement of one.arrangements) expect(check(one, arrangement)).toEqual([])
  })

  it('is refused when a link of a use is not plugged', () => {
    for (const one of found) {
      const [arrangement] = one.arrangements
      const [first] = arrangement!.uses[0]!.hookup.links
      const links = arrangement!.links.filter((l) => JSON.stringify(l) !== JSON.stringify(first))
      expect(check(one, { ...arrangement!, links })).toContain('links-left-out')
    }
  })

  it('is refused when a lead of one use comes out of a socket of the other', () => {
    for (const one of found) {
      const [arrangement] = one.arrangements
      const [a, b] = arrangement!.uses.map((u) => u.hookup.links[0]!)
      if (JSON.stringify(a) === JSON.stringify(b)) continue
      const moved = { ...b!, to: a!.to }
      const swap = (l: typeof moved) => (JSON.stringify(l) === JSON.stringify(b) ? moved : l)
      const uses = arrangement!.uses.map((u) => ({
        ...u,
        hookup: { ...u.hookup, links: u.hookup.links.map(swap) },
      }))
      const codes = check(one, { ...arrangement!, uses, links: arrangement!.links.map(swap) })
      expect(codes).not.toEqual([])
    }
  })
})
