import type { DeviceModel } from '@coaxwain/models'
import { portBadges, unitBadge, type Unit } from '@coaxwain/shelf'
import { findChannel } from '@coaxwain/signal'
import { describe, expect, it } from 'vitest'
import {
  DEMO,
  DEMO_ROLES,
  demoUid,
  placePath,
  SITE_ROLES,
  snapshotOf,
  type DemoUnit,
} from './index'

const everyUnit = DEMO.collections.flatMap((c) => c.units)
const isPiece = (u: Unit): boolean => DEMO.models[u.model]?.type === 'piece'
const devicesOf = (units: readonly DemoUnit[]) => units.filter((u) => !isPiece(u))

/** The model of a unit with everything that was added to this one. */
function deviceOf(unit: Unit): DeviceModel {
  const model = DEMO.models[unit.model]
  if (model?.type !== 'device') throw new Error(`${unit.uid} is not a device`)
  const added = unit.modifications.filter((m) => m.kind === 'added')
  return {
    ...model,
    ports: [...model.ports, ...added.flatMap((m) => m.ports)],
    jacks: [...model.jacks, ...added.flatMap((m) => m.jacks)],
    functions: [...model.functions, ...added.flatMap((m) => m.functions)],
  }
}

const badgeOf = (number: number) => {
  const unit = DEMO.collections[0]?.units.find((u) => u.number === number)
  if (!unit) throw new Error(`no unit ${number}`)
  return unitBadge(portBadges(unit, deviceOf(unit)))
}

describe('ids', () => {
  const uids = [
    ...Object.keys(DEMO.models),
    ...DEMO.people.map((p) => p.uid),
    ...DEMO.collections.flatMap((c) => [
      c.uid,
      ...c.places.map((p) => p.uid),
      ...c.units.map((u) => u.uid),
    ]),
  ]

  it('are 22 base64url characters, and no two are the same', () => {
    expect(uids.filter((uid) => !/^[A-Za-z0-9_-]{21}[AQgw]$/.test(uid))).toEqual([])
    expect(new Set(uids).size).toBe(uids.length)
  })

  it('are made from names', () => {
    expect(everyUnit.map((u) => u.uid)).toContain(demoUid('u-a-142'))
  })
})

describe('collections', () => {
  it('are three, with about 65, 25 and 95 devices and a leads drawer each', () => {
    const [alder, marram, sallow] = DEMO.collections.map((c) => devicesOf(c.units).length)
    expect(DEMO.collections).toHaveLength(3)
    expect(alder).toBeGreaterThanOrEqual(60)
    expect(alder).toBeLessThanOrEqual(70)
    expect(marram).toBeGreaterThanOrEqual(22)
    expect(marram).toBeLessThanOrEqual(28)
    expect(sallow).toBeGreaterThanOrEqual(90)
    expect(sallow).toBeLessThanOrEqual(100)
    for (const c of DEMO.collections) {
      expect(c.units.filter(isPiece).length).toBeGreaterThanOrEqual(15)
    }
  })

  it('hold 180 units and more without counting leads', () => {
    expect(devicesOf(everyUnit).length).toBeGreaterThanOrEqual(180)
  })

  it('use every model of the catalogue', () => {
    const used = new Set(everyUnit.map((u) => u.model))
    expect(Object.keys(DEMO.models).filter((uid) => !used.has(uid))).toEqual([])
  })

  it.each(DEMO.collections)('number their units once each: $name', (collection) => {
    const numbers = collection.units.map((u) => u.number)
    expect(new Set(numbers).size).toBe(numbers.length)
    expect(numbers.every((n) => Number.isInteger(n) && n > 0)).toBe(true)
  })

  it.each(DEMO.collections)('stand every unit in one of their places: $name', (collection) => {
    const keys = collection.places.map((p) => p.key)
    expect(new Set(keys).size).toBe(keys.length)
    collection.places.forEach((place, i) => {
      if (place.parent !== null) expect(keys.slice(0, i)).toContain(place.parent)
    })
    for (const unit of collection.units) {
      if (unit.holding === 'sold') expect(unit.place).toBeNull()
      else expect(keys).toContain(unit.place)
    }
  })

  it.each(DEMO.collections)('name stations by channels that exist: $name', (collection) => {
    expect(collection.offAir.length).toBeGreaterThan(0)
    for (const station of collection.offAir) {
      expect(findChannel(station.plan, station.channel)).not.toBeNull()
    }
  })

  it('have a place inside a place', () => {
    const [alder] = DEMO.collections
    expect(alder && placePath(alder, 'loft-3')).toEqual(['Loft', 'crate 3'])
    const sallow = DEMO.collections[2]
    expect(sallow && placePath(sallow, 'rack-1')).toEqual(['Workshop', 'rack', 'shelf 1'])
  })
})

