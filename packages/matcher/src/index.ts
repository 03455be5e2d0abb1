export { createSearch, findHookups, type HookupSearch } from './create-search'
