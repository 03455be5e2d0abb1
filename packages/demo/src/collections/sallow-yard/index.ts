import { demoUid } from '../../uid'
import type { DemoCollection } from '../../demo-data'
import { DESMOND, NESSA, RAFE, TOBIN } from '../people'
import { BOXES } from './boxes'
import { DRAWER } from './drawer'
import { PLACES } from './places'
import { PLAYERS } from './players'
import { SETS } from './sets'
import { SPARES } from './spares'
import { VISITORS } from './visitors'

const digital = (channel: string) => ({ plan: 'uk-uhf', channel, kind: 'digital' }) as const

/** A small business that repairs and resells, in a system I country, with sets and sources from elsewhere. */
export const SALLOW_YARD: DemoCollection = {
  uid: demoUid('c-sallow-yard'),
  key: 'sallow-yard',
  name: 'Sallow Yard Repairs',
  market: '625-i',
  currency: 'GBP',
  offAir: ['33', '36', '40', '43', '46'].map(digital),
  members: [
    { person: NESSA, role: 'owner' },
    { person: TOBIN, role: 'restorer' },
    { person: DESMOND, role: 'reseller' },
    { person: RAFE, role: 'viewer' },
  ],
  places: PLACES,
  units: [...SETS, ...PLAYERS, ...VISITORS, ...BOXES, ...SPARES, ...DRAWER],
}
