import type {
  BodyOf,
  ManyStateChanges,
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
const NUMBERS_PAGE = '200'
/** A larger shelf shows its units without numbers from there on. */
const MOST_NUMBER_PAGES = 10

/** The units of a collection: the list under the filters of the address, and one unit in full. */
export const useUnits = defineStore('units', () => {
  const items = shallowRef<readonly UnitSummary[]>([])
  const next = shallowRef<string | null>(null)
  const total = ref(0)
  const places = shallowRef<readonly Place[]>([])
  const numbers = shallowRef<ReadonlyMap<string, number>>(new Map())
  const snapshot = useSnapshot()
  let asked = 0
  /** The shelf, in the state in which its units were last numbered. */
  let numbered = ''

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

  /** The numbers by which two units of a model are told apart: asked once for each state of the shelf. */
  async function ensureNumbers(collection: string): Promise<Result<void, Failure>> {
    const state = `${collection} ${snapshot.snapshot.shelfVersion}`
    if (numbered === state) return ok(undefined)
    numbered = state
    const found = new Map<string, number>()
    let cursor: string | null = null
    for (let i = 0; i < MOST_NUMBER_PAGES; i++) {
      const reply: Awaited<ReturnType<typeof numbersPage>> = await numbersPage(collection, cursor)
      if (numbered !== state) return ok(undefined)
      if (!reply.ok) {
        numbered = ''
        return err(reply.problem)
      }
      for (const { uid, number } of reply.value.items) found.set(uid, number)
      cursor = reply.value.next
      if (cursor === null) break
    }
    numbers.value = found
    return ok(undefined)
  }

  const numbersPage = (collection: string, cursor: string | null) =>
    call('listUnits', {
      params: { collection },
      query: { type: 'device', limit: NUMBERS_PAGE, ...(cursor ? { cursor } : {}) },
    })

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

  /** Marks everything that a hookup used as working, on all of its units or on none. */
  async function noteWorked(
    collection: string,
    used: readonly UsedParts[],
    evidence: { readonly on: string; readonly how: string },
  ): Promise<Result<void, Failure>> {
    const now = await Promise.all(used.map(({ unit }) => read(collection, unit)))
    const state = 'works' as const
    const units: ManyStateChanges['units'] = []
    for (const [i, { unit, forms, functions }] of used.entries()) {
      const reply = now[i]
      if (!reply) continue
      if (!reply.ok) return err(reply.problem)
      units.push({
        unit,
        version: reply.value.version,
        changes: {
          forms: forms.map((f) => ({ ...f, state, ...evidence })),
          functions: functions.map((key) => ({ function: key, state, ...evidence })),
        },
      })
    }
    const noted = await written(
      call('changeStatesOfUnits', { params: { collection }, body: { units } }),
    )
    return noted.ok ? ok(undefined) : err(noted.problem)
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
    numbers,
    list,
    ensureNumbers,
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
