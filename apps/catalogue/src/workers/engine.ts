import { compileShelf } from '@coaxwain/matcher'
import { answerCourse, whenWrongCourse, type Shelved } from './courses'
import type { FromEngine, ToEngine } from './messages'
import { createQueue } from './queue'

/** The engine beside the page: it holds one shelf and works out one thing after another. */
const queue = createQueue((message: FromEngine) => postMessage(message))
let shelf: Shelved | null = null

function take(message: ToEngine): void {
  if (message.kind === 'cancel') return queue.cancel(message.id)
  if (message.kind === 'shelf') {
    const { snapshot, parts } = message
    shelf = { snapshot, parts, compiled: compileShelf(snapshot) }
    return
  }
  if (!shelf) throw new Error('asked before there is a shelf')
  queue.add(
    message.id,
    message.kind === 'ask' ? answerCourse(shelf, message) : whenWrongCourse(shelf, message),
  )
}

addEventListener('message', ({ data }: MessageEvent<ToEngine>) => take(data))
