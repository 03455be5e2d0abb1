import { POWER_KEY } from '@coaxwain/models'
import { doubtOf, functionState, type Setting, type Uid } from '@coaxwain/shelf'
import type { Finding } from '../finding'
import type { Said } from './codes'
import { wantedOn } from './stands'
import type { Wired } from './wire'

/** What is found at a unit: what it makes of what comes, switches that stand wrong, and those that nobody named. */
export function unitFindings(unit: Uid, found: readonly Finding[], wired: Wired): Said[] {
  const wrong = standsWrong(unit, wired)
  const told = found.filter(
    (f) =>
      f.code !== 'position-left-open' &&
      !(f.code === 'function-not-acting' && wrong.length > 0) &&
      !(f.code === 'function-unknown' && !wired.path.arrives),
  )
  return [...wrong, ...told, ...unsaid(unit, wired), ...untried(unit, wired)]
}

/** Switches that the person named, and that stand where the way is closed. */
function standsWrong(unit: Uid, wired: Wired): Said[] {
  const { path, row, hookup } = wired
  const wanted = wantedOn(path, row, hookup.settings).get(unit) ?? []
  const halt = wired.path.halts.find((h) => h.unit === unit)
  const power =
    halt && halt.fn.power !== 'none'
      ? [{ control: POWER_KEY, in: halt.fn.power === 'on' ? ['on'] : ['on', 'standby'] }]
      : []
  return [...wanted, ...power].flatMap(({ control, in: positions }): Said[] => {
    const set = wired.hookup.settings.find((s) => s.unit === unit && s.control === control)
    if (!set || wired.filled.includes(set) || positions.includes(set.position)) return []
    const details = { unit, control, position: set.position, wanted: positions.join(' ') }
    return [{ code: control === POWER_KEY ? 'stands-wrong-power' : 'stands-wrong', details }]
  })
}

/** Controls that the answer rests on and the person has not named; those that move by themselves need no word. */
function unsaid(unit: Uid, { filled, view }: Wired): Said[] {
  return filled
    .filter((s) => s.unit === unit && s.why !== 'moves-itself')
    .filter((s) => view.unit(unit)?.stands[s.control] !== s.position)
    .map((s: Setting) => ({
      code: 'stands-unsaid',
      details: { unit, control: s.control, position: s.position },
    }))
}

/** What the unit does on the way, where nobody has tried it. */
function untried(uid: Uid, { path, view }: Wired): Said[] {
  const halt = path.halts.find((h) => h.unit === uid)
  const unit = view.unit(uid)
  if (!halt || !unit) return []
  const doubt = doubtOf(unit, functionState(unit, halt.fn.key))
  const details = { unit: uid, function: halt.fn.key }
  if (doubt === null || doubt === 0) return []
  return [{ code: doubt > 1 ? 'function-intermittent' : 'function-untested', details }]
}
