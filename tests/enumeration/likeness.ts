import type { Condition, Give, Key } from '@coaxwain/models'
import { formState, functionState, type Unit } from '@coaxwain/shelf'
import { jackIn, portIn, type Bench, type Box } from './bench'
import { holdsIn, standsOf, type Doing, type Positions } from './stands'

/** Of things that cannot be told apart, the first. */
export function oneOfEach<T>(things: readonly T[], nameOf: (thing: T) => string): T[] {
  const kept = new Map<string, T>()
  for (const thing of things) {
    const name = nameOf(thing)
    if (!kept.has(name)) kept.set(name, thing)
  }
  return [...kept.values()]
}

/** Units of one model in the same state have one name. */
export const unitLikeness = ({ model, working, forms, functions, ...unit }: Unit): string =>
  JSON.stringify([
    model,
    working,
    forms,
    functions,
    unit.modifications,
    unit.stands,
    unit.remotePresent,
  ])

/** Of units that are alike and not in use yet, only the first is tried. */
export function freeBoxes(bench: Bench, used: readonly Box[]): Box[] {
  return oneOfEach(
    bench.boxes.filter((box) => !used.includes(box)),
    (box) => unitLikeness(box.unit),
  )
}

/**
 * What a unit does at a stop, without the names of sockets, switches and positions: two ways through a unit
 * with the same likeness differ in nothing but which of several like sockets they use. Where sockets are
 * shared between forms, or a switch moves by itself or is out of reach, the names are kept.
 */
export function likenessOf(doing: Doing): string {
  const { box, fn, in: input, give } = doing
  const { unit } = box
  if (!isPlain(doing)) return JSON.stringify([fn.key, input, give?.jack])
  const stands = standsOf(doing)
  const bits = (condition: Condition | undefined): string =>
    stands.map((s) => (holdsIn(condition, s) ? '1' : '0')).join('')
  const given = (g: Give): string =>
    JSON.stringify([
      jackLikeness(box, g.jack, stands),
      bits(g.while),
      g.sound,
      g.volts,
      g.picture?.map((row) => ({ ...row, while: bits(row.while) })),
      g.rf?.map((row) => ({ ...row, while: bits(row.while) })),
    ])
  return JSON.stringify(
    [
      {
        ...fn,
        key: '',
        label: '',
        while: bits(fn.while),
        needs: fn.needs.length,
        oneOf: fn.oneOf?.length,
      },
      functionState(unit, fn.key),
      fn.accepts.map((row) => ({
        ...row,
        jacks: row.jacks?.includes(input ?? ''),
        while: bits(row.while),
      })),
      input === null ? null : jackLikeness(box, input, stands),
      (fn.optional ?? []).map((o) => [jackLikeness(box, o.jack, stands), bits(o.while)]),
      give && given(give),
      fn.gives
        .filter((g) => g !== give)
        .map(given)
        .sort(),
    ],
    (key, value: unknown) => (OWN_LISTS.has(key) && Array.isArray(value) ? null : value),
  )
}

/** Lists of a function that are written out by themselves. */
const OWN_LISTS = new Set(['accepts', 'gives', 'optional'])

/** Sound outputs of a stop that cannot be told apart are one. */
export const soundLikeness = (doing: Doing, give: Give): string => {
  if (!isPlain(doing)) return give.jack
  const stands = standsOf(doing)
  const bits = stands.map((s) => (holdsIn(give.while, s) ? '1' : '0')).join('')
  return JSON.stringify([jackLikeness(doing.box, give.jack, stands), give.sound, bits])
}

function jackLikeness(box: Box, key: Key, stands: readonly Positions[]): unknown {
  const jack = jackIn(box, key)
  return [
    jack.form,
    jack.contacts.map(({ circuit, port: at }) => {
      const port = portIn(box, at)
      const { load } = port
      const ended =
        load?.kind === 'switch'
          ? stands.map((s) => s.get(load.control) === load.position75)
          : load?.kind
      const facts = { ...port, key: '', label: '', at: null, note: '', group: '', loopsTo: '' }
      const place = jack.contacts.findIndex((c) => c.port === at)
      return [circuit, place, { ...facts, load: ended, ring: '' }, formState(box.unit, key, at)]
    }),
  ]
}

/** Every socket belongs to one form, and every switch can be put where it is wanted. */
function isPlain({ box, fn, in: input, give }: Doing): boolean {
  const { device, unit } = box
  const keys = [
    input,
    give?.jack,
    ...fn.gives.map((g) => g.jack),
    ...(fn.optional ?? []).map((o) => o.jack),
  ]
  const ports = keys.flatMap((key) =>
    key === null || key === undefined ? [] : jackIn(box, key).contacts.map((c) => c.port),
  )
  const isShared = (port: Key): boolean =>
    device.jacks.filter((j) => j.contacts.some((c) => c.port === port)).length > 1
  const isStuck = device.remote === 'needed' && !unit.remotePresent
  return !isStuck && !device.controls.some((c) => c.kind === 'auto') && !ports.some(isShared)
}
