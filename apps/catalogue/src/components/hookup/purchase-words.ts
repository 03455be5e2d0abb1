import { ORDINARY_PARTS } from '@coaxwain/patterns'
import type { Speak } from '../../format/words'

/** Each part by its name, with how many of it are needed. */
export function purchaseWords(parts: readonly string[], say: Speak): string {
  const counts = new Map<string, number>()
  for (const key of parts) counts.set(key, (counts.get(key) ?? 0) + 1)
  return [...counts]
    .map(([key, count]) => {
      const name = ORDINARY_PARTS[key]?.name ?? key
      return count === 1 ? name : say('answer.purchase-several', { count, name })
    })
    .join('; ')
}
