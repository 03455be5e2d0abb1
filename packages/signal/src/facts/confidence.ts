/** How sure a fact is, and the words that stand beside a row of trade lore. */
export const FACT_CONFIDENCES = [
  'two independent sources agree',
  'one source',
  'one source (agrees with memory of the standard)',
  'from memory',
  'common practice',
] as const

export type FactConfidence = (typeof FACT_CONFIDENCES)[number]
