import { whenWrong } from '@coaxwain/checker'
import type { Hookup, Question, Snapshot } from '@coaxwain/shelf'

/** What the worker is asked: a hookup with as much of the shelf as it rests on. */
export interface WhenWrongAsked {
  readonly snapshot: Snapshot
  readonly question: Question
  readonly hookup: Hookup
}

/** Runs the check once for every control that could stand otherwise; the page goes on meanwhile. */
addEventListener('message', ({ data }: MessageEvent<WhenWrongAsked>) => {
  postMessage(whenWrong(data.snapshot, data.question, data.hookup))
})
