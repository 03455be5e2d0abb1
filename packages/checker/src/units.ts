import { LIMITS, mayLend, type Question, type Stop } from '@coaxwain/shelf'
import { unitsIn, type Bench } from './bench'
import { finding, type Finding } from './finding'

/** The units and legs of a hookup: what may be used, how often and how far, without harm. */
export const checkUnits = (bench: Bench): Finding[] => [
  ...checkLending(bench),
  ...checkLegs(bench),
  ...checkHarm(bench),
]

function checkLending({ question, hookup, view }: Bench): Finding[] {
  const ends = [question.source.unit, question.display.unit]
  return unitsIn(hookup).flatMap((uid): Finding[] => {
    const unit = view.unit(uid)
    if (!unit || !view.device(uid)) return [finding('unit-unknown', { unit: uid })]
    if (ends.includes(uid)) return []
    if (question.avoid.includes(uid)) return [finding('unit-avoided', { unit: uid })]
    return mayLend(unit) ? [] : [finding('unit-not-lent', { unit: uid })]
  })
}

/** A leg passes no unit twice and not too many; every link belongs to a leg and joins units of legs. */
function checkLegs({ hookup, question }: Bench): Finding[] {
  const used = new Set(hookup.legs.flatMap((l) => l.links))
  const strange = [...used].some((i) => hookup.links[i] === undefined)
  const units = new Set(unitsIn(hookup))
  const outside = hookup.links.some((l) => !units.has(l.from.unit) || !units.has(l.to.unit))
  const loose = hookup.links.some((_, i) => !used.has(i))
  return [
    ...hookup.legs.flatMap(({ purpose, stops }) => [
      ...(new Set(stops.map((s) => s.unit)).size < stops.length - timesMore(stops, question)
        ? [finding('unit-twice', { leg: purpose })]
        : []),
      ...(stops.length - 2 > LIMITS.boxesInLeg
        ? [finding('too-many-boxes', { leg: purpose })]
        : []),
    ]),
    ...(strange || outside || loose ? [finding('legs-and-links-differ')] : []),
  ]
}

/** Rule 0: a socket that is joined to a live chassis harms whoever touches what is plugged in. */
function checkHarm({ hookup, view }: Bench): Finding[] {
  const ends = hookup.links.flatMap((l) => [l.from, l.to])
  return ends.flatMap((end): Finding[] => {
    const chassis = view.device(end.unit)?.chassis
    const port = view.port(end.unit, end.port)
    if (!port || chassis === 'isolated' || port.isolated !== 'no') return []
    return chassis === 'live' || port.origin === 'added'
      ? [finding('live-socket', { unit: end.unit, port: end.port })]
      : []
  })
}

/** A set that plays and shows at once stands at both ends of a leg. */
const timesMore = (stops: readonly Stop[], { source, display }: Question): number =>
  source.unit === display.unit &&
  stops.length > 1 &&
  [stops[0], stops.at(-1)].every((s) => s?.unit === source.unit)
    ? 1
    : 0
