import { checkHookup, whenWrong } from '@coaxwain/checker'
import { createSearch, withParts, type CompiledShelf } from '@coaxwain/matcher'
import { answered, type Stands } from '@coaxwain/shelf'
import { cutSnapshot } from '../format/cut-snapshot'
import type { Asked, AskedWhenWrong, Held } from './messages'
import type { Course } from './queue'

export interface Shelved extends Held {
  readonly compiled: CompiledShelf
}

const stands: Stands = (shelf, question, hookup) => checkHookup(shelf, question, hookup).ok

/**
 * The same search, the same check and the same answer as on the server. When its patience ends, the best so
 * far is the answer, and says that it is not complete.
 */
export function* answerCourse(shelf: Shelved, asked: Asked): Course {
  const { snapshot, parts } = shelf
  const { id, question, patienceMs } = asked
  const start = performance.now()
  const search = createSearch(shelf.compiled, question, { parts })
  while (!search.done && performance.now() - start < patienceMs) {
    search.step(1)
    yield search.work
  }
  const answer = search.best()
  yield search.work
  const stocked = () => withParts(snapshot, parts)
  const reply = answered({ snapshot, stocked, question, answer }, stands)
  return reply ? { kind: 'answer', id, reply } : { kind: 'refused', id }
}

/** The check once for every control that could stand otherwise, on as much of the shelf as it takes. */
export function* whenWrongCourse({ snapshot }: Shelved, asked: AskedWhenWrong): Course {
  const { id, question, hookup } = asked
  yield 0
  const cut = cutSnapshot(snapshot, hookup, question)
  return { kind: 'wrongs', id, wrongs: whenWrong(cut, question, hookup) }
}
