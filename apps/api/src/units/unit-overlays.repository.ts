import type { FormState, FunctionState, Modification } from '@coaxwain/shelf'
import type { Knex } from 'knex'
import { parseJson } from '../db/json'
import { addedParts } from './added-parts'
import type { FormFound, FunctionFound, Overlays } from './unit-rows'

/** Where a unit is: its collection, and itself. */
export interface UnitKey {
  readonly collectionId: number
  readonly unitId: number
}

export const keyColumns = (key: UnitKey) => ({
  collection_id: key.collectionId,
  unit_id: key.unitId,
})

interface Evidence {
  readonly on: string | null
  readonly how: string | null
  readonly by: string | null
}

const toEvidence = ({ on, how, by }: Evidence) => ({
  ...(on === null ? {} : { on }),
  ...(how === null ? {} : { how }),
  ...(by === null ? {} : { by }),
})

const EVIDENCE = { state: 'state', on: 'found_on', how: 'how', by: 'by_name' }

type Found = FormFound | FunctionFound

const foundColumns = (found: Found) => ({
  state: found.state,
  found_on: found.on,
  how: found.how,
  by_person_id: found.byId,
  by_name: found.byName,
})

type FormRow = { unitId: number; jack: string; port: string; state: FormState['state'] } & Evidence
type FunctionRow = { unitId: number; function: string; state: FunctionState['state'] } & Evidence
type ModificationRow = { unitId: number; document: unknown }
type StandRow = { unitId: number; control: string; position: string }

/** What is noted of units beside their own rows: states, modifications, and where controls stand. */
export const createUnitOverlays = (db: Knex) => {
  const rowsOf = async <Row extends { unitId: number }>(
    table: string,
    columns: Readonly<Record<string, string>>,
    scope: { readonly collectionId: number; readonly unitIds: readonly number[] | 'all' },
  ): Promise<Map<number, Row[]>> => {
    const query = db(table)
      .where(`${table}.collection_id`, scope.collectionId)
      .orderBy(`${table}.id`)
      .select({ unitId: `${table}.unit_id`, ...columns })
    if (scope.unitIds !== 'all') void query.whereIn(`${table}.unit_id`, [...scope.unitIds])
    const found = new Map<number, Row[]>()
    for (const row of (await query) as Row[]) {
      found.set(row.unitId, [...(found.get(row.unitId) ?? []), row])
    }
    return found
  }

  /** Every state takes the place of the one before; `untested` leaves none. */
  const replaceStates = async <F extends Found>(
    table: string,
    key: UnitKey,
    found: readonly F[],
    place: (f: F) => Readonly<Record<string, string>>,
  ): Promise<void> => {
    const [first] = found
    if (!first) return
    const columns = Object.keys(place(first))
    const places = found.map((f) => Object.values(place(f)))
    await db(table).where(keyColumns(key)).whereIn(columns, places).delete()
    const rows = found
      .filter((f) => f.state !== 'untested')
      .map((f) => ({ ...keyColumns(key), ...place(f), ...foundColumns(f) }))
    if (rows.length > 0) await db(table).insert(rows)
  }

  return {
    async overlays(
      collectionId: number,
      unitIds: readonly number[] | 'all',
    ): Promise<(unitId: number) => Overlays> {
      const scope = { collectionId, unitIds }
      const [forms, functions, modifications, stands] = await Promise.all([
        rowsOf<FormRow>(
          'unit_form_states',
          { jack: 'jack_key', port: 'port_key', ...EVIDENCE },
          scope,
        ),
        rowsOf<FunctionRow>(
          'unit_function_states',
          { function: 'function_key', ...EVIDENCE },
          scope,
        ),
        rowsOf<ModificationRow>('unit_modifications', { document: 'document' }, scope),
        rowsOf<StandRow>('unit_stands', { control: 'control_key', position: 'position' }, scope),
      ])
      return (id) => ({
        forms: (forms.get(id) ?? []).map((f) => ({
          jack: f.jack,
          port: f.port,
          state: f.state,
          ...toEvidence(f),
        })),
        functions: (functions.get(id) ?? []).map((f) => ({
          function: f.function,
          state: f.state,
          ...toEvidence(f),
        })),
        modifications: (modifications.get(id) ?? []).map((m) =>
          parseJson<Modification>(m.document),
        ),
        stands: Object.fromEntries((stands.get(id) ?? []).map((s) => [s.control, s.position])),
      })
    },

    setFormStates: (key: UnitKey, found: readonly FormFound[]): Promise<void> =>
      replaceStates('unit_form_states', key, found, (f) => ({
        jack_key: f.jack,
        port_key: f.port,
      })),

    setFunctionStates: (key: UnitKey, found: readonly FunctionFound[]): Promise<void> =>
      replaceStates('unit_function_states', key, found, (f) => ({ function_key: f.function })),

    async setModifications(key: UnitKey, wanted: readonly Modification[]): Promise<void> {
      await db('unit_modifications').where(keyColumns(key)).delete()
      await db('unit_added_parts').where(keyColumns(key)).delete()
      if (wanted.length === 0) return
      await db('unit_modifications').insert(
        wanted.map((m, position) => ({
          ...keyColumns(key),
          position,
          kind: m.kind,
          document: JSON.stringify(m),
        })),
      )
      const parts = wanted.flatMap(addedParts)
      if (parts.length > 0) {
        await db('unit_added_parts').insert(parts.map((p) => ({ ...keyColumns(key), ...p })))
      }
    },

    async setStands(key: UnitKey, stands: Readonly<Record<string, string>>): Promise<void> {
      await db('unit_stands').where(keyColumns(key)).delete()
      const rows = Object.entries(stands).map(([control, position]) => ({
        ...keyColumns(key),
        control_key: control,
        position,
      }))
      if (rows.length > 0) await db('unit_stands').insert(rows)
    },
  }
}
