import {
  CHAIN_VERDICTS,
  DEGRADATIONS,
  FINDING_WEIGHTS,
  type Chain,
  type ChainChecked,
} from '@coaxwain/shelf'
import { PLAN_IDS, QUALITIES, SOUNDS } from '@coaxwain/signal'
import { z } from 'zod'
import { hookup, question } from './question'
import type { Holds, Same } from './same'
import { key, line, uid, version } from './text'

const portRef = z.strictObject({ unit: uid, port: key })

const copy = z.int().min(0).max(1000)
const plug = z.int().min(0).max(40)

const chainDocument = z.strictObject({
  links: z
    .array(
      z.strictObject({
        from: portRef,
        pieces: z
          .array(
            z.strictObject({
              model: uid,
              copy: copy.optional(),
              wayRound: z.enum(['forward', 'reverse']).optional(),
              inPlug: plug.optional(),
              outPlug: plug.optional(),
            }),
          )
          .max(6),
        to: portRef,
      }),
    )
    .min(1)
    .max(24),
  ends: z
    .array(z.strictObject({ ...portRef.shape, model: uid, copy }))
    .max(10)
    .optional(),
  settings: z
    .array(
      z.strictObject({
        unit: uid,
        control: key,
        position: line(80),
        plan: z.enum(PLAN_IDS).optional(),
      }),
    )
    .max(60),
})

const finding = z.strictObject({
  code: z.string().regex(/^[a-z][a-z-]{0,59}$/),
  details: z.record(z.string(), z.union([z.string(), z.number()])),
  weight: z.enum(FINDING_WEIGHTS),
})

const judged = { verdict: z.enum(CHAIN_VERDICTS), findings: z.array(finding) }

const checkedDocument = z.strictObject({
  verdict: z.enum(CHAIN_VERDICTS),
  links: z.array(z.strictObject(judged)),
  units: z.array(z.strictObject({ unit: uid, ...judged })),
  whole: z.array(finding),
  picture: z
    .strictObject({
      colour: z.boolean(),
      quality: z.enum(QUALITIES),
      lumaMhz: z.number(),
      degradations: z.array(z.enum(DEGRADATIONS)),
    })
    .nullable(),
  sound: z.strictObject({ sound: z.enum(SOUNDS), from: uid.nullable() }),
  hookup,
})

export type ChainAgrees = [
  Holds<Same<z.infer<typeof chainDocument>, Chain>>,
  Holds<Same<z.infer<typeof checkedDocument>, ChainChecked>>,
]

export const chain: z.ZodType<Chain> = chainDocument
export const chainChecked: z.ZodType<ChainChecked> = checkedDocument

export const hookupCheckRequest = z.strictObject({ question, chain })

/** What the check says of a chain, and the shelf that it was held against. */
export const hookupCheckReply = z.strictObject({
  question,
  checked: chainChecked,
  shelfVersion: version,
  catalogueVersion: version,
})
export type HookupCheckReply = z.infer<typeof hookupCheckReply>
