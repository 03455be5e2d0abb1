import type { DemoUnit } from '../../demo-data'
import { TOBIN } from '../people'
import { dead, intermittent, on, works } from '../unit-maker'
import { unit, untried } from './maker'

const lot = { place: 'store-boxes', addedOn: '2026-05-18' } as const
const set = { place: 'store-sets', addedOn: '2026-05-18' } as const
const parts = { place: 'store-parts', addedOn: '2026-05-18', working: 'parts-only' } as const

/** Lot of 18 May: a cleared house, most of it not looked at yet. */
export const SPARES: readonly DemoUnit[] = [
  untried(80, 'fennock-u-17', set),
  untried(81, 'fennock-s-25', { ...set, note: 'No remote.' }),
  untried(82, 'lindrake-ce-21', set),
  untried(83, 'quillmark-qb-5', set),
  untried(84, 'lindrake-ms-28', { ...set, note: 'Too heavy for one.' }),
  untried(85, 'fennock-dv-410', lot),
  untried(86, 'fennock-dv-410', lot),
  untried(87, 'fennock-dv-200', { ...lot, stands: { 'tv-shape': 'pan-scan' } }),
  untried(88, 'fennock-rv-22', lot),
  untried(89, 'fennock-rv-22', lot),
  untried(90, 'lindrake-vx-5', lot),
  untried(91, 'oakhithe-gs-16-i', { ...lot, note: 'No pack.' }),
  untried(92, 'mistrand-mc-16', lot),
  untried(93, 'brindlow-hc-20', { ...lot, note: 'Battery swollen: taken out and disposed of.' }),
  untried(94, 'selvane-tb-6', { ...lot, note: 'No remote.' }),
  untried(95, 'jorvane-tc-5', { ...lot, stands: { 'av-form': 'rgb' }, remotePresent: true }),
  untried(96, 'lindrake-q1', { ...lot, note: 'No remote.' }),
  untried(97, 'fennock-um-3', lot),
  untried(98, 'pellmere-hv-1', lot),
  untried(99, 'corbray-sc-10', lot),
  untried(100, 'hollin-es-2', lot),
  untried(101, 'corbray-sp-2e', lot),
  unit(102, 'fennock-u-17', {
    ...parts,
    note: 'Tube good, line transformer gone.',
    tests: [dead(on('2026-05-20', TOBIN, 'no raster'), 'does:aerial-picture')],
  }),
  unit(103, 'fennock-s-25', {
    ...parts,
    note: 'Cabinet broken; panels kept.',
  }),
  unit(104, 'fennock-rv-22', {
    ...parts,
    tests: [dead(on('2026-05-20', TOBIN, 'power supply burnt'), '*')],
  }),
  unit(105, 'oakhithe-gs-16-i', {
    ...lot,
    working: 'works',
    tests: [
      works(on('2026-05-21', TOBIN, 'one cartridge'), 'av-rgb-out', 'does:cartridge'),
      intermittent(on('2026-05-21', TOBIN, 'left drops out'), 'av-sound-out'),
    ],
  }),
  untried(106, 'lindrake-fp-40', { ...set, remotePresent: true }),
  untried(107, 'jorvane-mv-14', set),
  untried(108, 'fennock-ia-3', lot),
  untried(109, 'hollin-sx-1', lot),
]
