import { DEMO } from '@coaxwain/demo'
import type { DeviceModel, Model } from '@coaxwain/models'
import type { Answer, Snapshot, Unit } from '@coaxwain/shelf'
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { ask, axesOf, holds, RUNS, unmatched, type Drawn } from './asked'

const AN_HOUR = 3_600_000

const DEMO_MODELS = Object.entries(DEMO.models)

const withUnits = (snapshot: Snapshot, units: readonly Unit[]): Snapshot => ({ ...snapshot, units })

/** One more unit of a model of the demo, with everything in order. */
function withOneMore({ snapshot, chance }: Drawn): Snapshot {
  const [uid, model] = chance.pick(DEMO_MODELS)
  const units = [...snapshot.units, working('one-more', uid, model)]
  return {
    ...snapshot,
    models: { ...snapshot.models, [uid]: snapshot.models[uid] ?? model },
    units,
  }
}

function working(uid: string, modelUid: string, model: Model): Unit {
  const isDevice = model.type === 'device'
  return {
    ...{ uid, model: modelUid, quantity: 1, working: 'works', holding: 'kept', place: null },
    ...{ modifications: [], stands: {}, remotePresent: true },
    forms: isDevice
      ? model.jacks.flatMap((j) =>
          j.contacts.map(({ port }) => ({ jack: j.key, port, state: 'works' as const })),
        )
      : [],
    functions: isDevice
      ? model.functions.map((f) => ({ function: f.key, state: 'works' as const }))
      : [],
  }
}

/** Everything on one port of a unit is found dead. */
const killed = (snapshot: Snapshot, uid: string, port: string): Snapshot =>
  withUnits(
    snapshot,
    snapshot.units.map((unit) => {
      const model = snapshot.models[unit.model]
      if (unit.uid !== uid || model?.type !== 'device') return unit
      const others = unit.forms.filter((f) => f.port !== port)
      return { ...unit, forms: [...others, ...deadOn(model, port)] }
    }),
  )

const deadOn = (model: DeviceModel, port: string) =>
  model.jacks
    .filter((j) => j.contacts.some((c) => c.port === port))
    .map((j) => ({ jack: j.key, port, state: 'dead' as const }))

const devicesIn = ({ models, units }: Snapshot) =>
  units.flatMap((unit) => {
    const model = models[unit.model]
    return model?.type === 'device' ? [{ unit, model }] : []
  })

/** All that an answer plugs or passes. */
function usedBy({ hookups }: Answer): ReadonlySet<string> {
  const units = hookups.flatMap((h) => h.legs.flatMap((l) => l.stops.map((s) => s.unit)))
  const pieces = hookups.flatMap((h) => [...h.links.flatMap((l) => l.pieces), ...(h.ends ?? [])])
  return new Set([...units, ...pieces.map((p) => p.model)])
}

describe(`laws of more and less, ${RUNS} shelves each`, () => {
  it(
    'a working unit more makes nothing worse',
    () =>
      holds((drawn) => {
        const before = ask(drawn)
        const after = ask({ ...drawn, snapshot: withOneMore(drawn) })
        expect(unmatched(before.hookups, after)).toEqual([])
      }),
    AN_HOUR,
  )

  it(
    'a dead port makes nothing better',
    () =>
      holds((drawn) => {
        const { unit, model } = drawn.chance.pick(devicesIn(drawn.snapshot))
        const port = drawn.chance.pickIfAny(model.ports)
        fc.pre(port !== undefined)
        const after = ask({ ...drawn, snapshot: killed(drawn.snapshot, unit.uid, port!.key) })
        expect(unmatched(after.hookups, ask(drawn))).toEqual([])
      }),
    AN_HOUR,
  )

  it(
    'a port that is found dead is in no hookup any more',
    () =>
      holds((drawn) => {
        const used = ask(drawn).hookups.flatMap((h) => h.links.flatMap((l) => [l.from, l.to]))
        const end = drawn.chance.pickIfAny(used)
        fc.pre(end !== undefined)
        const after = ask({ ...drawn, snapshot: killed(drawn.snapshot, end!.unit, end!.port) })
        const ends = after.hookups.flatMap((h) => h.links.flatMap((l) => [l.from, l.to]))
        expect(ends).not.toContainEqual(end)
      }),
    AN_HOUR,
  )

  it(
    'a unit that no hookup uses is not missed',
    () =>
      holds((drawn) => {
        const { snapshot, question } = drawn
        const before = ask(drawn)
        const used = usedBy(before)
        const ends = [question.source.unit, question.display.unit]
        const idle = snapshot.units.filter(
          (u) => !ends.includes(u.uid) && !used.has(u.uid) && !used.has(u.model),
        )
        fc.pre(idle.length > 0 && before.moreCount === 0)
        const lost = drawn.chance.pick(idle)
        const left = snapshot.units.filter((u) => u !== lost)
        const after = ask({ question, snapshot: withUnits(snapshot, left) })
        expect(axesOf(after)).toEqual(axesOf(before))
      }),
    AN_HOUR,
  )
})
