import { jack, onPort, one, picture, gives, plays, port } from '@coaxwain/models/build'
import type { Modification } from '@coaxwain/shelf'
import type { DemoUnit } from '../../demo-data'
import { NESSA, TOBIN } from '../people'
import { dead, intermittent, on, works } from '../unit-maker'
import { unit } from './maker'

/** A customer had the digital sound carrier of large discs led out (2.88 MHz, from memory). */
const soundCarrier: Modification = {
  kind: 'added',
  ports: [
    {
      ...port('ac3-rf', 'AC-3 RF', [one('ac3-rf', 'out')], {
        connector: 'phono-socket',
        origin: 'added',
        note: 'For a sound decoder, and no aerial output.',
      }),
      at: { face: 'back', row: 1, column: 0 },
    },
  ],
  jacks: [jack('ac3-rf', 'ac3-rf', 'out', onPort('ac3-rf', ['ac3-rf']))],
  functions: [],
  note: 'Added by a customer; neatly done.',
}

/** RGB on a 21-pin socket of its own, without the voltage that a set waits for. */
const rgbSocket: Modification = {
  kind: 'added',
  ports: [
    {
      ...port(
        'added-rgb',
        'RGB',
        (['r', 'g', 'b', 'cvbs'] as const).map((c) => one(c, 'out')),
        { connector: 'scart-socket', origin: 'added', impedanceOhm: 75 },
      ),
      at: { face: 'back', row: 1, column: 0 },
    },
  ],
  jacks: [jack('added-rgb', 'rgbs', 'out', onPort('added-rgb', ['r', 'g', 'b', 'cvbs']))],
  functions: [
    plays('program-rgb', 'Runs programs, in RGB on the added socket', [
      gives('added-rgb', [picture('312p50', 'rgb')]),
    ]),
  ],
  note: 'Pins 8 and 16 were left open.',
}

