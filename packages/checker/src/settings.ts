import { POWER_KEY, POWER_STATES, type AutoCause, type AutoControl } from '@coaxwain/models'
import type { Setting } from '@coaxwain/shelf'
import type { Bench } from './bench'
import { finding, type Finding, type FindingCode } from './finding'

/** Every setting names a position that is there and can be reached. */
export const checkSettings = (bench: Bench): Finding[] =>
  bench.hookup.settings.flatMap((setting) => {
    const code = wrongWith(setting, bench)
    return code === null ? [] : [finding(code, { unit: setting.unit, control: setting.control })]
  })

function wrongWith(setting: Setting, bench: Bench): FindingCode | null {
  const { position } = setting
  const device = bench.view.device(setting.unit)
  if (device && setting.control === POWER_KEY) {
    return (POWER_STATES as readonly string[]).includes(position) ? null : 'position-unknown'
  }
  const control = device?.controls.find((c) => c.key === setting.control)
  if (!control) return 'control-unknown'
  if (control.kind !== 'positions' && control.kind !== 'auto') return null
  if (!control.positions.some((p) => p.key === position)) return 'position-unknown'
  if (control.kind === 'auto' && !isMoved(bench, control, setting)) return 'automatic-not-moved'
  return outOfReach(bench, setting) ? 'out-of-reach' : null
}

/** A control that only the missing remote moves stands where it was left. */
function outOfReach({ view }: Bench, { unit: uid, control: key, position }: Setting): boolean {
  const unit = view.unit(uid)
  const device = view.device(uid)
  const access = device?.controls.find((c) => c.key === key)?.access
  const byRemote = device?.remote === 'needed' && (access === 'remote' || access === 'menu')
  return byRemote && unit?.remotePresent === false && unit.stands[key] !== position
}

/** The cause of an automatic position is there, or all other causes are absent. */
function isMoved({ hookup }: Bench, control: AutoControl, { unit, position }: Setting): boolean {
  const joins = (port: string, side: 'from' | 'to'): boolean =>
    hookup.links.some((l) => l[side].unit === unit && l[side].port === port)
  const acts = (cause: AutoCause): boolean => {
    switch (cause.kind) {
      case 'signal-at':
      case 'voltage-at':
        return joins(cause.port, 'to')
      case 'plug-in':
        return joins(cause.port, 'to') || joins(cause.port, 'from')
      case 'powered':
        return true
      case 'otherwise':
        return !control.positions.some((p) => p.cause.kind !== 'otherwise' && acts(p.cause))
    }
  }
  return control.positions.some((p) => p.key === position && acts(p.cause))
}
