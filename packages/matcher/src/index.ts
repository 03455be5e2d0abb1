export { CompiledShelf } from './compile/shelf'
export {
  compileShelf,
  createSearch,
  findHookups,
  type HookupSearch,
  type SearchOptions,
} from './create-search'
export { partUid, withParts, type Parts } from './reasons/purchases'
