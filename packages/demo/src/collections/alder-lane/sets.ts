import { NTSC_SET, jack, onPort, one, port, shows } from '@coaxwain/models/build'
import type { Modification } from '@coaxwain/shelf'
import type { DemoUnit } from '../../demo-data'
import { INES, MAREN, TOBIN } from '../people'
import { dead, intermittent, on, works } from '../unit-maker'
import { unit } from './maker'

/** What an owner before this one did to a set with a live chassis. */
const addedSockets: Modification = {
  kind: 'added',
  ports: [
    {
      ...port('added-video', 'VIDEO', [one('cvbs', 'in')], {
        connector: 'phono-socket',
        origin: 'added',
        isolated: 'no',
        impedanceOhm: 75,
        load: { kind: '75' },
        note: 'Soldered straight to the chassis, without a transformer or an optocoupler.',
      }),
      at: { face: 'back', row: 1, column: 0 },
    },
    {
      ...port('added-sound', 'AUDIO', [one('audio-mono', 'in')], {
        connector: 'phono-socket',
        origin: 'added',
        isolated: 'no',
      }),
      at: { face: 'back', row: 1, column: 1 },
    },
  ],
  jacks: [
    jack('added-video', 'composite', 'in', onPort('added-video', ['cvbs'])),
    jack('added-sound', 'sound', 'in', onPort('added-sound', ['audio-mono'])),
  ],
  functions: [
    shows('added-picture', 'Shows the added VIDEO', 'added-video', {
      accepts: NTSC_SET,
      sound: 'added-sound',
    }),
  ],
  note: 'Two phono sockets in the back cover, added by an owner before us. Do not use.',
}

const swap = on('2026-02-14', MAREN, 'ch 4 from the VM-2, half an hour')

