import type { WhenWrong } from '@coaxwain/checker'
import { ORDINARY_PARTS } from '@coaxwain/patterns'
import type { Answered, Hookup, Question, Snapshot } from '@coaxwain/shelf'
import { defineStore } from 'pinia'
import { ref } from 'vue'
import type { FromEngine, Outcome, ToEngine } from '../workers/messages'
import { useSnapshot } from './snapshot'

/** As long as the server is patient. */
const PATIENCE_MS = 5000

/** The engine that runs beside the page, over the shelf that the page holds. */
export const useEngine = defineStore('engine', () => {
  const store = useSnapshot()
  /** Small steps of the search that goes on now. */
  const work = ref(0)
  let worker: Worker | null = null
  let sent: Snapshot | null = null
  let last = 0
  const waiting = new Map<number, (outcome: Outcome | null) => void>()

  function settle(id: number, outcome: Outcome | null): void {
    const settled = waiting.get(id)
    waiting.delete(id)
    work.value = 0
    settled?.(outcome)
  }

  function hear({ data }: MessageEvent<FromEngine>): void {
    if (data.kind !== 'progress') settle(data.id, data)
    else if (waiting.has(data.id)) work.value = data.work
  }

  /** A worker that cannot run answers nobody; the next question starts another. */
  function fail(): void {
    worker?.terminate()
    worker = null
    sent = null
    for (const id of [...waiting.keys()]) settle(id, null)
  }

  function start(): Worker {
    const made = new Worker(new URL('../workers/engine.ts', import.meta.url), { type: 'module' })
    made.addEventListener('message', hear)
    made.addEventListener('error', fail)
    return made
  }

  const post = (message: ToEngine): void => worker?.postMessage(message)

  /** Sends the shelf once, so that questions can be asked when the network has gone. */
  function prepare(): void {
    worker ??= start()
    if (sent === store.snapshot) return
    sent = store.snapshot
    post({ kind: 'shelf', snapshot: store.snapshot, parts: ORDINARY_PARTS })
  }

  function callOff(id: number): void {
    if (!waiting.has(id)) return
    post({ kind: 'cancel', id })
    settle(id, null)
  }

  /** Null when it was called off, or cannot be worked out here. */
  function request(
    message: (id: number) => ToEngine,
    signal?: AbortSignal,
  ): Promise<Outcome | null> {
    if (signal?.aborted || !store.ready) return Promise.resolve(null)
    prepare()
    const id = ++last
    return new Promise((resolve) => {
      waiting.set(id, resolve)
      signal?.addEventListener('abort', () => callOff(id), { once: true })
      post(message(id))
    })
  }

  async function ask(question: Question, signal?: AbortSignal): Promise<Answered | null> {
    const message = (id: number): ToEngine => ({
      kind: 'ask',
      id,
      question,
      patienceMs: PATIENCE_MS,
    })
    const outcome = await request(message, signal)
    return outcome?.kind === 'answer' ? outcome.reply : null
  }

  async function whenWrong(
    question: Question,
    hookup: Hookup,
    signal: AbortSignal,
  ): Promise<readonly WhenWrong[] | null> {
    const outcome = await request((id) => ({ kind: 'when-wrong', id, question, hookup }), signal)
    return outcome?.kind === 'wrongs' ? outcome.wrongs : null
  }

  return { work, prepare, ask, whenWrong }
})
