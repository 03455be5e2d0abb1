import type { Collection, Member } from '@coaxwain/contract'
import type { OffAir } from '@coaxwain/shelf'
import type { CollectionRow, MemberRow } from './repository'

export const toCollection = (row: CollectionRow, offAir: readonly OffAir[]): Collection => ({
  uid: row.uid,
  name: row.name,
  role: row.role,
  market: row.market as Collection['market'],
  currency: row.currency,
  offAir: [...offAir],
  shelfVersion: row.shelfVersion,
})

export const toMember = (row: MemberRow): Member => ({
  uid: row.uid,
  name: row.name,
  role: row.role,
  since: row.since.toISOString(),
})
