import type { DemoUnit } from '../../demo-data'
import { INES, MAREN, TOBIN } from '../people'
import { dead, intermittent, on, works } from '../unit-maker'
import { unit } from './maker'

const asBought = '2026-01-05'

export const BOXES: readonly DemoUnit[] = [
  unit(137, 'pellmere-vm-2', {
    place: 'loft-3',
    addedOn: '2026-01-10',
    working: 'works',
    serial: 'B 0291',
    stands: { termination: '75-ohm' },
    tests: [
      works(
        on('2026-03-03', INES, 'disc to the 14-C, channels 3 and 4'),
        'video-in',
        'sound-in',
        'to-tv',
        'does:modulator',
      ),
    ],
  }),
  unit(138, 'pellmere-vm-2', {
    place: 'loft-3',
    addedOn: '2026-05-23',
    working: 'faulty',
    holding: 'spare',
    note: 'No pack; the channel switch is stiff.',
    tests: [
      dead(on('2026-05-24', INES, 'no carrier on either channel'), 'to-tv', 'does:modulator'),
    ],
  }),
  unit(139, 'varnhope-rm-1', {
    place: 'loft-3',
    addedOn: '2026-01-10',
    working: 'works',
    holding: 'spare',
    tests: [
      works(on('2026-02-07', TOBIN, 'channel 3'), 'video-in', 'sound-in', 'does:modulator'),
      intermittent(on('2026-02-07', TOBIN, 'lead breaks at the grommet'), 'rf-lead'),
    ],
  }),
  unit(140, 'corbray-hm-60', {
    place: 'loft-5',
    addedOn: '2026-04-25',
    working: 'works',
    tests: [
      works(
        on('2026-05-03', INES, 'channel 6, clean edges'),
        'video-in',
        'rf-out',
        'does:modulator',
      ),
    ],
  }),
  unit(141, 'fennock-um-3', {
    place: 'loft-3',
    addedOn: '2026-05-30',
    stands: { standard: 'i' },
    note: 'Came with the VX-5.',
  }),
  unit(143, 'hollin-sb-4', {
    place: 'front-shelf-1',
    addedOn: asBought,
    working: 'works',
    stands: { input: '1' },
    tests: [
      works(on('2026-01-17', MAREN, 'all three'), '*'),
      intermittent(on('2026-03-15', TOBIN, 'left drops on 3'), 'sound-3/sound-3-l'),
    ],
  }),
  unit(144, 'hollin-ab-1', {
    place: 'front-shelf-1',
    addedOn: asBought,
    working: 'works',
    stands: { switch: 'a' },
    tests: [works(on('2026-01-17', MAREN, 'aerial and player in turn'), '*')],
  }),
  unit(145, 'pellmere-gs-1', {
    place: 'loft-1',
    addedOn: asBought,
    working: 'works',
    stands: { switch: 'tv' },
    tests: [works(on('2026-02-16', TOBIN, 'with the GX'), 'game', 'tv', 'does:select-game')],
  }),
  unit(146, 'pellmere-gs-1', { place: 'loft-1', addedOn: '2026-02-15', holding: 'spare' }),
  unit(147, 'pellmere-as-1', {
    place: 'loft-1',
    addedOn: asBought,
    working: 'works',
    tests: [works(on('2026-01-21', TOBIN, 'turns over by itself'), '*')],
  }),
  unit(148, 'jorvane-ld-31', { place: 'garage-a', addedOn: '2026-04-04', holding: 'spare' }),
  unit(149, 'hollin-ct-4', { place: 'loft-5', addedOn: '2026-04-04' }),
  unit(150, 'hollin-rc-2', {
    place: 'garage-a',
    addedOn: '2026-04-04',
    working: 'works',
    tests: [
      works(
        on('2026-04-11', INES, 'converter box to the CT-27'),
        'rgb-rgb-in',
        'component',
        'does:matrix',
      ),
    ],
  }),
  unit(151, 'hollin-yc-1', {
    place: 'front-shelf-2',
    addedOn: asBought,
    working: 'works',
    tests: [works(on('2026-01-18', INES, 'no crawling dots on the CT-27'), '*')],
  }),
  unit(152, 'lindrake-hc-1', {
    place: 'bedroom',
    addedOn: '2026-02-02',
    working: 'works',
    stands: { standard: 'ntsc' },
    tests: [works(on('2026-02-03', MAREN, 'Q1 to the CT-20'), '*')],
  }),
  unit(153, 'hollin-da-4', {
    place: 'garage-a',
    addedOn: asBought,
    working: 'works',
    tests: [works(on('2026-01-25', INES, 'bars on three monitors'), '*')],
  }),
  unit(154, 'corbray-sp-2', {
    place: 'loft',
    addedOn: asBought,
    working: 'works',
    tests: [works(on('2026-01-25', INES, '4 dB each way'), '*')],
  }),
  unit(155, 'corbray-sp-2', { place: 'loft-5', addedOn: asBought, holding: 'spare' }),
  unit(156, 'corbray-cb-2', { place: 'loft-5', addedOn: asBought }),
  unit(157, 'corbray-dx-1', {
    place: 'loft-5',
    addedOn: asBought,
    working: 'works',
    tests: [works(on('2026-01-25', INES, 'both bands'), '*')],
  }),
  unit(158, 'pellmere-bs-3', {
    place: 'loft-1',
    addedOn: asBought,
    working: 'works',
    tests: [works(on('2026-03-03', INES, 'channel 4 to the 14-C'), 'in', 'vhf', 'does:to-vhf')],
  }),
  unit(159, 'corbray-am-12', {
    place: 'loft',
    addedOn: asBought,
    working: 'works',
    tests: [works(on('2026-01-25', INES, '12 dB on three channels'), '*')],
  }),
  unit(160, 'corbray-am-4', { place: 'loft-5', addedOn: '2026-04-25', holding: 'spare' }),
  unit(161, 'corbray-va-20', {
    place: 'bench',
    addedOn: asBought,
    working: 'works',
    tests: [works(on('2026-01-06', INES, 'turns through its range'), '*')],
  }),
  unit(162, 'corbray-ft-1', { place: 'loft-5', addedOn: asBought }),
  unit(163, 'corbray-mt-1', { place: 'loft-5', addedOn: asBought, holding: 'spare' }),
  unit(164, 'pellmere-ra-2', {
    place: 'front-room',
    addedOn: asBought,
    working: 'works',
    tests: [works(on('2026-01-10', MAREN, 'one weak station'), '*')],
  }),
  unit(165, 'corbray-ry-10', {
    place: 'roof',
    addedOn: asBought,
    working: 'works',
    tests: [works(on('2026-01-07', MAREN, 'seven stations by the CB-3'), '*')],
  }),
  unit(166, 'belloway-ls-2', {
    place: 'front-shelf-3',
    addedOn: asBought,
    working: 'works',
    stands: { input: 'optical' },
    tests: [
      works(on('2026-01-18', INES, 'large disc, both sides'), 'optical', 'does:optical-sound'),
    ],
  }),
  unit(167, 'belloway-mx-1', { place: 'loft-5', addedOn: asBought }),
]
