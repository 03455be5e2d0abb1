import { PAGE_DEFAULT, type UnitDetail, type UnitPage, type UnitQuery } from '@coaxwain/contract'
import type { Model } from '@coaxwain/models'
import type { Unit } from '@coaxwain/shelf'
import { notFound, unknownReference } from '../app-error'
import type { Scope } from '../http/call'
import type { ModelsService } from '../models/service'
import type { PlacesService } from '../places/service'
import { toUnit, toUnitDetail, toUnitSummary } from './mapper'
import type { UnitsRepository } from './repository'
import type { Overlays, UnitRow } from './unit-rows'

export interface Loaded {
  readonly row: UnitRow
  readonly model: Model
  readonly overlays: Overlays
}

/** Units with everything that is noted of them, for those who look and for those who are about to change. */
export function createUnitReading(
  units: UnitsRepository,
  models: ModelsService,
  places: PlacesService,
) {
  const modelsOf = async (rows: readonly UnitRow[]): Promise<(row: UnitRow) => Model> => {
    const refs = rows.map((r) => ({ id: r.modelId, revision: r.revision }))
    const documents = await models.documents(refs)
    return (row) => {
      const model = documents.get(models.refKey({ id: row.modelId, revision: row.revision }))
      if (!model) throw new Error(`no document of model ${row.modelId}`)
      return model
    }
  }

  const loadAll = async (scope: Scope, uids: readonly string[]): Promise<Map<string, Loaded>> => {
    const rows = await units.find(scope.collectionId, uids)
    const ids = rows.map((r) => r.id)
    const [modelOf, overlaysOf] = await Promise.all([
      modelsOf(rows),
      units.overlays(scope.collectionId, ids),
    ])
    return new Map(
      rows.map((row) => [row.uid, { row, model: modelOf(row), overlays: overlaysOf(row.id) }]),
    )
  }

  const load = async (scope: Scope, uid: string): Promise<Loaded> => {
    const loaded = (await loadAll(scope, [uid])).get(uid)
    if (!loaded) throw notFound()
    return loaded
  }

  const readAll = async (scope: Scope, uids: readonly string[]): Promise<UnitDetail[]> => {
    const loaded = await loadAll(scope, uids)
    const ids = [...loaded.values()].map(({ row }) => row.id)
    const [paths, neededBy] = await Promise.all([
      places.paths(scope),
      units.neededBy(scope.collectionId, ids),
    ])
    return uids.flatMap((uid) => {
      const found = loaded.get(uid)
      if (!found) return []
      const { row, model, overlays } = found
      const place = row.placeId === null ? null : (paths.get(row.placeId) ?? null)
      return [toUnitDetail(row, { model, overlays, place }, neededBy.get(row.id) ?? [])]
    })
  }

  /** For edits: what was deleted has to be brought back first. */
  const loadStanding = async (scope: Scope, uid: string): Promise<Loaded> => {
    const loaded = await load(scope, uid)
    if (loaded.row.deletedAt) throw notFound()
    return loaded
  }

  const read = async (scope: Scope, uid: string): Promise<UnitDetail> => {
    const [found] = await readAll(scope, [uid])
    if (!found) throw notFound()
    return found
  }

  const list = async (scope: Scope, query: UnitQuery): Promise<UnitPage> => {
    const { cursor, limit = PAGE_DEFAULT, sort = 'name', place, ...filters } = query
    const placeIds = place === undefined ? undefined : await places.within(scope, place)
    if (placeIds === null) throw unknownReference('query.place')
    const wish = { sort, limit, cursor }
    const page = await units.list(scope.collectionId, { ...filters, placeIds }, wish)
    const ids = page.items.map((r) => r.id)
    const [modelOf, overlaysOf, paths] = await Promise.all([
      modelsOf(page.items),
      units.overlays(scope.collectionId, ids),
      places.paths(scope),
    ])
    const items = page.items.map((row) =>
      toUnitSummary(row, {
        model: modelOf(row),
        overlays: overlaysOf(row.id),
        place: row.placeId === null ? null : (paths.get(row.placeId) ?? null),
      }),
    )
    return { items, next: page.next, total: page.total }
  }

  /** All units as the engine sees them, and the models that they are of. */
  const everything = async (
    scope: Scope,
  ): Promise<{ units: Unit[]; models: Map<string, Model> }> => {
    const rows = await units.all(scope.collectionId)
    const [modelOf, overlaysOf, paths] = await Promise.all([
      modelsOf(rows),
      units.overlays(scope.collectionId, 'all'),
      places.paths(scope),
    ])
    return {
      units: rows.map((row) =>
        toUnit(row, {
          overlays: overlaysOf(row.id),
          place: row.placeId === null ? null : (paths.get(row.placeId) ?? null),
        }),
      ),
      models: new Map(rows.map((row) => [row.modelUid, modelOf(row)])),
    }
  }

  return { loadAll, load, loadStanding, read, readAll, list, everything }
}