export const PLAYERS: readonly DemoUnit[] = [
  unit(20, 'fennock-dv-410', {
    place: 'counter',
    addedOn: '2026-01-12',
    working: 'works',
    holding: 'listed',
    stands: { 'tv-shape': 'letterbox', 'av-form': 'rgb' },
    remotePresent: true,
    tests: [works(on('2026-01-15', NESSA, 'disc on the S-25, RGB and composite'), '*')],
  }),
  unit(21, 'fennock-dv-410', {
    place: 'rack-1',
    addedOn: '2026-02-17',
    working: 'works',
    stands: { 'tv-shape': 'wide' },
    note: 'No remote, and its menu was left on wide.',
    tests: [works(on('2026-02-18', TOBIN, 'disc played, squeezed'), 'video-out', 'sound-out')],
  }),
  unit(22, 'fennock-dv-200', {
    place: 'counter',
    addedOn: '2026-01-20',
    working: 'works',
    holding: 'listed',
    stands: { 'tv-shape': 'letterbox' },
    remotePresent: true,
    tests: [works(on('2026-01-21', NESSA, 'disc played through'), '*')],
  }),
  unit(23, 'fennock-dv-200', {
    place: 'rack-1',
    addedOn: '2026-03-30',
    working: 'faulty',
    note: 'Freezes after ten minutes.',
    tests: [
      intermittent(on('2026-03-31', TOBIN, 'freezes when warm'), 'does:disc'),
      works(on('2026-03-31', TOBIN, 'menu, colour and both sides'), 'video-out', 'sound-out'),
    ],
  }),
  unit(24, 'fennock-rv-22', {
    place: 'rack-2',
    addedOn: '2026-01-12',
    working: 'works',
    stands: { input: 'tuner' },
    remotePresent: true,
    tests: [works(on('2026-01-17', TOBIN, 'tape and line on channel 34'), '*')],
  }),
  unit(25, 'fennock-rv-22', {
    place: 'rack-2',
    addedOn: '2026-04-13',
    working: 'faulty',
    note: 'Heads worn; electronics good.',
    tests: [
      dead(on('2026-04-14', TOBIN, 'snow from every tape'), 'does:tape'),
      works(
        on('2026-04-14', TOBIN, 'LINE through to channel 34'),
        'line-video',
        'line-sound',
        'rf-out',
        'does:line',
      ),
    ],
  }),
  unit(26, 'brindlow-hc-20', {
    place: 'counter',
    addedOn: '2026-02-10',
    working: 'works',
    holding: 'listed',
    tests: [works(on('2026-02-12', NESSA, 'tape to the S-25'), '*')],
  }),
  unit(27, 'brindlow-hc-20', {
    place: 'rack-1',
    addedOn: '2026-03-23',
    working: 'works',
    tests: [
      dead(on('2026-03-24', TOBIN, 'A/V socket worn out'), 'av-video', 'av-sound'),
      works(on('2026-03-24', TOBIN, 'tape by S-Video'), 's-video-out', 'does:tape'),
    ],
  }),
  unit(28, 'selvane-tb-6', {
    place: 'counter',
    addedOn: '2026-01-12',
    working: 'works',
    remotePresent: true,
    tests: [works(on('2026-01-19', NESSA, 'five stations by the IA-3'), '*')],
  }),
  unit(29, 'varnhope-hx', {
    place: 'counter',
    addedOn: '2026-03-02',
    working: 'works',
    holding: 'listed',
    tests: [works(on('2026-03-03', NESSA, 'one game on the FP-40'), '*')],
  }),
  unit(30, 'lindrake-q1', {
    place: 'shop-wall',
    addedOn: '2026-01-12',
    working: 'works',
    stands: { resolution: '750p60' },
    remotePresent: true,
    tests: [works(on('2026-01-16', NESSA, 'film on the FP-40'), 'hdmi-out', 'does:film')],
  }),
  unit(31, 'oakhithe-gs-16-i', {
    place: 'window',
    addedOn: '2026-01-26',
    working: 'works',
    holding: 'listed',
    tests: [works(on('2026-01-27', NESSA, 'two cartridges, RGB and aerial'), '*')],
  }),
  unit(32, 'oakhithe-gs-16-i', {
    place: 'rack-3',
    addedOn: '2026-02-23',
    working: 'works',
    tests: [
      dead(
        on('2026-02-24', TOBIN, 'AV socket cut away by somebody'),
        'av-composite-out',
        'av-rgb-out',
        'av-sound-out',
      ),
      works(on('2026-02-24', TOBIN, 'channel 36 on the U-17'), 'rf-out', 'does:cartridge'),
    ],
  }),
  unit(33, 'mistrand-mc-16', {
    place: 'counter',
    addedOn: '2026-02-03',
    working: 'works',
    holding: 'listed',
    tests: [works(on('2026-02-04', TOBIN, 'RGB, video and channel 36'), '*')],
  }),
  unit(34, 'mistrand-mc-16', {
    place: 'rack-3',
    addedOn: '2026-03-09',
    working: 'works',
    label: 'the computer with the extra socket',
    modifications: [rgbSocket],
    tests: [
      works(on('2026-03-11', TOBIN, 'RGB on the bench monitor'), 'added-rgb', 'does:program-rgb'),
      works(on('2026-03-11', TOBIN, 'channel 36 on the U-17'), 'rf-out', 'does:program'),
    ],
  }),
  unit(35, 'mistrand-md-16', {
    place: 'bench-right',
    addedOn: '2026-02-17',
    working: 'works',
    stands: { rate: 'tv-50' },
    tests: [works(on('2026-02-19', TOBIN, 'all three rates, M-21 and MV-14'), '*')],
  }),
  unit(36, 'mistrand-md-4', {
    place: 'bench-right',
    addedOn: '2026-01-12',
    working: 'works',
    stands: { 'screen-mode': 'text' },
    tests: [works(on('2026-01-13', TOBIN, 'on the MV-14'), '*')],
  }),
  unit(37, 'tarnbeck-ld-8', {
    place: 'rack-3',
    addedOn: '2026-04-07',
    working: 'works',
    note: 'For 120 V: runs on the bench transformer only.',
    modifications: [soundCarrier],
    tests: [works(on('2026-04-09', TOBIN, 'one side on the M-21'), 'video-out', 'does:disc')],
  }),
  unit(38, 'tarnbeck-dp-62', {
    place: 'rack-3',
    addedOn: '2026-04-07',
    working: 'works',
    stands: { 'tv-shape': 'letterbox', progressive: 'off', 'digital-sound': 'two-channels' },
    remotePresent: true,
    note: 'For 120 V: runs on the bench transformer only.',
    tests: [
      dead(on('2026-04-09', TOBIN, 'no picture on either'), 'video-out', 's-video-out'),
      works(on('2026-04-09', TOBIN, 'on the M-21'), 'component', 'sound-out', 'does:disc'),
    ],
  }),
]
