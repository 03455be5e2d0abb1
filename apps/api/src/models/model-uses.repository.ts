import type { Modification } from '@coaxwain/shelf'
import type { Knex } from 'knex'
import { parseJson } from '../db/json'
import type { Part, PartKey } from './parts'

/** What the units of an own model hold on to. */
export const createModelUses = (db: Knex) => {
  const unitsOf = (collectionId: number, modelId: number): Knex.QueryBuilder =>
    db('units').where({
      'units.model_home_key': collectionId,
      'units.model_id': modelId,
      'units.collection_id': collectionId,
    })

  return {
    /** Units of an own model; those that were deleted can come back. */
    async unitCounts(
      collectionId: number,
      modelId: number,
    ): Promise<{ standing: number; all: number }> {
      return (await unitsOf(collectionId, modelId).first(
        db.raw('cast(coalesce(sum(units.deleted_at is null), 0) as unsigned) as standing'),
        db.raw('count(*) as `all`'),
      )) as { standing: number; all: number }
    },

    /** What was done to units of an own model, one list for each unit. */
    async modificationsOfUnits(collectionId: number, modelId: number): Promise<Modification[][]> {
      const rows = (await unitsOf(collectionId, modelId)
        .join('unit_modifications', (on) =>
          on
            .on('unit_modifications.collection_id', 'units.collection_id')
            .andOn('unit_modifications.unit_id', 'units.id'),
        )
        .orderBy('unit_modifications.id')
        .select('units.id as id', 'unit_modifications.document as document')) as {
        id: number
        document: unknown
      }[]
      const found = new Map<number, Modification[]>()
      for (const { id, document } of rows) {
        found.set(id, [...(found.get(id) ?? []), parseJson<Modification>(document)])
      }
      return [...found.values()]
    },

    /** Keys that states, stands, modifications or saved hookups of its units name. */
    async keysInUse(collectionId: number, modelId: number): Promise<PartKey[]> {
      const of = (table: string, part: Part, column: string): Knex.QueryBuilder =>
        unitsOf(collectionId, modelId)
          .join(table, (on) =>
            on
              .on(`${table}.collection_id`, 'units.collection_id')
              .andOn(`${table}.unit_id`, 'units.id'),
          )
          .select(db.raw('? as part', [part]), `${table}.${column} as key`)
      const bypassed = of('unit_modifications', 'function', 'kind')
        .clearSelect()
        .select(
          db.raw("'function' as part"),
          db.raw("json_value(unit_modifications.document, '$.function') as `key`"),
        )
        .where('unit_modifications.kind', 'bypassed')
      const inHookups = of('hookup_unit_parts', 'port', 'part_key')
        .clearSelect()
        .select('hookup_unit_parts.part', 'hookup_unit_parts.part_key as key')
      return (await of('unit_form_states', 'port', 'port_key').union([
        of('unit_form_states', 'jack', 'jack_key'),
        of('unit_function_states', 'function', 'function_key'),
        of('unit_stands', 'control', 'control_key'),
        bypassed,
        inHookups,
      ])) as PartKey[]
    },
  }
}
