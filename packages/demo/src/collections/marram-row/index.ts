import { demoUid } from '../../uid'
import type { DemoCollection } from '../../demo-data'
import { INES, RAFE, WILMA } from '../people'
import { DRAWER } from './drawer'
import { PLACES } from './places'
import { UNITS } from './units'

const digital = (channel: string) => ({ plan: 'uk-uhf', channel, kind: 'digital' }) as const

/** A small collection in a system I country, without one modulator that works. */
export const MARRAM_ROW: DemoCollection = {
  uid: demoUid('c-marram-row'),
  key: 'marram-row',
  name: 'Marram Row',
  market: '625-i',
  currency: 'GBP',
  offAir: ['22', '25', '28', '30', '41', '44'].map(digital),
  members: [
    { person: RAFE, role: 'owner' },
    { person: INES, role: 'restorer' },
    { person: WILMA, role: 'viewer' },
  ],
  places: PLACES,
  units: [...UNITS, ...DRAWER],
}
