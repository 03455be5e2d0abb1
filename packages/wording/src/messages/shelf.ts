/** States of units, sockets and functions, and the words of the shelf. */
export const SHELF = {
  'state.works': 'works',
  'state.untested': 'untested',
  'state.intermittent': 'intermittent',
  'state.dead': 'dead',

  'working.untested': 'untested',
  'working.works': 'works',
  'working.faulty': 'faulty',
  'working.parts-only': 'parts only',

  'holding.kept': 'kept',
  'holding.spare': 'spare',
  'holding.listed': 'listed',
  'holding.held': 'held',
  'holding.sold': 'sold',
  'holding.gone': 'gone',

  'badge.worst': '{count} {state}',
  'badge.tried': '{tried} of {of} tried',
} as const
