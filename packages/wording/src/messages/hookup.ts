/** Steps, settings, cautions and reasons of a hookup. Port and control names are the device's own. */
export const HOOKUP = {
  'step.fetch': 'Fetch, with everything off.',
  'step.fetch.unit': '{name}',
  'step.fetch.unit-at': '{name}: {place}',
  'step.fetch.piece': '{name}: [leads] drawer',
  'step.fetch.pieces': '{count} of {name}: [leads] drawer',
  'step.check-chassis':
    'Before touching anything: find out whether the chassis of the {name} is joined to the [mains]. If you cannot tell, leave it and ask somebody trained.',
  'step.check-isolation':
    'Do not connect yet: find out how well the {name} keeps its signal from the [aerial], or use a transfer switch.',
  'step.check-dc':
    'Before plugging in: find out whether the input stands the voltage that comes up this [lead].',
  'step.join.captive': 'Its own plug: {from} {fromPort} into {to} {toPort}.',
  'step.join.lead': '{name}: {from} {fromPort} to {to} {toPort}.',
  'step.join.to-piece': '{name}: {from} {fromPort} to the {next}.',
  'step.join.between': '{name} to the {next}.',
  'step.join.from-piece': '{name} to {to} {toPort}.',
  'step.join.yellow': 'Yellow: {from} {fromPort} to {to} {toPort}.',
  'step.join.white': 'White: {from} {fromPort} to {to} {toPort}.',
  'step.join.red': 'Red: {from} {fromPort} to {to} {toPort}.',
  'step.join.green': 'Green: {from} {fromPort} to {to} {toPort}.',
  'step.join.blue': 'Blue: {from} {fromPort} to {to} {toPort}.',
  'step.join.black': 'Black: {from} {fromPort} to {to} {toPort}.',
  'step.join.orange': 'Orange: {from} {fromPort} to {to} {toPort}.',
  'step.join.grey': '[Grey]: {from} {fromPort} to {to} {toPort}.',
  'step.join.colours': '[Colour] to [colour] at both ends: {from} {fromPort} to {to} {toPort}.',
  'step.join.same-to': 'Next end of the same {name}: to {to} {toPort}.',
  'step.join.same-from': 'Next end of the same {name}: from {from} {fromPort}.',
  'step.join.same-to-piece': 'The same {name} to the {next} as well.',
  'step.join.same-from-piece': 'The {last} to the same {name} as well.',
  'step.same-lead': 'It is the {name} from before, not a second one.',
  'step.tail.yellow': 'Yellow: {unit} {port}.',
  'step.tail.white': 'White: {unit} {port}.',
  'step.tail.red': 'Red: {unit} {port}.',
  'step.tail.green': 'Green: {unit} {port}.',
  'step.tail.blue': 'Blue: {unit} {port}.',
  'step.tail.black': 'Black: {unit} {port}.',
  'step.tail.orange': 'Orange: {unit} {port}.',
  'step.tail.grey': '[Grey]: {unit} {port}.',
  'step.end-line': '{name} on {to} {toPort}: the line ends there.',
  'step.not-the-green': 'Not the green {port}: that gives a [grey] picture.',
  'step.screw-home': 'Screw it home with your fingers.',
  'step.aerial-lugs-off':
    "Take the [aerial]'s lugs off first and leave them off. Either lug goes under either screw.",
  'step.set': 'Set the {name}.',
  'setting.position': '{control} to {position}',
  'setting.auto': '{control} goes to {position} by itself',
  'setting.channel': '{control} to channel {position}',
  'setting.tune.numbers': '{control}: key in {position}',
  'setting.tune.presets': '{control}: store channel {position} on a preset',
  'setting.tune.knob': '{control}: turn to channel {position}',
  'setting.tune.turret': '{control} to {position}',
  'setting.tune.search': '{control}: let it search until it finds channel {position}',
  'setting.power.on': 'switch it on',
  'setting.power.standby': 'switch it to standby',
  'setting.power.unplugged': 'pull its [mains] plug',
  'setting.trim.up': 'Turn {control} up until the picture is full',
  'setting.trim.down': 'Turn {control} down until white no longer buzzes',
  'setting.trim.by-eye': '{control} by eye: until the [colour] holds and the sound is clean',

  'why.opens-way': 'it opens the way',
  'why.picks-input': 'chooses what comes in',
  'why.picks-plan': 'the plan in which its channels count',
  'why.picks-channel': 'the channel that it puts out',
  'why.tunes-to': 'the same carrier',
  'why.fits-standard': 'fits the set',
  'why.fits-scan': 'a rate that the set follows',
  'why.fits-shape': 'wide discs keep their shape',
  'why.ends-line': 'one 75 ohm load at the end of the line',
  'why.trims': 'by eye and ear',
  'why.powers': 'must be on',
  'why.moves-itself': 'nothing to turn',

  'caution.never-to-aerial':
    'Never join {port} of the {name} to an [aerial] or a cable company\u2019s line.',
  'caution.never-to-aerial.more': 'It would put channel {channel} on the air.',
  'caution.chassis-live': 'The chassis of the {name} is joined to the [mains].',
  'caution.chassis-live.more':
    'Use its [aerial] terminals only; a 75/300 transformer does not isolate. Work inside is for people trained to do it.',
  'caution.chassis-may-be-live': 'The chassis of the {name} may be joined to the [mains].',
  'caution.chassis-may-be-live.more':
    'Use its [aerial] terminals only; a 75/300 transformer does not isolate.',
  'caution.added-socket': 'Do not use or touch {port} of the {name}.',
  'caution.added-socket.more':
    'It was added later and may put the [mains] on every [lead] that is plugged in. Have it taken out and the [aerial] isolator checked by somebody trained.',
  'caution.check-chassis': 'Nobody has noted whether the {name} is isolated.',
  'caution.check-chassis.more': 'Check that first; if in doubt, do not connect.',
  'caution.check-dc': 'There is a voltage on this cable.',
  'caution.check-dc.more': 'Check that the input stands it before you plug in.',
  'caution.mains-differs': 'The {name} is made for {volts} V; the set runs on {here} V.',
  'caution.mains-differs.more':
    'Compare the rating plates, voltage and frequency, before anything is plugged in.',
  'caution.pack-centre-positive': '{name} pack: {volts} V DC, {milliamps} mA, [centre] positive.',
  'caution.pack-centre-positive.more': 'Compare its label first.',
  'caution.pack-centre-negative': '{name} pack: {volts} V DC, {milliamps} mA, [centre] negative.',
  'caution.pack-centre-negative.more': 'Compare its label first.',
  'caution.pack-ac': '{name} pack: {volts} V AC, {milliamps} mA.',
  'caution.pack-ac.more': 'Compare its label first.',
  'caution.pack-dc': '{name} pack: {volts} V DC, {milliamps} mA; polarity not noted.',
  'caution.pack-dc.more': 'Read the polarity from the unit before you plug it in.',
  'caution.recorder-input': 'Protected discs and tapes will not play properly through the {name}.',
  'caution.recorder-input.more':
    'Its input level control is upset by their pulses: the picture goes dark and bright. A plain modulator has no such control.',
  'caution.handshake-unknown':
    'Nobody has noted whether the {name} completes the content-protection handshake.',
  'caution.handshake-unknown.more': 'Without it protected material stays black.',
  'caution.luma-only': 'Only the brightness part arrives: a steady [grey] picture.',
  'caution.luma-only.more': 'Nothing is broken; the [colour] has no wire.',
  'caution.colour-not-decoded':
    'The picture is [grey]: the set does not decode this [colour] standard.',
  'caution.colour-not-decoded.more': 'The picture is steady and nothing is broken.',
  'caution.reduced-height': 'The picture is not as tall as the screen.',
  'caution.reduced-height.more': 'The set follows 60 fields a second with less height.',
  'caution.squeezed': 'Wide pictures look tall and thin.',
  'caution.squeezed.more': 'Tell the player that the screen is 4:3, if it can be told.',
  'caution.sound-half': 'One sound channel of two is lost.',
  'caution.sound-half.more':
    'Whatever is on the other side is not heard. A mixing Y adapter would bring both.',
  'caution.silent': 'There is no sound on this way.',
  'caution.silent.more': 'The picture comes alone.',
  'caution.sound-folded': 'Left and right are added into one sound channel.',
  'caution.sound-folded.more': 'Nothing is lost but the width.',
  'caution.scan-too-fast': '{control} of the {name} must stay as said.',
  'caution.scan-too-fast.more':
    'Its other position doubles the line rate: torn lines, and old sets do not like it.',
  'caution.check-isolation':
    'Do not connect yet: nobody has noted how much of the modulated signal gets through the {name} to the [aerial].',
  'caution.check-isolation.more':
    'What goes up to the [aerial] is sent out. Use a transfer switch or a box whose isolation is known; local rules come first.',
  'caution.radiation-limit':
    'At most {limit} dBmV may get up to the [aerial]; here it is {level} dBmV.',
  'caution.radiation-limit.more':
    'That holds only for these boxes, joined just so. Do not join the wires in any other way. Limit: 47 CFR 15.115(c)(1); local rules come first.',
  'caution.both-plugs': 'Both sound plugs must be in the Y adapter.',
  'caution.both-plugs.more': 'With one alone, whatever is on the other side is lost.',
  'caution.no-loudspeaker': 'The {name} has no loudspeaker: the sound goes its own way.',
  'caution.no-loudspeaker.more': 'Switch the loudspeakers on as well.',
  'caution.sound-apart': 'The picture [lead] carries no sound.',
  'caution.sound-apart.more': 'The sound has a [lead] of its own.',
  'caution.wide-picture': 'Wide pictures look tall, or get black bars, on this screen.',
  'caution.wide-picture.more': 'Tell the source that the screen is 4:3, if it can be told.',
  'caution.few-lines': 'The source draws 240 or 288 lines without interlace.',
  'caution.few-lines.more':
    'Picture tubes take it; converters and flat sets may flicker, treat it as interlaced or refuse it.',
  'caution.interlaced-only': 'The converter makes interlaced pictures, and no true 240-line ones.',
  'caution.interlaced-only.more': 'Lines flicker where the old picture had gaps.',
  'caution.delay': 'The picture comes a little late.',
  'caution.delay.more': 'For quick games a picture tube without processing is better.',
  'caution.cross-colour': 'Fine patterns get false [colours].',
  'caution.cross-colour.more':
    'Adding [colour] to brightness is simple; taking them apart again is not.',
  'caution.sync-needed': 'RGB needs its sync wire: it travels on the composite pin.',
  'caution.sync-needed.more': 'Without it the picture does not stand still.',
  'caution.sixty-fields':
    'Sixty pictures a second: a set that cannot follow would roll on any setting.',
  'caution.sixty-fields.more': 'This one follows.',
  'caution.white-buzz': 'White writing buzzes while {control} of the {name} is up too far.',
  'caution.white-buzz.more':
    'Peak white drives the carrier to nothing and breaks up the sound. Nothing is broken.',
  'caution.one-load': 'Load the video of the {name} once only.',
  'caution.one-load.more':
    'A second plug on the same output, or none at its end, changes the size of the signal.',
  'caution.handshake-needed':
    'The {name} completes the content-protection handshake; others stay black.',
  'caution.handshake-needed.more': 'A plain cable converts nothing.',
  'caution.channel-stays-free': 'Channel {channel} must stay free of stations.',
  'caution.channel-stays-free.more': 'If one comes up there, choose again.',
  'caution.neighbour-channel': 'Prefer {channel}: {other} lies next to {beside}.',
  'caution.neighbour-channel.more':
    'Use {other} only where {channel} is on the air and {beside} is not.',
  'caution.idle-carrier':
    'If the {name} hangs on the same [lead], keep its own channel off {channel}.',
  'caution.idle-carrier.more':
    'Its carrier is on even when it plays nothing, and two on one channel beat together.',
  'caution.idle-sideband': 'Nor set the {name} just above or just below it.',
  'caution.idle-sideband.more': 'An unfiltered output also fouls the channel below its own.',
  'caution.band-switch': '{control} of the {name} on {position}.',
  'caution.band-switch.more': 'On another band the tuner does not reach this channel.',
  'caution.aerial-to-box': 'The [aerial] goes to the {name}, and not to the {set}.',
  'caution.aerial-to-box.more': 'An old set finds no digital station by itself.',
  'caution.sound-carrier-socket': 'One [socket] of the {name} says RF and is no [aerial] output.',
  'caution.sound-carrier-socket.more': 'It carries digital sound for a decoder.',
  'caution.shared-socket':
    '{port} of the {name} takes composite only while its AV input is chosen.',
  'caution.shared-socket.more': 'On the component input the same plug shows [grey].',
  'caution.level-lost': 'About {db} dB is lost on the way.',
  'caution.level-lost.more': 'If the picture snows, look here first.',
  'caution.level-high': 'About {dbmv} dBmV would reach the {set}, more than it need stand.',
  'caution.level-high.more':
    'Turn the level down where it is made, or put a pad of {pad} dB before the set: else lines, buzz and false channels.',
  'caution.channel-below':
    'Keep the {name} on channel {channel}: on others it would spoil a station.',
  'caution.channel-below.more':
    'An unfiltered modulator also fouls the channel just below its own.',
  'caution.channel-on-air': 'Something is on the air on channel {channel}.',
  'caution.channel-on-air.more':
    'There is no free channel on the {name}: expect patterns in the picture.',
  'caution.channel-may-be-used':
    'If anything is received on channel {channel}, use {other} at both ends.',
  'caution.channel-may-be-used.more': 'Two signals on one channel spoil each other.',
  'caution.air-or-cable': '{control} of the {name} on {position}.',
  'caution.air-or-cable.more': 'Channels of the same number lie elsewhere in the other plan.',
  'caution.moves-itself': 'The {name} switches by itself.',
  'caution.moves-itself.more': 'Leave the source off while you want what is behind it.',
  'caution.direction-switch': '{control} of the {name} decides which way the signal goes.',
  'caution.direction-switch.more': 'On the wrong side there is no picture.',
  'caution.choose-by-hand': 'Choose the input of the {name} by hand.',
  'caution.choose-by-hand.more': 'Nothing on this [lead] wakes it.',
  'caution.line-open': 'Nothing at the input of the {name} ends the line.',
  'caution.line-open.more':
    'The picture may be too bright; a 75 ohm terminator on a T piece ends it.',
  'caution.less-detail': 'High definition becomes an ordinary television picture.',
  'caution.less-detail.more': 'Small text will be hard to read.',
} as const

