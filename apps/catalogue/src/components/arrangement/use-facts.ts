import { POWER_KEY } from '@coaxwain/models'
import type { Question, Uid, Use } from '@coaxwain/shelf'
import { fullName, type Lookup } from '../../format/lookup'
import type { Speak } from '../../format/words'
import { unitOrder } from '../hookup/unit-order'
import type { Way } from './arrange-form'

const nameOf = (lookup: Lookup, unit: Uid): string => {
  const device = lookup.device(unit)
  return device ? fullName(device) : ''
}

/** What a use is called: by the player that is watched, or by the set that shows it. */
export function titleOfUse(question: Question, way: Way, lookup: Lookup, say: Speak): string {
  if (way === 'displays') {
    return say('arrangement.use-display', { display: nameOf(lookup, question.display.unit) })
  }
  const { unit, playing } = question.source
  const fns = lookup.device(unit)?.functions.filter((f) => f.kind === 'plays') ?? []
  const fn = fns.find((f) => f.key === playing)
  const use = say('arrangement.use-source', { source: nameOf(lookup, unit) })
  // One that plays one thing alone needs no word for it.
  return fns.length > 1 && fn
    ? say('arrangement.use-playing', { use, playing: fn.label ?? say(`function.${fn.kind}`) })
    : use
}

/** Units on the way of a use that are under power meanwhile, in the order of its drawing. */
export function unitsOn({ hookup }: Use, lookup: Lookup): Uid[] {
  const stops = hookup.legs.flatMap((l) => l.stops)
  const asleep = hookup.settings.filter((s) => s.control === POWER_KEY && s.position !== 'on')
  return unitOrder(hookup).filter((uid) => {
    const used = stops.filter((s) => s.unit === uid).map((s) => s.function)
    const functions = lookup.device(uid)?.functions.filter((f) => used.includes(f.key)) ?? []
    return functions.some((f) => f.power !== 'none') && !asleep.some((s) => s.unit === uid)
  })
}

export const namesOf = (units: readonly Uid[], lookup: Lookup): readonly string[] =>
  units.map((uid) => nameOf(lookup, uid))

export const listed = (names: readonly string[], say: Speak): string =>
  names.reduce((first, second) =>
    first === '' ? second : say('arrangement.names', { first, second }),
  )
