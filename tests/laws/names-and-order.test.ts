import type { Model } from '@coaxwain/models'
import type { Answer, Hookup, PieceUse, Snapshot, Unit } from '@coaxwain/shelf'
import { describe, expect, it } from 'vitest'
import { unitLikeness } from '../enumeration/likeness'
import type { Asked } from '../enumeration/shrink'
import { renamedDevice, renamedUnit, type Names } from '../support/rename'
import type { Chance } from '../support/chance'
import { ask, axesOf, holds, RUNS } from './asked'

const AN_HOUR = 3_600_000

// ---------------------------------------------------------------- renaming

/** New names of the same length, so that they sort otherwise; the old one is what follows the first letter. */
function nameGiver(chance: Chance): (name: string) => string {
  const given = new Map<string, string>()
  return (name) => {
    const known = given.get(name) ?? `${chance.pick([...'qwertyuiopasdfghjklzxcvbnm'])}${name}`
    given.set(name, known)
    return known
  }
}

const oldName = (name: string): string => name.slice(1)

function renamed({ snapshot, question }: Asked, chance: Chance): Asked {
  const give = nameGiver(chance)
  const names: Names = {
    ...{ group: give, port: give, jack: give, control: give, position: give, fn: give },
    label: give,
  }
  const renameModel = (model: Model): Model =>
    model.type === 'device'
      ? { ...renamedDevice(model, names), name: give(model.name), maker: give(model.maker) }
      : { ...model, name: give(model.name), maker: give(model.maker) }
  const renameUnit = (unit: Unit): Unit => ({
    ...renamedUnit(unit, names),
    uid: give(unit.uid),
    model: give(unit.model),
  })
  const { source, display, avoid, assumedLeads } = question
  return {
    snapshot: {
      ...snapshot,
      models: Object.fromEntries(
        Object.entries(snapshot.models).map(([uid, model]) => [give(uid), renameModel(model)]),
      ),
      units: snapshot.units.map(renameUnit),
    },
    question: {
      ...question,
      source: { unit: give(source.unit), playing: give(source.playing) },
      display: { unit: give(display.unit) },
      avoid: avoid.map(give),
      assumedLeads: assumedLeads.map(give),
    },
  }
}

// ---------------------------------------------------------------- what a hookup is, whatever its units are called

/** All of a model but what it is called, and how long a lead is. */
const madeOf = (model: Model | undefined): string =>
  JSON.stringify({ ...model, maker: '', name: '', aliases: [], lengthMm: 0 })

/** Units and pieces that are alike in everything are one and the same here. */
function contentOf(hookup: Hookup, snapshot: Snapshot, name: (key: string) => string): unknown {
  const alike = (uid: string): string => {
    const unit = snapshot.units.find((u) => u.uid === name(uid))!
    return unitLikeness({ ...unit, model: madeOf(snapshot.models[unit.model]) })
  }
  const end = ({ unit, port }: { unit: string; port: string }) => [alike(unit), name(port)]
  const maybe = (key: string | null): string | null => (key === null ? null : name(key))
  const laid: string[] = []
  const numberOf = ({ model, copy }: PieceUse): number => {
    const piece = `${model} ${copy}`
    if (!laid.includes(piece)) laid.push(piece)
    return laid.indexOf(piece)
  }
  return {
    axes: hookup.axes,
    picture: hookup.picture,
    sound: [hookup.sound.sound, hookup.sound.from === null ? null : alike(hookup.sound.from)],
    worksFully: hookup.worksFully,
    legs: hookup.legs.map((leg) => [
      leg.purpose,
      leg.links,
      leg.stops.map((s) => [alike(s.unit), name(s.function), maybe(s.in), maybe(s.out), s.picture]),
    ]),
    links: hookup.links.map((l) => [
      end(l.from),
      l.pieces.map((p) => ({
        ...p,
        model: madeOf(snapshot.models[name(p.model)]),
        copy: numberOf(p),
      })),
      end(l.to),
      l.circuits,
    ]),
    cautions: hookup.cautions.map((c) => c.code),
  }
}

const contents = (answer: Answer, snapshot: Snapshot, name = (key: string): string => key) =>
  answer.hookups.map((h) => contentOf(h, snapshot, name))

// ---------------------------------------------------------------- order

const shuffledShelf = ({ snapshot, question }: Asked, chance: Chance): Asked => ({
  question: {
    ...question,
    avoid: chance.shuffled(question.avoid),
    assumedLeads: chance.shuffled(question.assumedLeads),
  },
  snapshot: {
    ...snapshot,
    units: chance.shuffled(snapshot.units),
    models: Object.fromEntries(chance.shuffled(Object.entries(snapshot.models))),
  },
})

/** Within each model its sockets, controls and functions in another order. Rows keep theirs: the first wins. */
const shuffledModels = ({ snapshot, question }: Asked, chance: Chance): Asked => ({
  question,
  snapshot: {
    ...snapshot,
    models: Object.fromEntries(
      Object.entries(snapshot.models).map(([uid, model]) => [uid, shuffledModel(model, chance)]),
    ),
  },
})

const shuffledModel = (model: Model, chance: Chance): Model =>
  model.type === 'piece'
    ? model
    : {
        ...model,
        ports: chance.shuffled(model.ports),
        jacks: chance.shuffled(model.jacks),
        controls: chance.shuffled(model.controls),
        functions: chance.shuffled(model.functions),
      }

describe(`laws of names and order, ${RUNS} shelves each`, () => {
  it(
    'other names of models, units, sockets and switches change nothing but the names',
    () =>
      holds((drawn) => {
        const other = ask(renamed(drawn, drawn.chance))
        expect(contents(other, drawn.snapshot, oldName)).toEqual(
          contents(ask(drawn), drawn.snapshot),
        )
      }),
    AN_HOUR,
  )

  it(
    'another order of units and models changes nothing',
    () =>
      holds((drawn) => {
        const other = ask(shuffledShelf(drawn, drawn.chance))
        expect(contents(other, drawn.snapshot)).toEqual(contents(ask(drawn), drawn.snapshot))
      }),
    AN_HOUR,
  )

  it(
    'another order of sockets, switches and functions within a model leaves the axes as they are',
    () =>
      holds((drawn) => {
        expect(axesOf(ask(shuffledModels(drawn, drawn.chance)))).toEqual(axesOf(ask(drawn)))
      }),
    AN_HOUR,
  )
})
