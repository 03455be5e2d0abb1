import { DEVICE_KINDS, FUNCTION_KINDS, MARKETS, PIECE_KINDS } from '@coaxwain/models'
import { CONNECTORS, FORMS } from '@coaxwain/signal'
import { z } from 'zod'
import { modelDocument } from './model-document'
import { page, pageQuery } from './page'
import { instant, line, name, queryFlag, uid, version } from './text'

export const MODEL_KINDS = [...DEVICE_KINDS, ...PIECE_KINDS] as const
export const modelKind = z.enum(MODEL_KINDS)

/** What lists and search boxes need of a model. */
export const modelSummary = z.strictObject({
  uid,
  type: z.enum(['device', 'piece']),
  kind: modelKind,
  maker: name(80),
  name: name(80),
  market: z.enum(MARKETS),
  aliases: z.array(z.string()),
  year: z.int().nullable(),
  /** Belongs to this collection alone; shared models are for everybody and not to be changed here. */
  own: z.boolean(),
  revision: version,
  version,
  connectors: z.array(z.enum(CONNECTORS)),
  forms: z.array(z.enum(FORMS)),
  functions: z.array(z.enum(FUNCTION_KINDS)),
  /** Units of it in this collection. */
  units: z.int().min(0),
})
export type ModelSummary = z.infer<typeof modelSummary>

export const MODEL_SORTS = ['maker', '-maker', 'changed', '-changed'] as const

export const modelQuery = z.strictObject({
  ...pageQuery,
  sort: z.enum(MODEL_SORTS).optional(),
  q: line(100).optional(),
  type: z.enum(['device', 'piece']).optional(),
  kind: modelKind.optional(),
  market: z.enum(MARKETS).optional(),
  connector: z.enum(CONNECTORS).optional(),
  function: z.enum(FUNCTION_KINDS).optional(),
  own: queryFlag.optional(),
  deleted: queryFlag.optional(),
})
export type ModelQuery = z.infer<typeof modelQuery>

export const modelPage = page(modelSummary)
export type ModelPage = z.infer<typeof modelPage>

/** A model with the description of its latest revision. */
export const modelDetail = z.strictObject({
  ...modelSummary.shape,
  document: modelDocument,
  changedAt: instant,
  deletedAt: instant.nullable(),
})
export type ModelDetail = z.infer<typeof modelDetail>

export const newModel = z.strictObject({ uid: uid.optional(), document: modelDocument })
export type NewModel = z.infer<typeof newModel>

export const modelChange = z.strictObject({ document: modelDocument })

export const modelRevision = z.strictObject({
  model: uid,
  revision: version,
  document: modelDocument,
  madeAt: instant,
})
export type ModelRevision = z.infer<typeof modelRevision>
