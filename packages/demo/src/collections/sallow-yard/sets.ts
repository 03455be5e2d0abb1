import type { DemoUnit } from '../../demo-data'
import { NESSA, TOBIN } from '../people'
import { dead, intermittent, on, works } from '../unit-maker'
import { unit } from './maker'

export const SETS: readonly DemoUnit[] = [
  unit(1, 'fennock-u-17', {
    place: 'shop-wall',
    addedOn: '2026-01-12',
    working: 'works',
    holding: 'listed',
    serial: 'U17 22814',
    tests: [works(on('2026-01-14', TOBIN, 'pattern on channel 30, two hours'), '*')],
  }),
  unit(2, 'fennock-u-17', {
    place: 'rack-1',
    addedOn: '2026-02-03',
    working: 'works',
    tests: [
      works(on('2026-02-05', TOBIN, 'pattern on channel 30'), 'does:aerial-picture'),
      intermittent(on('2026-02-05', TOBIN, 'aerial socket loose on its panel'), 'aerial'),
    ],
  }),
  unit(3, 'fennock-s-25', {
    place: 'window',
    addedOn: '2026-01-12',
    working: 'works',
    holding: 'listed',
    stands: { input: 'av' },
    remotePresent: true,
    tests: [works(on('2026-01-15', NESSA, 'every input in turn'), '*')],
  }),
  unit(4, 'fennock-s-25', {
    place: 'bench-left',
    addedOn: '2026-02-17',
    working: 'faulty',
    stands: { input: 'av-2' },
    note: 'Somebody has pulled a 21-pin lead out sideways.',
    tests: [
      dead(
        on('2026-02-18', TOBIN, 'contacts of the 21-pin socket torn off'),
        'av-composite-in',
        'av-rgb-in',
        'av-sound-in',
      ),
      works(
        on('2026-02-18', TOBIN, 'front sockets, colour and both sides'),
        'video-in',
        'sound-in',
        'does:front-picture',
      ),
      works(on('2026-02-18', TOBIN, 'pattern on channel 30'), 'aerial', 'does:aerial-picture'),
    ],
  }),
  unit(5, 'fennock-s-25', {
    place: 'rack-2',
    addedOn: '2026-03-09',
    working: 'works',
    stands: { input: 'tv' },
    note: 'The front panel was replaced by one from a set without sockets.',
    modifications: [
      { kind: 'bypassed', function: 'front-picture', note: 'Front sockets no longer wired.' },
      { kind: 'bypassed', function: 's-video-picture', note: 'Front sockets no longer wired.' },
    ],
    tests: [
      works(
        on('2026-03-10', TOBIN, 'player by the 21-pin socket'),
        'av-composite-in',
        'av-rgb-in',
        'av-sound-in',
        'does:av-picture',
        'does:av-rgb-picture',
      ),
    ],
  }),
  unit(6, 'lindrake-ce-21', {
    place: 'window',
    addedOn: '2026-01-20',
    working: 'works',
    holding: 'held',
    stands: { input: 'av-1' },
    remotePresent: true,
    note: 'Kept back for a customer until the end of the month.',
    tests: [works(on('2026-01-22', NESSA, 'player in RGB and composite'), '*')],
  }),
  unit(7, 'lindrake-ce-21', {
    place: 'store-sets',
    addedOn: '2026-04-02',
    working: 'works',
    stands: { input: 'tv' },
    tests: [
      works(on('2026-04-03', TOBIN, 'player on AV 1'), 'av-1-composite-in', 'does:av-1-picture'),
      intermittent(on('2026-04-03', TOBIN, 'blue comes and goes'), 'av-1-rgb-in'),
    ],
  }),
  unit(8, 'quillmark-qb-5', {
    place: 'counter',
    addedOn: '2026-02-10',
    working: 'works',
    holding: 'listed',
    tests: [works(on('2026-02-11', NESSA, 'pattern on channel 30'), '*')],
  }),
  unit(9, 'quillmark-qb-5', {
    place: 'rack-1',
    addedOn: '2026-03-16',
    working: 'faulty',
    note: 'No sound by the loudspeaker; the earphone works.',
    tests: [
      dead(on('2026-03-17', TOBIN, 'whip broken off'), 'whip', 'does:whip-picture'),
      works(
        on('2026-03-17', TOBIN, 'pattern on channel 30'),
        'aerial',
        'does:aerial-picture',
        'does:earphone-sound',
      ),
    ],
  }),
  unit(10, 'lindrake-fp-40', {
    place: 'window',
    addedOn: '2026-01-12',
    working: 'works',
    holding: 'listed',
    stands: { input: 'hdmi' },
    remotePresent: true,
    tests: [works(on('2026-01-16', NESSA, 'every input in turn'), '*')],
  }),
  unit(11, 'lindrake-fp-40', {
    place: 'store-sets',
    addedOn: '2026-05-04',
    working: 'works',
    holding: 'spare',
    note: 'No remote; nobody has looked which input it stands on.',
    tests: [works(on('2026-05-05', TOBIN, 'lights up, menu seen'), 'does:hdmi-picture')],
  }),
  unit(12, 'jorvane-mv-14', {
    place: 'bench-right',
    addedOn: '2026-01-12',
    working: 'works',
    tests: [works(on('2026-01-13', TOBIN, 'with the MD-4'), '*')],
  }),
  unit(13, 'jorvane-m-21', {
    place: 'bench-right',
    addedOn: '2026-01-12',
    working: 'works',
    stands: { input: 'rgb' },
    tests: [
      works(on('2026-01-13', TOBIN, 'pattern on all five inputs'), '*'),
      dead(
        on('2026-04-20', TOBIN, '21-pin socket bent'),
        'av-composite-in',
        'av-rgb-in',
        'av-sound-in',
      ),
    ],
  }),
  unit(14, 'hollin-pm-12', {
    place: 'bench-left',
    addedOn: '2026-02-24',
    working: 'works',
    stands: { input: 'a' },
    tests: [works(on('2026-02-25', TOBIN, 'steady once the hold was turned'), '*')],
  }),
  unit(15, 'hollin-pm-9', {
    place: 'bench-left',
    addedOn: '2026-01-12',
    working: 'works',
    stands: { termination: '75-ohm' },
    tests: [works(on('2026-01-13', TOBIN, 'test pattern, and looped on'), '*')],
  }),
  unit(16, 'fennock-u-17', {
    place: 'away',
    addedOn: '2026-02-03',
    working: 'works',
    holding: 'gone',
    label: 'the set on loan',
    note: 'Lent to a customer while the own one is repaired; back in June.',
    tests: [works(on('2026-02-06', TOBIN, 'pattern on channel 30'), '*')],
  }),
]
