import { RF_BAND_NAMES } from '@coaxwain/contract'
import { FUNCTION_KINDS } from '@coaxwain/models'
import { HOLDING_STATES, TEST_STATES } from '@coaxwain/shelf'
import { CONNECTORS, FORMS } from '@coaxwain/signal'
import type { LocationQuery } from 'vue-router'
import type { UnitFilters } from '../../stores/units'

export const SHELF_TABS = ['units', 'leads', 'places'] as const
export type ShelfTab = (typeof SHELF_TABS)[number]

/** Everything by which the shelf is narrowed, as it stands in the address. Empty means any. */
export interface ShelfFilters {
  tab: ShelfTab
  q: string
  connector: string
  form: string
  function: string
  state: string
  place: string
  /** `present` unless chosen otherwise; `all` for every one. */
  holding: string
  rfOut: string
  sort: 'name' | '-name' | 'place' | '-place'
}

const SORTS = ['name', '-name', 'place', '-place'] as const

const inList = (list: readonly string[], value: unknown): string =>
  typeof value === 'string' && list.includes(value) ? value : ''

export const HOLDINGS = ['present', ...HOLDING_STATES] as const

export const readShelfFilters = (query: LocationQuery): ShelfFilters => ({
  tab: SHELF_TABS.find((t) => t === query['tab']) ?? 'units',
  q: typeof query['q'] === 'string' ? query['q'].slice(0, 100) : '',
  connector: inList(CONNECTORS, query['connector']),
  form: inList(FORMS, query['form']),
  function: inList(FUNCTION_KINDS, query['function']),
  state: inList(TEST_STATES, query['state']),
  place:
    typeof query['place'] === 'string' && /^[\w-]{22}$/.test(query['place']) ? query['place'] : '',
  holding: query['holding'] === 'all' ? '' : inList(HOLDINGS, query['holding']) || 'present',
  rfOut: inList(RF_BAND_NAMES, query['rfOut']),
  sort: SORTS.find((s) => s === query['sort']) ?? 'name',
})

/** Only what differs from the plain list goes into the address. */
export const writeShelfFilters = (f: ShelfFilters): Record<string, string> => {
  const all: Record<string, string> = {
    tab: f.tab === 'units' ? '' : f.tab,
    q: f.q,
    connector: f.connector,
    form: f.form,
    function: f.function,
    state: f.state,
    place: f.place,
    holding: f.holding === 'present' ? '' : f.holding === '' ? 'all' : f.holding,
    rfOut: f.rfOut,
    sort: f.sort === 'name' ? '' : f.sort,
  }
  return Object.fromEntries(Object.entries(all).filter(([, value]) => value !== ''))
}

export const toUnitQuery = (f: ShelfFilters): UnitFilters =>
  ({
    type: f.tab === 'leads' ? 'piece' : 'device',
    sort: f.sort,
    q: f.q || undefined,
    connector: f.connector || undefined,
    form: f.form || undefined,
    function: f.function || undefined,
    state: f.state || undefined,
    place: f.place || undefined,
    rfOut: f.rfOut || undefined,
    ...(f.holding === 'present'
      ? { present: 'true' }
      : { holding: f.holding === '' ? undefined : f.holding }),
  }) as UnitFilters

/** Filters that are set, the ordinary one about holding left out. */
export const countFilters = (f: ShelfFilters): number =>
  [f.connector, f.form, f.function, f.state, f.place, f.rfOut].filter((v) => v !== '').length +
  (f.holding === '' ? 0 : 1)
