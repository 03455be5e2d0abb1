import {
  hasRight,
  PAGE_DEFAULT,
  type ModificationChange,
  type NewUnit,
  type StateChange,
  type UnitChange,
  type UnitDetail,
  type UnitPage,
  type UnitQuery,
} from '@coaxwain/contract'
import type { DeviceModel, Model } from '@coaxwain/models'
import type { Unit } from '@coaxwain/shelf'
import { AppError, notFound, unknownReference } from '../app-error'
import type { Order } from '../db/pages'
import type { Together } from '../db/transact'
import { isDuplicateOf } from '../db/translate-db-error'
import type { Scope } from '../http/call'
import type { ModelsService } from '../models/service'
import type { PlacesService } from '../places/service'
import { fingerprint } from '../uid'
import { mustHold, orLate, type At } from '../versioned'
import { toUnit, toUnitDetail, toUnitSummary } from './mapper'
import type { UnitsRepository } from './repository'
import type { Overlays, UnitFields, UnitRow } from './unit-rows'
import {
  modificationsMustFit,
  mustBeCountable,
  mustKeepAddedParts,
  onlyDevices,
  standsMustFit,
  statesMustFit,
  withAdditions,
} from './unit-rules'

export type UnitsService = ReturnType<typeof createUnitsService>

interface Needs {
  readonly units: UnitsRepository
  readonly inOne: Together<UnitsRepository>
  readonly models: ModelsService
  readonly places: PlacesService
  readonly today: () => string
}

const order = (column: string, descending = false): Order => ({
  column,
  descending,
  tie: 'units.uid',
})

const BY_PLACE = "coalesce(places.name, '')"

const ORDERS: Readonly<Record<NonNullable<UnitQuery['sort']>, Order>> = {
  name: order('units.sort_name'),
  '-name': order('units.sort_name', true),
  added: order('units.created_at'),
  '-added': order('units.created_at', true),
  changed: order('units.changed_at'),
  '-changed': order('units.changed_at', true),
  place: order(BY_PLACE),
  '-place': order(BY_PLACE, true),
}

const SORT_NAME_LENGTH = 170

const sortName = (label: string, model: { maker: string; name: string }): string =>
  (label.trim() === '' ? `${model.maker} ${model.name}` : label).slice(0, SORT_NAME_LENGTH)

interface Loaded {
  readonly row: UnitRow
  readonly model: Model
  readonly overlays: Overlays
}

