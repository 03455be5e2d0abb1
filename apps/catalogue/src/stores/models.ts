import type { ModelDetail, ModelSummary } from '@coaxwain/contract'
import type { Model } from '@coaxwain/models'
import { err, ok, type Result } from '@coaxwain/result'
import { defineStore } from 'pinia'
import { shallowRef } from 'vue'
import { call } from '../api/client'
import type { Failure } from '../api/failure'
import { useSnapshot } from './snapshot'

const PAGE = '200'
const MOST_PAGES = 25

/** Models that a collection sees. All of them are held, so that the search can forgive typos. */
export const useModels = defineStore('models', () => {
  const items = shallowRef<readonly ModelSummary[]>([])
  const snapshot = useSnapshot()

  async function loadAll(collection: string): Promise<Result<void, Failure>> {
    const all: ModelSummary[] = []
    let cursor: string | null = null
    for (let i = 0; i < MOST_PAGES; i++) {
      const reply: Awaited<ReturnType<typeof page>> = await page(collection, cursor)
      if (!reply.ok) return err(reply.problem)
      all.push(...reply.value.items)
      cursor = reply.value.next
      if (cursor === null) break
    }
    items.value = all
    return ok(undefined)
  }

  const page = (collection: string, cursor: string | null) =>
    call('listModels', {
      params: { collection },
      query: { sort: 'maker', limit: PAGE, ...(cursor ? { cursor } : {}) },
    })

  const read = (collection: string, model: string): Promise<Result<ModelDetail, Failure>> =>
    call('readModel', { params: { collection, model } })

  async function written<T>(write: Promise<Result<T, Failure>>): Promise<Result<T, Failure>> {
    const result = await write
    if (result.ok) snapshot.markStale()
    return result
  }

  const create = (
    collection: string,
    uid: string,
    document: Model,
  ): Promise<Result<ModelDetail, Failure>> =>
    written(call('createModel', { params: { collection }, body: { uid, document } }))

  const change = (
    collection: string,
    { uid, version }: ModelDetail,
    document: Model,
  ): Promise<Result<ModelDetail, Failure>> =>
    written(
      call('changeModel', { params: { collection, model: uid }, body: { document }, version }),
    )

  return { items, loadAll, read, create, change }
})
