import { checkProofs } from '@coaxwain/checker'
import { compileTried, createProveSearch, findHookups } from '@coaxwain/matcher'
import type { DeviceModel } from '@coaxwain/models'
import { fitted, nameOf, thingOf } from '@coaxwain/shelf'
import type {
  Hookup,
  Proof,
  ProveAnswer,
  ProveQuestion,
  Question,
  Signal,
  Snapshot,
  Unit,
} from '@coaxwain/shelf'
import { describe, expect, it } from 'vitest'
import { holds, type Drawn } from './asked'

const AN_HOUR = 3_600_000

const isDevice = (snapshot: Snapshot, unit: Unit): boolean =>
  snapshot.models[unit.model]?.type === 'device'

/** One device of the shelf that nobody has tried, and leads and most other devices that are known to work. */
function benchOf({ snapshot, chance }: Drawn): { snapshot: Snapshot; unit: Unit } {
  const drawn = chance.pick(snapshot.units.filter((u) => isDevice(snapshot, u)))
  const unit: Unit = { ...drawn, working: 'untested', forms: [], functions: [] }
  const units = snapshot.units.map((u): Unit => {
    if (u.uid === unit.uid) return unit
    return isDevice(snapshot, u) && chance.isHit(1 / 4) ? u : known(snapshot, u)
  })
  return { snapshot: { ...snapshot, units }, unit }
}

/** The same, with everything in order. */
function known(snapshot: Snapshot, unit: Unit): Unit {
  const device = deviceOf(snapshot, unit)
  const works = { state: 'works' as const }
  return {
    ...unit,
    working: 'works',
    forms: (device?.jacks ?? []).flatMap((j) =>
      j.contacts.map(({ port }) => ({ jack: j.key, port, ...works })),
    ),
    functions: (device?.functions ?? []).map((f) => ({ function: f.key, ...works })),
  }
}

function prove(snapshot: Snapshot, question: ProveQuestion): ProveAnswer {
  const search = createProveSearch(compileTried(snapshot), question)
  while (!search.done) search.step(100)
  return search.best()
}

const about = (unit: Unit, signal?: Signal): ProveQuestion => ({
  format: 1,
  unit: unit.uid,
  signal,
  avoid: [],
})

describe('chains that try a unit', () => {
  it(
    'pass the check, try each thing once, and are refused where more in them is untried',
    () => {
      let tried = 0
      holds((drawn) => {
        const { snapshot, unit } = benchOf(drawn)
        const { proofs, left } = prove(snapshot, about(unit))
        expect(codesOf(snapshot, about(unit), proofs)).toEqual([])
        const names = proofs.flatMap((p) => [...p.seen, ...p.heard]).map(nameOf)
        expect(new Set(names).size).toBe(names.length)
        expect(left.map((l) => nameOf(l.signal)).filter((n) => names.includes(n))).toEqual([])
        tried += names.length
        const [proof] = proofs
        const other = proof?.hookup.legs[0]?.stops.find((s) => s.unit !== unit.uid)
        if (!proof || !other) return
        const forget = (u: Unit): Unit =>
          u.uid === other.unit ? { ...u, working: 'works', functions: [] } : u
        const forgetful = { ...snapshot, units: snapshot.units.map(forget) }
        const nothing = { ...proof, seen: [], heard: [] }
        expect(codesOf(forgetful, about(unit), [proof])).toContain('untried-beside')
        expect(codesOf(snapshot, about(unit), [nothing])).toContain('untried-beside')
        expect(codesOf(snapshot, about(unit), [proof, proof])).toContain('not-on-trial')
      })
      expect(tried).toBeGreaterThan(50)
    },
    AN_HOUR,
  )

  it(
    'are no longer than a hookup that leans on the same',
    () => {
      let compared = 0
      holds((drawn) => {
        const { snapshot, unit } = benchOf(drawn)
        const known = everyHookup(snapshot, unit)
        for (const signal of picturesOf(snapshot, unit)) {
          const [proof] = prove(snapshot, about(unit, signal)).proofs
          const rivals = known.filter((h) => h.picture.colour && leansOn(h, unit, signal))
          expect(proof ?? rivals[0]).toBe(proof)
          if (!proof) continue
          compared += rivals.length
          for (const rival of rivals.filter((r) => thingsIn(r, unit) <= thingsOf(proof)))
            expect(rankOf(rival) >= rankOf(proof.hookup)).toBe(true)
        }
      })
      expect(compared).toBeGreaterThan(15)
    },
    AN_HOUR,
  )
})

const codesOf = (snapshot: Snapshot, question: ProveQuestion, proofs: readonly Proof[]): string[] =>
  checkProofs(snapshot, question, proofs).findings.flatMap((f) => f.map((x) => x.code))

// ---------------------------------------------------------------- hookups found otherwise

const deviceOf = ({ models }: Snapshot, { model, modifications }: Unit): DeviceModel | null => {
  const found = models[model]
  return found?.type === 'device' ? fitted(found, modifications) : null
}

/** What the search for one answer finds between any two ends on a shelf that lends only what is known to work. */
function everyHookup(snapshot: Snapshot, unit: Unit): Hookup[] {
  const units = snapshot.units.map((u): Unit => {
    const stays = u.uid === unit.uid || !isDevice(snapshot, u) || u.working === 'parts-only'
    return stays ? u : { ...u, working: 'faulty' }
  })
  const known = { ...snapshot, units }
  const lent = units.filter(
    (u) => u.working !== 'parts-only' && u.holding !== 'sold' && u.holding !== 'gone',
  )
  const ends = lent.flatMap(
    (u) => deviceOf(snapshot, u)?.functions.map((fn) => ({ uid: u.uid, fn })) ?? [],
  )
  const sources = ends.filter(({ fn }) => fn.kind === 'plays')
  const displays = new Set(ends.filter(({ fn }) => fn.kind === 'shows').map((e) => e.uid))
  return sources.flatMap(({ uid, fn }) =>
    [...displays]
      .filter((display) => display !== uid)
      .flatMap((display) => findHookups(known, asked(uid, fn.key, display)).hookups),
  )
}

const asked = (unit: string, playing: string, display: string): Question => ({
  format: 1,
  source: { unit, playing },
  material: { protection: 'none' },
  display: { unit: display },
  demands: {},
  avoid: [],
  offAir: [],
  assumedLeads: [],
})

/** Forms of pictures and the functions that take or give them; sound rides beside or stays away. */
function picturesOf(snapshot: Snapshot, unit: Unit): Signal[] {
  const device = deviceOf(snapshot, unit)
  const jacks = device?.jacks.filter((j) => j.form !== 'sound') ?? []
  return jacks.flatMap((j) => j.contacts.slice(0, 1).map(({ port }) => ({ jack: j.key, port })))
}

const picturesIn = ({ legs }: Hookup, { uid }: Unit) =>
  legs.filter((l) => l.purpose === 'picture').flatMap((l) => l.stops.filter((s) => s.unit === uid))

const leansOn = (hookup: Hookup, unit: Unit, signal: Signal): boolean =>
  picturesIn(hookup, unit).some((s) => 'jack' in signal && [s.in, s.out].includes(signal.jack))

const thingsIn = (hookup: Hookup, unit: Unit): number =>
  new Set(
    picturesIn(hookup, unit)
      .flatMap((s) => [s.in, s.out, s.function])
      .filter(Boolean),
  ).size

const thingsOf = ({ seen }: Proof): number => new Set(seen.map(thingOf)).size

const rankOf = ({ axes }: Hookup): number => (axes.doubt * 100 + axes.boxes) * 100 + axes.pieces
