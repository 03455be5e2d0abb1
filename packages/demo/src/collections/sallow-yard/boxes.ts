import type { DemoUnit } from '../../demo-data'
import { NESSA, TOBIN } from '../people'
import { dead, intermittent, on, works } from '../unit-maker'
import { unit } from './maker'

const ownedSince = '2026-01-12'

export const BOXES: readonly DemoUnit[] = [
  unit(60, 'corbray-hm-40', {
    place: 'bench-left',
    addedOn: ownedSince,
    working: 'works',
    tests: [works(on('2026-01-13', TOBIN, 'pattern on channel 30, levels measured'), '*')],
  }),
  unit(61, 'fennock-um-3', {
    place: 'rack-3',
    addedOn: '2026-02-17',
    working: 'faulty',
    stands: { standard: 'g' },
    tests: [dead(on('2026-02-18', TOBIN, 'no carrier'), 'rf-out', 'does:modulator')],
  }),
  unit(62, 'pellmere-hv-1', {
    place: 'counter',
    addedOn: '2026-03-02',
    working: 'works',
    holding: 'listed',
    stands: { standard: 'pal' },
    tests: [works(on('2026-03-03', NESSA, 'HX to the S-25'), '*')],
  }),
  unit(63, 'corbray-ha-3', {
    place: 'shop-wall',
    addedOn: ownedSince,
    working: 'works',
    tests: [works(on('2026-01-16', NESSA, 'menu of the Q1 on the FP-40'), '*')],
  }),
  unit(64, 'lindrake-hc-1', {
    place: 'shop-wall',
    addedOn: ownedSince,
    working: 'works',
    stands: { standard: 'pal' },
    tests: [works(on('2026-01-16', NESSA, 'Q1 to the S-25'), '*')],
  }),
  unit(65, 'corbray-sc-10', {
    place: 'rack-3',
    addedOn: '2026-04-07',
    working: 'works',
    stands: { standard: 'pal' },
    tests: [
      works(on('2026-04-12', TOBIN, 'LD-8 to the S-25'), 'video-in', 'video-out', 'does:convert'),
      intermittent(on('2026-04-12', TOBIN, 'right channel crackles'), 'sound-out/sound-out-r'),
    ],
  }),
  unit(66, 'jorvane-pc-2', {
    place: 'bench-right',
    addedOn: ownedSince,
    working: 'works',
    stands: { standard: 'pal' },
    tests: [works(on('2026-01-13', TOBIN, 'MD-4 on the S-25'), '*')],
  }),
  unit(67, 'hollin-rc-2', {
    place: 'shop-wall',
    addedOn: '2026-01-26',
    working: 'works',
    tests: [works(on('2026-01-27', NESSA, 'GS-16 to the FP-40'), '*')],
  }),
  unit(68, 'hollin-es-2', {
    place: 'shop-wall',
    addedOn: ownedSince,
    working: 'works',
    tests: [
      works(on('2026-01-15', NESSA, 'two players'), 'in-1-composite-in', 'does:select-1'),
      intermittent(on('2026-05-11', TOBIN, 'second input cuts out'), 'in-2-composite-in'),
    ],
  }),
  unit(69, 'hollin-sx-1', {
    place: 'counter',
    addedOn: '2026-01-20',
    working: 'works',
    holding: 'listed',
    stands: { way: 'out' },
    tests: [works(on('2026-01-21', NESSA, 'both ways'), '*')],
  }),
  unit(70, 'hollin-yc-2', {
    place: 'bench-left',
    addedOn: '2026-03-23',
    working: 'works',
    tests: [works(on('2026-03-24', TOBIN, 'HC-20 to the S-25'), '*')],
  }),
  unit(71, 'corbray-rj-2', { place: 'rack-3', addedOn: '2026-02-03' }),
  unit(72, 'corbray-sp-2e', {
    place: 'shop-wall',
    addedOn: ownedSince,
    working: 'works',
    tests: [works(on('2026-01-14', TOBIN, '4 dB each way'), '*')],
  }),
  unit(73, 'fennock-ua-18', {
    place: 'roof',
    addedOn: ownedSince,
    working: 'works',
    tests: [works(on('2026-01-14', TOBIN, 'five stations'), '*')],
  }),
  unit(74, 'fennock-ia-3', {
    place: 'counter',
    addedOn: ownedSince,
    working: 'works',
    holding: 'listed',
    tests: [works(on('2026-01-19', NESSA, 'five stations by the TB-6'), '*')],
  }),
  unit(75, 'hollin-sb-4', {
    place: 'shop-wall',
    addedOn: ownedSince,
    working: 'works',
    stands: { input: '1' },
    tests: [
      works(on('2026-01-15', NESSA, 'players in the window'), '*'),
      dead(on('2026-04-20', TOBIN, 'third position does not catch'), 'in-3', 'does:select-3'),
    ],
  }),
  unit(76, 'hollin-da-4', {
    place: 'bench-left',
    addedOn: ownedSince,
    working: 'works',
    tests: [works(on('2026-01-13', TOBIN, 'pattern on three monitors'), '*')],
  }),
]
