import type { Membership, Person } from '@coaxwain/contract'
import type { KnownPerson, MembershipRow } from './repository'

export const toPerson = ({ uid, name, email, locale }: KnownPerson): Person => ({
  uid,
  name,
  email,
  locale,
})

export const toMembership = (row: MembershipRow): Membership => ({
  collection: { uid: row.collectionUid, name: row.collectionName },
  role: row.role,
})
