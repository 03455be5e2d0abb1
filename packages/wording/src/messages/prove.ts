/** Trying what nobody has tried of a unit. */
export const PROVE = {
  'prove.title': 'Try what is untested',
  'prove.line':
    'Test chains from your own shelf in which everything else is known to work, so that what you see and hear is the verdict.',
  'prove.care':
    'Before a unit is switched on for the first time: look for damage, stay beside it, and unplug it at any smell or smoke. Its inside is for people trained to work there; the local electrical code goes before anything said here.',
  'prove.find': 'Find test chains',
  'prove.asking': 'Looking for test chains ...',
  'prove.found': '{count|# test chain|# test chains} found',
  'prove.none': 'Nothing here can be tried now.',
  'prove.best-found':
    'Best found. The search ended before everything was tried, so there may be shorter ones.',
  'prove.in-order': 'Take them in this order: each counts on what those before it have shown.',
  'prove.chain': 'Test chain {number}: {source} to {display}',
  'prove.seen': 'The picture tries',
  'prove.heard': 'The sound tries',
  'prove.picture-worked': 'Picture is good',
  'prove.picture-failed': 'No good picture',
  'prove.sound-worked': 'Sound is good',
  'prove.sound-failed': 'No good sound',
  'prove.several':
    'If it fails, this alone does not tell what is to blame: note by hand the [socket] that turns out bad.',
  'prove.thing': '{title} ({sockets})',
  'prove.how': 'test chain',
  'prove.show': 'Steps and drawing',
  'prove.other-ways': 'Every way from the one to the other',
  'prove.left': 'Cannot be tried now',
  'prove.left.no-way-inside':
    'All that uses it inside is noted as not working, or the model names nothing that uses it.',
  'prove.left.would-harm':
    'A [lead] plugged in there could carry [mains]. Leave it to somebody who is qualified for it.',
  'prove.left.out-of-reach':
    'A control that only the missing remote reaches may stand anywhere. Note where it stands.',
  'prove.left.no-tried-source': 'No source on the shelf is known to work.',
  'prove.left.no-tried-display': 'No set on the shelf is known to work.',
  'prove.left.no-tried-lead': 'No [lead] in the drawer is known to work.',
  'prove.left.nothing-arrives':
    'No source that is known to work reaches it by [leads] and boxes that are known to work.',
  'prove.left.nothing-shows':
    'No set that is known to work takes what comes out of it, by [leads] and boxes that are known to work.',
  'prove.left.not-known-yet': 'The search ended before a test chain was found.',
} as const
