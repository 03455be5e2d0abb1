import type { DemoUnit } from '../../demo-data'
import { NESSA, TOBIN } from '../people'
import { dead, on, works } from '../unit-maker'
import { unit } from './maker'

const DOWN = 'For 120 V: runs on the bench transformer only.'

/** Sets and sources from other countries, in for repair or for sale. */
export const VISITORS: readonly DemoUnit[] = [
  unit(40, 'lindrake-ms-28', {
    place: 'store-sets',
    addedOn: '2026-02-10',
    working: 'works',
    stands: { input: 'tv', system: 'bg', band: 'uhf' },
    tests: [works(on('2026-02-13', TOBIN, 'I and L, VHF and UHF'), '*')],
  }),
  unit(41, 'lindrake-cf-17', {
    place: 'bench-left',
    addedOn: '2026-03-02',
    working: 'works',
    stands: { input: 'av' },
    tests: [works(on('2026-03-04', TOBIN, 'with the MC-9, aerial and PERITEL'), '*')],
  }),
  unit(42, 'mistrand-mc-9', {
    place: 'bench-left',
    addedOn: '2026-03-02',
    working: 'works',
    stands: { system: 'l' },
    tests: [works(on('2026-03-04', TOBIN, 'with the CF-17'), '*')],
  }),
  unit(43, 'varnhope-gx-au', {
    place: 'counter',
    addedOn: '2026-03-16',
    working: 'works',
    holding: 'listed',
    tests: [works(on('2026-03-18', NESSA, 'channel 0 on the QB-5'), '*')],
  }),
  unit(44, 'oakhithe-gs-8', {
    place: 'counter',
    addedOn: '2026-03-16',
    working: 'works',
    holding: 'listed',
    note: 'Its 21-pin plug goes into every set here and belongs in none.',
    tests: [works(on('2026-03-18', TOBIN, 'channel 1 on the 13-R, cable 95'), 'rf-out')],
  }),
  unit(45, 'selvane-13-r', {
    place: 'bench-right',
    addedOn: '2026-03-16',
    working: 'works',
    stands: { 'tuner-plan': 'air' },
    remotePresent: true,
    note: DOWN,
    tests: [works(on('2026-03-18', TOBIN, 'with the GS-8'), '*')],
  }),
  unit(46, 'ostrel-14-c', {
    place: 'store-sets',
    addedOn: '2026-04-07',
    working: 'works',
    note: `${DOWN} Aerial isolator leaks: not to be connected.`,
    modifications: [{ kind: 'aerial-isolator', state: 'bad', on: '2026-04-10' }],
    tests: [works(on('2026-04-10', TOBIN, 'raster and hiss only'), 'does:vhf-picture')],
  }),
  unit(47, 'ostrel-19-l', {
    place: 'store-parts',
    addedOn: '2026-04-07',
    working: 'works',
    note: `${DOWN} Somebody has bridged the isolator: work on it is for people trained to do it.`,
    modifications: [{ kind: 'aerial-isolator', state: 'bypassed' }],
    tests: [works(on('2026-04-10', TOBIN, 'raster and hiss only'), 'does:vhf-picture')],
  }),
  unit(48, 'ostrel-9-m', {
    place: 'rack-1',
    addedOn: '2026-04-07',
    working: 'works',
    note: DOWN,
    tests: [works(on('2026-04-11', TOBIN, 'pattern on channel 3'), 'vhf', 'does:vhf-picture')],
  }),
  unit(49, 'varnhope-gx', {
    place: 'rack-3',
    addedOn: '2026-04-07',
    working: 'works',
    tests: [works(on('2026-04-11', TOBIN, 'channel 3 on the 13-R'), '*')],
  }),
  unit(50, 'lindrake-vx-5', {
    place: 'rack-2',
    addedOn: '2026-02-10',
    working: 'works',
    stands: { input: 'av-1' },
    remotePresent: true,
    tests: [works(on('2026-02-13', TOBIN, 'tape on AV 1 and channel 38'), '*')],
  }),
  unit(51, 'brindlow-tg-2', {
    place: 'counter',
    addedOn: '2026-02-10',
    working: 'works',
    holding: 'listed',
    tests: [works(on('2026-02-11', NESSA, 'on the QB-5'), '*')],
  }),
  unit(52, 'brindlow-tg-2', {
    place: null,
    addedOn: '2026-02-10',
    working: 'works',
    holding: 'sold',
    tests: [works(on('2026-02-11', NESSA, 'on the QB-5'), '*')],
  }),
  unit(53, 'mistrand-mc-9', {
    place: 'store-parts',
    addedOn: '2026-03-02',
    working: 'parts-only',
    note: 'Board corroded; case and keys good.',
    tests: [dead(on('2026-03-04', TOBIN, 'does not start'), 'does:program')],
  }),
]