export const SETS: readonly DemoUnit[] = [
  unit(101, 'ostrel-14-c', {
    place: 'front-room',
    addedOn: '2026-01-10',
    working: 'works',
    serial: '40716',
    modifications: [{ kind: 'aerial-isolator', state: 'tested-good', on: '2026-03-03' }],
    tests: [works(on('2026-03-03', INES, 'steady on channels 3 and 4'), 'vhf', 'does:vhf-picture')],
  }),
  unit(102, 'ostrel-14-c', {
    place: 'garage-b',
    addedOn: '2026-04-18',
    holding: 'spare',
    note: 'No plug on the mains lead; isolator not measured.',
  }),
  unit(103, 'ostrel-19-l', {
    place: 'bench',
    addedOn: '2026-02-21',
    working: 'works',
    label: 'the set with the extra sockets',
    note: 'Chassis joined to one side of the mains: work on it is for people trained to do it.',
    modifications: [
      addedSockets,
      { kind: 'aerial-isolator', state: 'tested-good', on: '2026-02-28' },
    ],
    tests: [
      works(on('2026-02-28', INES, 'channel 3 from the VM-2'), 'vhf', 'does:vhf-picture'),
      works(on('2026-02-28', INES, 'weak station, channel 30'), 'uhf', 'does:uhf-picture'),
    ],
  }),
  unit(104, 'ostrel-9-m', {
    place: 'garage-a',
    addedOn: '2026-01-24',
    working: 'works',
    tests: [
      works(on('2026-01-24', INES, 'channel 3 on the screws'), 'vhf', 'does:vhf-picture'),
      dead(on('2026-01-24', INES, 'noise only on every channel'), 'uhf', 'does:uhf-picture'),
    ],
  }),
  unit(105, 'selvane-13-r', {
    place: 'bedroom',
    addedOn: '2026-01-12',
    working: 'works',
    stands: { 'tuner-plan': 'air' },
    remotePresent: true,
    tests: [works(swap, '*')],
  }),
  unit(106, 'selvane-13-r', {
    place: 'garage-b',
    addedOn: '2026-05-09',
    working: 'faulty',
    holding: 'spare',
    stands: { 'tuner-plan': 'cable' },
    note: 'Picture folds at the top until warm.',
    tests: [
      intermittent(on('2026-05-10', INES, 'sound comes and goes with the plug'), 'aerial'),
      works(on('2026-05-10', INES, 'colour once warm'), 'does:aerial-picture'),
    ],
  }),
  unit(107, 'quillmark-ct-20', {
    place: 'front-shelf-1',
    addedOn: '2026-01-08',
    working: 'works',
    stands: { input: 'tv', 'tuner-plan': 'air' },
    remotePresent: true,
    tests: [
      works(on('2026-01-17', MAREN, 'all inputs in turn'), '*'),
      dead(on('2026-04-02', INES, 'centre contact gone'), 'video-2', 'does:front-picture'),
    ],
  }),
  unit(108, 'quillmark-ct-27', {
    place: 'front-room',
    addedOn: '2026-01-08',
    working: 'works',
    stands: { input: 'video-1', 'tuner-plan': 'cable' },
    remotePresent: true,
    tests: [
      works(
        on('2026-01-17', MAREN, 'disc and tape, colour and both sides'),
        'video-1',
        'sound-1',
        'component',
        'sound-component',
        'does:composite-picture',
        'does:component-picture',
      ),
    ],
  }),
  unit(109, 'belloway-pv-9', {
    place: 'desk-2',
    addedOn: '2026-03-07',
    working: 'works',
    holding: 'spare',
    tests: [
      dead(on('2026-03-08', TOBIN, 'whip broken off at its pivot'), 'whip', 'does:whip-picture'),
      works(
        on('2026-03-08', TOBIN, 'converter box on channel 3'),
        'ext-aerial',
        'does:outside-picture',
      ),
    ],
  }),
  unit(110, 'quillmark-qb-5', {
    place: 'loft-1',
    addedOn: '2026-01-31',
    working: 'works',
    tests: [
      works(
        on('2026-02-01', INES, 'test pattern on channel 36'),
        'aerial',
        'whip',
        'does:aerial-picture',
      ),
    ],
  }),
  unit(111, 'lindrake-fp-32', {
    place: 'bedroom',
    addedOn: '2026-02-02',
    working: 'works',
    stands: { input: 'hdmi-1' },
    remotePresent: true,
    tests: [
      works(
        on('2026-02-02', MAREN, 'every input but the second HDMI'),
        'aerial',
        'video-in',
        'sound-in',
        'component',
        'hdmi-1',
        'does:aerial-picture',
        'does:composite-picture',
        'does:component-picture',
        'does:hdmi-1-picture',
      ),
    ],
  }),
  unit(112, 'jorvane-m-21', {
    place: 'garage-a',
    addedOn: '2026-01-19',
    working: 'works',
    holding: 'spare',
    stands: { input: 'component' },
    tests: [
      works(
        on('2026-05-02', INES, 'disc player, component interlaced'),
        'component',
        'does:component-picture',
      ),
      works(on('2026-04-11', INES, 'RGB from a converter box'), 'av-rgb-in', 'does:av-rgb-picture'),
    ],
  }),
  unit(113, 'jorvane-mt-12', {
    place: 'garage-a',
    addedOn: '2026-03-21',
    working: 'works',
    tests: [works(on('2026-03-22', INES, 'colour bars from the MD-1'), '*')],
  }),
  unit(114, 'jorvane-mv-14', {
    place: 'under-desk',
    addedOn: '2026-03-21',
    working: 'faulty',
    note: 'Bright line across the middle: no vertical scan.',
    tests: [dead(on('2026-03-29', INES, 'one bright line'), 'does:rgb-picture')],
  }),
  unit(115, 'hollin-pm-9', {
    place: 'bench',
    addedOn: '2026-01-05',
    working: 'works',
    stands: { termination: '75-ohm' },
    tests: [works(on('2026-01-06', INES, 'test pattern, and looped to the M-21'), '*')],
  }),
]
