import type { Arrangement, ArrangementAnswer, ArrangementQuestion, Use } from '@coaxwain/shelf'
import { z } from 'zod'
import { hookup, linkDocument, questionDocument } from './question'
import type { Holds, Same } from './same'
import { uid, version } from './text'

/** So many sources, or so many displays, are wired at once at most. */
export const MOST_ENDS = 4

const { format, source, material, display, demands, avoid, offAir, assumedLeads } =
  questionDocument.shape

const arrangementQuestionDocument = z.strictObject({
  format,
  sources: z
    .array(z.strictObject({ ...source.shape, material }))
    .min(1)
    .max(MOST_ENDS),
  displays: z.array(display).min(1).max(MOST_ENDS),
  demands: demands.omit({ keepAerial: true }),
  avoid,
  offAir,
  assumedLeads,
})

const useDocument = z.strictObject({
  source: uid,
  display: uid,
  hookup,
  off: z.array(uid).max(40),
})

const arrangementDocument = z.strictObject({
  uses: z.array(useDocument).max(MOST_ENDS),
  links: z.array(linkDocument).max(400),
  axes: z.strictObject({ boxes: z.number(), pieces: z.number(), doubt: z.number() }),
})

const arrangementAnswerDocument = z.strictObject({
  format: z.literal(1),
  verdict: z.enum(['yes', 'none']),
  complete: z.boolean(),
  work: z.number(),
  arrangements: z.array(arrangementDocument),
})

export type ArrangementAgrees = [
  Holds<Same<z.infer<typeof arrangementQuestionDocument>, ArrangementQuestion>>,
  Holds<Same<z.infer<typeof useDocument>, Use>>,
  Holds<Same<z.infer<typeof arrangementDocument>, Arrangement>>,
  Holds<Same<z.infer<typeof arrangementAnswerDocument>, ArrangementAnswer>>,
]

export const arrangementQuestion: z.ZodType<ArrangementQuestion> = arrangementQuestionDocument
export const arrangementAnswer: z.ZodType<ArrangementAnswer> = arrangementAnswerDocument

export const arrangementRequest = z.strictObject({ question: arrangementQuestion })

export const arrangementReply = z.strictObject({
  question: arrangementQuestion,
  answer: arrangementAnswer,
  shelfVersion: version,
  catalogueVersion: version,
})
export type ArrangementReply = z.infer<typeof arrangementReply>
