import type { HookupDetail, HookupSummary } from '@coaxwain/contract'
import type { Standing } from './bearing'
import type { HookupRow } from './repository'

export const toHookupSummary = (row: HookupRow, now: Standing): HookupSummary => ({
  uid: row.uid,
  version: row.version,
  title: row.title,
  label: now.label,
  source: row.question.source.unit,
  display: row.question.display.unit,
  savedAt: row.savedAt.toISOString(),
  changedAt: row.changedAt.toISOString(),
  deletedAt: row.deletedAt?.toISOString() ?? null,
})

export const toHookupDetail = (row: HookupRow, now: Standing): HookupDetail => ({
  ...toHookupSummary(row, now),
  question: row.question,
  hookup: row.hookup,
  changedUnits: now.changedUnits,
  missingUnits: now.missingUnits,
  missingPieces: now.missingPieces,
})
