import type {
  BodyOf,
  NewUnit,
  Place,
  QueryOf,
  StateChange,
  UnitChange,
  UnitDetail,
  UnitSummary,
} from '@coaxwain/contract'
import { err, ok, type Result } from '@coaxwain/result'
import { defineStore } from 'pinia'
import { ref, shallowRef } from 'vue'
import { call } from '../api/client'
import type { Failure } from '../api/failure'
import { createUid } from '../api/uid'
import type { UsedParts } from '../format/used-parts'
import { useSnapshot } from './snapshot'

export type UnitFilters = QueryOf<'listUnits'>

const PAGE = '60'

/** The units of a collection: the list under the filters of the address, and one unit in full. */
export const useUnits = defineStore('units', () => {
  const items = shallowRef<readonly UnitSummary[]>([])
  const next = shallowRef<string | null>(null)
  const total = ref(0)
  const places = shallowRef<readonly Place[]>([])
  const snapshot = useSnapshot()
  let asked = 0

  /** Only the newest of several running lists is shown. */
  async function list(
    collection: string,
    filters: UnitFilters,
    more = false,
  ): Promise<Result<void, Failure>> {
    const turn = ++asked
    const reply = await call('listUnits', {
      params: { collection },
      query: { ...filters, limit: PAGE, ...(more && next.value ? { cursor: next.value } : {}) },
    })
    if (turn !== asked) return ok(undefined)
    if (!reply.ok) return err(reply.problem)
    items.value = more ? [...items.value, ...reply.value.items] : reply.value.items
    next.value = reply.value.next
    total.value = reply.value.total
    return ok(undefined)
  }

  async function loadPlaces(collection: string): Promise<Result<void, Failure>> {
    const reply = await call('listPlaces', { params: { collection } })
    if (!reply.ok) return err(reply.problem)
    places.value = [...reply.value.items].sort((a, b) =>
      a.path.join(' / ').localeCompare(b.path.join(' / ')),
    )
    return ok(undefined)
  }

  async function createPlace(collection: string, name: string): Promise<Result<Place, Failure>> {
    const reply = await call('createPlace', {
      params: { collection },
      body: { uid: createUid(), name },
    })
    if (reply.ok) await loadPlaces(collection)
    return reply
  }

  const read = (collection: string, unit: string): Promise<Result<UnitDetail, Failure>> =>
    call('readUnit', { params: { collection, unit } })

  /** What a write changes is what answers rest on: the next reader fetches it anew. */
  async function written<T>(write: Promise<Result<T, Failure>>): Promise<Result<T, Failure>> {
    const result = await write
    if (result.ok) snapshot.markStale()
    return result
  }

  const create = (collection: string, body: NewUnit): Promise<Result<UnitDetail, Failure>> =>
    written(call('createUnit', { params: { collection }, body }))

  const change = (
    collection: string,
    { uid, version }: UnitDetail,
    body: UnitChange,
  ): Promise<Result<UnitDetail, Failure>> =>
    written(call('changeUnit', { params: { collection, unit: uid }, body, version }))

  const changeStates = (
    collection: string,
    { uid, version }: UnitDetail,
    body: StateChange,
  ): Promise<Result<UnitDetail, Failure>> =>
    written(call('changeUnitStates', { params: { collection, unit: uid }, body, version }))

  /** Marks everything that a hookup used as working; stops at the first unit that refuses. */
  async function noteWorked(
    collection: string,
    used: readonly UsedParts[],
    evidence: { readonly on: string; readonly how: string },
  ): Promise<Result<void, Failure>> {
    const state = 'works' as const
    for (const { unit, forms, functions } of used) {
      const now = await read(collection, unit)
      if (!now.ok) return err(now.problem)
      const noted = await changeStates(collection, now.value, {
        forms: forms.map((f) => ({ ...f, state, ...evidence })),
        functions: functions.map((key) => ({ function: key, state, ...evidence })),
      })
      if (!noted.ok) return err(noted.problem)
    }
    return ok(undefined)
  }

  const changeStands = (
    collection: string,
    { uid, version }: UnitDetail,
    body: BodyOf<'changeUnitStands'>,
  ): Promise<Result<UnitDetail, Failure>> =>
    written(call('changeUnitStands', { params: { collection, unit: uid }, body, version }))

  const changeModifications = (
    collection: string,
    { uid, version }: UnitDetail,
    body: BodyOf<'changeUnitModifications'>,
  ): Promise<Result<UnitDetail, Failure>> =>
    written(call('changeUnitModifications', { params: { collection, unit: uid }, body, version }))

  const remove = (collection: string, { uid, version }: UnitDetail) =>
    written(call('deleteUnit', { params: { collection, unit: uid }, version }))

  const restore = (
    collection: string,
    { uid, version }: UnitDetail,
  ): Promise<Result<UnitDetail, Failure>> =>
    written(call('restoreUnit', { params: { collection, unit: uid }, version: version + 1 }))

  return {
    items,
    next,
    total,
    places,
    list,
    loadPlaces,
    createPlace,
    read,
    create,
    change,
    changeStates,
    noteWorked,
    changeStands,
    changeModifications,
    remove,
    restore,
  }
})
