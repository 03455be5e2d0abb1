import { PROOF_OBSTACLES, type Proof, type ProveAnswer, type ProveQuestion } from '@coaxwain/shelf'
import { z } from 'zod'
import { hookup, question, questionDocument } from './question'
import type { Holds, Same } from './same'
import { key, uid, version } from './text'

const signal = z.union([
  z.strictObject({ jack: key, port: key }),
  z.strictObject({ function: key }),
])

const proveQuestionDocument = z.strictObject({
  format: z.literal(1),
  unit: uid,
  signal: signal.optional(),
  avoid: questionDocument.shape.avoid,
})

const proofDocument = z.strictObject({
  question,
  hookup,
  seen: z.array(signal),
  heard: z.array(signal),
  several: z.boolean(),
})

const proveAnswerDocument = z.strictObject({
  format: z.literal(1),
  complete: z.boolean(),
  work: z.number(),
  proofs: z.array(proofDocument),
  left: z.array(z.strictObject({ signal, code: z.enum(PROOF_OBSTACLES) })),
})

export type ProofAgrees = [
  Holds<Same<z.infer<typeof proveQuestionDocument>, ProveQuestion>>,
  Holds<Same<z.infer<typeof proofDocument>, Proof>>,
  Holds<Same<z.infer<typeof proveAnswerDocument>, ProveAnswer>>,
]

export const proveQuestion: z.ZodType<ProveQuestion> = proveQuestionDocument
export const proveAnswer: z.ZodType<ProveAnswer> = proveAnswerDocument

export const proveRequest = z.strictObject({ question: proveQuestion })

export const proveReply = z.strictObject({
  question: proveQuestion,
  answer: proveAnswer,
  shelfVersion: version,
  catalogueVersion: version,
})
export type ProveReply = z.infer<typeof proveReply>
