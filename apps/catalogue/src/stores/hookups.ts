import type { AnswerReply, HookupDetail, HookupSummary } from '@coaxwain/contract'
import { err, ok, type Result } from '@coaxwain/result'
import type { Hookup, Question } from '@coaxwain/shelf'
import { defineStore } from 'pinia'
import { shallowRef } from 'vue'
import { call } from '../api/client'
import type { Failure } from '../api/failure'
import { createUid } from '../api/uid'
import { useEngine } from './engine'
import { useSnapshot } from './snapshot'

const MOST_ANSWERS = 24

/** Answers that were asked for, and hookups that were kept. */
export const useHookups = defineStore('hookups', () => {
  const saved = shallowRef<readonly HookupSummary[]>([])
  const savedTotal = shallowRef(0)
  const next = shallowRef<string | null>(null)
  const snapshot = useSnapshot()
  const engine = useEngine()
  /** Answers that still hold for the shelf as it is known here, the newest last. */
  const answers = new Map<string, AnswerReply>()

  const keyOf = (collection: string, question: Question): string =>
    JSON.stringify([collection, question])

  /** The same question about the same shelf is not asked again. */
  function known(key: string): AnswerReply | null {
    const reply = answers.get(key)
    return reply && snapshot.isAt(reply) ? reply : null
  }

  /** A search that was cut short may get further next time. */
  function keep(key: string, reply: AnswerReply): void {
    answers.delete(key)
    if (!reply.answer.complete) return
    answers.set(key, reply)
    for (const oldest of answers.keys()) {
      if (answers.size <= MOST_ANSWERS) break
      answers.delete(oldest)
    }
  }

  async function ask(
    collection: string,
    question: Question,
    signal?: AbortSignal,
  ): Promise<Result<AnswerReply, Failure>> {
    const key = keyOf(collection, question)
    const before = known(key)
    if (before) return ok(before)
    const reply = await call('ask', { params: { collection }, body: { question }, signal })
    if (!reply.ok) return err(reply.problem)
    keep(key, reply.value)
    return ok(reply.value)
  }

  /** Worked out on this device, from the shelf that is held here; null when that cannot be. */
  async function askHere(
    collection: string,
    question: Question,
    signal?: AbortSignal,
  ): Promise<AnswerReply | null> {
    if (!snapshot.holds(collection)) return null
    const key = keyOf(collection, question)
    const reply = known(key) ?? (await engine.ask(question, signal))
    if (reply) keep(key, reply)
    return reply
  }

  /** A question with one thing changed is answered here, at once; only what cannot be goes to the server. */
  async function askWhatIf(
    collection: string,
    question: Question,
    signal?: AbortSignal,
  ): Promise<Result<AnswerReply, Failure>> {
    const here = await askHere(collection, question, signal)
    return here ? ok(here) : ask(collection, question, signal)
  }

  async function loadSaved(collection: string, more = false): Promise<Result<void, Failure>> {
    const reply = await call('listHookups', {
      params: { collection },
      query: {
        sort: '-saved',
        limit: '20',
        ...(more && next.value ? { cursor: next.value } : {}),
      },
    })
    if (!reply.ok) return err(reply.problem)
    saved.value = more ? [...saved.value, ...reply.value.items] : reply.value.items
    next.value = reply.value.next
    savedTotal.value = reply.value.total
    return ok(undefined)
  }

  const read = (collection: string, hookup: string): Promise<Result<HookupDetail, Failure>> =>
    call('readHookup', { params: { collection, hookup } })

  const save = (
    collection: string,
    title: string,
    question: Question,
    hookup: Hookup,
  ): Promise<Result<HookupDetail, Failure>> =>
    call('saveHookup', {
      params: { collection },
      body: { uid: createUid(), title, question, hookup },
    })

  const rename = (
    collection: string,
    { uid, version }: HookupDetail,
    title: string,
  ): Promise<Result<HookupDetail, Failure>> =>
    call('renameHookup', { params: { collection, hookup: uid }, body: { title }, version })

  const remove = (
    collection: string,
    { uid, version }: HookupDetail,
  ): Promise<Result<void, Failure>> =>
    call('deleteHookup', { params: { collection, hookup: uid }, version })

  const restore = (
    collection: string,
    { uid, version }: HookupDetail,
  ): Promise<Result<HookupDetail, Failure>> =>
    call('restoreHookup', { params: { collection, hookup: uid }, version: version + 1 })

  return {
    saved,
    savedTotal,
    next,
    ask,
    askHere,
    askWhatIf,
    loadSaved,
    read,
    save,
    rename,
    remove,
    restore,
  }
})