describe('people', () => {
  const keys = DEMO.people.map((p) => p.key)

  it('fill every role of a collection and of the site', () => {
    const [alder] = DEMO.collections
    expect(alder?.members.map((m) => m.role)).toEqual(DEMO_ROLES)
    expect(DEMO.people.flatMap((p) => p.site ?? [])).toEqual(SITE_ROLES)
  })

  it('own each collection once, and are members once', () => {
    for (const { members } of DEMO.collections) {
      expect(members.filter((m) => m.role === 'owner')).toHaveLength(1)
      expect(new Set(members.map((m) => m.person)).size).toBe(members.length)
      expect(members.filter((m) => !keys.includes(m.person))).toEqual([])
    }
  })

  it('have addresses under names that are kept for examples', () => {
    const addresses = DEMO.people.map((p) => p.email)
    expect(addresses.filter((a) => !/^[a-z.-]+@example\.(org|com)$/.test(a))).toEqual([])
    expect(new Set(addresses).size).toBe(addresses.length)
  })

  it('leave the site roles without a right in a collection', () => {
    const site = DEMO.people.filter((p) => p.site !== null).map((p) => p.key)
    const members = DEMO.collections.flatMap((c) => c.members.map((m) => m.person))
    expect(members.filter((p) => site.includes(p))).toEqual([])
  })
})

describe.each(devicesOf(everyUnit).map((u) => [u.uid, u] as const))('unit %s', (_uid, unit) => {
  const model = deviceOf(unit)

  it('states only forms on ports, and functions, that it has, each once', () => {
    const contacts = model.jacks.flatMap((j) => j.contacts.map((c) => `${j.key}/${c.port}`))
    const forms = unit.forms.map((f) => `${f.jack}/${f.port}`)
    expect(forms.filter((f) => !contacts.includes(f))).toEqual([])
    expect(new Set(forms).size).toBe(forms.length)
    const functions = unit.functions.map((f) => f.function)
    const known = model.functions.map((f) => f.key)
    expect(functions.filter((f) => !known.includes(f))).toEqual([])
    expect(new Set(functions).size).toBe(functions.length)
  })

  it('says how, when and by whom it was tried, after it came', () => {
    for (const state of [...unit.forms, ...unit.functions]) {
      expect(state.on).toMatch(/^2026-(0[1-9]|1[0-2])-([0-2][0-9]|3[01])$/)
      expect(state.how?.length ?? 0).toBeGreaterThan(0)
      expect(DEMO.people.map((p) => p.key)).toContain(state.by)
      expect((state.on ?? '') >= unit.addedOn, `${state.on} before ${unit.addedOn}`).toBe(true)
    }
  })

  it('notes positions that its controls have', () => {
    for (const [key, position] of Object.entries(unit.stands)) {
      const control = model.controls.find((c) => c.key === key)
      if (control?.kind !== 'positions') throw new Error(`${key} has no positions`)
      expect(control.positions.map((p) => p.key)).toContain(position)
    }
  })

  it('is one thing', () => {
    expect(unit.quantity).toBe(1)
  })
})

describe('states', () => {
  const states = everyUnit.flatMap((u) => [...u.forms, ...u.functions].map((s) => s.state))

  it('cover works, intermittent and dead, and leave much untested', () => {
    for (const state of ['works', 'intermittent', 'dead'] as const) {
      expect(states.filter((s) => s === state).length, state).toBeGreaterThanOrEqual(6)
    }
    const untried = devicesOf(everyUnit).filter((u) => u.forms.length === 0)
    expect(untried.length).toBeGreaterThanOrEqual(10)
  })

  it('cover every working state and every holding state', () => {
    expect(new Set(everyUnit.map((u) => u.working))).toEqual(
      new Set(['works', 'untested', 'faulty', 'parts-only']),
    )
    expect(new Set(everyUnit.map((u) => u.holding))).toEqual(
      new Set(['kept', 'spare', 'listed', 'held', 'sold', 'gone']),
    )
  })

  it('count as the shelf page shows them', () => {
    expect(badgeOf(142)).toEqual({ state: 'intermittent', inThatState: 1, tried: 7, of: 9 })
    expect(badgeOf(121)).toEqual({ state: 'dead', inThatState: 1, tried: 6, of: 8 })
    expect(badgeOf(137)).toEqual({ state: 'works', inThatState: 4, tried: 4, of: 5 })
    expect(badgeOf(101)).toEqual({ state: 'works', inThatState: 1, tried: 1, of: 2 })
    expect(badgeOf(128)).toMatchObject({ state: 'untested', tried: 0 })
  })
})

describe('leads', () => {
  it('stand in the drawer with a quantity, and nothing else has one', () => {
    for (const collection of DEMO.collections) {
      const leads = collection.units.filter(isPiece)
      expect(leads.every((u) => u.place === 'drawer' && u.quantity >= 1)).toBe(true)
      expect(leads.some((u) => u.quantity > 1)).toBe(true)
    }
  })
})

describe('snapshotOf', () => {
  it('gives a collection with the names of its places', () => {
    const { units } = snapshotOf(DEMO, 'alder-lane')
    expect(units.find((u) => u.uid === demoUid('u-a-137'))?.place).toBe('Loft, crate 3')
    expect(units.find((u) => u.uid === demoUid('u-a-126'))?.place).toBeNull()
  })

  it('keeps to the fields of a unit', () => {
    const [unit] = snapshotOf(DEMO, 'marram-row').units
    expect(unit).not.toHaveProperty('number')
    expect(unit).not.toHaveProperty('note')
  })

  it('refuses a collection that is not there', () => {
    expect(() => snapshotOf(DEMO, 'nowhere')).toThrow('nowhere')
  })
})
