import type { ModelDetail, ModelSummary } from '@coaxwain/contract'
import type { Model } from '@coaxwain/models'
import type { ModelFacets, ModelRow } from './repository'

/** Closed lists were checked when the row was written. */
export const toModelSummary = (row: ModelRow, facets: ModelFacets): ModelSummary => ({
  uid: row.uid,
  type: row.type,
  kind: row.kind as ModelSummary['kind'],
  maker: row.maker,
  name: row.name,
  market: row.market as ModelSummary['market'],
  aliases: facets.aliases,
  year: row.year,
  own: row.homeKey !== 0,
  revision: row.revision,
  version: row.version,
  connectors: facets.connectors as ModelSummary['connectors'],
  forms: facets.forms as ModelSummary['forms'],
  functions: facets.functions as ModelSummary['functions'],
  units: facets.units,
})

export const toModelDetail = (
  row: ModelRow,
  facets: ModelFacets,
  document: Model,
): ModelDetail => ({
  ...toModelSummary(row, facets),
  document,
  changedAt: row.changedAt.toISOString(),
  deletedAt: row.deletedAt?.toISOString() ?? null,
})