/** Why the shelf does not do it: each names the two facts that clash. */
export const OBSTACLES = {
  'obstacle.japanese-21-pin':
    'Do not plug the 21-pin plug of the {from} into the {to}: it goes in, and its pins are wired in the Japanese way. Sound and supply would land on picture pins.',
  'obstacle.added-socket':
    'Do not use {port} of the {to}. It was added later to a set whose chassis is or may be joined to the [mains]: everything plugged in there, and whoever touches it, may be live.',
  'obstacle.line-rate':
    'The {from} draws its lines at {fromKhz} kHz; the {to} follows {toKhz} kHz. No [lead] changes that, and some sets are harmed by it: a scan converter is needed.',
  'obstacle.field-rate':
    'The {from} gives {fromHz} pictures a second; the {to} follows {toHz}. The picture would roll: a standards converter is needed.',
  'obstacle.socket-dead': '{port} of the {to} is marked as dead.',
  'obstacle.one-way': 'The {to} is made for the other direction. Turned round it converts nothing.',
  'obstacle.wrong-circuits':
    'A [lead] goes into both, but the {from} gives {form:fromForm} there and the {to} takes {form:toForm}. A fitting plug promises nothing: look in the book of the set. Wires cannot convert.',
  'obstacle.wires-missing':
    'A [lead] at hand fits the {from} and the {to} and has no wires for {form:form}. A fitting plug promises nothing.',
  'obstacle.level-control':
    'What is played is protected against copying, and the input level control of the {to} is thrown off by its pulses: the picture goes dark and bright.',
  'obstacle.no-handshake':
    'What is played is protected, and the {to} does not complete the handshake that the {from} asks for: the screen stays black.',
  'obstacle.light-gun':
    'A light gun looks for a bright spot on a picture tube drawn at the speed of the {from}; the {to} stores or redraws the picture. No [lead] changes that.',
  'obstacle.switching-voltage':
    'The {to} takes RGB only when a voltage on the plug tells it to, and none comes there from the {from}.',
  'obstacle.scan': 'The {from} gives {scan:scan}; the {to} does not take it.',
  'obstacle.colour':
    'The {from} gives {colour:colour} [colour]; the {to} decodes {colour:listed}. The picture would be [grey].',
  'obstacle.sound-spacing':
    'The {from} sends its sound {fromMhz} MHz from the picture; the {to} listens at {toMhz} MHz. There would be a picture and no sound.',
  'obstacle.luma-only':
    'From the {from} into the {to} only the brightness part would arrive: a steady [grey] picture.',
  'obstacle.not-a-channel':
    'What the {from} gives is no television channel, although the plug fits the {to}.',
  'obstacle.digital-only':
    'The {from} sends an analogue channel; the tuner of the {to} receives digital stations only.',
  'obstacle.band':
    'The {from} puts out channel {channel} at {mhz} MHz; the tuner of the {to} does not reach it.',
  'obstacle.vision-polarity':
    'The {from} sends system {system}; the tuner of the {to} works the other way round and would show a negative picture.',
  'obstacle.not-taken': 'The input of the {to} does not take what the {from} gives.',
  'obstacle.line-not-ended':
    'The input of the {to} does not end its line, and there is no 75 ohm terminator for {port}: the picture would be far too bright.',
  'obstacle.out-of-reach':
    'The remote of the {to} is missing, and nobody has noted where {control} stands. Look on its screen and note it on the unit’s page.',
  'obstacle.no-lead':
    'Both have a fitting output and input, but no [lead] at hand joins the {from} to the {to}.',
  'obstacle.whip-only':
    'The {to} has a whip and no [socket]: nothing can be plugged in there, and to send the {from} to it through the air is not allowed.',
  'obstacle.no-common-form':
    'The {from} and the {to} have no form of picture in common, and nothing at hand turns one into the other.',
} as const

/** What a purchase brings and what it does not. */
export const PURCHASES = {
  'brings.opens-way': 'It opens a way where there is none.',
  'brings.better-picture': 'A better picture.',
  'brings.colour': '[Colour].',
  'brings.more-sound': 'Sound, or more of it.',
  'does-not.stays-mono': 'The sound stays in one channel.',
  'does-not.no-more-detail': 'It brings back no detail that was lost before.',
} as const
