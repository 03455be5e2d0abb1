import { err, ok, type Result } from '@coaxwain/result'
import type { Snapshot } from '@coaxwain/shelf'
import { defineStore } from 'pinia'
import { computed, ref, shallowRef } from 'vue'
import { call } from '../api/client'
import type { Failure } from '../api/failure'
import { createLookup } from '../format/lookup'

const EMPTY: Snapshot = { shelfVersion: 0, catalogueVersion: 0, models: {}, units: [] }

/** One collection's units with the models they are of: what drawings, strips and search boxes rest on. */
export const useSnapshot = defineStore('snapshot', () => {
  const snapshot = shallowRef<Snapshot>(EMPTY)
  const of = ref<string | null>(null)
  const failure = shallowRef<Failure | null>(null)
  /** When the server was last asked for what is held. */
  const readAt = shallowRef<Date | null>(null)
  /** Whose units are held, fresh or stale. */
  let shown: string | null = null
  let loading: { collection: string; reply: Promise<Result<void, Failure>> } | null = null

  const lookup = computed(() => createLookup(snapshot.value))
  const ready = computed(() => snapshot.value !== EMPTY)

  function load(collection: string): Promise<Result<void, Failure>> {
    if (loading?.collection === collection) return loading.reply
    if (shown !== collection) snapshot.value = EMPTY
    const asked = new Date()
    const reply = call('readSnapshot', { params: { collection } }).then((r) => {
      if (loading?.collection === collection) loading = null
      failure.value = r.ok ? null : r.problem
      if (!r.ok) return err(r.problem)
      // The same shelf read again stays the same thing, so that nothing rests on it anew.
      if (shown !== collection || !isAt(r.value)) snapshot.value = r.value
      readAt.value = asked
      of.value = collection
      shown = collection
      return ok(undefined)
    })
    loading = { collection, reply }
    return reply
  }

  /** Whether an answer was worked out on the very shelf that is held here. */
  const isAt = (versions: Pick<Snapshot, 'shelfVersion' | 'catalogueVersion'>): boolean =>
    versions.shelfVersion === snapshot.value.shelfVersion &&
    versions.catalogueVersion === snapshot.value.catalogueVersion

  /** Whether this collection's shelf is here, fresh or stale. */
  const holds = (collection: string): boolean => ready.value && shown === collection

  /** Loads unless this collection is here already. */
  const ensure = async (collection: string): Promise<Result<void, Failure>> =>
    of.value === collection ? ok(undefined) : load(collection)

  /** What an answer names must be known here, so the shelf is read again if it has changed meanwhile. */
  async function whileKnown<T extends Pick<Snapshot, 'shelfVersion' | 'catalogueVersion'>>(
    collection: string,
    ask: () => Promise<Result<T, Failure>>,
  ): Promise<Result<T, Failure>> {
    const ready = await ensure(collection)
    if (!ready.ok) return ready
    const answered = await ask()
    if (!answered.ok || isAt(answered.value)) return answered
    const fresh = await load(collection)
    return fresh.ok ? answered : fresh
  }

  /** The next reader asks the server again; what is shown stays until then. */
  function markStale(): void {
    of.value = null
  }

  return {
    snapshot,
    lookup,
    ready,
    readAt,
    failure,
    isAt,
    holds,
    load,
    ensure,
    whileKnown,
    markStale,
  }
})
