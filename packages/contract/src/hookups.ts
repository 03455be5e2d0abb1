import { z } from 'zod'
import { page, pageQuery } from './page'
import { answer, hookup, question } from './question'
import { instant, name, queryFlag, uid, version } from './text'

export const answerReply = z.strictObject({
  question,
  answer,
  shelfVersion: version,
  catalogueVersion: version,
})
export type AnswerReply = z.infer<typeof answerReply>

export const answerRequest = z.strictObject({ question })

/** How a saved hookup stands against today's shelf. */
export const HOOKUP_LABELS = ['still-right', 'changed', 'unit-missing'] as const
export const hookupLabel = z.enum(HOOKUP_LABELS)
export type HookupLabel = z.infer<typeof hookupLabel>

export const hookupSummary = z.strictObject({
  uid,
  version,
  title: name(120),
  label: hookupLabel,
  source: uid,
  display: uid,
  savedAt: instant,
  changedAt: instant,
  deletedAt: instant.nullable(),
})
export type HookupSummary = z.infer<typeof hookupSummary>

export const hookupDetail = z.strictObject({
  ...hookupSummary.shape,
  question,
  hookup,
  /** Units that bear on it and are no longer as they were. */
  changedUnits: z.array(uid),
  missingUnits: z.array(uid),
  /** Models of leads and adapters of which too few are left. */
  missingPieces: z.array(uid),
})
export type HookupDetail = z.infer<typeof hookupDetail>

export const hookupQuery = z.strictObject({
  ...pageQuery,
  sort: z.enum(['title', '-title', 'saved', '-saved']).optional(),
  unit: uid.optional(),
  deleted: queryFlag.optional(),
})
export type HookupQuery = z.infer<typeof hookupQuery>

export const hookupPage = page(hookupSummary)
export type HookupPage = z.infer<typeof hookupPage>

export const newHookup = z.strictObject({
  uid: uid.optional(),
  title: name(120),
  question,
  hookup,
})
export type NewHookup = z.infer<typeof newHookup>

export const hookupChange = z.strictObject({ title: name(120) })
