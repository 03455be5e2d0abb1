export { createSearch, findHookups, type HookupSearch, type SearchOptions } from './create-search'
export { partUid, withParts, type Parts } from './reasons/purchases'