export function createUnitsService({ units, inOne, models, places, today }: Needs) {
  const modelsOf = async (rows: readonly UnitRow[]): Promise<(row: UnitRow) => Model> => {
    const refs = rows.map((r) => ({ id: r.modelId, revision: r.revision }))
    const documents = await models.documents(refs)
    return (row) => {
      const model = documents.get(models.refKey({ id: row.modelId, revision: row.revision }))
      if (!model) throw new Error(`no document of model ${row.modelId}`)
      return model
    }
  }

  const load = async (scope: Scope, uid: string): Promise<Loaded> => {
    const row = await units.find(scope.collectionId, uid)
    if (!row) throw notFound()
    const [modelOf, overlaysOf] = await Promise.all([
      modelsOf([row]),
      units.overlays(scope.collectionId, [row.id]),
    ])
    return { row, model: modelOf(row), overlays: overlaysOf(row.id) }
  }

  const read = async (scope: Scope, uid: string): Promise<UnitDetail> => {
    const { row, model, overlays } = await load(scope, uid)
    const [paths, neededBy] = await Promise.all([
      places.paths(scope),
      units.neededBy({ collectionId: scope.collectionId, unitId: row.id }),
    ])
    const place = row.placeId === null ? null : (paths.get(row.placeId) ?? null)
    return toUnitDetail(row, { model, overlays, place }, neededBy)
  }

  /** For edits: what was deleted has to be brought back first. */
  const loadStanding = async (scope: Scope, uid: string): Promise<Loaded> => {
    const loaded = await load(scope, uid)
    if (loaded.row.deletedAt) throw notFound()
    return loaded
  }

  const deviceOf = ({ model }: Loaded, path: string): DeviceModel => {
    if (model.type !== 'device') throw onlyDevices(path)
    return model
  }

  const placeIdOf = async (
    repository: UnitsRepository,
    scope: Scope,
    place: string | null | undefined,
  ): Promise<number | null | undefined> => {
    if (place === undefined || place === null) return place
    const id = await repository.placeId(scope.collectionId, place)
    if (id === null) throw unknownReference('place')
    return id
  }

  /** Bumps the shelf, then the unit if its version still holds, then whatever hangs on it. */
  const edit = async (
    scope: Scope,
    at: At,
    fields: (repository: UnitsRepository) => Promise<UnitFields>,
    then: (repository: UnitsRepository) => Promise<void> = () => Promise.resolve(),
  ): Promise<UnitDetail> => {
    const by = scope.person.id
    await orLate(
      () =>
        inOne(async (repository) => {
          await repository.bumpShelf(scope.collectionId)
          const wanted = await fields(repository)
          mustHold(await repository.update(scope.collectionId, { ...at, by }, wanted))
          await then(repository)
        }),
      () => read(scope, at.uid),
    )
    return read(scope, at.uid)
  }

  const nothing = (): Promise<UnitFields> => Promise.resolve({})

  const mayChange = (scope: Scope, change: UnitChange): void => {
    if (hasRight(scope.role, 'shelf.write')) return
    const foreign = Object.keys(change).filter((field) => field !== 'holding')
    if (foreign.length === 0) return
    throw new AppError('forbidden', {
      errors: foreign.map((path) => ({ path, code: 'not-yours-to-change', details: {} })),
    })
  }

  return {
    read,

    async list(scope: Scope, query: UnitQuery): Promise<UnitPage> {
      const { cursor, limit = PAGE_DEFAULT, sort = 'name', place, ...filters } = query
      const placeIds = place === undefined ? undefined : await places.within(scope, place)
      if (placeIds === null) throw unknownReference('query.place')
      const wish = { order: ORDERS[sort], limit, cursor }
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
    },

    /** All units as the engine sees them, and the models that they are of. */
    async everything(scope: Scope): Promise<{ units: Unit[]; models: Map<string, Model> }> {
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
    },

    async create(scope: Scope, uid: string, wish: NewUnit): Promise<UnitDetail> {
      const model = await models.findRef(scope, wish.model)
      if (!model) throw unknownReference('model')
      mustBeCountable(model.type, wish.quantity)
      const { uid: _, ...content } = wish
      const madeFrom = fingerprint(content)
      const label = wish.label ?? ''
      try {
        await inOne(async (repository) => {
          await repository.bumpShelf(scope.collectionId)
          if (!(await repository.modelStands(model.id))) throw unknownReference('model')
          await repository.insert(scope.collectionId, {
            uid,
            number: await repository.takeNumber(scope.collectionId),
            modelId: model.id,
            modelHomeKey: model.homeKey,
            label,
            sortName: sortName(label, model),
            serial: wish.serial ?? '',
            note: wish.note ?? '',
            quantity: wish.quantity ?? 1,
            working: wish.working ?? 'untested',
            holding: wish.holding ?? 'kept',
            placeId: (await placeIdOf(repository, scope, wish.place)) ?? null,
            remotePresent: wish.remotePresent ?? true,
            madeFrom,
            by: scope.person.id,
          })
        })
      } catch (error) {
        if (!isDuplicateOf(error, 'units_uid')) throw error
        const there = await units.find(scope.collectionId, uid)
        if (there?.madeFrom !== madeFrom) throw new AppError('uid-taken')
      }
      return read(scope, uid)
    },

    async change(scope: Scope, at: At, change: UnitChange): Promise<UnitDetail> {
      mayChange(scope, change)
      const { row } = await loadStanding(scope, at.uid)
      mustBeCountable(row.modelType, change.quantity)
      const { place, ...rest } = change
      const model = { maker: row.maker, name: row.modelName }
      return edit(scope, at, async (repository) => ({
        ...(rest as UnitFields),
        ...(rest.label === undefined ? {} : { sortName: sortName(rest.label, model) }),
        ...(place === undefined
          ? {}
          : { placeId: (await placeIdOf(repository, scope, place)) ?? null }),
      }))
    },

    async changeStates(scope: Scope, at: At, change: StateChange): Promise<UnitDetail> {
      const loaded = await loadStanding(scope, at.uid)
      const device = deviceOf(loaded, 'forms')
      statesMustFit(withAdditions(device, loaded.overlays.modifications), change)
      const key = { collectionId: scope.collectionId, unitId: loaded.row.id }
      const noted = <F extends { on?: string | undefined; how?: string | undefined }>(f: F) => ({
        ...f,
        on: f.on ?? today(),
        how: f.how ?? null,
        byId: scope.person.id,
        byName: scope.person.name,
      })
      return edit(scope, at, nothing, async (repository) => {
        await repository.setFormStates(key, (change.forms ?? []).map(noted))
        await repository.setFunctionStates(key, (change.functions ?? []).map(noted))
      })
    },

    async changeModifications(
      scope: Scope,
      at: At,
      change: ModificationChange,
    ): Promise<UnitDetail> {
      const loaded = await loadStanding(scope, at.uid)
      const device = deviceOf(loaded, 'modifications')
      modificationsMustFit(device, change)
      const key = { collectionId: scope.collectionId, unitId: loaded.row.id }
      return edit(scope, at, nothing, async (repository) => {
        const whole = withAdditions(device, change.modifications)
        mustKeepAddedParts(whole, loaded.overlays, await repository.keysInHookups(key))
        await repository.setModifications(key, change.modifications)
      })
    },

    async changeStands(
      scope: Scope,
      at: At,
      stands: Readonly<Record<string, string>>,
    ): Promise<UnitDetail> {
      const loaded = await loadStanding(scope, at.uid)
      standsMustFit(deviceOf(loaded, 'stands'), stands)
      const key = { collectionId: scope.collectionId, unitId: loaded.row.id }
      return edit(scope, at, nothing, (repository) => repository.setStands(key, stands))
    },

    async remove(scope: Scope, at: At): Promise<void> {
      await loadStanding(scope, at.uid)
      const by = scope.person.id
      await orLate(
        () =>
          inOne(async (repository) => {
            await repository.bumpShelf(scope.collectionId)
            mustHold(await repository.setDeleted(scope.collectionId, { ...at, by }, true))
          }),
        () => read(scope, at.uid),
      )
    },

    async restore(scope: Scope, at: At): Promise<UnitDetail> {
      const { row } = await load(scope, at.uid)
      const by = scope.person.id
      await orLate(
        () =>
          inOne(async (repository) => {
            await repository.bumpShelf(scope.collectionId)
            if (!(await repository.modelStands(row.modelId))) throw unknownReference('model')
            mustHold(await repository.setDeleted(scope.collectionId, { ...at, by }, false))
          }),
        () => read(scope, at.uid),
      )
      return read(scope, at.uid)
    },
  }
}
