import type { FromEngine, Outcome } from './messages'

/** After that it is looked whether something has been called off. */
const SLICE_MS = 30

/** Work in small steps, each of which says how far it has got. */
export type Course = Generator<number, Outcome, void>

/**
 * Pieces of work in slices, so that each can be called off at any time. What throws ends the worker, and the
 * page asks elsewhere.
 */
export function createQueue(post: (message: FromEngine) => void) {
  const jobs = new Map<number, Course>()
  let running = false

  function end(outcome: Outcome): void {
    jobs.delete(outcome.id)
    post(outcome)
  }

  function advance(id: number, course: Course): void {
    const until = performance.now() + SLICE_MS
    let step = course.next()
    while (!step.done && performance.now() < until) step = course.next()
    if (step.done) return end(step.value)
    // Short work does not wait for long work: each gets its slice in turn.
    jobs.delete(id)
    jobs.set(id, course)
    post({ kind: 'progress', id, work: step.value })
  }

  function slice(): void {
    const [first] = jobs
    running = first !== undefined
    if (!first) return
    advance(...first)
    setTimeout(slice)
  }

  return {
    add(id: number, course: Course): void {
      jobs.set(id, course)
      if (!running) slice()
    },
    cancel(id: number): void {
      jobs.delete(id)
    },
  }
}
