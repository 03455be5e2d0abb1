import type { Role, RouteName } from '@coaxwain/contract'

/**
 * Who may use which route, written down by hand from the table of roles. It is kept apart from the
 * table that the server reads, so that the two can be compared.
 */
export type Access = 'anyone' | 'signed-in' | readonly Role[]

const ALL: Access = ['owner', 'collector', 'restorer', 'reseller', 'viewer']
const WRITERS: Access = ['owner', 'collector', 'restorer']

export const ACCESS: Readonly<Record<RouteName, Access>> = {
  readSession: 'anyone',
  signIn: 'anyone',
  signOut: 'signed-in',
  listDemoSignIns: 'anyone',
  listCollections: 'signed-in',
  readCollection: ALL,
  listMembers: ['owner'],
  listPlaces: ALL,
  createPlace: WRITERS,
  changePlace: WRITERS,
  deletePlace: WRITERS,
  listModels: ALL,
  readModel: ALL,
  createModel: WRITERS,
  changeModel: WRITERS,
  deleteModel: WRITERS,
  restoreModel: WRITERS,
  readModelRevision: ALL,
  listUnits: ALL,
  readUnit: ALL,
  createUnit: WRITERS,
  changeUnit: ['owner', 'collector', 'restorer', 'reseller'],
  deleteUnit: WRITERS,
  restoreUnit: WRITERS,
  changeUnitStates: WRITERS,
  changeStatesOfUnits: WRITERS,
  changeUnitModifications: WRITERS,
  changeUnitStands: WRITERS,
  readSnapshot: ALL,
  ask: ALL,
  arrange: ALL,
  prove: ALL,
  checkChain: ALL,
  listHookups: ALL,
  readHookup: ALL,
  saveHookup: WRITERS,
  renameHookup: WRITERS,
  deleteHookup: WRITERS,
  restoreHookup: WRITERS,
}
