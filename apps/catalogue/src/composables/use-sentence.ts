import { hasSentence, sentence } from '@coaxwain/wording'
import { useWords } from './use-words'

interface Coded {
  readonly code: string
  readonly details: Readonly<Record<string, string | number>>
}

/** Codes that come from the engine as sentences; whole or nothing, never a bare code. */
export function useSentence() {
  const { locale } = useWords()

  const sentenceOf = ({ code, details }: Coded): string => sentence(code, details, locale.value)

  /** A caution or reason: what matters first, and more about it where there is more. */
  const leadAndMore = (prefix: string, { code, details }: Coded) => {
    const full = `${prefix}.${code}`
    const more = `${full}.more`
    return {
      lead: sentenceOf({ code: full, details }),
      more: hasSentence(more) ? sentenceOf({ code: more, details }) : '',
    }
  }

  return { sentenceOf, leadAndMore }
}
