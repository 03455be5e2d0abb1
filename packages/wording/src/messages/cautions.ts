/** What a person must know about a hookup beside what is said with its settings: positions, sockets, supplies. */
export const CAUTIONS = {
  'caution.socket-dead': '{port} of the {name} is marked as dead: leave it alone.',
  'caution.socket-dead.more': 'What it would have done goes another way.',
  'caution.double-dead':
    'Use the {name} named in the steps: on another of its kind {port} is marked as dead.',
  'caution.double-dead.more': 'The two look alike.',
  'caution.matching-needed': 'The {name} wants a matching transformer between 75 and 300 ohm.',
  'caution.matching-needed.more':
    'A bare [lead] under its screws gives ghosts and loses most of the signal.',
  'caution.own-wiring': '{port} of the {name} has a wiring of its own.',
  'caution.own-wiring.more':
    'Its four contacts follow no common order: use the [lead] made for it, and swap plugs if half works.',
  'caution.channel-socket': '{port} of the {name} gives a television channel and no video.',
  'caution.channel-socket.more':
    'It fits {other} of the {set} and shows nothing there: it belongs in the [aerial] input.',
  'caution.digital-socket': '{port} of the {name} gives digital sound.',
  'caution.digital-socket.more': 'In an ordinary sound input it makes a roar: it wants a decoder.',
  'caution.repeats-aerial': '{port} of the {name} only repeats the [aerial].',
  'caution.repeats-aerial.more': 'What the {name} plays never leaves by it: nothing is broken.',
  'caution.other-socket': '{port} of the {name} carries neither picture nor sound.',
  'caution.other-socket.more': 'Its plug fits {other} of the {set} all the same. Leave it alone.',
  'caution.tell-shape': '{control} of the {name} decides how wide pictures arrive.',
  'caution.tell-shape.more': 'Told of a wide screen it makes everybody thin on this one.',
  'caution.dc-on-lead': 'There is a voltage on the [lead] from {port} of the {name}.',
  'caution.dc-on-lead.more': 'Plug it only where that is wanted, and with everything off.',
  'caution.dc-to-aerial': 'The [aerial] [lead] carries the supply of the amplifier up there.',
  'caution.dc-to-aerial.more':
    'Nothing else may hang on that piece of cable; switch off before you plug.',
  'caution.two-programmes': 'The two sound tracks are two programmes.',
  'caution.two-programmes.more': 'Take the one that is wanted; added together both are spoilt.',
  'caution.gun-needs-tube': 'The light gun works only on a picture tube drawn as the source draws.',
  'caution.gun-needs-tube.more': 'No converter, no flat screen and no [recorder] on the way.',
  'caution.splitter-radiates': 'Do not join the [aerial] and this signal with the {name}.',
  'caution.splitter-radiates.more':
    'It would let the signal up to the [aerial], where it may not be radiated.',
  'caution.channel-taken': 'Channel {taken} is on the air here: stay on {channel}.',
  'caution.channel-taken.more': 'Two signals on one channel spoil each other.',
  'caution.in-fm-band': 'Channel {channel} lies where FM radio is.',
  'caution.in-fm-band.more': 'Near a strong station use screened [leads], and keep them short.',
  'caution.aerial-first': 'The [aerial] goes to the {name} first, and from there to the {set}.',
  'caution.aerial-first.more': 'The other way round the {name} receives nothing.',
  'caution.box-waits': 'The {name} waits for a voltage that the {source} does not send.',
  'caution.box-waits.more': 'It would never switch over by itself.',
  'caution.standard-grey': '{control} of the {name} must stay as said: elsewhere it shows [grey].',
  'caution.standard-grey.more': 'Nothing is broken: the [colour] is not decoded there.',
  'caution.standard-negative':
    '{control} of the {name} must stay as said: elsewhere the picture is torn and like a negative.',
  'caution.standard-negative.more': 'The picture is modulated the other way up there.',
  'caution.volts-by-lead':
    'The {name} takes RGB only while a voltage on the plug tells it to: use the [lead] as said.',
  'caution.volts-by-lead.more': 'Other [leads] that fit need not bring it.',
  'caution.hum-loop': 'The [aerial] cable and the [mains] of the {name} may make a loop that hums.',
  'caution.hum-loop.more':
    'If it hums, an isolator for [aerial] cables goes between the wall and the set, never before the place where the cable is bonded; the local electrical code decides. Never lift the [earth] of a plug.',
  'caution.sync-kind': '{control} of the {name} says where the sync comes from.',
  'caution.sync-kind.more': 'Elsewhere the picture does not stand still.',
  'caution.standard-hiss': '{control} of the {name} must stay as said: elsewhere there is a hiss.',
  'caution.standard-hiss.more': 'The sound lies at another distance from the picture there.',
  'caution.other-lines': '{control} of the {name} must stay as said.',
  'caution.other-lines.more':
    'Elsewhere it draws its lines at {khz} kHz, which the {set} does not follow and which may harm it.',
  'caution.other-fields': '{control} of the {name} must stay as said.',
  'caution.other-fields.more':
    'Elsewhere the picture rolls: the {set} does not follow {hz} fields.',
  'caution.other-colour': '{control} of the {name} must stay as said.',
  'caution.other-colour.more':
    'Elsewhere the {set} shows [grey]: it does not decode that [colour].',
  'caution.turn-hold': 'The picture rolls until {control} of the {name} is turned.',
  'caution.turn-hold.more': 'It stands for another number of fields a second.',
  'caution.set-level': '{control} of the {name} does not stand where it should.',
  'caution.set-level.more': 'Move it as said, a little at a time.',
  'caution.sync-wire': 'The sync needs a wire of its own beside red, green and blue.',
  'caution.sync-wire.more': 'Without it the picture does not stand still.',
  'caution.no-loudspeaker-here': 'The {name} has no loudspeaker, and nothing at hand has one.',
  'caution.no-loudspeaker-here.more': 'The picture comes alone.',
  'caution.last-ends-line': 'The last input on the line has the 75 ohm load on, and no other.',
  'caution.last-ends-line.more':
    'None: the picture is far too bright. Two: it is dim and may not stand still.',
} as const
