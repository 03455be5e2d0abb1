import type { DeviceModel } from '@coaxwain/models'
import { portBadges, unitBadge, type Unit } from '@coaxwain/shelf'
import { triedWords, worstWords } from './badge-words'
import type { Speak } from './words'

/** What tells a unit from another of its model: number, place, and how far it was tried. */
export function optionLine(
  unit: Unit,
  kind: string,
  known: { readonly device: DeviceModel | undefined; readonly number: number | undefined },
  say: Speak,
): string {
  const { device, number } = known
  const first = number === undefined ? kind : say('ask.kind-number', { kind, number })
  const parts = [first, unit.place ?? '', device ? stateWords(unit, device, say) : '']
  return parts
    .filter((part) => part !== '')
    .reduce((all, part) => say('ask.joined', { first: all, second: part }))
}

function stateWords(unit: Unit, device: DeviceModel, say: Speak): string {
  const badge = unitBadge(portBadges(unit, device))
  if (badge.of === 0) return ''
  return say('badge.line', { worst: worstWords(badge, say), tried: triedWords(badge, say) })
}
