/** What went wrong, whether anything was saved, and what to do; by the codes of the API. */
export const PROBLEMS = {
  'problem.invalid-request':
    'Nothing was saved: something in what was sent is not as it must be. Put right what is marked, then try again.',
  'problem.malformed-json':
    'Nothing was saved: what was sent is not readable as JSON. Check its form, then send it again.',
  'problem.too-deep':
    'Nothing was saved: what was sent is nested more than {limit} levels deep. Send it flatter.',
  'problem.sign-in-required': 'Nobody is signed in here. Sign in, then try again.',
  'problem.sign-in-failed':
    'The e-mail address and the pass phrase do not belong together. Check both, then try again.',
  'problem.forbidden':
    'Your part in this collection does not cover that, and nothing was changed. An owner of the collection can do it, or give you another part.',
  'problem.other-site':
    'Nothing was changed: the request did not come from a page of this site. Open the page here and try again; a program sends an Origin header with the address of this server.',
  'problem.not-found':
    'There is nothing here, or it is not yours to see. Check the address, or go back to the list.',
  'problem.method-not-allowed':
    'This address cannot be used in that way. The Allow header names the ways that it knows.',
  'problem.uid-taken':
    'Nothing was saved: something else already has this id. Send it again with a new one.',
  'problem.model-in-use':
    'Nothing was changed: {units|# unit is|# units are} of this model. Delete them first, or keep the model.',
  'problem.part-in-use':
    'Nothing was saved: what is marked is needed by a noted state, a saved hookup or a part that was added to a unit. Keep it, or mark the [socket] as retired instead.',
  'problem.key-reused':
    'Nothing was saved: a key that was used before cannot come back for something else. Choose another key.',
  'problem.place-in-use':
    'The place was not deleted: {units|# unit stands|# units stand} there, and it holds {places|# other place|# other places}. Move them first.',
  'problem.place-within-itself':
    'Nothing was moved: {name} cannot stand inside itself. Choose another place.',
  'problem.edited-meanwhile':
    'Nothing was saved: others were changing the same thing at the same moment. Try again.',
  'problem.version-stale':
    'Nothing was saved: somebody changed this while you had it open. Look at how it is now, then make your change again.',
  'problem.too-large':
    'Nothing was saved: what was sent is larger than {limit}. Send less at once.',
  'problem.wrong-content-type':
    'Nothing was saved: this address takes JSON only. Send it with the content type application/json.',
  'problem.model-unsound':
    'The model was not saved: its description does not hold together. Put right what is marked.',
  'problem.unit-unsound':
    'Nothing was saved: what was sent does not fit the unit and its model. Put right what is marked.',
  'problem.question-unsound':
    'This cannot be answered: it names something that is not on the shelf. Choose again what is marked.',
  'problem.unknown-reference':
    'Nothing was saved: it refers to something that is not in this collection. Choose again what is marked.',
  'problem.hookup-refused':
    'The hookup was not saved: it does not pass the check that every answer must pass. Ask again, and save the answer that you get.',
  'problem.version-missing':
    'Nothing was changed: the request must say which version it changes. Send the ETag that was read, in an If-Match header.',
  'problem.too-many-requests':
    'That was tried too often. Wait {minutes|# minute|# minutes}, then try again.',
  'problem.answer-refused':
    'An answer was found and then refused by the check that every answer must pass. This is a fault of ours; it has been noted.',
  'problem.internal':
    'Something failed here, and it has been noted. Nothing more than you see was saved; try again, and if it happens again, tell us the request id.',
  'problem.busy':
    'The server took too long, and it is not known whether anything was saved. Wait a moment, look, then try again.',
  'problem.database-unavailable':
    'The database cannot be reached just now. What you typed is still here; try again in a few seconds.',

  'field.required': 'This is needed.',
  'field.unknown-field': 'There is no field of this name here: {name}.',
  'field.wrong-type': 'This is of the wrong kind; wanted: {wanted}.',
  'field.too-long': 'This is too long: {limit|# character is|# characters are} the most.',
  'field.too-short': 'This is too short: {limit|# character is|# characters are} the least.',
  'field.too-small': 'This is too small: {limit} is the least.',
  'field.too-big': 'This is too big: {limit} is the most.',
  'field.too-many': 'These are too many: {limit} are the most.',
  'field.too-few': 'These are too few: {limit|# is|# are} the least.',
  'field.not-in-list': 'This is none of the possible values: {choices}.',
  'field.bad-format': 'This does not have the form that is wanted here.',
  'field.blank': 'This is empty. Write something.',
  'field.several-lines': 'This must be a single line, without tabs.',
  'field.control-character': 'This holds a character that cannot be seen or stored. Type it anew.',
  'field.given-twice': 'This is given twice. Keep one of them.',
  'field.not-yours-to-change': 'Your part in this collection does not cover this field.',
  'field.unknown-reference': 'There is nothing of that kind in this collection.',
  'field.in-use': '{name} is named by a noted state or a saved hookup, so it has to stay.',
  'field.clashes-with-fitting':
    '{name} does not go together with what was added to a unit of this model.',
  'field.used-before': '{name} was the key of something else before. Choose another key.',
  'field.quantity-of-device':
    'Of a device there is one to a unit; only [leads] and small parts are counted.',
  'field.check-failed': 'The check found a fault here: {name}.',
  'field.devices-only': 'A [lead] or an adapter has no such thing.',

  'field.key-repeated': 'The key {name} is used twice. Give one of them another.',
  'field.unknown-port': 'There is no [socket] with the key {name}.',
  'field.unknown-group': 'There is no group with the key {name}.',
  'field.unknown-jack': 'There is no form with the key {name}.',
  'field.unknown-control': 'There is no switch or control with the key {name}.',
  'field.unknown-position': 'The control has no position {name}.',
  'field.unknown-channel': 'No channel of the plan is meant by {name}.',
  'field.unknown-function': 'There is no function with the key {name}.',
  'field.circuit-not-on-port': 'That [socket] does not carry {name}.',
  'field.contact-missing': 'The form lacks a contact for {name}.',
  'field.jack-direction': 'The [socket] carries {name} the other way.',
  'field.function-without-jacks': 'The function {name} takes nothing and gives nothing.',
  'field.plug-missing': 'There is no plug number {name} at that end.',
  'field.connector-unknown': 'There is no connector {name}.',
  'field.display-facts-missing': 'It shows pictures, so say what its screen is like.',
} as const
