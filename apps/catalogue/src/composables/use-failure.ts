import { hasSentence, type Details } from '@coaxwain/wording'
import type { Failure } from '../api/failure'
import { useAnnouncer } from '../stores/announcer'
import { useWords } from './use-words'

/** Failures in words: what happened, what was kept, what to do. */
export function useFailure() {
  const { say } = useWords()
  const announcer = useAnnouncer()

  function words(failure: Failure): string {
    switch (failure.kind) {
      case 'offline':
        return say('failure.offline')
      case 'unreadable':
        return say('failure.unreadable', { status: failure.status })
      case 'problem':
        return (
          ofCode(`problem.${failure.problem.code}`, failure.problem.details) ??
          failure.problem.detail
        )
    }
  }

  const ofCode = (code: string, details: Details): string | null =>
    hasSentence(code) ? say(code, details) : null

  function tell(failure: Failure): void {
    announcer.warn(words(failure))
  }

  return { words, tell }
}
