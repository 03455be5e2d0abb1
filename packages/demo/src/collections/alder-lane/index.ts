import { demoUid } from '../../uid'
import type { DemoCollection } from '../../demo-data'
import { DESMOND, INES, MAREN, TOBIN, WILMA } from '../people'
import { BOXES } from './boxes'
import { DRAWER } from './drawer'
import { PLACES } from './places'
import { SETS } from './sets'
import { SOURCES } from './sources'

const digital = (channel: string) => ({ plan: 'us-broadcast', channel, kind: 'digital' }) as const

/** A large household collection in a 525-line country, with five people in it. */
export const ALDER_LANE: DemoCollection = {
  uid: demoUid('c-alder-lane'),
  key: 'alder-lane',
  name: 'Alder Lane collection',
  market: '525-m',
  currency: 'USD',
  offAir: ['3', '8', '21', '24', '30', '34'].map(digital),
  members: [
    { person: MAREN, role: 'owner' },
    { person: TOBIN, role: 'collector' },
    { person: INES, role: 'restorer' },
    { person: DESMOND, role: 'reseller' },
    { person: WILMA, role: 'viewer' },
  ],
  places: PLACES,
  units: [...SETS, ...SOURCES, ...BOXES, ...DRAWER],
}
