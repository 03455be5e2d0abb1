import { RF_BANDS, type UnitQuery } from '@coaxwain/contract'
import type { Knex } from 'knex'
import { likePatterns } from '../db/pages'

export type UnitFilters = Omit<UnitQuery, 'cursor' | 'limit' | 'sort' | 'place'> & {
  /** The place asked for, with all places in it. */
  readonly placeIds?: readonly number[] | undefined
}

type Query = Knex.QueryBuilder
type Where = Readonly<Record<string, unknown>>

const ofModel = (db: Knex, table: string, where: Where): Query =>
  db(table).select(db.raw('1')).whereRaw(`${table}.model_id = units.model_id`).where(where)

const ofUnit = (db: Knex, table: string, where: Where): Query =>
  db(table)
    .select(db.raw('1'))
    .whereRaw(`${table}.collection_id = units.collection_id and ${table}.unit_id = units.id`)
    .where(where)

const either = (query: Query, ...ways: readonly Query[]): void => {
  void query.where((q) => ways.forEach((way) => void q.orWhereExists(way)))
}

function bySearch(db: Knex, query: Query, text: string): void {
  for (const pattern of likePatterns(text)) {
    void query.where((q) =>
      q
        .where('units.label', 'like', pattern)
        .orWhere('models.sort_name', 'like', pattern)
        .orWhereRaw('convert(models.kind using utf8mb4) like ?', [pattern])
        .orWhereRaw('convert(units.number using utf8mb4) like ?', [pattern])
        .orWhere('units.serial', 'like', pattern)
        .orWhere('units.note', 'like', pattern)
        .orWhereExists(
          ofModel(db, 'model_aliases', {}).where('model_aliases.alias', 'like', pattern),
        ),
    )
  }
}

/** A socket or plug of the model, or one that was added to the unit. */
const byConnector = (db: Knex, query: Query, connector: string): void =>
  either(
    query,
    ofModel(db, 'model_ports', { 'model_ports.connector': connector, is_retired: false }),
    ofModel(db, 'model_plugs', { 'model_plugs.connector': connector }),
    ofUnit(db, 'unit_added_parts', { 'unit_added_parts.connector': connector }),
  )

function byForm(db: Knex, query: Query, form: string | undefined, dir: string | undefined): void {
  const wanted = (table: string): Where => ({
    ...(form === undefined ? {} : { [`${table}.form`]: form }),
    ...(dir === undefined ? {} : { [`${table}.dir`]: dir }),
  })
  either(
    query,
    ofModel(db, 'model_jacks', wanted('model_jacks')),
    ofUnit(db, 'unit_added_parts', wanted('unit_added_parts')).where(
      'unit_added_parts.part',
      'jack',
    ),
  )
}

/** `untested` has no rows of its own: it is a form that nothing was noted of. */
function byState(db: Knex, query: Query, state: string): void {
  if (state !== 'untested') {
    either(
      query,
      ofUnit(db, 'unit_form_states', { 'unit_form_states.state': state }),
      ofUnit(db, 'unit_function_states', { 'unit_function_states.state': state }),
    )
    return
  }
  const noted = ofUnit(db, 'unit_form_states', {}).whereRaw(
    'unit_form_states.jack_key = model_jack_ports.jack_key and unit_form_states.port_key = model_jack_ports.port_key',
  )
  void query.whereExists(ofModel(db, 'model_jack_ports', {}).whereNotExists(noted))
}

function byRfOutput(db: Knex, query: Query, filters: UnitFilters): void {
  const [low, high] = filters.rfOut ? RF_BANDS[filters.rfOut] : [0, Number.MAX_SAFE_INTEGER]
  const from = Math.max(low, filters.rfOutFromMhz ?? 0)
  const to = Math.min(high, filters.rfOutToMhz ?? 99_999)
  void query.whereExists(
    ofModel(db, 'model_rf_outputs', {})
      .where('model_rf_outputs.low_mhz', '<=', to)
      .where('model_rf_outputs.high_mhz', '>=', from),
  )
}

const byColumns = (filters: UnitFilters): Where =>
  Object.fromEntries(
    Object.entries({
      'models.uid': filters.model,
      'models.type': filters.type,
      'models.kind': filters.kind,
      'units.working': filters.working,
      'units.holding': filters.holding,
    }).filter(([, value]) => value !== undefined),
  )

type Restriction = readonly [
  wanted: (filters: UnitFilters) => unknown,
  restrict: (db: Knex, query: Query, filters: UnitFilters) => void,
]

const byFunction = (db: Knex, query: Query, kind: string | undefined): void =>
  void query.whereExists(ofModel(db, 'model_functions', { 'model_functions.kind': kind }))

const RESTRICTIONS: readonly Restriction[] = [
  [(f) => f.q, (db, query, f) => bySearch(db, query, f.q ?? '')],
  [(f) => f.connector, (db, query, f) => byConnector(db, query, f.connector ?? '')],
  [(f) => f.form ?? f.dir, (db, query, f) => byForm(db, query, f.form, f.dir)],
  [(f) => f.function, (db, query, f) => byFunction(db, query, f.function)],
  [(f) => f.state, (db, query, f) => byState(db, query, f.state ?? '')],
  [(f) => f.present, (_, query) => void query.whereNotIn('units.holding', ['sold', 'gone'])],
  [(f) => f.placeIds, (_, query, f) => void query.whereIn('units.place_id', f.placeIds ?? [])],
  [(f) => [f.rfOut, f.rfOutFromMhz, f.rfOutToMhz].some((v) => v !== undefined), byRfOutput],
]

/** Units of one collection under the filters of a list. */
export function filterUnits(db: Knex, collectionId: number, filters: UnitFilters): Query {
  const query = db('units')
    .join('models', 'models.id', 'units.model_id')
    .leftJoin('places', (on) =>
      on.on('places.collection_id', 'units.collection_id').andOn('places.id', 'units.place_id'),
    )
    .where('units.collection_id', collectionId)
    .where(byColumns(filters))
  void (filters.deleted === true
    ? query.whereNotNull('units.deleted_at')
    : query.whereNull('units.deleted_at'))
  for (const [wanted, restrict] of RESTRICTIONS) {
    if (wanted(filters)) restrict(db, query, filters)
  }
  return query
}
