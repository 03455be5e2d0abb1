import {
  hasRight,
  type ManyStateChanges,
  type ModificationChange,
  type NewUnit,
  type StateChange,
  type UnitChange,
  type UnitDetail,
} from '@coaxwain/contract'
import type { DeviceModel } from '@coaxwain/models'
import { AppError, unknownReference } from '../app-error'
import type { Together } from '../db/transact'
import { isDuplicateOf } from '../db/translate-db-error'
import type { Scope } from '../http/call'
import type { ModelsService } from '../models/service'
import type { PlacesService } from '../places/service'
import { fingerprint } from '../uid'
import { mustHold, orLate, type At } from '../versioned'
import type { UnitsRepository } from './repository'
import { createUnitReading, type Loaded } from './unit-reading.service'
import type { UnitFields } from './unit-rows'
import {
  modificationsMustFit,
  mustBeCountable,
  mustKeepAddedParts,
  mustNameEachOnce,
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

const SORT_NAME_LENGTH = 170

const sortName = (label: string, model: { maker: string; name: string }): string =>
  (label.trim() === '' ? `${model.maker} ${model.name}` : label).slice(0, SORT_NAME_LENGTH)

const keyOf = (scope: Scope, { row }: Loaded) => ({
  collectionId: scope.collectionId,
  unitId: row.id,
})

const deviceOf = ({ model }: Loaded, path: string): DeviceModel => {
  if (model.type !== 'device') throw onlyDevices(path)
  return model
}

function mustFit(loaded: Loaded, change: StateChange, path = ''): void {
  const device = deviceOf(loaded, `${path}forms`)
  statesMustFit(withAdditions(device, loaded.overlays.modifications), change, path)
}

function mayChange(scope: Scope, change: UnitChange): void {
  if (hasRight(scope.role, 'shelf.write')) return
  const foreign = Object.keys(change).filter((field) => field !== 'holding')
  if (foreign.length === 0) return
  throw new AppError('forbidden', {
    errors: foreign.map((path) => ({ path, code: 'not-yours-to-change', details: {} })),
  })
}

async function placeIdOf(
  repository: UnitsRepository,
  scope: Scope,
  place: string | null,
): Promise<number | null> {
  if (place === null) return null
  const id = await repository.placeId(scope.collectionId, place)
  if (id === null) throw unknownReference('place')
  return id
}

/** A change was judged by a revision of the model, which must still be the latest when it is written. */
async function mustBeLatest(
  repository: UnitsRepository,
  model: { readonly id: number; readonly revision: number },
): Promise<void> {
  const latest = await repository.modelRevision(model.id)
  if (latest === null) throw unknownReference('model')
  if (latest !== model.revision) throw new AppError('edited-meanwhile')
}

export function createUnitsService({ units, inOne, models, places, today }: Needs) {
  const reading = createUnitReading(units, models, places)
  const { loadAll, load, loadStanding, read, readAll } = reading

  /** Moves a unit to its next version; what was judged by its model is written only if that is still the same. */
  const moveOn = async (
    repository: UnitsRepository,
    scope: Scope,
    { row }: Loaded,
    version: number,
  ): Promise<void> => {
    await mustBeLatest(repository, { id: row.modelId, revision: row.revision })
    const at = { uid: row.uid, version, by: scope.person.id }
    mustHold(await repository.update(scope.collectionId, at, {}))
  }

  /** Bumps the shelf, then does everything in one transaction; all writers of a collection queue there. */
  const onShelf = <T>(
    scope: Scope,
    job: (repository: UnitsRepository) => Promise<T>,
    current: () => Promise<unknown>,
  ): Promise<T> =>
    orLate(
      () =>
        inOne(async (repository) => {
          await repository.bumpShelf(scope.collectionId)
          return job(repository)
        }),
      current,
    )

  const edit = async (
    scope: Scope,
    at: At,
    job: (repository: UnitsRepository) => Promise<void>,
  ): Promise<UnitDetail> => {
    await onShelf(scope, job, () => read(scope, at.uid))
    return read(scope, at.uid)
  }

  const noteStates = async (
    repository: UnitsRepository,
    scope: Scope,
    loaded: Loaded,
    change: StateChange,
  ): Promise<void> => {
    const noted = <F extends { on?: string | undefined; how?: string | undefined }>(f: F) => ({
      ...f,
      on: f.on ?? today(),
      how: f.how ?? null,
      byId: scope.person.id,
      byName: scope.person.name,
    })
    const key = keyOf(scope, loaded)
    await repository.setFormStates(key, (change.forms ?? []).map(noted))
    await repository.setFunctionStates(key, (change.functions ?? []).map(noted))
  }

  return {
    read,
    list: reading.list,
    everything: reading.everything,

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
          await mustBeLatest(repository, model)
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
            placeId: await placeIdOf(repository, scope, wish.place ?? null),
            remotePresent: wish.remotePresent ?? true,
            madeFrom,
            by: scope.person.id,
          })
        })
      } catch (error) {
        if (!isDuplicateOf(error, 'units_uid')) throw error
        const [there] = await units.find(scope.collectionId, [uid])
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
      const by = scope.person.id
      return edit(scope, at, async (repository) => {
        const fields = {
          ...(rest as UnitFields),
          ...(rest.label === undefined ? {} : { sortName: sortName(rest.label, model) }),
          ...(place === undefined ? {} : { placeId: await placeIdOf(repository, scope, place) }),
        }
        mustHold(await repository.update(scope.collectionId, { ...at, by }, fields))
      })
    },

    async changeStates(scope: Scope, at: At, change: StateChange): Promise<UnitDetail> {
      const loaded = await loadStanding(scope, at.uid)
      mustFit(loaded, change)
      return edit(scope, at, async (repository) => {
        await moveOn(repository, scope, loaded, at.version)
        await noteStates(repository, scope, loaded, change)
      })
    },

    /** All or nothing; the first unit whose version has moved on is shown as it is now. */
    async changeStatesOfMany(scope: Scope, { units: wishes }: ManyStateChanges) {
      const uids = wishes.map((w) => w.unit)
      mustNameEachOnce(uids)
      const found = await loadAll(scope, uids)
      const changes = wishes.map((wish, i) => {
        const loaded = found.get(wish.unit)
        if (!loaded || loaded.row.deletedAt) throw unknownReference(`units.${i}.unit`)
        mustFit(loaded, wish.changes, `units.${i}.changes.`)
        return { ...wish, loaded }
      })
      let reached = ''
      const job = async (repository: UnitsRepository): Promise<void> => {
        for (const { unit, version, changes: change, loaded } of changes) {
          reached = unit
          await moveOn(repository, scope, loaded, version)
          await noteStates(repository, scope, loaded, change)
        }
      }
      await onShelf(scope, job, () => read(scope, reached))
      return readAll(scope, uids)
    },

    async changeModifications(
      scope: Scope,
      at: At,
      change: ModificationChange,
    ): Promise<UnitDetail> {
      const loaded = await loadStanding(scope, at.uid)
      const device = deviceOf(loaded, 'modifications')
      modificationsMustFit(device, change)
      const whole = withAdditions(device, change.modifications)
      const key = keyOf(scope, loaded)
      return edit(scope, at, async (repository) => {
        await moveOn(repository, scope, loaded, at.version)
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
      return edit(scope, at, async (repository) => {
        await moveOn(repository, scope, loaded, at.version)
        await repository.setStands(keyOf(scope, loaded), stands)
      })
    },

    async remove(scope: Scope, at: At): Promise<void> {
      await loadStanding(scope, at.uid)
      const by = scope.person.id
      await onShelf(
        scope,
        async (repository) =>
          mustHold(await repository.setDeleted(scope.collectionId, { ...at, by }, true)),
        () => read(scope, at.uid),
      )
    },

    async restore(scope: Scope, at: At): Promise<UnitDetail> {
      const { row } = await load(scope, at.uid)
      const by = scope.person.id
      return edit(scope, at, async (repository) => {
        await mustBeLatest(repository, { id: row.modelId, revision: row.revision })
        mustBeCountable(row.modelType, row.quantity)
        mustHold(await repository.setDeleted(scope.collectionId, { ...at, by }, false))
      })
    },
  }
}
