import type { UnitBadge } from '@coaxwain/shelf'
import type { Speak } from './words'

/** The worst of what was tried on a unit, with how many are in that state where it matters. */
export const worstWords = (badge: UnitBadge, say: Speak): string => {
  const word = say(`state.${badge.state}`)
  return badge.state === 'works' || badge.state === 'untested'
    ? word
    : say('badge.worst', { count: badge.inThatState, state: word })
}

export const triedWords = (badge: UnitBadge, say: Speak): string =>
  say('badge.tried', { tried: badge.tried, of: badge.of })
